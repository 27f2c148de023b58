/* Figures as pages show them: digits and unit apart, with where they come from. */
import { type F, type Input, isKnown, type Origin, type Q } from '@domain/basis';
import { formatNumber, unitLabel } from '@engine/quantity';

/** A figure ready for a cell. `hidden`: withheld from the reader; `unknown`: asked and not known, with the reason. */
export type Shown = { text: string; unit?: string; origin?: string; hidden?: true; unknown?: true };

const ORIGIN_WORDS: Record<Origin['kind'], string> = {
  drawing: 'drawing',
  'data-sheet': 'data sheet',
  maker: 'maker',
  plate: 'nameplate',
  'test-record': 'test record',
  'field-reading': 'field reading',
  simulation: 'simulation',
  calculation: 'calculation',
  judgement: 'judgement',
  figure: 'copied figure',
};

/** An origin in words: what was read, by which method, or only its kind where it names nothing. */
export function originWords(origin: Origin | undefined): string | undefined {
  if (!origin) return undefined;
  const named = origin.ref === '' ? ORIGIN_WORDS[origin.kind] : origin.ref;
  return origin.method === undefined ? named : `${named}, ${origin.method}`;
}

/** Empty for what has no dimension: it is a figure all the same. */
const shownUnit = (unit: string) => ({ unit: unit === '-' ? '' : unitLabel(unit) });

/** A quantity: the digits as typed where they say more than the number. */
export function shownQ(q: Q, decimals?: number): Shown {
  return { text: q.text ?? formatNumber(q.value, decimals), ...shownUnit(q.unit) };
}

/** A figure of a document; without an origin of its own it has that of what it belongs to. */
export function shownFigure(figure: F | undefined, owner?: Origin): Shown | undefined {
  if (figure === undefined) return undefined;
  if (isKnown(figure)) {
    const origin = originWords(figure.origin ?? owner);
    return { ...shownQ(figure), ...(origin === undefined ? {} : { origin }) };
  }
  if ('hidden' in figure) return { text: 'hidden', hidden: true };
  return { text: `not known: ${figure.unknown}`, unknown: true };
}

/** A fraction of a document, shown as a percentage. */
export function shownShare(figure: F | undefined, owner?: Origin): Shown | undefined {
  const shown = shownFigure(figure, owner);
  if (!shown || figure === undefined || !isKnown(figure) || figure.unit !== '-') return shown;
  return { ...shown, text: formatNumber(Math.round(figure.value * 1e6) / 1e4), unit: '%' };
}

/** An input of a method as the document states it; `label` names the place that it is taken from. */
export function shownInput(input: Input, label: (path: string) => string): Shown {
  if ('use' in input) return { text: label(input.use) };
  if ('word' in input) return { text: input.word };
  if ('flag' in input) return { text: input.flag ? 'yes' : 'no' };
  if ('list' in input) return { text: input.list.join(', ') };
  return shownFigure(input) ?? { text: '–' };
}

/** A value of a sheet: a quantity, a word or a flag. */
export function shownValue(value: Q | string | boolean): Shown {
  if (typeof value === 'boolean') return { text: value ? 'yes' : 'no' };
  return typeof value === 'string' ? { text: value } : shownQ(value);
}

/** Figure and unit in one string, joined by a no-break space. */
export function inline(shown: Shown | undefined): string {
  if (!shown) return '–';
  return shown.unit === undefined || shown.unit === '' ? shown.text : `${shown.text}\u00a0${shown.unit}`;
}

/** A share as a percentage with one decimal. */
export function percent(share: number, decimals = 1): string {
  return formatNumber(share * 100, decimals);
}
