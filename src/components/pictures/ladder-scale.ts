/* The pressure ladder's scale: linear, with round ticks, broken once between back pressure and operating pressure when that space is empty. */

/** The pressures of one state of a relief point, all in one unit; what is not known is left out. */
export type LadderState = {
  set: number;
  operating?: number;
  reseating?: number;
  relieving?: number;
  /** Total back pressure. */
  backPressure?: number;
  mawp?: number;
  /** Maximum allowed accumulated pressure. */
  allowed?: number;
};

export type RungKey = keyof LadderState;

export type LadderScale = {
  /** Lower and upper end of the upper part. */
  lo: number;
  hi: number;
  /** Upper end of the part that starts at zero; 0 when the scale is not broken. */
  low: number;
  /** Distance of the ticks. */
  step: number;
  /** Digits after the point that labels need. */
  decimals: number;
};

/** A step of 1, 2 or 5 times a power of ten, at least as large as asked. */
export function niceStep(atLeast: number): number {
  const power = 10 ** Math.floor(Math.log10(Math.max(atLeast, 1e-9)));
  return ([1, 2, 5, 10].find((factor) => factor * power >= atLeast * 0.999) ?? 10) * power;
}

function upwards(value: number, step: number, air: number): number {
  const end = Math.ceil(value / step - 1e-9) * step;
  return end - value < air * step ? end + step : end;
}

function downwards(value: number, step: number, air: number): number {
  const end = Math.floor(value / step + 1e-9) * step;
  return value - end < air * step ? end - step : end;
}

function decimalsFor(step: number): number {
  if (step >= 50) return 0;
  return step >= 5 ? 1 : 2;
}

/** Chooses ends, break and ticks for up to two states on one scale. Any unit; values may not be negative but for a vacuum. */
export function ladderScale(states: LadderState[]): LadderScale {
  const upper = states
    .flatMap((s) => [s.set, s.operating, s.reseating, s.relieving, s.mawp, s.allowed])
    .filter((value): value is number => value !== undefined);
  const top = Math.max(...upper);
  const bottom = Math.min(...upper);
  const back = Math.max(0, ...states.map((s) => s.backPressure ?? 0));
  const step = niceStep(Math.max(top - bottom, Math.abs(top) * 0.02) / 8);
  const lo = downwards(bottom, step, 0.5);
  const low = Math.max(2 * step, upwards(back, step, 0.5));
  if (lo > low + 2 * step) return { lo, hi: upwards(top, step, 0.3), low, step, decimals: decimalsFor(step) };
  const whole = niceStep((top - Math.min(0, bottom)) / 12);
  const from = bottom < 0 ? downwards(bottom, whole, 0.3) : 0;
  return { lo: from, hi: upwards(top, whole, 0.3), low: 0, step: whole, decimals: decimalsFor(whole) };
}

export type LadderFrame = LadderScale & {
  top: number;
  bottom: number;
  gap: number;
  breakAt: number;
  y(p: number): number;
};

/** Lays the scale between two heights in pixels. */
export function ladderFrame(scale: LadderScale, top: number, bottom: number): LadderFrame {
  const gap = scale.low > 0 ? 22 : 0;
  const perUnit = (bottom - top - gap) / (scale.hi - scale.lo + scale.low);
  const y = (p: number) => {
    const exact = p >= scale.lo ? top + (scale.hi - p) * perUnit : bottom - p * perUnit;
    return Math.round(exact * 10) / 10;
  };
  return { ...scale, top, bottom, gap, breakAt: top + (scale.hi - scale.lo) * perUnit, y };
}
