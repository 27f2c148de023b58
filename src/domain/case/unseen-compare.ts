/* One entry of the unseen check against the originator's value. */
import { halfDigit } from '@domain/field';
import { convert, formatQuantity, fromSI, type Q, type QuantityContext, toSI } from '@engine/quantity';
import { toleranceOf } from './unseen-tolerances';

export type UnseenPair = {
  quantity: string;
  label: string;
  mine: Q | string;
  theirs: Q | string | undefined;
  /** What divides adequate from inadequate for this quantity. */
  limit?: Q;
  /** Set pressure, for bands given as points of set. */
  set?: Q;
  factor?: number;
  context?: QuantityContext;
};
export type UnseenCompared = {
  within: boolean;
  /** (mine − theirs) / theirs; absent for words and for a zero. */
  deviation?: number;
  /** True when one lies within the limit and the other beyond it: then no tolerance helps. */
  acrossLimit: boolean;
  /** True when all digits that were typed are the originator's, five or more of them. */
  identical: boolean;
  sentence: string;
};

const text = (value: Q | string): string => (typeof value === 'string' ? value : formatQuantity(value));
const digitsOf = (q: Q): string => (q.text ?? String(q.value)).replace(/[^\d]/g, '').replace(/^0+/, '');

/** True when the checker's figure repeats the originator's to every typed digit, and that is more than a chart can give. */
export function isIdentical(mine: Q, theirs: Q, context?: QuantityContext): boolean {
  const digits = digitsOf(mine).length;
  if (digits < 5) return false;
  const other = converted(theirs, mine.unit, context);
  return other !== undefined && Number(mine.value.toPrecision(digits)) === Number(other.toPrecision(digits));
}

function converted(q: Q, unit: string, context: QuantityContext | undefined): number | undefined {
  try {
    return convert(q, unit, context);
  } catch {
    return undefined;
  }
}

/** Half width of the band about the originator's figure, in its unit. */
function band(pair: UnseenPair, mine: Q, theirs: Q): number {
  const tolerance = toleranceOf(pair.quantity, pair.factor);
  const slack = 0.001 * Math.abs(theirs.value);
  if (tolerance.kind === 'equal') return 0;
  if (tolerance.kind === 'printed') {
    const scale = Math.abs(
      (converted({ value: 1, unit: mine.unit }, theirs.unit, pair.context) ?? 1) -
        (converted({ value: 0, unit: mine.unit }, theirs.unit, pair.context) ?? 0),
    );
    return Math.max(
      Math.min(Math.max(halfDigit(mine) * scale, halfDigit(theirs)), 0.01 * Math.abs(theirs.value)),
      slack,
    );
  }
  if (tolerance.kind === 'abs')
    return tolerance.unit === 'dK' ? tolerance.value * kelvinIn(theirs.unit) : tolerance.value;
  const ofSet =
    pair.set && tolerance.ofSet !== undefined ? tolerance.ofSet * differenceIn(pair.set, theirs.unit) : 0;
  return Math.max(tolerance.share * Math.abs(theirs.value), ofSet);
}

function kelvinIn(unit: string): number {
  return fromSI(toSI({ value: 0, unit }) + 1, unit).value;
}

/** A gauge pressure as a difference in another unit: the offset of gauge against absolute does not matter. */
function differenceIn(set: Q, unit: string): number {
  if (unit === '%') return 100;
  return Math.abs(fromSI(toSI(set), unit).value - fromSI(0, unit).value);
}

function across(mine: number, theirs: number, limit: number): boolean {
  const beyond = (value: number): boolean => value > limit * 1.001;
  return beyond(mine) !== beyond(theirs);
}

/**
 * Compares a figure or word of the checker with the originator's. Outside its tolerance, or on different sides of a
 * limit whatever the difference, it must be corrected or reconciled in writing. An absent value of the originator differs.
 */
export function compareUnseen(pair: UnseenPair): UnseenCompared {
  const { mine, theirs, label } = pair;
  const none = { acrossLimit: false, identical: false };
  if (theirs === undefined)
    return { within: false, ...none, sentence: `${label}: the originator has no figure for this.` };
  const both = `${text(mine)} against ${text(theirs)}`;
  if (typeof mine === 'string' || typeof theirs === 'string') {
    const within = String(mine).trim().toLowerCase() === String(theirs).trim().toLowerCase();
    return {
      within,
      ...none,
      sentence: within ? `${label}: the same.` : `Checker and originator differ on ${label}: ${both}.`,
    };
  }
  const value = converted(mine, theirs.unit, pair.context);
  if (value === undefined)
    return { within: false, ...none, sentence: `${label}: ${both} do not measure the same.` };
  const limit = pair.limit && converted(pair.limit, theirs.unit, pair.context);
  const acrossLimit = limit !== undefined && across(value, theirs.value, limit);
  const within = !acrossLimit && Math.abs(value - theirs.value) <= band(pair, mine, theirs) * (1 + 1e-9);
  const deviation = theirs.value === 0 ? undefined : (value - theirs.value) / Math.abs(theirs.value);
  const side = acrossLimit ? ', and they lie on different sides of the limit' : '';
  const sentence = within
    ? `${label}: ${both}, within tolerance.`
    : `Checker and originator differ on ${label}: ${both}${side}.`;
  return {
    within,
    ...(deviation === undefined ? {} : { deviation }),
    acrossLimit,
    identical: isIdentical(mine, theirs, pair.context),
    sentence,
  };
}

/** Share of compared figures that are identical to all digits; above 0.8 the approver is told. */
export function identicalShare(compared: readonly { mine: Q | string; identical: boolean }[]): number {
  const figures = compared.filter((each) => typeof each.mine !== 'string');
  return figures.length === 0 ? 0 : figures.filter((each) => each.identical).length / figures.length;
}
