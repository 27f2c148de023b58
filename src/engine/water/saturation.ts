/* The saturation line and the boundary between regions 2 and 3: IAPWS R7-97(2012), sections 4 and 8. */
import { CRITICAL, LIMITS_T } from './constants';

/** Coefficients of the saturation equation, Table 34. */
const [N1, N2, N3, N4, N5] = [
  1167.0521452767, -724213.16703206, -17.073846940092, 12020.82470247, -3232555.0322333,
];
const [N6, N7, N8, N9, N10] = [
  14.91510861353, -4823.2657361591, 405113.40542057, -0.23855557567849, 650.17534844798,
];

/** Coefficients of the boundary equation, Table 1. */
const [B1, B2, B3, B4, B5] = [
  348.05185628969, -1.1671859879975, 0.0010192970039326, 572.54459862746, 13.91883977887,
];

/** Saturation pressure in Pa at T from 273.15 K to the critical temperature, Eq. (30); undefined elsewhere. */
export function saturationPressure(T: number): number | undefined {
  if (!(T >= LIMITS_T.lowest && T <= CRITICAL.T)) return undefined;
  const theta = T + N9 / (T - N10);
  const A = theta * theta + N1 * theta + N2;
  const B = N3 * theta * theta + N4 * theta + N5;
  const C = N6 * theta * theta + N7 * theta + N8;
  return 1e6 * ((2 * C) / (-B + Math.sqrt(B * B - 4 * A * C))) ** 4;
}

/** The lowest saturation pressure of the formulation, at 273.15 K, in Pa. */
export const LOWEST_SATURATION = saturationPressure(LIMITS_T.lowest) ?? Number.NaN;

/** Saturation temperature in K at P from the lowest saturation pressure to the critical one, Eq. (31); undefined elsewhere. */
export function saturationTemperature(P: number): number | undefined {
  if (!(P >= LOWEST_SATURATION && P <= CRITICAL.P)) return undefined;
  const beta = (P / 1e6) ** 0.25;
  const E = beta * beta + N3 * beta + N6;
  const F = N1 * beta * beta + N4 * beta + N7;
  const G = N2 * beta * beta + N5 * beta + N8;
  const D = (2 * G) / (-F - Math.sqrt(F * F - 4 * E * G));
  const sum = N10 + D;
  return Math.min(
    CRITICAL.T,
    Math.max(LIMITS_T.lowest, (sum - Math.sqrt(sum * sum - 4 * (N9 + N10 * D))) / 2),
  );
}

/** Pressure in Pa on the boundary between regions 2 and 3 at T from 623.15 to 863.15 K, Eq. (5). */
export function boundaryPressure(T: number): number {
  return 1e6 * (B1 + B2 * T + B3 * T * T);
}

/** Temperature in K on the boundary between regions 2 and 3 at P from 16.5292 to 100 MPa, Eq. (6). */
export function boundaryTemperature(P: number): number {
  return B4 + Math.sqrt((P / 1e6 - B5) / B3);
}
