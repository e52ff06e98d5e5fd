import type { Comment } from '@/shared/api/comments';
import type { Revision, RevisionDetail } from '@/shared/api/revisions';
import type { Estimate } from '@/shared/estimate/estimate-result';
import { createId } from '@/shared/ids';
import type { LayoutDocument, PlacedAntenna, Radio } from '@/shared/layout/document';

/** Comments, revisions and small documents for tests of the review; every field can be overridden. */

const AT = '2031-03-04T09:15:00.000Z';

export function buildComment(overrides: Partial<Comment> = {}): Comment {
  return {
    id: createId(),
    layoutId: createId(),
    revisionId: null,
    number: 1,
    target: { kind: 'spot', x: 1.2, y: -0.3 },
    text: 'Does the ladder still fit here?',
    author: { id: createId(), name: 'Rev Viewer', initials: 'RV' },
    createdAt: AT,
    resolvedAt: null,
    resolvedBy: null,
    replies: [],
    abilities: { reply: true, resolve: true },
    ...overrides,
  };
}

export function buildRevision(overrides: Partial<Revision> = {}): Revision {
  return {
    id: createId(),
    layoutId: createId(),
    letter: 'A',
    state: 'saved',
    hash: '0123456789abcdef'.repeat(4),
    note: '',
    sequence: 7,
    savedBy: 'Ina Integrator',
    savedAt: AT,
    events: [{ kind: 'saved', by: 'Ina Integrator', at: AT, reason: null }],
    abilities: { submit: false, return: false, freeze: false, comment: false },
    ...overrides,
  };
}

export function buildRadio(overrides: Partial<Radio> = {}): Radio {
  return {
    id: createId(),
    name: 'UHF radio',
    receiveOnly: false,
    transmitBands: [{ from: 455e6, to: 465e6 }],
    receiveBands: [{ from: 455e6, to: 465e6 }],
    power: 25,
    noiseDbcPerHz: -150,
    noiseFigureDb: 7,
    bandwidth: 12_500,
    overloadDbm: -20,
    rejections: [],
    ...overrides,
  };
}

export function buildAntenna(overrides: Partial<PlacedAntenna> = {}): PlacedAntenna {
  return {
    id: createId(),
    label: 'A1',
    name: 'UHF',
    part: {
      name: 'Quarter-wave whip, 460 MHz',
      elements: [
        {
          id: createId(),
          kind: 'wire',
          form: 'whip',
          length: 0.155,
          radius: 0.001,
          quarterWaveAt: 460e6,
          offset: { x: 0, y: 0, z: 0 },
        },
      ],
    },
    x: 1.55,
    y: 0.02,
    mountHeight: 0,
    azimuthDeg: 0,
    tiltDeg: 0,
    radioId: null,
    feederLossDb: 0,
    ...overrides,
  };
}

/** A bare rectangular roof of 3.2 m by 1.48 m with the given antennas and radios. */
export function buildDocument(
  parts: { readonly antennas?: readonly PlacedAntenna[]; readonly radios?: readonly Radio[] } = {},
  overrides: Partial<LayoutDocument> = {},
): LayoutDocument {
  const outline = [
    { x: 0, y: -0.74 },
    { x: 3.2, y: -0.74 },
    { x: 3.2, y: 0.74 },
    { x: 0, y: 0.74 },
  ];
  const surfaceId = createId();
  return {
    version: 1,
    platform: {
      kind: 'vehicle',
      name: 'Roof',
      starter: 'van-roof',
      length: 3.2,
      width: 1.48,
      height: 2.5,
      outline,
      datum: 'middle of the rear edge of the roof',
      forwardAxis: 'forward',
    },
    surfaces: { [surfaceId]: { id: surfaceId, name: 'Roof', outline, height: 2.5, conducting: true } },
    obstacles: {},
    keepOuts: {},
    mountPoints: {},
    cableEntries: {},
    radios: byId(parts.radios ?? []),
    neverTogether: {},
    antennas: byId(parts.antennas ?? []),
    ...overrides,
  };
}

export function buildEstimate(overrides: Partial<Estimate> = {}): Estimate {
  return {
    solverVersion: '1',
    model: 'live',
    assumption: 'infinite flat metal roof',
    pairs: [],
    antennas: {},
    counts: { clear: 0, tight: 0, lacking: 0, 'not held': 0, 'never together': 0 },
    warnings: [],
    ...overrides,
  };
}

export function buildRevisionDetail(overrides: Partial<RevisionDetail> = {}): RevisionDetail {
  return {
    ...buildRevision(),
    job: 'Patrol van 7',
    platform: 'Roof',
    layout: 'Layout 2',
    document: buildDocument(),
    results: buildEstimate(),
    solverVersion: '1',
    ...overrides,
  };
}

function byId<T extends { readonly id: string }>(items: readonly T[]): Record<string, T> {
  return Object.fromEntries(items.map((item) => [item.id, item]));
}
