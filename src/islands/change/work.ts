/* What the typed figures come to: the ops to save, the document with them in it, and the effect on every group. */
import { type Q } from '@engine/quantity';
import { applyOps, type Basis, describePath, getAt, type Op } from '@domain/basis';
import { evaluate, type Evaluation, type ImportSet, type Verdict } from '@domain/evaluate';
import { blocking, judge, type Outcome } from '@domain/rulebook';
import { type JudgementRules } from '@domain/rules';
import { type Field, type Read, readField, type Typed } from './field';

export type TypedByPath = Readonly<Record<string, Typed>>;
export type Plant = {
  document: Basis;
  base: Basis | null;
  judgement: JudgementRules;
  imports: ImportSet;
};
export type GroupEffect = {
  id: string;
  name: string;
  verdict: Verdict;
  before?: Verdict;
  governing?: string;
  governedBefore?: string;
  required?: Q;
  requiredBefore?: Q;
  installed?: Q;
  installedBefore?: Q;
  use?: number;
  useBefore?: number;
};
export type Effect = { groups: GroupEffect[]; fresh: Outcome[]; cleared: Outcome[]; refused: string[] };
type Judged = { doc: Basis; evaluation: Evaluation; outcomes: Outcome[] };

/** Reads every typed field. */
export function readAll(
  fields: readonly Field[],
  typed: TypedByPath,
  { document, judgement }: Plant,
): Record<string, Read> {
  return Object.fromEntries(
    fields.map((field) => [
      field.path,
      readField(field, typed[field.path] ?? field.start, document, judgement),
    ]),
  );
}

/** The changes to save: one `set` for each figure that is right and new, with what stood there. */
export function opsOf(reads: Readonly<Record<string, Read>>, document: Basis): Op[] {
  return Object.entries(reads).flatMap(([path, read]) =>
    read.state === 'right'
      ? [{ op: 'set' as const, path, value: read.figure, was: getAt(document, path) ?? null }]
      : [],
  );
}

/** Evaluates and judges a document against the revision in force. */
export function judged(doc: Basis, { base, judgement, imports }: Plant): Judged {
  const evaluation = evaluate(doc, judgement, imports);
  const prior = base && { doc: base, evaluation: evaluate(base, judgement, imports) };
  const outcomes = judge({ doc, evaluation, imports, rules: judgement, ...(prior ? { prior } : {}) });
  return { doc, evaluation, outcomes: blocking(outcomes, doc) };
}

function areaAt(evaluation: Evaluation, id: string, name: string): Q | undefined {
  const value = evaluation.figures[`groups/${id}#${name}`];
  return typeof value === 'object' ? value : undefined;
}

function governingOf(
  { doc, evaluation }: Pick<Judged, 'doc' | 'evaluation'>,
  id: string,
): string | undefined {
  const [, scenario] = /^size:([^/]+)\//.exec(evaluation.groups[id]?.governing ?? '') ?? [];
  return scenario === undefined ? undefined : describePath(doc, `scenarios/${scenario}`).label;
}

/** One group now beside the revision in force. */
function groupEffect(
  id: string,
  now: Judged,
  before: Pick<Judged, 'doc' | 'evaluation'> | undefined,
): GroupEffect {
  const result = now.evaluation.groups[id];
  const old = before?.evaluation.groups[id];
  return {
    id,
    name: describePath(now.doc, `groups/${id}`).label,
    verdict: result?.verdict ?? 'not-sized',
    governing: governingOf(now, id),
    use: result?.use,
    required: areaAt(now.evaluation, id, 'required'),
    installed: areaAt(now.evaluation, id, 'installed'),
    ...(before && old
      ? {
          before: old.verdict,
          governedBefore: governingOf(before, id),
          useBefore: old.use,
          requiredBefore: areaAt(before.evaluation, id, 'required'),
          installedBefore: areaAt(before.evaluation, id, 'installed'),
        }
      : {}),
  };
}

const keyOf = ({ code, subject }: Outcome) => `${code} ${subject}`;

/** Those of the first list that the second does not have: same rule, same subject. */
export function without(one: readonly Outcome[], other: readonly Outcome[]): Outcome[] {
  const known = new Set(other.map(keyOf));
  return one.filter((outcome) => !known.has(keyOf(outcome)));
}

/** A worker that remembers what stands, so that each keystroke evaluates only the changed document. */
export function effectsOf(plant: Plant): (ops: readonly Op[]) => Effect | string {
  const stands = judged(plant.document, plant);
  const before = plant.base && {
    doc: plant.base,
    evaluation: evaluate(plant.base, plant.judgement, plant.imports),
  };
  return (ops) => {
    const applied = applyOps(plant.document, ops, { barometer: plant.judgement.barometer });
    if (!applied.ok) return applied.problem.detail;
    const now = ops.length === 0 ? stands : judged(applied.value, plant);
    return {
      groups: now.doc.groups.map(({ id }) => groupEffect(id, now, before ?? undefined)),
      fresh: without(now.outcomes, stands.outcomes),
      cleared: without(stands.outcomes, now.outcomes),
      refused: [
        ...new Set(Object.values(now.evaluation.sheets).flatMap((sheet) => sheet.refused?.text ?? [])),
      ],
    };
  };
}
