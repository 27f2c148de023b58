/* The working revision of a system in a case, for programs and for the editor in the browser. */
import { type Basis } from '@domain/basis';
import { type ImportSet } from '@domain/evaluate';
import { type JudgementRules } from '@domain/rules';
import { fail, ok, type Result } from '@domain/result';
import { documentOf } from '../../stage/revisions';
import { noteLook, type OpenedCase } from './open';

export type WorkingView = {
  system: string;
  version: number;
  base: Basis | null;
  document: Basis;
  judgement: JudgementRules;
  imports: ImportSet;
};

/** Everything that evaluating a working revision needs. HIDDEN while the reader must not see its results. */
export async function workingView(of: OpenedCase, tag: string): Promise<Result<WorkingView>> {
  const one = documentOf(of.file, tag);
  const number = of.file.row.number;
  if (!one) return fail('UNKNOWN', `Case ${number} does not hold ${tag.slice(0, 60)}.`);
  if (!one.working || !one.after)
    return fail('WRONG_STAGE', `${tag} has no working revision yet: it is made when the draft is passed.`);
  if (of.hidden)
    return fail('HIDDEN', 'Results of this case are hidden from you until your own figures are in.');
  await noteLook(of, `document ${one.document.tag}`);
  return ok({
    system: one.document.tag,
    version: one.working.version,
    base: one.before?.body ?? null,
    document: one.after.body,
    judgement: of.file.rules.judgement,
    imports: one.after.imports,
  });
}
