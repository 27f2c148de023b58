/* Bare arithmetic of normal tank venting: ISO 28300 / API 2000 thermal terms and insulation, and the older table method. */
import { interpolate } from '../../numeric';
import { type System } from '../common/system';

/**
 * Printed constants of the venting equations (from memory of ISO 28300 and API 2000): air per liquid moved, and the factors of
 * thermal out- and in-breathing. SI: m³/h, m³ → Nm³/h; US: US gpm, ft³ → SCFH.
 */
export const VENTING_FORMS: Record<System, { liquid: number; out: number; into: number }> = {
  SI: { liquid: 1, out: 1, into: 1 },
  US: { liquid: 8.02, out: 1.51, into: 3.08 },
};

/** Bands of latitude as words of the sheet: below 42°, 42° to 58°, above 58°. */
export const LATITUDE_BANDS = ['below 42', '42 to 58', 'above 58'] as const;

/** One of the bands of latitude. */
export type LatitudeBand = (typeof LATITUDE_BANDS)[number];

/** The band of a latitude in degrees, north or south. */
export function latitudeBand(degrees: number): LatitudeBand {
  const size = Math.abs(degrees);
  if (size < 42) return 'below 42';
  return size <= 58 ? '42 to 58' : 'above 58';
}

/** Factor Y of thermal out-breathing (ISO 28300, API 2000 7th edition, Table 1; from memory, as a public worksheet prints it). */
export const Y_FACTORS: Record<LatitudeBand, number> = {
  'below 42': 0.32,
  '42 to 58': 0.25,
  'above 58': 0.2,
};

/** Vapour pressure of the stored liquid against that of hexane, as words of the sheet. */
export const VAPOUR_CLASSES = ['like hexane', 'higher or unknown'] as const;

/** Factor C of thermal in-breathing (ISO 28300, API 2000 7th edition, Table 2; from memory): cool storage, warm storage (25 °C). */
const C_FACTORS: Record<LatitudeBand, { cool: number; warm: number }> = {
  'below 42': { cool: 4, warm: 6.5 },
  '42 to 58': { cool: 3, warm: 5 },
  'above 58': { cool: 2.5, warm: 4 },
};

/** Factor C: the lower figure only for vapour pressures like that of hexane at an average storage temperature below 25 °C. */
export function cFactor(
  band: LatitudeBand,
  vapour: (typeof VAPOUR_CLASSES)[number],
  storageCelsius: number,
): number {
  const { cool, warm } = C_FACTORS[band];
  return vapour === 'like hexane' && storageCelsius < 25 ? cool : warm;
}

/** Thermal out-breathing: Y·V^0.9·R in the units of the system. V > 0. */
export function thermalOut(Y: number, V: number, R: number, system: System): number {
  return VENTING_FORMS[system].out * Y * V ** 0.9 * R;
}

/** Thermal in-breathing: C·V^0.7·R in the units of the system. V > 0. */
export function thermalIn(C: number, V: number, R: number, system: System): number {
  return VENTING_FORMS[system].into * C * V ** 0.7 * R;
}

/** Reduction by insulation all over: 1/(1 + h·l/λ), h in W/(m²·K), l in m, λ in W/(m·K) above 0. */
export function insulationReduction(h: number, thickness: number, conductivity: number): number {
  return 1 / (1 + (h * thickness) / conductivity);
}

/** Reduction by insulation on a share of the surface: share·R + (1 − share), share from 0 to 1. */
export function partialReduction(R: number, share: number): number {
  return share * R + (1 - share);
}

/** Reduction by a second wall around a share of the surface: 0.25 + 0.75·(1 − share). */
export function doubleWallReduction(share: number): number {
  return 0.25 + 0.75 * (1 - share);
}

/** Cubic feet of air an hour for each barrel an hour moved, API 2000 5th edition (from memory; the first as Ludwig p. 475 uses it). */
export const BARREL_FORMS = { outVolatile: 12, outOther: 6, into: 5.6 };

/** Thermal in-breathing by capacity in barrels, SCFH, API 2000 5th edition Table 2A column 2 (from memory). */
const CAPACITY = {
  x: [
    0, 60, 100, 500, 1000, 2000, 3000, 4000, 5000, 10000, 15000, 20000, 25000, 30000, 35000, 40000, 45000,
    50000, 60000, 70000, 80000, 90000, 100000, 120000, 140000, 160000, 180000,
  ],
  y: [
    0, 60, 100, 500, 1000, 2000, 3000, 4000, 5000, 10000, 15000, 20000, 24000, 28000, 31000, 34000, 37000,
    40000, 44000, 48000, 52000, 56000, 60000, 68000, 75000, 82000, 90000,
  ],
};

/** Share of the thermal in-breathing that a liquid of high flash point breathes out, API 2000 5th edition (from memory; its table rounds). */
export const OUT_SHARE_HIGH_FLASH = 0.6;

/** The largest capacity of the older table, barrels. */
export const LARGEST_CAPACITY = 180000;

/** Thermal in-breathing of the older table by capacity in barrels, SCFH; undefined above 180 000 barrels. */
export function thermalByCapacity(barrels: number): number | undefined {
  return interpolate(CAPACITY, barrels);
}
