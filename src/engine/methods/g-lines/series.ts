/* Numbered inputs of a line: how many segments there are, one number for each, and their symbols. */
import { type Bounds, type SheetBuilder } from '../../sheet';

/** More segments than any tail pipe with its header has; beyond it a list is taken for a slip. */
const MOST_SEGMENTS = 60;

/** The name of an input for segment `index`, counted from 0. */
export function nameAt(name: string, index: number): string {
  return index === 0 ? name : `${name}_${index + 1}`;
}

/** How many segments were given, by their bores. */
export function segmentCount(sheet: SheetBuilder): number {
  let count = 0;
  while (sheet.has(nameAt('D', count)) && count <= MOST_SEGMENTS) count += 1;
  if (count === 0) sheet.quantity('D');
  if (count > MOST_SEGMENTS)
    sheet.refuse('TOO_MANY', 'D', `A line has at most ${MOST_SEGMENTS} segments; check the list.`);
  return count;
}

/** What is read for each segment. */
export type Each = { unit: string; bounds?: Bounds; tex: string };

/**
 * One number a segment. Given once, it holds for all of them; given for some, or for more than there are bores, it is refused.
 */
export function readEach(sheet: SheetBuilder, name: string, count: number, each: Each): number[] {
  const { unit, bounds = {}, tex } = each;
  if (sheet.has(nameAt(name, count)))
    sheet.refuse(
      'LISTS_DIFFER',
      nameAt(name, count),
      `${name} is given for more segments than the ${count} whose D is given.`,
    );
  const symbol = (index: number) => symbolAt(tex, index, count);
  const single = !Array.from({ length: count - 1 }, (_, i) => i + 1).some((i) => sheet.has(nameAt(name, i)));
  return Array.from({ length: count }, (_, index) => {
    if (single && index > 0 && sheet.has(name))
      return sheet.keep(nameAt(name, index), sheet.number(name, unit, bounds, symbol(0)), symbol(index));
    return sheet.number(nameAt(name, index), unit, bounds, symbol(index));
  });
}

/** A symbol for segment `index`: `p_{out}` → `p_{out,2}`; bare when there is one segment only. */
export function symbolAt(tex: string, index: number, count: number): string {
  if (count === 1) return tex;
  return tex.endsWith('}') ? tex.replace(/\}$/, `,${index + 1}}`) : `${tex}_{${index + 1}}`;
}

/** “ of segment 2”, or nothing when there is one only. */
export function ofSegment(index: number, count: number): string {
  return count === 1 ? '' : ` of segment ${index + 1}`;
}
