/* A body with everything that follows from it: evaluation, outcomes, hashes; justifications bound to their outcomes. */
import { type Basis, hashOf, type Hash, type Justification } from '@domain/basis';
import { evaluate, type Evaluation, type ImportSet } from '@domain/evaluate';
import { judge, type Outcome } from '@domain/rulebook';
import { importsHash, importSetOf } from './imports';
import { type World } from './world';

/** A body of a revision with what a signature binds of it. */
export type Bound = {
  body: Basis;
  imports: ImportSet;
  evaluation: Evaluation;
  outcomes: Outcome[];
  documentHash: Hash;
  importsHash: Hash;
};

function worked(world: World, body: Basis, prior: Bound | undefined): Bound {
  const imports = importSetOf(body);
  const evaluation = evaluate(body, world.judgement, imports);
  const before = prior ? { prior: { doc: prior.body, evaluation: prior.evaluation } } : {};
  const outcomes = judge({ doc: body, evaluation, imports, rules: world.judgement, ...before });
  return {
    body,
    imports,
    evaluation,
    outcomes,
    documentHash: hashOf('document', body),
    importsHash: importsHash(imports),
  };
}

/** A justification tied to the outcome that it answers; one whose outcome is not there stays as written. */
function tied(justification: Justification, outcomes: readonly Outcome[]): Justification {
  const [, id = ''] = justification.subject.split('/');
  const outcome = outcomes.find(
    (candidate) =>
      candidate.code === justification.code && candidate.subject.includes(id.replace(/^rp_/, '')),
  );
  return outcome
    ? { ...justification, subject: outcome.subject, values: outcome.values, hash: outcome.hash }
    : justification;
}

/** Works a body; its justifications are tied to the outcomes that they answer. `prior` is what outcomes are inherited from. */
export function bind(world: World, body: Basis, prior?: Bound): Bound {
  const shifted = body.justifications.map((one) => ({ ...one, on: world.shift.day(one.on) }));
  const dated = { ...body, justifications: shifted };
  const first = worked(world, dated, prior);
  if (dated.justifications.length === 0) return first;
  return worked(world, { ...dated, justifications: shifted.map((one) => tied(one, first.outcomes)) }, prior);
}
