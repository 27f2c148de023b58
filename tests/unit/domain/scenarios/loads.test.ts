/* Every standard scenario says how its load is found, by methods that exist, or why an external sheet serves. */
import { describe, expect, it } from 'vitest';
import { SCENARIOS, scenariosServedBy } from '@domain/scenarios';
import { METHODS, methodById } from '@engine/catalog';

describe('the loads of the standard scenarios', () => {
  it('stand for all 35', () => expect(SCENARIOS).toHaveLength(35));

  it.each(SCENARIOS.map((one) => [one.key, one] as const))('%s', (_key, { load }) => {
    if (load.methods.length === 0) {
      expect('none' in load && load.none.length).toBeGreaterThan(60);
      return;
    }
    expect('when' in load && load.when.length).toBeGreaterThan(10);
    expect(new Set(load.methods).size).toBe(load.methods.length);
    for (const id of load.methods) {
      const method = methodById(id);
      expect(method, id).toBeDefined();
      expect(
        method!.outputs.map((one) => one.name),
        id,
      ).toSatisfy((names: string[]) => names.some((name) => LOADS.has(name)));
    }
  });

  it('have no relief method only where relief does not answer the scenario', () => {
    const without = SCENARIOS.filter((one) => one.load.methods.length === 0).map((one) => one.key);
    expect(without).toEqual(['volatile-ingress', 'jet-fire', 'internal-deflagration', 'hydraulic-surge']);
  });

  it('leave no load method of the engine unused', () => {
    const loads = METHODS.filter((one) => /^(e|f)\./.test(one.id)).map((one) => one.id);
    expect(loads.filter((id) => scenariosServedBy(id).length === 0)).toEqual([]);
    expect(scenariosServedBy('f.settle-out@1').map((one) => one.key)).toEqual(['compressor-settle-out']);
    expect(scenariosServedBy('a.gas')).toEqual([]);
  });
});

/** What a load method ends in: a mass or volume flow, an air equivalent, a pressure to be judged, or a heat input. */
const LOADS = new Set([
  'relief_load',
  'reverse_flow',
  'relief_flow',
  'volumetric_load',
  'W',
  'air_equivalent',
  'settle_out_pressure',
  'rise_per_kelvin',
  'heat_input',
]);
