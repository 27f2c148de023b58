/* Bare arithmetic of liquid relief: certified and non-certified forms, Reynolds number, viscosity factor, Kw. */
import { interpolate } from '../../numeric';
import { type System } from '../common/system';
import { areaOf, chooseLetter, type Orifice } from '../i-letters/letters';
import { KW } from './kw-curve';

/** Printed constants of API 520-1: A = c·Q…; Re from cP (`cP`) and from Saybolt seconds (`sus`). US forms from memory. */
export const LIQUID_FORMS: Record<System, { c: number; cP: number; sus: number }> = {
  SI: { c: 11.78, cP: 18800, sus: 85220 },
  US: { c: 1 / 38, cP: 2800, sus: 12700 },
};

/** Water to which the relative density G refers, kg/m³ (15 °C; gives the printed 11.78 exactly). */
export const WATER_DENSITY = 999;

/** The two viscosity formulas by the words of the reference topics. */
export const KV_FORMULAS = ['10E', '7E-9E'] as const;

/** Which viscosity formula. */
export type KvFormula = (typeof KV_FORMULAS)[number];

/** Kv of the 7th to 9th editions, capped at 1. Re > 0. */
export function kv7(Re: number): number {
  return Math.min(1, 1 / (0.9935 + 2.878 / Math.sqrt(Re) + 342.75 / Re ** 1.5));
}

/** Kv of the 10th edition; meant for Re above 80. Re > 0. */
export function kv10(Re: number): number {
  return 1 / Math.sqrt(1 + 170 / Re);
}

/** Kv by the formula named. */
export function liquidKv(Re: number, formula: KvFormula): number {
  return formula === '10E' ? kv10(Re) : kv7(Re);
}

/** Liquid to be relieved, in the units of the form (L/min and kPa, or US gpm and psi); `dp` = p1 − p2 > 0. */
export type LiquidFlow = { Q: number; G: number; dp: number; Kd: number; Kw: number; Kc: number };

/** Required effective area without viscosity correction, capacity-certified valves, mm² or in². */
export function liquidArea({ Q, G, dp, Kd, Kw, Kc }: LiquidFlow, system: System): number {
  return ((LIQUID_FORMS[system].c * Q) / (Kd * Kw * Kc)) * Math.sqrt(G / dp);
}

/** The viscosity of a liquid, as dynamic (cP) or Saybolt Universal seconds. */
export type Viscosity = { mu: number } | { sus: number };

/** Reynolds number of the valve at the area `area` of the SELECTED orifice, by the standard's rounded constants. */
export function liquidReynolds(
  Q: number,
  G: number,
  viscosity: Viscosity,
  area: number,
  system: System,
): number {
  const form = LIQUID_FORMS[system];
  if ('sus' in viscosity) return (form.sus * Q) / (viscosity.sus * Math.sqrt(area));
  return (form.cP * Q * G) / (viscosity.mu * Math.sqrt(area));
}

/** One pass of the viscosity procedure. */
export type ViscousResult = {
  selected: number;
  letter: string | undefined;
  Re: number;
  Kv: number;
  area: number;
};

function atArea(
  bare: number,
  selected: number,
  Re: (a: number) => number,
  formula: KvFormula,
): ViscousResult {
  const number = Re(selected);
  const Kv = liquidKv(number, formula);
  return { selected, letter: undefined, Re: number, Kv, area: bare / Kv };
}

/**
 * The viscosity procedure of API 520-1: take the letter for the area without correction, Re at its area, Kv, divide;
 * while the corrected area is above the selected one, take the next letter. Above T the area itself is iterated.
 * `passes` holds every pass; the last is the result. At most 14 letters and 100 iterations.
 */
export function viscousArea(
  bare: number,
  Re: (area: number) => number,
  formula: KvFormula,
  system: System,
): { passes: ViscousResult[]; converged: boolean } {
  const passes: ViscousResult[] = [];
  let orifice: Orifice | undefined = chooseLetter(bare, system);
  while (orifice) {
    const selected = areaOf(orifice, system);
    const pass = { ...atArea(bare, selected, Re, formula), letter: orifice.letter };
    passes.push(pass);
    if (pass.area <= selected) return { passes, converged: true };
    orifice = chooseLetter(selected * 1.0001, system);
  }
  let area = bare;
  for (let i = 0; i < 100; i += 1) {
    const pass = atArea(bare, area, Re, formula);
    if (Math.abs(pass.area - area) <= 1e-9 * area) return { passes: [...passes, pass], converged: true };
    area = pass.area;
  }
  return { passes: [...passes, atArea(bare, area, Re, formula)], converged: false };
}

/** Required area of a valve without capacity certification: 25 % overpressure basis, with Kp; p = SET pressure, gauge. */
export function nonCertifiedArea(
  f: {
    Q: number;
    G: number;
    set: number;
    back: number;
    Kd: number;
    Kw: number;
    Kc: number;
    Kv: number;
    Kp: number;
  },
  system: System,
): number {
  const { Q, G, set, back, Kd, Kw, Kc, Kv, Kp } = f;
  return ((LIQUID_FORMS[system].c * Q) / (Kd * Kw * Kc * Kv * Kp)) * Math.sqrt(G / (1.25 * set - back));
}

/** Kw of a balanced valve by the standard's curve at a percent of gauge back pressure to set; undefined above 50 %. */
export function balancedKw(percent: number): number | undefined {
  const [first = 0, last = 0] = [KW.x[0], KW.x.at(-1)];
  if (percent < 0 || percent > 50) return undefined;
  return percent < first ? 1 : interpolate(KW, Math.min(percent, last));
}
