/* A system for programs: its document and its evaluation, as far as the asker may see them. */
import { type Basis } from '@domain/basis';
import { type Evaluation } from '@domain/evaluate';
import { type HiddenEvaluation } from '@domain/hidden';
import { type Outcome } from '@domain/rulebook';
import { fail, ok, type Result } from '@domain/result';
import { type RevisionRow } from '@data/revisions';
import { type Actor, type Ctx } from '../../context';
import { hiddenKeys } from './sheets';
import { openSystem, type OpenedSystem, type Seen } from './open';

export type RevisionHead = Pick<RevisionRow, 'number' | 'state' | 'inPlantFrom' | 'knownFrom' | 'held'>;
export type SystemDocument = { tag: string; revision: RevisionHead; hidden: boolean; document: Basis };
export type SystemEvaluation = {
  tag: string;
  revision: RevisionHead;
  hidden: boolean;
  evaluation: Evaluation | HiddenEvaluation;
  outcomes: Outcome[];
};

const headOf = ({ number, state, inPlantFrom, knownFrom, held }: RevisionRow): RevisionHead => ({
  number,
  state,
  inPlantFrom,
  knownFrom,
  held,
});

async function open(
  ctx: Ctx,
  actor: Actor,
  tag: string,
  revision?: number,
): Promise<Result<{ of: OpenedSystem; seen: Seen }>> {
  const opened = await openSystem(ctx, actor, tag, revision);
  if (!opened.ok) return opened;
  const { shown } = opened.value;
  return shown
    ? ok({ of: opened.value, seen: shown })
    : fail('UNKNOWN', `No such revision of ${tag} is held here: it is known by number and note only.`);
}

/** The document of a system in force, or of a numbered revision; masked where it is hidden from the asker. */
export async function systemDocument(
  ctx: Ctx,
  actor: Actor,
  tag: string,
  revision?: number,
): Promise<Result<SystemDocument>> {
  const found = await open(ctx, actor, tag, revision);
  if (!found.ok) return found;
  const { of, seen } = found.value;
  return ok({
    tag: of.document.tag,
    revision: headOf(seen.revision),
    hidden: of.hidden,
    document: seen.body,
  });
}

/** Sheets, verdicts and outcomes of a system; of a hidden one only which sheets there are. */
export async function systemEvaluation(
  ctx: Ctx,
  actor: Actor,
  tag: string,
  revision?: number,
): Promise<Result<SystemEvaluation>> {
  const found = await open(ctx, actor, tag, revision);
  if (!found.ok) return found;
  const { of, seen } = found.value;
  const evaluation = seen.evaluation ?? {
    hidden: true as const,
    sheets: hiddenKeys(seen.body).map((key) => ({ key, hidden: true as const })),
  };
  const head = { tag: of.document.tag, revision: headOf(seen.revision), hidden: of.hidden };
  return ok({ ...head, evaluation, outcomes: seen.outcomes });
}
