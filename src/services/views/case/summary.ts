/* The summary to sign: the approver's ten minutes, in the order in which an approver reads. */
import { type ActAnswer, lengthOf } from '@domain/case';
import { peopleOfSite } from '@data/people';
import { dayWords } from '../days';
import { nameOf } from './acts';
import { noteLook, type OpenedCase } from './open';
import { type OutcomeView, outcomeView } from './outcomes';
import { baseOf, type Prose, proseOf, sheetHref } from './prose';
import { type MoveView, movesOf, type SigningView, signingHere } from './signatures';
import { type DeviceLine, deviceLines, type LeadView, leadOf } from './summary-figures';
import {
  type AffectedView,
  affectedIn,
  type ConditionView,
  conditionsIn,
  type Differed,
  differedIn,
  type DueView,
  dueIn,
  type NotExamined,
  notExamined,
  type PlaceView,
  placesIn,
} from './summary-record';

export type SummaryView = {
  hidden: boolean;
  what: Prose;
  basis?: Prose;
  effect?: Prose;
  by: string;
  until: string;
  lead: LeadView | null;
  devices: DeviceLine[];
  unmoved: string[];
  justified: OutcomeView[];
  inherited: OutcomeView[];
  differed: Differed[];
  notExamined: NotExamined[];
  affected: AffectedView[];
  conditions: ConditionView[];
  due: DueView[];
  papers: { text: string; state: string }[];
  places: PlaceView[];
  signing: SigningView | null;
  moves: MoveView[];
  /** Who can own a requirement or a deficiency. */
  people: { value: string; label: string }[];
  /** Inherited outcomes that no one owns yet: each needs a deficiency to be signed. */
  unowned: { hash: string; label: string }[];
};

function untilOf(of: OpenedCase): string {
  const { endsOn, brief } = of.file.row;
  const starts = brief.starts === undefined ? '' : `from ${dayWords(brief.starts)} `;
  if (endsOn !== null) return `${starts}until ${dayWords(endsOn)}`;
  return `${starts}for good`.trim();
}

function papersOf(of: OpenedCase): SummaryView['papers'] {
  return of.file.row.brief.papers
    .filter((paper) => paper.when === 'before-start-up' && paper.kind !== 'none')
    .map((paper) => ({
      text: [paper.kind, paper.reference, paper.to === '' ? '' : `to ${paper.to}`].filter(Boolean).join(' '),
      state: paper.state.replaceAll('-', ' '),
    }));
}

function outcomesOf(of: OpenedCase): { justified: OutcomeView[]; inherited: OutcomeView[] } {
  const all = of.file.documents.flatMap((one) => {
    const facts = of.facts.documents.find((each) => each.document === one.document.id);
    return facts ? (one.after?.outcomes ?? []).map((raw) => outcomeView(of, facts, one, raw)) : [];
  });
  return {
    justified: all.filter(
      (each) => each.severity === 'justify' && (each.justification !== undefined || !each.inherited),
    ),
    inherited: all.filter(
      (each) => each.inherited && each.severity !== 'note' && each.justification === undefined,
    ),
  };
}

function figuresOf(of: OpenedCase): Pick<SummaryView, 'lead' | 'devices' | 'unmoved'> {
  if (of.hidden) return { lead: null, devices: [], unmoved: [] };
  const lines = of.file.documents.flatMap((one) => deviceLines(one, baseOf(of)));
  const first = of.file.documents[0];
  return {
    lead: (first && leadOf(first, (key) => sheetHref(of, first, key))) ?? null,
    devices: lines.filter((line) => line.moved),
    unmoved: lines.filter((line) => !line.moved).map((line) => line.tag),
  };
}

/** The summary of the case for one reader; without results while they are hidden from them. */
export async function summaryView(of: OpenedCase, acts: readonly ActAnswer[]): Promise<SummaryView> {
  await noteLook(of, 'summary');
  const { brief, raisedBy } = of.file.row;
  const outcomes = outcomesOf(of);
  const people = await peopleOfSite(of.ctx.db, of.file.site.id);
  const optional = (name: 'basis' | 'effect', text: Prose['rich']) =>
    lengthOf(text) > 0 ? { [name]: proseOf(of, text) } : {};
  return {
    hidden: of.hidden,
    what: proseOf(of, brief.whatChanges as Prose['rich']),
    ...optional('basis', brief.technicalBasis as Prose['rich']),
    ...optional('effect', brief.effect as Prose['rich']),
    by: nameOf(of, raisedBy),
    until: untilOf(of),
    ...figuresOf(of),
    ...outcomes,
    differed: await differedIn(of),
    notExamined: of.file.documents.map((one) =>
      notExamined(
        of,
        one,
        of.facts.documents.find((each) => each.document === one.document.id),
      ),
    ),
    affected: affectedIn(of),
    conditions: of.file.documents.flatMap((one) => conditionsIn(of, one)),
    due: dueIn(of),
    papers: papersOf(of),
    places: placesIn(of),
    signing: signingHere(of, 'SIGN'),
    moves: movesOf(of, acts),
    people: people.filter((one) => !one.retiredAt).map((one) => ({ value: one.id, label: one.name })),
    unowned: of.hidden
      ? []
      : outcomes.inherited
          .filter((each) => each.deficiency === undefined)
          .map((each) => ({ hash: each.hash, label: `${each.subject}: ${each.sentence}` })),
  };
}
