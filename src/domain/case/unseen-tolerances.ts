/* How far checker and originator may lie apart, by quantity, before the difference must be reconciled in writing. */

/**
 * equal: words. printed: half of the last printed digit (a reading, not a calculation). rel: a share of the originator's
 * figure. abs: in the unit named. A band with `ofSet` is also never less than that share of the set pressure.
 */
export type Tolerance =
  | { kind: 'equal' }
  | { kind: 'printed' }
  | { kind: 'rel'; share: number; ofSet?: number }
  | { kind: 'abs'; value: number; unit: string };

const equal: Tolerance = { kind: 'equal' };
const printed: Tolerance = { kind: 'printed' };
const rel = (share: number, ofSet?: number): Tolerance =>
  ofSet === undefined ? { kind: 'rel', share } : { kind: 'rel', share, ofSet };
const abs = (value: number, unit = '-'): Tolerance => ({ kind: 'abs', value, unit });

/** Common practice, no published source: the defaults of the product, tabulated by quantity. */
export const TOLERANCES = {
  'governing-scenario': equal,
  phase: equal,
  regime: equal,
  method: equal,
  axes: equal,
  letter: equal,
  accumulation: equal,
  'back-pressure-source': equal,
  mawp: printed,
  'design-temperature': printed,
  set: printed,
  size: printed,
  level: printed,
  bore: printed,
  coefficient: printed,
  'curve-point': printed,
  area: printed,
  'molar-mass': rel(0.02),
  z: abs(0.02),
  k: abs(0.02),
  'relieving-temperature': abs(3, 'dK'),
  'liquid-density': rel(0.02),
  'vapour-density': rel(0.03),
  'latent-heat': rel(0.05),
  viscosity: rel(0.2),
  'limit-pressure': rel(0.005),
  p1: rel(0.005),
  load: rel(0.05),
  'load-fire': rel(0.05),
  'load-judgement': rel(0.1),
  'wetted-area': rel(0.03),
  'required-area': rel(0.05),
  'required-area-same-load': rel(0.02),
  'mass-flux': rel(0.1),
  kb: abs(0.03),
  kw: abs(0.03),
  kv: abs(0.02),
  ksh: abs(0.01),
  'rated-capacity': rel(0.02),
  'inlet-loss': rel(0.15, 0.003),
  'back-pressure': rel(0.1, 0.01),
  mach: abs(0.05),
  'reaction-force': rel(0.1),
  'sound-power': abs(2, 'dB'),
  cdtp: rel(0.005),
} as const satisfies Record<string, Tolerance>;

export type UnseenQuantity = keyof typeof TOLERANCES;

/** Causes whose load follows from a curve or an opening that both read alike. */
const READ_FROM_CURVES = [
  'outlet-control-valve-closed',
  'inlet-control-valve-open',
  'inadvertent-valve-opening',
  'gas-blow-by',
  'regulator-failure',
  'closed-outlet',
  'overfill',
  'tube-rupture',
  'check-valve-reverse-flow',
];

/** The quantity under which a load is compared: fire, read from a curve, or a balance with judgement in it (10 %). */
export function loadQuantity(key: string): UnseenQuantity {
  if (key.includes('fire')) return 'load-fire';
  return READ_FROM_CURVES.includes(key) ? 'load' : 'load-judgement';
}

/** The tolerance of a quantity at a site; a site may tighten it, or widen it to twice the default and no further. */
export function toleranceOf(quantity: string, factor = 1): Tolerance {
  const known: Tolerance = Object.hasOwn(TOLERANCES, quantity)
    ? TOLERANCES[quantity as UnseenQuantity]
    : equal;
  const wide = Math.min(Math.max(factor, 0), 2);
  if (known.kind === 'rel')
    return {
      ...known,
      share: known.share * wide,
      ...(known.ofSet === undefined ? {} : { ofSet: known.ofSet * wide }),
    };
  return known.kind === 'abs' ? { ...known, value: known.value * wide } : known;
}
