/* The unseen check as its reader may see it: what is asked in its order, what is entered, and after the reveal both sides. */
import { getAt, type Origin } from '@domain/basis';
import {
  chosenScenario,
  type DocumentFacts,
  identicalShare,
  scenarioName,
  unseenDifferences,
  type UnseenDifference,
  type UnseenEntry,
  type UnseenItem,
  type UnseenLayer,
  unseenState,
  type UnseenStep,
} from '@domain/case';
import { entryOfItem } from '@domain/case';
import { maskProse } from '@domain/hidden';
import { formatNumber, formatQuantity, type Q, unitLabel } from '@engine/quantity';
import { type CaseDocumentFile } from '../../case-file';
import { checkerFacts } from '../../check/unseen';
import { unitOf, unitsFor } from '../../check/unseen-typed';
import { originWords } from '../shown';
import { byAt, type May, mayHere, nameOf } from './acts';
import { noteLook, type OpenedCase } from './open';
import { type Prose, proseOf } from './prose';
import { instantWords } from './when';

export type Choice = { value: string; label: string };
export type ItemView = {
  scope: string;
  layer: UnseenLayer;
  label: string;
  ask: { kind: 'quantity'; unit: string; units: Choice[] } | { kind: 'word'; options: Choice[] };
  /** Where the originator read it, so that the checker knows where to look; never the value. */
  origin?: string;
  /** What the reader may see of the entry: its own figure, or only that it is there. */
  entry?: { shown?: string; cites?: string; at: string };
  /** It may be entered now. */
  asked: boolean;
};
export type ComparedRow = {
  entry: string;
  what: string;
  yours: string;
  sheet: string;
  /** "+3.9 %", "the same", "another". */
  differs: string;
  within: boolean;
  acrossLimit: boolean;
  reconciled?: { text: Prose; by: string };
};
export type UnseenSystem = {
  document: string;
  tag: string;
  step: UnseenStep;
  items: ItemView[];
  left: number;
  /** The scenario that the checker holds to govern, in words, for the heading of the figures. */
  chosen?: string;
  revealedAt?: string;
  rows: ComparedRow[];
  identical?: string;
};
export type UnseenView = {
  hidden: boolean;
  /** True for the checker: whose entries they are. */
  yours: boolean;
  checker: string;
  systems: UnseenSystem[];
  enter: May;
  reveal: May;
  reconcile: May;
};

const WORDS: Record<string, string> = {
  'flashing-liquid': 'flashing liquid',
  'two-phase': 'two-phase',
  'catch-tank': 'catch tank',
};

function wordLabel(one: DocumentFacts, item: UnseenItem, word: string): string {
  if (item.quantity !== 'governing-scenario') return WORDS[word] ?? word;
  const scenario = one.doc?.scenarios.find((each) => each.id === word);
  return scenario ? scenarioName(scenario) : word;
}

function askOf(one: DocumentFacts, item: UnseenItem): ItemView['ask'] {
  if (item.ask.kind === 'word')
    return {
      kind: 'word',
      options: item.ask.choices.map((value) => ({ value, label: wordLabel(one, item, value) })),
    };
  return {
    kind: 'quantity',
    unit: unitOf(item, one.doc?.units ?? 'SI'),
    units: unitsFor(item).map((value) => ({
      value,
      label: unitLabel(value) === '' ? '–' : unitLabel(value),
    })),
  };
}

/** Value and unit as typed where the digits say more; words in words. */
function shown(one: DocumentFacts, item: UnseenItem, value: Q | string | undefined): string {
  if (value === undefined) return 'none';
  if (typeof value === 'string') return wordLabel(one, item, value);
  return formatQuantity(value);
}

function originOf(one: DocumentFacts, item: UnseenItem): { origin?: string } {
  if (item.layer !== 'reading' || !one.doc) return {};
  const value = getAt(one.doc, item.scope);
  if (typeof value !== 'object' || value === null || !('origin' in value)) return {};
  const words = originWords(value.origin as Origin);
  return words === undefined ? {} : { origin: maskProse(words) };
}

function itemView(
  of: OpenedCase,
  one: DocumentFacts,
  item: UnseenItem,
  asked: boolean,
  open: boolean,
): ItemView {
  const entry = entryOfItem(one, item, of.facts);
  return {
    scope: item.scope,
    layer: item.layer,
    label: item.label,
    ask: askOf(one, item),
    ...originOf(one, item),
    ...(entry ? { entry: entryView(of, one, item, entry, open) } : {}),
    asked,
  };
}

function entryView(of: OpenedCase, one: DocumentFacts, item: UnseenItem, entry: UnseenEntry, open: boolean) {
  return {
    at: instantWords(entry.at, of.file.site.timeZone),
    ...(open ? { shown: shown(one, item, entry.value ?? entry.word) } : {}),
    ...(open && entry.cites !== undefined ? { cites: entry.cites } : {}),
  };
}

function comparedRow(
  of: OpenedCase,
  one: DocumentFacts,
  file: CaseDocumentFile,
  each: UnseenDifference,
): ComparedRow {
  const { item, entry, theirs, compared } = each;
  const { deviation } = compared;
  const words = typeof theirs === 'string' || deviation === undefined;
  const sign = (deviation ?? 0) >= 0.0005 ? '+' : '';
  return {
    entry: entry.id,
    what: item.label,
    yours: shown(one, item, entry.value ?? entry.word),
    sheet: shown(one, item, theirs),
    differs: words
      ? compared.within
        ? 'the same'
        : 'another'
      : `${sign}${formatNumber(deviation * 100, 1)} %`,
    within: compared.within,
    acrossLimit: compared.acrossLimit,
    ...(entry.reconciled
      ? {
          reconciled: {
            text: proseOf(of, entry.reconciled.text as Prose['rich'], file),
            by: byAt(of, entry.reconciled.by, entry.reconciled.at),
          },
        }
      : {}),
  };
}

/** What the approver is told when the checker's figures repeat the originator's to every digit. */
export function identicalNote(differences: readonly UnseenDifference[]): string | undefined {
  const share = identicalShare(
    differences.map((each) => ({
      mine: each.entry.value ?? each.entry.word ?? '',
      identical: each.compared.identical,
    })),
  );
  if (share <= 0.8) return undefined;
  return `${formatNumber(share * 100, 0)} % of the checker’s figures are identical to all digits with the originator’s: ask how they were worked.`;
}

function chosenIn(of: OpenedCase, one: DocumentFacts, open: boolean): { chosen?: string } {
  if (!open) return {};
  const ids = (one.doc?.groups ?? []).flatMap(
    (group) => chosenScenario(one, group.id, [...of.facts.unseen]) ?? [],
  );
  const names = [...new Set(ids)].flatMap((id) => {
    const scenario = one.doc?.scenarios.find((each) => each.id === id);
    return scenario ? [scenarioName(scenario)] : [];
  });
  return names.length > 0 ? { chosen: names.join(', ') } : {};
}

function systemOf(of: OpenedCase, one: DocumentFacts, file: CaseDocumentFile, yours: boolean): UnseenSystem {
  const state = unseenState(one, of.facts);
  const open = yours || state.revealed;
  const mayEnter = new Set(state.mayEnter.map((item) => item.scope));
  const shownBoth = state.revealed && !of.hidden;
  const differences = shownBoth
    ? unseenDifferences(one, of.facts, { barometer: of.file.site.barometer })
    : [];
  const reveal = of.file.reveals.filter((each) => each.documentId === one.document).at(-1);
  const identical = identicalNote(differences);
  return {
    document: one.document,
    tag: one.tag,
    step: state.step,
    items: state.items.map((item) => itemView(of, one, item, mayEnter.has(item.scope), open)),
    left: state.missing.length,
    ...chosenIn(of, one, open),
    ...(reveal && state.revealed ? { revealedAt: instantWords(reveal.at, of.file.site.timeZone) } : {}),
    rows: differences.map((each) => comparedRow(of, one, file, each)),
    ...(identical !== undefined && !yours ? { identical } : {}),
  };
}

/** The unseen check of the case. The checker's own entries are theirs alone until the reveal. */
export async function unseenView(of: OpenedCase): Promise<UnseenView> {
  await noteLook(of, 'unseen');
  const persons = [of.actor.person.id, ...of.actor.standsFor];
  const seats = of.file.seats.filter((seat) => seat.role === 'checker' && !seat.untilAt);
  const yours = seats.some((seat) => persons.includes(seat.personId));
  const facts = checkerFacts(of.file);
  return {
    hidden: of.hidden,
    yours,
    checker: seats.map((seat) => nameOf(of, seat.personId)).join(', '),
    systems: of.file.documents.flatMap((file) => {
      const one = of.facts.documents.find((each) => each.document === file.document.id);
      return one?.doc ? [systemOf(of, one, file, yours)] : [];
    }),
    enter: mayHere(of, 'unseen', facts),
    reveal: mayHere(of, 'reveal', facts),
    reconcile: mayHere(of, 'reconcile', facts),
  };
}
