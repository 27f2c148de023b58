/* Water and steam against 300 states of an independent implementation, over all regions; its name and version are in the file. */
import { describe, expect, it } from 'vitest';
import { type FluidState } from '../../src/engine/properties/types';
import { atHS, regionOf, WATER } from '../../src/engine/water';
import table from './water-states.json';

/**
 * Relative. What is evaluated directly from P and T agrees to about 1e-12, the rounding of the sums. The other implementation
 * stops its own iterations at 1.5e-8 in density, temperature or both, which flat isotherms and steep isobars amplify: most in
 * cp around the critical point. So what is iterated is held to 1e-6.
 */
const DIRECT = 1e-10;
const ITERATED = 1e-6;

/** h, s and x can be nought, where a relative difference says nothing: J/kg, J/(kg·K), kg/kg. */
const SCALE: Record<string, number> = { h: 1e3, s: 10, x: 1 };

type Row = Record<string, number>;
type State = { kind: string; given: Row; state: Row };
const STATES = table.states as unknown as State[];

/** What a state of one phase has beyond P, T, ρ, h and s. */
const MORE = ['cp', 'cv', 'w', 'mu'];

/** Whether ours is a full state of one phase: by P and T, or saturated. */
function hasMore({ kind, given }: State): boolean {
  return kind === 'PT' || given['x'] === 0 || given['x'] === 1;
}

function find({
  kind,
  given,
}: State): Partial<FluidState & { cp: number; cv: number; w: number; mu: number }> | undefined {
  const { P, T, x, h, s } = given as { P: number; T: number; x: number; h: number; s: number };
  if (kind === 'PT') return WATER.atPT(P, T);
  if (kind === 'PH') return WATER.atPH(P, h);
  if (kind === 'PS') return WATER.atPS(P, s);
  if (kind === 'HS') return atHS(h, s);
  if (x === 0) return WATER.saturation(P)?.liquid;
  return x === 1 ? WATER.saturation(P)?.vapour : WATER.atPx(P, x);
}

describe(table.source, () => {
  it('has 300 states, every region among them, and viscosities', () => {
    expect(STATES).toHaveLength(300);
    expect(new Set(STATES.map((one) => one.state['region']))).toEqual(new Set([1, 2, 3, 4, 5]));
    expect(STATES.filter((one) => one.state['mu'] !== undefined).length).toBeGreaterThan(200);
  });

  it.each(STATES.map((one) => [`${one.kind} ${JSON.stringify(one.given)}`, one] as const))(
    '%s',
    (_name, one) => {
      const got = find(one);
      const { region, ...wanted } = one.state;
      expect(got).toBeDefined();
      if (one.kind !== 'Px') expect(regionOf(got as FluidState)).toBe(region);
      const within = one.kind === 'PT' && region !== 3 ? DIRECT : ITERATED;
      for (const [name, value] of Object.entries(wanted)) {
        if (MORE.includes(name) && !hasMore(one)) continue;
        if (name === 'mu' && one.state['T']! > 1173.15) continue;
        const ours = (got as Row)[name]!;
        expect(Math.abs(ours - value) / (Math.abs(value) + (SCALE[name] ?? 0)), name).toBeLessThan(within);
      }
    },
  );

  it('compares cp, cv, w and viscosity of states found by P and h, P and s, h and s through their P and T', () => {
    const single = STATES.filter((one) => ['PH', 'PS', 'HS'].includes(one.kind) && one.state['region'] !== 4);
    expect(single.length).toBeGreaterThan(60);
    for (const { state } of single) {
      const got = WATER.atPT(state['P']!, state['T']!)!;
      for (const name of ['cp', 'cv', 'w'] as const)
        expect(Math.abs(got[name] / state[name]! - 1), name).toBeLessThan(ITERATED);
      if (got.mu !== undefined) expect(Math.abs(got.mu / state['mu']! - 1)).toBeLessThan(ITERATED);
      else expect(state['T']).toBeGreaterThan(1173.15);
    }
  });
});
