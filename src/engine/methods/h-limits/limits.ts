/* Bare limits of pressure: maximum accumulated pressure, relieving pressure, set pressures, tolerances, CDTP. */
import { type System } from '../common/system';

/** The codes that an item may be built to. */
export const CODE_BASES = [
  'asme-viii-1',
  'asme-viii-2',
  'asme-i',
  'b31.3',
  'en',
  'api-620',
  'api-650',
  'other',
] as const;

/** The code whose limits hold for an item; every basis without limits of its own follows ASME VIII-1 here. */
export type CodeBasis = (typeof CODE_BASES)[number];

/** The classes of a scenario for its limit: one device, several, fire. */
export const LIMIT_CLASSES = ['single', 'multiple', 'fire'] as const;

/** The class of a scenario for its limit. */
export type LimitClass = (typeof LIMIT_CLASSES)[number];

/**
 * Low-pressure floors of ASME VIII-1 UG-125(c), in psi and in kPa: the columns are printed, not converted (30 kPa is
 * 4.35 psi). f3 for one device, f4 for several; the SI figure of f4 is from memory.
 */
export const FLOORS: Record<System, { f3: number; f4: number }> = {
  US: { f3: 3, f4: 4 },
  SI: { f3: 20, f4: 30 },
};

/** Options of the limits: the code, its unit system (psi or kPa gauge), and the site's fire limit under EN. */
export type LimitOptions = { basis: CodeBasis; units: System; enFireLimit?: number };

/** The percentage and the floor that make a limit; the greater of the two rules. */
export function limitTerms(limitClass: LimitClass, options: LimitOptions): { factor: number; floor: number } {
  const { f3, f4 } = FLOORS[options.units];
  if (options.basis === 'en')
    return { factor: limitClass === 'fire' ? (options.enFireLimit ?? 1.1) : 1.1, floor: 0 };
  if (options.basis === 'asme-i') return { factor: 1.06, floor: 0 };
  if (limitClass === 'fire') return { factor: 1.21, floor: 0 };
  return limitClass === 'single' ? { factor: 1.1, floor: f3 } : { factor: 1.16, floor: f4 };
}

/**
 * Maximum accumulated pressure allowed (MAAP) on a MAWP or PS, gauge, in kPa (SI) or psi (US). ASME: single
 * max(110 %, +f3), several max(116 %, +f4), fire 121 % (below about 19 psi that is less than MAWP + f4; it is kept).
 * EN: 110 % of PS for everything, with a site figure for fire. ASME I: 106 % (from memory). Source: ASME VIII-1
 * UG-125(c); PED Annex I 7.3. Tanks (API 620, 650) have their own limits: their MAAP comes from the vents, not here.
 */
export function maap(mawp: number, limitClass: LimitClass, options: LimitOptions): number {
  const { factor, floor } = limitTerms(limitClass, options);
  return Math.max(factor * mawp, mawp + floor);
}

/**
 * Relieving pressure, gauge: the lower of the MAAP on the limiting equipment and the same class factor (with floors)
 * on the highest set pressure of the group. kPa or psi by `units`.
 */
export function relievingPressure(
  mawp: number,
  highestSet: number,
  limitClass: LimitClass,
  options: LimitOptions,
): number {
  return Math.min(maap(mawp, limitClass, options), maap(highestSet, limitClass, options));
}

/** The place of a device in its group. */
export type SetPlace = 'first' | 'additional' | 'supplemental-fire';

/** Highest set pressure allowed for a place in the group, gauge: 100, 105 or 110 % of MAWP (EN: 100, 105, 105 %). */
export function maxSetPressure(mawp: number, place: SetPlace, basis: CodeBasis = 'asme-viii-1'): number {
  const fire = basis === 'en' ? 1.05 : 1.1;
  return mawp * { first: 1, additional: 1.05, 'supplemental-fire': fire }[place];
}

/**
 * Set-pressure tolerance ± of a valve, in kPa or psi: ASME ±2 psi to 70 psi (±15 kPa to 500 kPa), ±3 % above
 * (ASME VIII-1 2015 UG-134(d)); EN max(3 %, 10 kPa) (ISO 4126-1:2013/Amd 1:2016).
 */
export function setTolerance(set: number, options: { basis: CodeBasis; units: System }): number {
  if (options.basis === 'en')
    return Math.max(0.03 * set, options.units === 'SI' ? 10 : 10 / 6.894757293168361);
  const { upTo, fixed } = options.units === 'US' ? { upTo: 70, fixed: 2 } : { upTo: 500, fixed: 15 };
  return set <= upTo ? fixed : 0.03 * set;
}

/** Tolerance ± of a rupture disk or pin: ±2 psi to 40 psi (±15 kPa to 300 kPa), ±5 % above (UG-134(e), (f)). */
export function burstTolerance(burst: number, units: System): number {
  const { upTo, fixed } = units === 'US' ? { upTo: 40, fixed: 2 } : { upTo: 300, fixed: 15 };
  return burst <= upTo ? fixed : 0.05 * burst;
}

/** Pressure at which the valve closes again, gauge; `blowdown` as a fraction of set. */
export function reseatPressure(set: number, blowdown: number): number {
  return set * (1 - blowdown);
}

/** The valve types that matter for the test pressure on the bench. */
export const VALVE_TYPES = ['conventional', 'balanced', 'pilot'] as const;

/** A valve type. */
export type ValveType = (typeof VALVE_TYPES)[number];

/**
 * Cold differential test pressure: (set − constant superimposed back pressure) × the maker's temperature multiplier;
 * only a conventional valve subtracts. Gauge, any unit. Source: definition of CDTP in API 520-1.
 */
export function coldDifferentialTestPressure(
  set: number,
  options: { constantSuperimposed: number; multiplier: number; type: ValveType },
): number {
  const spring = options.type === 'conventional' ? set - options.constantSuperimposed : set;
  return spring * options.multiplier;
}

/** Blowdown allowed by EN ISO 4126-1 as kPa: gas 2 % to max(15 %, 30 kPa), liquid 2.5 % to max(20 %, 60 kPa). */
export function enBlowdown(set: number, phase: 'gas' | 'liquid'): { min: number; max: number } {
  return phase === 'gas'
    ? { min: 0.02 * set, max: Math.max(0.15 * set, 30) }
    : { min: 0.025 * set, max: Math.max(0.2 * set, 60) };
}

/** Overpressure within which an EN valve must reach full lift, kPa: the greater of 10 % and 10 kPa. */
export function enOverpressure(set: number): number {
  return Math.max(0.1 * set, 10);
}
