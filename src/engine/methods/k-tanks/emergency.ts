/* Bare arithmetic of emergency venting in a fire: heat into the wetted shell, air by the formula and by the regulation's table. */
import { interpolate } from '../../numeric';
import { type System } from '../common/system';

/** Heat absorbed: bands of wetted area with factor and exponent, and the constant above the last for tanks of low pressure. */
type HeatForm = {
  bands: readonly { upTo: number; factor: number; exponent: number }[];
  large: { factor: number; exponent: number };
  cap: number;
};

/** Printed forms of ISO 28300 / API 2000 (from memory; US as Ludwig and 29 CFR 1910.106 give them). m² → W; ft² → Btu/h. */
export const HEAT_FORMS: Record<System, HeatForm> = {
  SI: {
    bands: [
      { upTo: 18.6, factor: 63150, exponent: 1 },
      { upTo: 93, factor: 224200, exponent: 0.566 },
      { upTo: 260, factor: 630400, exponent: 0.338 },
    ],
    large: { factor: 43200, exponent: 0.82 },
    cap: 4129700,
  },
  US: {
    bands: [
      { upTo: 200, factor: 20000, exponent: 1 },
      { upTo: 1000, factor: 199300, exponent: 0.566 },
      { upTo: 2800, factor: 963400, exponent: 0.338 },
    ],
    large: { factor: 21000, exponent: 0.82 },
    cap: 14090000,
  },
};

/** Constant of the venting formula (from memory): Nm³/h with W, J/kg, K; SCFH with Btu/h, Btu/lb, °R. */
export const VENT_FORMS: Record<System, number> = { SI: 906.6, US: 3.091 };

/** One band of the heat form, or its end: `exponent` 0 means the factor is the heat itself. */
export type HeatBand = { factor: number; exponent: number };

/** The form of the heat for a wetted area; above the last band tanks over 1 psig (6.9 kPa) design pressure keep growing. */
export function heatBand(area: number, highPressure: boolean, system: System): HeatBand {
  const { bands, large, cap } = HEAT_FORMS[system];
  const found = bands.find((band) => area < band.upTo);
  if (found) return found;
  return highPressure ? large : { factor: cap, exponent: 0 };
}

/** Heat absorbed from a fire by a wetted area: W from m², Btu/h from ft². F is the environment factor. */
export function tankFireHeat(area: number, F: number, highPressure: boolean, system: System): number {
  const { factor, exponent } = heatBand(area, highPressure, system);
  return factor * F * area ** exponent;
}

/** Venting in air for boiling by a heat: Nm³/h (W, J/kg, K, kg/kmol) or SCFH (Btu/h, Btu/lb, °R, lb/lbmol). */
export function boilingAir(heat: number, latent: number, T: number, M: number, system: System): number {
  return ((VENT_FORMS[system] * heat) / latent) * Math.sqrt(T / M);
}

/**
 * Table H-10 of 29 CFR 1910.106: wetted area in ft² against SCFH of free air. The rows at 20, 100, 500, 900, 1 000 and
 * 1 400 ft² were compared with Ludwig, vol. 1, 3rd ed., p. 475 and Table 7-17; the others are from memory, and every row follows
 * 70.5·Q/1337 with the heat form within 0.6 %. Between rows the regulation interpolates.
 */
export const REGULATION_TABLE = {
  x: [
    0, 20, 30, 40, 50, 60, 70, 80, 90, 100, 120, 140, 160, 180, 200, 250, 300, 350, 400, 500, 600, 700, 800,
    900, 1000, 1200, 1400, 1600, 1800, 2000, 2400, 2800,
  ],
  y: [
    0, 21100, 31600, 42100, 52700, 63200, 73700, 84200, 94800, 105000, 126000, 147000, 168000, 190000, 211000,
    239000, 265000, 288000, 312000, 354000, 392000, 428000, 462000, 493000, 524000, 557000, 587000, 614000,
    639000, 662000, 704000, 742000,
  ],
};

/** L·√M of hexane, on which the regulation's table rests, Btu/lb·√(lb/lbmol). */
export const HEXANE = 1337;

/** Free air by the regulation for a wetted area in ft², SCFH: the table, and above 2 800 ft² its last row or 1107·A^0.82. */
export function regulationAir(area: number, highPressure: boolean): number {
  const inTable = interpolate(REGULATION_TABLE, area);
  if (inTable !== undefined) return inTable;
  return highPressure ? 1107 * area ** 0.82 : 742000;
}

/** Factors of 29 CFR 1910.106(b)(2)(v) on the air of a protected tank; only one of them may be taken. */
export const PROTECTION = {
  none: 1,
  drainage: 0.5,
  'water spray and drainage': 0.3,
  insulation: 0.3,
  'insulation, water spray and drainage': 0.15,
} as const;

/** A kind of protection as a word of the sheet. */
export type Protection = keyof typeof PROTECTION;

/** Height above grade to which the fire wets a vertical tank, m (30 ft; 29 CFR 1910.106, ISO 28300 says 9.14 m). */
export const TANK_FIRE_HEIGHT = 9.144;

/** Wetted area of a vertical tank standing on the ground: shell up to a height; with its bottom when that is exposed. */
export function verticalArea(D: number, height: number, bottom: boolean): number {
  return Math.PI * D * height + (bottom ? (Math.PI / 4) * D ** 2 : 0);
}

/** Three quarters of the surface of a horizontal cylinder with flat ends. */
export function horizontalArea(D: number, L: number): number {
  return 0.75 * (Math.PI * D * L + (Math.PI / 2) * D ** 2);
}

/** 55 % of the surface of a sphere. */
export function sphereArea(D: number): number {
  return 0.55 * Math.PI * D ** 2;
}
