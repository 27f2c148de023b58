/* Load sheets can be re-worked by hand, mean the same in other units, and never give a figure that is none. */
import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { methodById, METHODS, workMethod } from '../../../../src/engine/catalog';
import { convert, dimensionOf, displayUnit, type Q, UNITS } from '../../../../src/engine/quantity';
import { type Inputs, type Worked } from '../../../../src/engine/sheet';
import { EXAMPLES } from './examples';

const CASES = Object.entries(EXAMPLES);

/** Inputs in the units that the other system shows. */
function customary(inputs: Inputs): Inputs {
  const other = ([name, given]: [string, Inputs[string]]): [string, Inputs[string]] => {
    if (typeof given !== 'object') return [name, given];
    const dimension = dimensionOf(given.unit);
    // Kv and Cv have printed constants of their own, rounded to 0.4 %: compared apart.
    const unit =
      dimension === undefined || dimension === 'flow-coefficient' ? given.unit : displayUnit(dimension, 'US');
    return [name, { value: convert(given, unit), unit }];
  };
  return Object.fromEntries(Object.entries(inputs).map(other));
}

function differences(a: Worked, b: Worked): string[] {
  return Object.entries(a.outputs).flatMap(([name, first]) => {
    const second = b.outputs[name];
    if (typeof first !== 'object' || typeof second !== 'object')
      return first === second ? [] : [`${name}: ${String(first)} and ${String(second)}`];
    const there = convert(second, first.unit);
    const off = Math.abs(there - first.value) / Math.max(1e-12, Math.abs(first.value));
    return off <= 1e-9 ? [] : [`${name}: ${first.value} and ${there} ${first.unit}`];
  });
}

describe.each(CASES)('%s', (id, inputs) => {
  it('gives steps with meaning, unit and TeX that renders, all symbols substituted', () => {
    const { steps, refused } = workMethod(id, inputs);
    expect(refused).toBeUndefined();
    expect(steps.length).toBeGreaterThan(0);
    for (const step of steps) {
      expect(step.meaning).not.toBe('');
      expect(dimensionOf(step.unit), step.unit).toBeDefined();
      if (typeof step.value === 'number') expect(step.value).toSatisfy(Number.isFinite);
      for (const tex of [step.symbol, step.tex, step.worked])
        expect(() => katex.renderToString(tex, { throwOnError: true, strict: 'error' }), tex).not.toThrow();
      for (const one of methodById(id)!.inputs.filter(({ name }) => name.includes('_')))
        expect(step.worked).not.toContain(one.name);
    }
  });

  it('means the same in the other system of units', () => {
    if (id === 'e.fire-unwetted') return;
    expect(differences(workMethod(id, inputs), workMethod(id, customary(inputs)))).toEqual([]);
  });

  it('refuses with a sentence when any required input is left out', () => {
    for (const one of methodById(id)!.inputs.filter((input) => input.required)) {
      const { refused } = workMethod(
        id,
        Object.fromEntries(Object.entries(inputs).filter(([name]) => name !== one.name)),
      );
      if (refused) expect(refused.text).toMatch(/\.$/);
      if (one.name in inputs) expect(refused, one.name).toBeDefined();
    }
  });

  it('gives only finite figures, or refuses, for 2 000 sets of absurd inputs', () => {
    const unit = fc.constantFrom(...Object.keys(UNITS));
    const absurd = fc.oneof(
      fc.record({ value: fc.oneof(fc.double(), fc.constantFrom(0, -1, 1e-300, 1e300, 1e12)), unit }),
      fc.boolean(),
      fc.constantFrom('gas', 'liquid', 'flashing', ''),
    );
    const wide = (given: Inputs[string]): fc.Arbitrary<Inputs[string]> =>
      typeof given === 'object'
        ? fc.oneof(
            {
              weight: 6,
              arbitrary: fc
                .double({ min: -6, max: 6, noNaN: true })
                .map((e): Q => ({ ...given, value: given.value * 10 ** e })),
            },
            { weight: 2, arbitrary: fc.constant(given) },
            { weight: 1, arbitrary: absurd },
          )
        : fc.constant(given);
    const model = Object.fromEntries(
      Object.entries(inputs).map(([name, given]) => [
        name,
        fc.option(wide(given), { nil: undefined, freq: 20 }),
      ]),
    );
    fc.assert(
      fc.property(fc.record(model), (typed) => {
        const given = Object.fromEntries(
          Object.entries(typed).filter(([, one]) => one !== undefined),
        ) as Inputs;
        const worked = workMethod(id, given);
        for (const out of Object.values(worked.outputs))
          if (typeof out === 'object' && !Number.isFinite(out.value)) throw new Error('not finite');
        for (const step of worked.steps)
          if (typeof step.value === 'number' && !Number.isFinite(step.value)) throw new Error('not finite');
      }),
      { numRuns: 2000 },
    );
  });
});

describe('printed constants that are rounded', () => {
  it('of IEC 60534 for Kv and Cv agree within 0.5 % (N8 1.1 and 0.948, from memory)', () => {
    for (const id of ['f.control-valve-bypass', 'f.blowby-displacement']) {
      const inputs = EXAMPLES[id]!;
      const cv = (name: string) => ({ value: convert(inputs[name] as Q, 'Cv'), unit: 'Cv' });
      const bypass: Inputs =
        'bypass_coefficient' in inputs ? { bypass_coefficient: cv('bypass_coefficient') } : {};
      const load = (given: Inputs) => (workMethod(id, given).outputs['relief_load'] as Q).value;
      const ratio = load({ ...inputs, coefficient: cv('coefficient'), ...bypass }) / load(inputs);
      expect(Math.abs(ratio - 1)).toBeGreaterThan(1e-4);
      expect(Math.abs(ratio - 1)).toBeLessThan(0.005);
    }
  });

  it('of the unwetted fire in SI and US agree within 0.5 % (0.2772 by conversion of 0.1406)', () => {
    const si = workMethod('e.fire-unwetted', EXAMPLES['e.fire-unwetted']!).outputs;
    const us = workMethod('e.fire-unwetted', customary(EXAMPLES['e.fire-unwetted']!)).outputs;
    for (const name of ['relief_load', 'A_required', 'exposed_area']) {
      const there = convert(us[name] as Q, (si[name] as Q).unit);
      expect(Math.abs(there / (si[name] as Q).value - 1), name).toBeLessThan(0.005);
    }
  });
});

describe('the examples', () => {
  it('stand for every load method but those that the reference cases hold', () => {
    const held = [
      'e.fire-insulation',
      'e.fire-wetted',
      'f.check-valve-reverse-flow',
      'f.control-valve-gas',
      'f.control-valve-liquid',
      'f.gas-blowby',
      'f.thermal-expansion',
    ];
    const loads = METHODS.map((one) => one.id).filter((id) => /^[ef]\./.test(id));
    expect(loads.filter((id) => !(id in EXAMPLES))).toEqual(held);
  });
});
