import { polygonDistance } from '../geometry/polygon';
import { compareLabels } from '../layout/labels';
import type { LayoutDocument } from '../layout/document';
import { wavelength } from '../units/constants';
import type { Reason } from './estimate-result';
import { lengthWords } from './frequency-words';
import type { PairPlan } from './pair-plan';
import { hasWire, type DocumentScene } from './scene-from-document';

/** What a reader of the numbers must know of this layout, in sentences. */
export function warningsOf(document: LayoutDocument, scene: DocumentScene, plan: PairPlan): Reason[] {
  return [...planeWarnings(scene), ...obstacleWarnings(document), ...edgeWarnings(scene, plan)];
}

function planeWarnings({ ground, antennas }: DocumentScene): Reason[] {
  if (ground === 'plane' || !antennas.some(({ antenna }) => hasWire(antenna))) return [];
  return [
    {
      code: 'no-plane',
      message: 'No antenna stands on metal: the wires are computed in free space, without a plane.',
    },
  ];
}

function obstacleWarnings({ obstacles }: LayoutDocument): Reason[] {
  const names = Object.values(obstacles)
    .map(({ name }) => name)
    .sort((a, b) => a.localeCompare(b, 'en', { numeric: true }));
  if (names.length === 0) return [];
  return [
    {
      code: 'obstacle-not-modelled',
      message: `Not modelled, and credited with nothing: ${[...new Set(names)].join(', ')}.`,
    },
  ];
}

/** A whip nearer than a quarter wavelength to the edge of its metal does not stand on an infinite roof. */
function edgeWarnings({ antennas, ground }: DocumentScene, { patternFrequency }: PairPlan): Reason[] {
  if (ground !== 'plane') return [];
  return [...antennas]
    .sort((a, b) => compareLabels(a.antenna, b.antenna))
    .flatMap(({ antenna, surface, ports }) => {
      const frequency = patternFrequency.get(antenna.id);
      if (!surface?.conducting || frequency === undefined || ports.length === 0) return [];
      const distance = polygonDistance(surface.outline, antenna);
      const quarter = wavelength(frequency) / 4;
      if (distance >= quarter) return [];
      const message = `${antenna.label} stands ${lengthWords(distance)} from the edge of the metal, less than a quarter wavelength (${lengthWords(quarter)}).`;
      return [{ code: 'near-edge', message }];
    });
}
