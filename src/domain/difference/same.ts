/* When two values of a document say the same: figures after conversion, everything else by its canonical form. */
import { sameValue, type Q, type QuantityContext } from '@engine/quantity';
import { canonical } from '@domain/basis/canonical';
import { isKnown } from '@domain/basis/figures';
import { isFigure } from '@domain/basis/leaves';

/** What a comparison needs from the site: its barometer, for a gauge pressure against an absolute one. */
export type CompareContext = { barometer?: Q };

/**
 * True when two leaves say the same. A figure is one leaf with its origin: in the same unit every digit counts, in
 * another unit the value after conversion (12 barg is 174.05 psig).
 */
export function sameLeaf(one: unknown, other: unknown, context: CompareContext = {}): boolean {
  if (one === other) return true;
  if (isFigure(one) && isFigure(other) && isKnown(one) && isKnown(other) && one.unit !== other.unit) {
    const bridge: QuantityContext | undefined = context.barometer && { barometer: context.barometer };
    return sameValue(one, other, bridge) && canonical(one.origin) === canonical(other.origin);
  }
  return canonical(one) === canonical(other);
}
