/* The state that two figures of a sheet fix, and the words for it. */
import { type FluidState } from '../../properties/types';
import { type SheetBuilder } from '../../sheet';
import { atHS, WATER } from '../../water';
import { CRITICAL } from '../../water/constants';
import { saturationPressure, saturationTemperature } from '../../water/saturation';
import { absoluteIn } from '../common/pressures';

/** Figures that may be given, and the pairs that fix a state. */
const GIVEN = ['P', 'T', 'x', 'h', 's'] as const;
const PAIRS = ['P T', 'P x', 'P h', 'P s', 'T x', 'h s'] as const;

/** A pair that fixes a state, as the names of its figures. */
export type Pair = (typeof PAIRS)[number];

/** Where the formulation holds, for sentences. */
export const RANGE = '273.15 to 1073.15 K up to 100 MPa, and to 2273.15 K up to 50 MPa';

/** Which two figures were given; refuses any other number or pair. */
export function pairOf(sheet: SheetBuilder): Pair {
  const given = GIVEN.filter((name) => sheet.has(name));
  const pair = PAIRS.find((one) => one === given.join(' '));
  if (pair !== undefined) return pair;
  const text = given.length === 0 ? 'none was given' : `given: ${given.join(', ')}`;
  return sheet.refuse(
    given.length < 2 ? 'INPUT_MISSING' : 'PAIR_NOT_WORKED',
    given.length < 2 ? (given[0] === 'P' ? 'T' : 'P') : (given[given.length - 1] ?? 'P'),
    `A state of water needs exactly two figures: P and T, P and x, P and h, P and s, T and x, or h and s; ${text}.`,
  );
}

/** Reads the pair and finds the state; what was given is kept as a symbol in the units of the sheet. */
export function readState(sheet: SheetBuilder, pair: Pair): FluidState {
  const P = () => absoluteIn(sheet, 'P', 'p', 'kPa_abs') * 1e3;
  const T = () => sheet.number('T', 'K', { above: 0 });
  const x = () => sheet.number('x', '-', { min: 0, max: 1 });
  const h = () => sheet.number('h', 'kJ/kg') * 1e3;
  const s = () => sheet.number('s', 'kJ/(kg.K)') * 1e3;
  const found: Record<Pair, () => FluidState | undefined> = {
    'P T': () => WATER.atPT(P(), T()),
    'P x': () => WATER.atPx(P(), x()),
    'P h': () => WATER.atPH(P(), h()),
    'P s': () => WATER.atPS(P(), s()),
    'T x': () => WATER.atPx(saturationPressure(T()) ?? Number.NaN, x()),
    'h s': () => atHS(h(), s()),
  };
  const state = found[pair]();
  if (state !== undefined) return state;
  const field = pair.split(' ')[1] ?? 'T';
  if (field === 'x')
    return sheet.refuse(
      'NO_SATURATION',
      pair === 'P x' ? 'P' : 'T',
      'Liquid water and steam stand together only from 273.15 K (0.6112 kPa) up to below the critical point at 647.096 K (22 064 kPa).',
    );
  return sheet.refuse(
    'OUTSIDE_FORMULATION',
    field,
    `IAPWS-IF97 has no state with these figures: it holds from ${RANGE}, and not at the critical point itself.`,
  );
}

/** What stands there, in the words of the trade. */
export function phaseOf({ P, T, x }: FluidState): string {
  if (x !== undefined) return x <= 0 ? 'saturated liquid' : x >= 1 ? 'saturated steam' : 'two-phase';
  if (P >= CRITICAL.P && T >= CRITICAL.T) return 'supercritical';
  const boiling = saturationTemperature(P);
  return T < (boiling ?? (P > CRITICAL.P ? CRITICAL.T : 0)) ? 'compressed liquid' : 'superheated steam';
}

/** Pressure and temperature where they were not given: by the saturation equations or by iteration. */
export function missingSteps(sheet: SheetBuilder, pair: Pair, state: FluidState): void {
  const wet = state.x !== undefined;
  const other = pair.split(' ')[1] ?? '';
  if (!pair.includes('P'))
    sheet.step(
      {
        key: 'P',
        tex: 'p',
        meaning: pair === 'T x' ? 'saturation pressure' : 'pressure at which both are met, by iteration',
        value: state.P / 1e3,
        unit: 'kPa_abs',
        clause:
          pair === 'T x' ? 'IAPWS R7-97(2012), Eq. (30)' : 'basic equations, iterated along the isentrope',
      },
      (v) => (pair === 'T x' ? `p_s(${v('T')})` : `p(h = ${v('h')},\\ s = ${v('s')})`),
    );
  if (!pair.includes('T'))
    sheet.step(
      {
        key: 'T',
        meaning: wet ? 'saturation temperature' : `temperature at which ${other} is met, by iteration`,
        value: state.T,
        unit: 'K',
        clause: wet ? 'IAPWS R7-97(2012), Eq. (31)' : 'basic equations, iterated along the isobar',
      },
      (v) => (wet ? `T_s(${v('P')})` : `T(p = ${v('P')},\\ ${other} = ${v(other)})`),
    );
}
