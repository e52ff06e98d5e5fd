import type { AntennaPart, LayoutDocument, NeverTogether, PlacedAntenna, Radio } from '../document';
import { idFromName } from '../named-id';
import { buildPlatformDocument, type Dimensions } from '../starter-platforms';
import type { ShelfRadio } from '../starter-parts';

/** An antenna of a demo layout; its mark is its place in the list. */
export type DemoAntenna = {
  readonly name: string;
  readonly part: AntennaPart;
  readonly radio: string | null;
  readonly x: number;
  readonly y: number;
  readonly mountHeight?: number;
  readonly feederLossDb: number;
};

/** What a demo layout is made of. */
export type DemoLayout = {
  readonly key: string;
  readonly starter: string;
  readonly platformName: string;
  readonly dimensions?: Dimensions;
  readonly radios: Readonly<Record<string, ShelfRadio>>;
  readonly neverTogether?: readonly { readonly radios: readonly [string, string]; readonly rule: string }[];
  readonly antennas: readonly DemoAntenna[];
};

/**
 * The document of a demo layout, always the same one.
 * @throws Error when its starter refuses the dimensions: the demo data is broken.
 */
export function demoDocument(layout: DemoLayout): LayoutDocument {
  const built = buildPlatformDocument(layout.starter, layout.dimensions);
  if (!built.ok) throw new Error(`demo layout ${layout.key}: ${built.refusal.message}`);
  const radioId = (key: string) => idFromName(`demo/${layout.key}/radio/${key}`);
  const radios = Object.entries(layout.radios).map(([key, radio]): Radio => ({ id: radioId(key), ...radio }));
  const rules = (layout.neverTogether ?? []).map(({ radios: pair, rule }): NeverTogether => {
    const [one, other] = pair;
    return {
      id: idFromName(`demo/${layout.key}/never/${one}/${other}`),
      radioIds: [radioId(one), radioId(other)],
      rule,
    };
  });
  const antennas = layout.antennas.map((antenna, index): PlacedAntenna => {
    const label = `A${index + 1}`;
    return {
      id: idFromName(`demo/${layout.key}/antenna/${label}`),
      label,
      name: antenna.name,
      part: antenna.part,
      x: antenna.x,
      y: antenna.y,
      mountHeight: antenna.mountHeight ?? 0,
      azimuthDeg: 0,
      tiltDeg: 0,
      radioId: antenna.radio === null ? null : radioId(antenna.radio),
      feederLossDb: antenna.feederLossDb,
    };
  });
  return {
    ...built.value,
    platform: { ...built.value.platform, name: layout.platformName },
    radios: byId(radios),
    neverTogether: byId(rules),
    antennas: byId(antennas),
  };
}

function byId<T extends { readonly id: string }>(objects: readonly T[]): Record<string, T> {
  return Object.fromEntries(objects.map((object) => [object.id, object]));
}
