/* Where the two-phase methods become doubtful, said on the sheet in words. */
import { type MethodInput } from '../../catalog/types';
import { convert } from '../../quantity';
import { type Throat } from '../../nozzle/hem';
import { type Inlet } from '../../nozzle/inlet';
import { type PropertySource } from '../../properties/types';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';

/** Inputs that only serve to say how far the method may be trusted. */
export const DOUBT_INPUTS: readonly MethodInput[] = [
  optional('Tc', 'critical temperature, to see how near it is', 'temperature', {
    rangeKey: 'criticalTemperature',
  }),
  optional('Pc', 'critical pressure, to see how near it is', 'pressure-absolute', {
    rangeKey: 'criticalPressure',
  }),
  optional('boiling_range', 'boiling range of a mixture at the inlet', 'temperature-difference'),
  optional('nozzle_length', 'flow length of the nozzle', 'length'),
];

/** Relative temperature and pressure above which the omega law departs from the isentrope: API 520-1 Annex C (from memory). */
const NEAR_CRITICAL = { T: 0.9, P: 0.5 };
/** Boiling range, K, to which one component stands for a mixture (150 °F): API 520-1 Annex C (from memory). */
const NARROW_RANGE = 83;
/** Flow length, m, in which flashing comes to equilibrium (4 in): common practice after Fauske, from memory. */
export const EQUILIBRIUM_LENGTH = 0.1;

/** Warns of an inlet near the critical point, by reduced temperature and pressure where they are known. */
export function warnCritical(
  sheet: SheetBuilder,
  reduced: { T?: number | undefined; P?: number | undefined },
): void {
  const hot = reduced.T !== undefined && reduced.T >= NEAR_CRITICAL.T;
  const high = reduced.P !== undefined && reduced.P >= NEAR_CRITICAL.P;
  if (!hot && !high) return;
  const why = [
    hot ? `${(reduced.T ?? 0).toFixed(2)} of the critical temperature` : '',
    high ? `${(reduced.P ?? 0).toFixed(2)} of the critical pressure` : '',
  ].filter(Boolean);
  sheet.warn(
    'OMEGA_NEAR_CRITICAL',
    `The inlet is at ${why.join(' and ')}: one omega does not follow the isentrope there; integrate along it (d.hem-nozzle).`,
    'below 0.9 of Tc and 0.5 of Pc',
  );
}

/** Warns of a nozzle that is too short for equilibrium, where liquid flashes in it. */
export function warnShortNozzle(sheet: SheetBuilder): void {
  if (!sheet.has('nozzle_length')) return;
  const length = sheet.number('nozzle_length', 'm', { above: 0 }, 'l_n');
  if (length >= EQUILIBRIUM_LENGTH) return;
  sheet.warn(
    'SHORT_NOZZLE',
    `The nozzle is ${(length * 1000).toFixed(0)} mm long: below 100 mm flashing lags behind equilibrium, and more passes than is worked here. The area is on the safe side, but reaction force, line losses and what the header receives are not.`,
    'at least 100 mm',
  );
}

/** Reads critical point, boiling range and nozzle length where given, and warns; T0 in K, P0 in Pa. */
export function warnDoubts(sheet: SheetBuilder, inlet: { P0: number; T0?: number | undefined }): void {
  const Tc = sheet.has('Tc') ? sheet.number('Tc', 'K', { above: 0 }, 'T_c') : undefined;
  const Pc = sheet.has('Pc') ? sheet.number('Pc', 'Pa_abs', { above: 0 }, 'P_{crit}') : undefined;
  warnCritical(sheet, {
    T: Tc !== undefined && inlet.T0 !== undefined ? inlet.T0 / Tc : undefined,
    P: Pc === undefined ? undefined : inlet.P0 / Pc,
  });
  if (sheet.has('boiling_range')) {
    const range = sheet.number('boiling_range', 'dK', { min: 0 });
    if (range > NARROW_RANGE)
      sheet.warn(
        'BOILING_RANGE_WIDE',
        `The mixture boils over ${range.toFixed(0)} K: one omega from inlet properties or two points may mislead; integrate along the isentrope.`,
        'up to 83 K (150 °F)',
      );
  }
  warnShortNozzle(sheet);
}

/** How near to the critical point a cubic equation is not to be trusted, in reduced temperature and pressure: common practice, no source. */
const CRITICAL_REGION = { T: [0.97, 1.1], P: [0.8, 1.5] } as const;

const within = (value: number, [low, high]: readonly [number, number]): boolean =>
  value >= low && value <= high;

/** Warns of the critical region, of a short nozzle where liquid flashes, and of a flash that only begins at the throat. */
export function warnIntegration(
  sheet: SheetBuilder,
  source: PropertySource,
  inlet: Inlet,
  throat: Throat,
): void {
  const { T, P } = { T: inlet.state.T / source.critical.T, P: inlet.state.P / source.critical.P };
  if (within(T, CRITICAL_REGION.T) && within(P, CRITICAL_REGION.P))
    sheet.warn(
      'CRITICAL_REGION',
      `The inlet is at ${T.toFixed(2)} of the critical temperature and ${P.toFixed(2)} of the critical pressure: densities and speed of sound change steeply there, and an equation of state with three constants is off by several per cent. Check with a reference equation.`,
      'outside 0.97 to 1.1 of Tc together with 0.8 to 1.5 of Pc',
    );
  const flashes = inlet.phase.includes('liquid') || inlet.phase === 'two-phase';
  if (flashes) warnShortNozzle(sheet);
  if (inlet.phase === 'subcooled liquid' && throat.choked && !throat.atOnset)
    sheet.warn(
      'LOW_SUBCOOLING',
      'The liquid is only just subcooled and flashes ahead of the throat: the flux changes steeply with the inlet temperature here. Work the sheet also with the highest temperature that is possible.',
    );
}

/** A figure of the sheet in coherent SI. */
export function inSI(value: number, unit: string, target: string): number {
  return convert({ value, unit }, target);
}
