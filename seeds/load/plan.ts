/* What is known of a case before its rows are written: its documents worked out, its people, its place in time. */
import { type Basis, hashOf, sameContent } from '@domain/basis';
import {
  type Brief,
  type CaseDocumentState,
  type DocumentFacts,
  type Role,
  type SeatRole,
  type Stage,
} from '@domain/case';
import { type DemoCase } from '../cases/demo-case-types';
import { changed, changesOf, systemsOf } from '../cases/change';
import {
  basisOf,
  caseId,
  documentId,
  personId,
  resultsOf,
  RESULTS,
  rich,
  SITE,
  slug,
  systemOf,
} from '../convert';
import supplement from '../data/supplement/cases.json';
import people from '../data/supplement/site.json';
import { bind, type Bound } from './bound';
import { type World } from './world';

/** One document of a case: the revision it began from and the one that it makes. */
export type CaseDoc = {
  tag: string;
  document: string;
  why: 'own' | 'affected';
  base: Bound;
  baseRevision: string;
  working: Bound;
  workingRevision: string;
  state: CaseDocumentState;
  /** Number of the revision that the case issued. */
  issued?: number;
};

export type CasePlan = {
  world: World;
  demo: DemoCase;
  id: string;
  stage: Stage;
  documents: CaseDoc[];
  brief: Brief;
};

type Written = { system: string; code: string; subject: string; by: string; on: string; text: string };
const JUSTIFICATIONS: Record<string, Written[] | undefined> = supplement.justifications;

const STAGES: Record<string, Stage> = {
  draft: 'draft',
  'scenario analysis': 'scenarios',
  'calculation check': 'check',
  approval: 'approval',
  'field verification': 'field',
  'in force': 'in-force',
  withdrawn: 'withdrawn',
  refused: 'refused',
};
const STATES: Partial<Record<Stage, CaseDocumentState>> = {
  field: 'approved',
  'in-force': 'issued',
  withdrawn: 'dropped',
  refused: 'dropped',
};

/** The stage of a case of theirs. */
export function stageOf(demo: DemoCase): Stage {
  return STAGES[demo.stage] ?? 'draft';
}

/** The id of a numbered revision of a system. */
export const revisionId = (tag: string, number: number): string => `rev_${slug(tag)}_${String(number)}`;

/** The number of the revision of a system that is in force. */
export const inForceNumber = (tag: string): number => systemOf(tag).revision;

const figuresOf = (sheet: Basis['externalSheets'][number]): unknown =>
  Object.entries(sheet.figures).map(([name, figure]) => [
    name,
    'value' in figure ? [figure.value, figure.unit] : figure,
  ]);

/** External sheets whose figures the change leaves as they are stay those of the basis in force. */
function keepUnmoved(made: Basis, before: Basis): Basis {
  const externalSheets = made.externalSheets.map((sheet) => {
    const old = before.externalSheets.find((candidate) => candidate.id === sheet.id);
    return old && sameContent(figuresOf(old), figuresOf(sheet))
      ? { ...sheet, author: old.author, figures: old.figures }
      : sheet;
  });
  return { ...made, externalSheets };
}

/** What the originator justified in writing in this case. */
function withJustifications(demo: DemoCase, tag: string, body: Basis): Basis {
  const own = (JUSTIFICATIONS[demo.id] ?? []).filter((one) => one.system === tag);
  const written = own.map(({ code, subject, by, on, text }) => ({
    id: `js_${slug(demo.id)}_${code.replaceAll('-', '')}`,
    code,
    subject,
    values: {},
    hash: hashOf('outcome', { code, subject }),
    text: rich(text),
    by: personId(by),
    on,
  }));
  return { ...body, justifications: [...body.justifications, ...written] };
}

function docOf(
  world: World,
  demo: DemoCase,
  system: { tag: string; why: 'own' | 'affected' },
  inForce: Bound,
): CaseDoc {
  const stage = stageOf(demo);
  const issued = stage === 'in-force';
  const raw = systemOf(system.tag);
  const side = issued ? 'old' : 'new';
  const results = RESULTS.cases[demo.id]?.[issued ? 'before' : 'after'][system.tag] ?? resultsOf(system.tag);
  const study = issued ? undefined : `Relief study of ${demo.id}`;
  const made = basisOf(
    changed(raw, changesOf(demo), side),
    study === undefined ? results : { ...results, study },
  );
  const other = issued ? made : withJustifications(demo, system.tag, keepUnmoved(made, inForce.body));
  const base = issued ? bind(world, other) : inForce;
  const working = issued ? bind(world, inForce.body, base) : bind(world, other, inForce);
  const number = inForceNumber(system.tag);
  return {
    tag: system.tag,
    document: documentId(system.tag),
    why: system.why,
    base,
    baseRevision: revisionId(system.tag, issued ? number - 1 : number),
    working,
    workingRevision: issued ? revisionId(system.tag, number) : `rev_${slug(demo.id)}_${slug(system.tag)}`,
    state: STATES[stage] ?? 'open',
    ...(issued ? { issued: number } : {}),
  };
}

/** The documents of a case with base and working revision worked out. */
export function documentsOf(world: World, demo: DemoCase, inForce: ReadonlyMap<string, Bound>): CaseDoc[] {
  return systemsOf(demo).map((system) => {
    const bound = inForce.get(system.tag);
    if (!bound) throw new Error(`${system.tag} of ${demo.id} has no basis in force`);
    return docOf(world, demo, system, bound);
  });
}

/** A document as the gates read it. */
export function factsOf(doc: CaseDoc): DocumentFacts {
  return {
    document: doc.document,
    tag: doc.tag,
    state: doc.state,
    base: doc.baseRevision,
    inForce: revisionId(doc.tag, inForceNumber(doc.tag)),
    doc: doc.working.body,
    baseDoc: doc.base.body,
    evaluation: doc.working.evaluation,
    baseEvaluation: doc.base.evaluation,
    outcomes: doc.working.outcomes,
  };
}

const WORDS: Record<string, string | undefined> = people.people.roleWords;

/** The roles of a person at the site. */
export function rolesOf(person: string): Role[] {
  const found = SITE.people.find((candidate) => candidate.id === person);
  return (found?.roles ?? []).map((role) => (WORDS[role] ?? role) as Role);
}

/** Who holds which seat of a case, in the order of the gates. */
export function seatsOf(demo: DemoCase): { role: SeatRole; person: string }[] {
  const { originator, checker, approvers, operations } = demo.nominated;
  return [
    { role: 'originator', person: originator },
    { role: 'checker', person: checker },
    ...approvers.map((person) => ({ role: 'approver' as const, person })),
    { role: 'operations', person: operations },
  ];
}

/** Ids under which a case and its people are written. */
export const idsOf = { case: caseId, person: personId };
