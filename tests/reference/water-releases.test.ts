/* Water and steam against every check value of the IAPWS releases; the table stands in the name of each test. */
import { describe, expect, it } from 'vitest';
import { type FluidState } from '../../src/engine/properties/types';
import { atHS, regionOf, WATER } from '../../src/engine/water';
import { region1 } from '../../src/engine/water/basic';
import { region3 } from '../../src/engine/water/region3';
import {
  boundaryPressure,
  boundaryTemperature,
  saturationPressure,
  saturationTemperature,
} from '../../src/engine/water/saturation';
import { viscosity } from '../../src/engine/water/viscosity';
import { findRoot } from '../../src/engine/numeric';
import releases from './water-releases.json';

/** Nine digits are printed: half of the last one, for a mantissa that begins with 1. */
const PRINTED = 5e-9;

const off = (actual: number | undefined, wanted: number) => Math.abs((actual ?? Number.NaN) / wanted - 1);

type Row = Record<string, number>;

function expectPrinted(state: FluidState & { cp: number; w: number }, row: Row): void {
  const got: Row = {
    v: 1 / state.rho,
    h: state.h / 1e3,
    u: (state.h - state.P / state.rho) / 1e3,
    s: state.s / 1e3,
    cp: state.cp / 1e3,
    w: state.w,
    P: state.P / 1e6,
  };
  for (const name of ['v', 'h', 'u', 's', 'cp', 'w', 'P'])
    if (row[name] !== undefined) expect(off(got[name], row[name]), name).toBeLessThan(PRINTED);
}

describe('basic equations', () => {
  it.each(
    releases.basic.flatMap((one) =>
      one.rows.map(
        (row) => [`${one.release}, ${one.table}: ${row.P} MPa, ${row.T} K`, one.region, row] as const,
      ),
    ),
  )('%s', (_name, region, row) => {
    const state = WATER.atPT(row.P * 1e6, row.T)!;
    expect(regionOf(state)).toBe(region);
    expectPrinted(state, row);
  });

  it.each(releases.region3.rows)('IAPWS R7-97(2012), Table 33: $T K, $rho kg/m³', (row) => {
    expectPrinted(region3(row.rho, row.T), row);
    const found = WATER.atPT(row.P * 1e6, row.T)!;
    expect(regionOf(found)).toBe(3);
    // The pressure is printed to nine digits only, which moves the density by up to 2e-8 where the isotherm is flat.
    expect(off(found.rho, row.rho)).toBeLessThan(1e-7);
  });

  it('IAPWS R7-97(2012), Tables 35 and 36: saturation; section 4: the boundary of regions 2 and 3', () => {
    for (const row of releases.saturation[0]!.rows)
      expect(off(saturationPressure(row.T)! / 1e6, row.P)).toBeLessThan(PRINTED);
    for (const row of releases.saturation[1]!.rows)
      expect(off(saturationTemperature(row.P * 1e6), row.T)).toBeLessThan(PRINTED);
    const { T, P } = releases.boundary23;
    expect(off(boundaryPressure(T) / 1e6, P)).toBeLessThan(PRINTED);
    expect(off(boundaryTemperature(P * 1e6), T)).toBeLessThan(PRINTED);
  });
});

const FIND: Record<string, (a: number, b: number) => FluidState | undefined> = {
  PT: (P, T) => WATER.atPT(P * 1e6, T),
  PH: (P, h) => WATER.atPH(P * 1e6, h * 1e3),
  PS: (P, s) => WATER.atPS(P * 1e6, s * 1e3),
  HS: (h, s) => atHS(h * 1e3, s * 1e3),
};
const READ: Record<string, (state: FluidState) => number> = {
  T: (state) => state.T,
  P: (state) => state.P / 1e6,
  v: (state) => 1 / state.rho,
};

describe('backward equations: the iterated state agrees as closely as the release holds its own equation', () => {
  it.each(
    releases.backward.flatMap((one) =>
      one.rows.map(
        (row) =>
          [`${one.release}, ${one.table}: ${one.of}(${one.given}) ${row.join(' ')}`, one, row] as const,
      ),
    ),
  )('%s', (_name, one, [a, b, wanted]) => {
    const got = READ[one.of]!(FIND[one.given]!(a!, b!)!);
    if ('abs' in one.within) expect(Math.abs(got - wanted!)).toBeLessThan(one.within.abs!);
    else expect(off(got, wanted!)).toBeLessThan(one.within.rel!);
  });

  it.each(
    releases.saturationOf.flatMap((one) =>
      one.rows.map(([value, P]) => [one.release, one.table, one.of, value!, P!] as const),
    ),
  )('%s, %s: saturation pressure of %s = %s in region 3', (_release, _table, of, value, P) => {
    const { liquid, vapour } = WATER.saturation(P * 1e6)!;
    const nearest = Math.min(...[liquid, vapour].map((state) => off(state[of as 'h' | 's'] / 1e3, value)));
    // The release holds the pressure within 0.0088 %; h and s move less.
    expect(nearest).toBeLessThan(1e-4);
  });

  it.each(
    releases.saturationLines.flatMap((one) =>
      one.rows.map(([s, h]) => [one.release, one.table, one.line, s!, h!] as const),
    ),
  )('%s, %s: saturated %s at s = %s kJ/(kg·K) has h = %s kJ/kg', (_release, _table, line, s, h) => {
    const side = (P: number) => WATER.saturation(P)![line as 'liquid' | 'vapour'];
    const root = findRoot((P) => side(P).s / 1e3 - s, 700, 22.0639e6);
    expect(root.ok).toBe(true);
    if (root.ok) expect(off(side(root.x).h / 1e3, h)).toBeLessThan(1e-5);
  });

  it.each(releases.boundary13.rows)('IAPWS SR4-04(2014), hB13(s): s = %s has h = %s at 623.15 K', (s, h) => {
    const root = findRoot((P) => region1(P, 623.15).s / 1e3 - s!, 16.6e6, 100e6);
    expect(root.ok).toBe(true);
    if (root.ok) expect(off(region1(root.x, 623.15).h / 1e3, h!)).toBeLessThan(1e-5);
  });

  it.each(releases.boundary23hs.rows)('IAPWS SR4-04(2014), Table 26: TB23(%s, %s) = %s K', (h, s, T) => {
    // The release's rule: the state lies in region 3 where its pressure is above the boundary's at this temperature.
    const state = atHS(h! * 1e3, s! * 1e3)!;
    expect(regionOf(state)).toBe(state.P > boundaryPressure(T!) ? 3 : 2);
    expect(Math.abs(state.T - T!)).toBeLessThan(0.025);
  });
});

describe('viscosity', () => {
  it.each(releases.viscosity.rows)('IAPWS R12-08, Table 4: %s K, %s kg/m³ is %s µPa·s', (T, rho, mu) => {
    expect(off(viscosity(rho!, T!)! * 1e6, mu!)).toBeLessThan(5e-8);
  });

  it.each(releases.viscosityCritical.rows)(
    'IAPWS R12-08, Table 5: at 647.35 K and %s kg/m³ the left-out critical factor is worth up to 12 %% of %s µPa·s',
    (rho, mu) => {
      const ours = viscosity(rho!, releases.viscosityCritical.T)! * 1e6;
      expect(ours).toBeLessThan(mu!);
      expect(ours).toBeGreaterThan(mu! * 0.88);
    },
  );
});
