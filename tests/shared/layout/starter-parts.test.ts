import { SPEED_OF_LIGHT } from '@/shared/units/constants';
import { antennaPartSchema, radioSchema } from '@/shared/layout/schema';
import { applyOperation } from '@/shared/layout/operations';
import { STARTER_PARTS } from '@/shared/layout/starter-parts';
import { BARE_ROOF, idOf, operationOf, whipAt } from './arbitrary-layout';

describe('the parts of a new shelf', () => {
  test.each(STARTER_PARTS.antennas.map((part) => [part.name, part] as const))(
    '%s can be stored and placed',
    (_name, part) => {
      expect(antennaPartSchema.parse(part)).toEqual(part);
      // a dipole stands on a mast: half of the longest is below its mount
      const antenna = whipAt(2, 0, { part, mountHeight: 1 });
      const operation = operationOf({ kind: 'add', collection: 'antennas', value: antenna });
      expect(applyOperation(BARE_ROOF, operation)).toMatchObject({ ok: true });
    },
  );

  test.each(STARTER_PARTS.radios.map((radio) => [radio.name, radio] as const))(
    '%s can be stored and used',
    (_name, radio) => {
      const placed = { ...radio, id: idOf(radio.name) };
      expect(radioSchema.parse(placed)).toEqual(placed);
      const operation = operationOf({ kind: 'add', collection: 'radios', value: placed });
      expect(applyOperation(BARE_ROOF, operation)).toMatchObject({ ok: true });
    },
  );

  test('a radio that only receives has no power and no transmit band, every other one has both', () => {
    for (const { name, receiveOnly, power, transmitBands } of STARTER_PARTS.radios) {
      expect([name, power > 0, transmitBands.length > 0]).toEqual([name, !receiveOnly, !receiveOnly]);
    }
  });

  test('names and element identifiers are all different', () => {
    const names = [...STARTER_PARTS.antennas, ...STARTER_PARTS.radios].map(({ name }) => name);
    const elements = STARTER_PARTS.antennas.flatMap(({ elements: all }) => all.map(({ id }) => id));
    expect(new Set(names).size).toBe(names.length);
    expect(new Set(elements).size).toBe(elements.length);
  });

  test('a wire is as long as its frequency asks, to the tenth of a millimetre', () => {
    const wires = STARTER_PARTS.antennas.flatMap(({ elements }) =>
      elements.flatMap((element) => (element.kind === 'wire' ? [element] : [])),
    );
    expect(wires.length).toBeGreaterThan(5);
    for (const { form, length, quarterWaveAt } of wires) {
      const wave = SPEED_OF_LIGHT / (quarterWaveAt ?? Number.NaN);
      const expected = (form === 'whip' ? 0.25 : 0.5) * 0.95 * wave;
      // 50 micrometres: half of the step that wire is cut in
      expect(Math.abs(length - expected)).toBeLessThanOrEqual(5.01e-5);
    }
  });
});
