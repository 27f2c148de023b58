/* Works a revision once and keeps it at hand: body, evaluation and outcomes of what a document, its imports and the rules say. */
import { hashOf, type Basis } from '@domain/basis';
import { catalogHash, evaluate, NO_IMPORTS, type Evaluation, type ImportSet } from '@domain/evaluate';
import { judge, type Outcome } from '@domain/rulebook';
import { type SiteRules } from '@domain/rules';
import { type Db } from '@data/connection';
import { findImports } from '@data/evaluations';
import { basisOf, type RevisionRow } from '@data/revisions';

/** A revision with everything that follows from it. Only services and papers may name this type: pages get projected views. */
export type Evaluated = { body: Basis; evaluation: Evaluation; outcomes: Outcome[]; imports: ImportSet };

const HELD_AT_MOST = 400;
const held = new Map<string, Evaluated>();

function keep(key: string, value: Evaluated): Evaluated {
  held.set(key, value);
  const oldest = held.keys().next();
  if (held.size > HELD_AT_MOST && !oldest.done) held.delete(oldest.value);
  return value;
}

const judgementHashes = new WeakMap<object, string>();

/** The hash of the judgement half of the rules, worked once for each set of rules. */
export function judgementHashOf(rules: SiteRules): string {
  const known = judgementHashes.get(rules.judgement);
  if (known !== undefined) return known;
  const made = hashOf('judgement', rules.judgement);
  judgementHashes.set(rules.judgement, made);
  return made;
}

async function importsOf(db: Db, hash: string | null): Promise<ImportSet> {
  if (hash === null) return NO_IMPORTS;
  return ((await findImports(db, hash)) as ImportSet | undefined) ?? NO_IMPORTS;
}

/** The key under which an evaluation is at hand; `prior` counts because inherited outcomes are judged against it. */
function keyOf(revision: RevisionRow, rules: SiteRules, prior?: RevisionRow): string {
  const parts = [revision.documentHash, revision.importsHash, judgementHashOf(rules), catalogHash()];
  return [...parts, prior?.documentHash, prior?.importsHash].join('|');
}

/**
 * Evaluates a revision, or takes the evaluation at hand. `prior` is the revision in force that outcomes are inherited from.
 * Undefined when the body of the revision was never held here.
 */
export async function evaluateRevision(
  db: Db,
  revision: RevisionRow,
  rules: SiteRules,
  prior?: RevisionRow,
): Promise<Evaluated | undefined> {
  const key = keyOf(revision, rules, prior);
  const known = held.get(key);
  if (known) {
    held.delete(key);
    return keep(key, known);
  }
  const body = await basisOf(db, revision.id);
  if (!body) return undefined;
  const before = prior && (await evaluateRevision(db, prior, rules));
  return keep(key, workBody(body, await importsOf(db, revision.importsHash), rules, before));
}

/** Evaluates and judges a body that is not stored yet, for instance one that is about to be saved. */
export function workBody(body: Basis, imports: ImportSet, rules: SiteRules, before?: Evaluated): Evaluated {
  const evaluation = evaluate(body, rules.judgement, imports);
  const prior = before && { doc: before.body, evaluation: before.evaluation };
  const outcomes = judge({
    doc: body,
    evaluation,
    imports,
    rules: rules.judgement,
    ...(prior ? { prior } : {}),
  });
  return { body, evaluation, outcomes, imports };
}
