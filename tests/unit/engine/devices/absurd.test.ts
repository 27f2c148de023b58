/* Devices and tanks under any input, absurd ones included: a result with finite figures, or a refusal with a sentence; never a throw. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DEVICE_METHODS } from '../../../../src/engine/methods/j-devices';
import { TANK_METHODS } from '../../../../src/engine/methods/k-tanks';
import { type Dimension, dimensionOf, UNITS } from '../../../../src/engine/quantity';
import { type Method, type MethodInput } from '../../../../src/engine/catalog';

const unitsOf = (dimension: Dimension) => Object.keys(UNITS).filter((key) => dimensionOf(key) === dimension);
const size = fc.oneof(
  fc.double({ min: 1e-3, max: 1e4, noNaN: true }),
  fc.double({ min: 0.01, max: 1, noNaN: true }),
  fc.constantFrom(0, -1, 1, 1e-300, 1e300, -1e12, Number.POSITIVE_INFINITY, Number.NaN, 1.4, 300),
);

/** Sizes that occur, in one unit of each dimension, so that most sheets come to their end. */
const USUAL: Partial<Record<Dimension, [string, number, number]>> = {
  'pressure-gauge': ['bar_g', 0.1, 30],
  'pressure-absolute': ['bar_abs', 0.5, 40],
  'pressure-difference': ['mbar', 1, 300],
  temperature: ['K', 250, 500],
  'molar-mass': ['kg/kmol', 2, 150],
  'mass-flow': ['kg/h', 10, 1e5],
  'volume-flow': ['m3/h', 0.1, 500],
  'normal-volume-flow': ['Nm3/h', 1, 1e5],
  area: ['mm2', 20, 2e4],
  length: ['m', 0.02, 5],
  density: ['kg/m3', 400, 1500],
  'specific-energy': ['kJ/kg', 100, 2000],
  power: ['kW', 1, 5000],
};
const NUMBERS: Record<string, [number, number]> = { k: [1.05, 1.6], Z: [0.5, 1.1], f_darcy: [0.008, 0.06] };

/** A usual size of an input. */
function usual(one: MethodInput, dimension: Dimension) {
  const [unit, min, max] = USUAL[dimension] ?? ['-', ...(NUMBERS[one.name] ?? [0.3, 0.95])];
  const fits = dimensionOf(unit) === dimension ? unit : (unitsOf(dimension)[0] ?? '-');
  return fc.record({ value: fc.double({ min, max, noNaN: true }), unit: fc.constant(fits) });
}

function valueOf(one: MethodInput): fc.Arbitrary<unknown> {
  if (one.words)
    return fc.oneof(
      { weight: 19, arbitrary: fc.constantFrom(...one.words) },
      { weight: 1, arbitrary: fc.constant('nonsense') },
    );
  const { dimension } = one;
  if (dimension === undefined) return fc.oneof(fc.boolean(), fc.constant('PSV-1'));
  const units = [
    ...unitsOf(dimension),
    ...(dimension === 'pressure-absolute' ? unitsOf('pressure-gauge') : []),
  ];
  return fc.oneof(
    { weight: 8, arbitrary: usual(one, dimension) },
    { weight: 1, arbitrary: fc.record({ value: size, unit: fc.constantFrom(...units) }) },
  );
}

const inputsOf = (method: Method) => {
  const names = method.inputs.flatMap((one) =>
    one.each === undefined ? [one] : [one, { ...one, name: `${one.name}_2`, required: false }],
  );
  return fc.record(Object.fromEntries(names.map((one) => [one.name, valueOf(one)])), {
    requiredKeys: names.filter((one) => one.required).map((one) => one.name),
  });
};

describe.each([...DEVICE_METHODS, ...TANK_METHODS].map((method) => [method.id, method] as const))(
  '%s',
  (_id, method) => {
    it('gives finite figures or a refusal in words', () => {
      let worked = 0;
      fc.assert(
        fc.property(inputsOf(method), fc.constantFrom(undefined, ...method.editions), (inputs, edition) => {
          const sheet = method.work(inputs as never, edition);
          for (const step of sheet.steps)
            if (typeof step.value === 'number') expect(Number.isFinite(step.value), step.symbol).toBe(true);
          for (const [name, out] of Object.entries(sheet.outputs))
            if (typeof out === 'object') expect(Number.isFinite(out.value), name).toBe(true);
          if (sheet.refused) expect(sheet.refused.text.length).toBeGreaterThan(0);
          else worked += 1;
          for (const name of Object.keys(sheet.outputs))
            expect(
              method.outputs.map((one) => one.name),
              name,
            ).toContain(name.replace(/_\d+$/, ''));
        }),
        { numRuns: 800 },
      );
      expect(worked).toBeGreaterThan(0);
    });
  },
);
