/* Laws that loads keep whatever the figures: no jump where flow chokes, more cause gives more load, twice the size twice the load. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';
import { EXAMPLES, q } from './examples';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

function load(id: string, change: Inputs = {}, name = 'relief_load'): number {
  const { outputs, refused } = workMethod(id, { ...EXAMPLES[id], ...change });
  if (refused) throw new Error(`${id}: ${refused.text}`);
  return (outputs[name] as Q).value;
}

describe('where flow chokes', () => {
  const { tube_length: _, f_darcy: __, ...ends } = EXAMPLES['f.tube-rupture']!;
  const flashing = { ...ends, phase: 'flashing', v0: q(0.012, 'm3/kg'), v9: q(0.0141, 'm3/kg') };

  it.each([
    ['f.inadvertent-opening', EXAMPLES['f.inadvertent-opening']!],
    ['f.tube-rupture', ends],
    ['f.tube-rupture', flashing],
  ] as [string, Inputs][])('%s does not jump', (id, inputs) => {
    const at = (P: number) => workMethod(id, { ...inputs, P_low: q(P, 'kPa_abs') }).outputs;
    let [choked, free] = [150, 2990];
    for (let i = 0; i < 60; i += 1) {
      const middle = (choked + free) / 2;
      if (at(middle)['choked'] === true) choked = middle;
      else free = middle;
    }
    const flow = (P: number) => (at(P)['relief_load'] as Q).value;
    expect(choked).toBeGreaterThan(160);
    expect(free).toBeLessThan(2900);
    expect(flow(choked * 1.0001) / flow(choked * 0.9999)).toBeCloseTo(1, 5);
  });
});

/** Methods, an input that is a cause, and whether more of it gives more (1) or less (−1). */
const CAUSES: [string, string, 1 | -1][] = [
  ['f.control-valve-bypass', 'bypass_coefficient', 1],
  ['f.control-valve-bypass', 'P1', 1],
  ['f.control-valve-bypass', 'T', -1],
  ['f.blowby-displacement', 'coefficient', 1],
  ['f.inadvertent-opening', 'bore', 1],
  ['f.inadvertent-opening', 'length', -1],
  ['f.tube-rupture', 'tube_id', 1],
  ['f.tube-rupture', 'tube_length', -1],
  ['f.compressor-curve', 'suction_pressure', 1],
  ['f.overfilling', 'device_above_pump', -1],
  ['f.loss-of-cooling', 'share_lost', 1],
  ['f.air-cooler-failure', 'natural_draught', -1],
  ['f.loss-of-reflux', 'latent_heat', -1],
  ['f.clean-exchanger', 'fouling', 1],
  ['f.clean-exchanger', 'T_sink', -1],
  ['f.reaction-heat', 'heat_of_reaction', 1],
  ['f.reaction-tempered', 'rate_set', 1],
  ['f.reaction-tempered', 'overtemperature', -1],
  ['f.reaction-gassy', 'pressure_rate', 1],
  ['f.reaction-gassy', 'P_max', -1],
  ['f.vacuum-inflow', 'condensing_rate', 1],
  ['e.fire-unwetted', 'T_wall', 1],
  ['e.fire-unwetted', 'D', 1],
  ['e.fire-supercritical', 'heat_input', 1],
];

describe('cause and load', () => {
  it.each(CAUSES)('%s by %s', (id, name, way) => {
    const given = EXAMPLES[id]![name] as Q;
    fc.assert(
      fc.property(number(0.9, 1.1), number(1.001, 1.05), (from, step) => {
        const at = (value: number) => load(id, { [name]: { ...given, value } });
        const [less, more] = [at(given.value * from), at(given.value * from * step)];
        expect(way * (more - less)).toBeGreaterThanOrEqual(-1e-9 * Math.abs(less));
        expect(more).not.toBe(less);
      }),
      { numRuns: 40 },
    );
  });

  it('a thicker wall and a stiffer metal let the pressure of a blocked-in liquid rise faster, never faster than a rigid one', () => {
    const rise = (change: Inputs) => load('f.blocked-in-rise', change, 'rise_per_kelvin');
    expect(rise({ wall: q(8, 'mm') })).toBeGreaterThan(rise({}));
    expect(rise({ modulus: q(100000, 'MPa') })).toBeLessThan(rise({}));
    const { wall: _, ...rigid } = EXAMPLES['f.blocked-in-rise']!;
    expect((workMethod('f.blocked-in-rise', rigid).outputs['rise_per_kelvin'] as Q).value).toBeGreaterThan(
      rise({ wall: q(500, 'mm') }),
    );
  });

  it('twice the area, the charge or the coefficients give twice the load', () => {
    expect(
      load('f.control-valve-bypass', {
        coefficient: q(50, 'Kv'),
        bypass_coefficient: q(12, 'Kv'),
        outflow_kept: q(0, 'kg/h'),
      }),
    ).toBeCloseTo(2 * load('f.control-valve-bypass', { outflow_kept: q(0, 'kg/h') }), 7);
    const twice = { mass: q(19000, 'kg'), volume: q(26.32, 'm3') };
    expect(load('f.reaction-tempered', twice) / load('f.reaction-tempered')).toBeCloseTo(2, 9);
    expect(load('f.clean-exchanger', { A: q(90, 'm2') }) / load('f.clean-exchanger')).toBeCloseTo(2, 9);
    expect(
      load('e.fire-supercritical', { heat_input: q(1600, 'kW') }) / load('e.fire-supercritical'),
    ).toBeCloseTo(2, 9);
  });
});
