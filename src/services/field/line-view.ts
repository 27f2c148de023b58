/* A line of the field sheet as one person may see it: the question first, what was signed only once it was seen. */
import { askOf, compareSeen, type FieldEntry, type FieldLine } from '@domain/field';
import { convert, dimensionOf, type Q, UNITS, unitLabel } from '@engine/quantity';
import { shownQ, type Shown } from '../views/shown';

/** What stands on a line for the reader. `elsewhere`: another has seen it, and the reader has not. */
export type LineState = 'to-see' | 'as-signed' | 'differs' | 'recorded' | 'unreadable' | 'elsewhere';

export type Gap = {
  seen: number;
  signed: number;
  tolerance: number;
  toleranceWords: string;
  decimals: number;
};
export type AskView =
  | { kind: 'quantity'; unit: string; units: { value: string; label: string }[] }
  | { kind: 'word'; choices: readonly string[] };
export type FieldLineView = {
  key: string;
  anchor: string;
  label: string;
  ask: AskView;
  /** A photograph is asked for; `photographs` are the ones that came with the entry that counts. */
  photo: boolean;
  photographs: string[];
  state: LineState;
  seen?: Shown;
  wants?: Shown;
  sentence?: string;
  gap?: Gap;
  by?: string;
  at?: string;
  cannot?: { means: string; second: string };
  /** Number of the discrepancy on the line that counts. */
  discrepancy?: number;
  /** It must be seen again: what is signed has changed since, or the photograph is missing. */
  again: boolean;
};

/** Units of the same kind that a plate is likely to carry, the line's own first. */
function unitsFor(unit: string): { value: string; label: string }[] {
  const dimension = dimensionOf(unit);
  const same = Object.entries(UNITS).flatMap(([key, one]) => (one.dimension === dimension ? [key] : []));
  return [unit, ...same.filter((key) => key !== unit)].map((key) => ({ value: key, label: unitLabel(key) }));
}

function askView(line: FieldLine): AskView {
  const ask = askOf(line);
  return ask.kind === 'quantity' ? { kind: 'quantity', unit: ask.unit, units: unitsFor(ask.unit) } : ask;
}

const shownValue = (value: Q | string): Shown =>
  typeof value === 'string' ? { text: value } : shownQ(value);

function decimalsOf(q: Q): number {
  return Math.min((q.text ?? String(q.value)).split('.')[1]?.length ?? 0, 4);
}

function gapOf(line: FieldLine, seen: Q | string | undefined, barometer: Q): Gap | undefined {
  const { wants } = line;
  if (!wants || !seen || typeof wants === 'string' || typeof seen === 'string') return undefined;
  const { tolerance } = compareSeen(line, seen, { barometer });
  try {
    const value = convert(seen, wants.unit, { barometer });
    const share = wants.value === 0 ? 0 : (tolerance / Math.abs(wants.value)) * 100;
    const decimals = Math.max(decimalsOf(wants), decimalsOf(seen), 1);
    return {
      seen: value,
      signed: wants.value,
      tolerance,
      toleranceWords: `± ${share.toFixed(1)} %`,
      decimals,
    };
  } catch {
    return undefined;
  }
}

/** Facts about the reader and the line that the view needs. */
export type LineOf = {
  line: FieldLine;
  /** The verifier's entry that counts, or the installer's where no one has verified. */
  entry: FieldEntry | undefined;
  discrepancy: number | undefined;
  /** Whether the reader may be shown what was signed and what was seen. */
  open: boolean;
  barometer: Q;
  nameOf: (id: string) => string;
  timeOf: (instant: string) => string;
  fileAt: (id: string) => string;
};

function stateOf({ line, entry, discrepancy, open }: LineOf, agrees: boolean | undefined): LineState {
  if (!entry || entry.as === 'installer') return 'to-see';
  if (!open) return 'elsewhere';
  if (discrepancy !== undefined || agrees === false) return 'differs';
  if (entry.seen === undefined) return 'unreadable';
  return line.wants === undefined ? 'recorded' : 'as-signed';
}

function seenSide(of: LineOf, entry: FieldEntry): Partial<FieldLineView> {
  const { line, barometer } = of;
  const compared = entry.seen === undefined ? undefined : compareSeen(line, entry.seen, { barometer });
  const gap = compared && !compared.agrees ? gapOf(line, entry.seen, barometer) : undefined;
  return {
    ...(entry.seen === undefined ? {} : { seen: shownValue(entry.seen) }),
    ...(line.wants === undefined ? {} : { wants: shownValue(line.wants) }),
    ...(compared ? { sentence: compared.sentence } : {}),
    ...(gap ? { gap } : {}),
    ...(entry.cannot
      ? { cannot: { means: entry.cannot.means, second: of.nameOf(entry.cannot.second) } }
      : {}),
    photographs: entry.files.map(of.fileAt),
  };
}

function mustSeeAgain({ line, entry, discrepancy }: LineOf, agrees: boolean | undefined): boolean {
  if (!entry || entry.as === 'installer' || discrepancy !== undefined) return false;
  return agrees === false || (line.photo && entry.files.length === 0);
}

/** The line for the reader. */
export function lineView(of: LineOf): FieldLineView {
  const { line, entry, open, barometer } = of;
  const agrees = entry?.seen === undefined ? undefined : compareSeen(line, entry.seen, { barometer }).agrees;
  const state = stateOf(of, agrees);
  const seen = entry && open && state !== 'to-see' ? seenSide(of, entry) : {};
  return {
    key: line.key,
    anchor: `line-${String(line.order)}`,
    label: line.label,
    ask: askView(line),
    photo: line.photo,
    photographs: [],
    again: mustSeeAgain(of, agrees),
    state,
    ...(entry && state !== 'to-see' ? { by: of.nameOf(entry.by), at: of.timeOf(entry.saw) } : {}),
    ...(of.discrepancy === undefined ? {} : { discrepancy: of.discrepancy }),
    ...seen,
  };
}
