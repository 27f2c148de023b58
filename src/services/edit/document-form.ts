/* Changes the working revision of a system from a plain form, by the same operations as a program sends. */
import { type Basis, getAt, isFigure, isKnown, isRich, plainText } from '@domain/basis';
import { fail, type Failed, ok, type Result } from '@domain/result';
import { loadCaseFile } from '../case-file';
import { type Actor, type Ctx, today } from '../context';
import { documentOf } from '../stage/revisions';
import { type DocumentSaved, editDocument } from './document';
import { digitsOf } from './form/figure';
import { askedOf } from './form/fields';
import { opsOfForm } from './form/ops';

type Typed = readonly (readonly [string, string])[];
type Sent = { typed: Typed; version: Result<number> };

const NOTHING = 'Nothing was changed: what you sent is what stands there.';

function textAt(document: Basis, path: string): string {
  const found = getAt(document, path);
  if (isFigure(found)) return isKnown(found) ? digitsOf(found) : '';
  if (isRich(found)) return plainText(found);
  return typeof found === 'string' || typeof found === 'number' ? String(found) : '';
}

/** A stale form is told what stands now in each of its fields. */
function withPresent(problem: Failed['problem'], document: Basis | undefined, typed: Typed): Failed {
  if (problem.code !== 'STALE' || !document) return { ok: false, problem };
  const version = (problem.present as { version?: number } | undefined)?.version;
  const paths = [...askedOf(typed)].filter(([, asked]) => asked.set !== undefined).map(([path]) => path);
  const fields = Object.fromEntries(paths.map((path) => [path, textAt(document, path)]));
  return { ok: false, problem: { ...problem, present: { version, ...fields } } };
}

/** Applies a form. The asker is judged before what was typed; a form that changes nothing is refused with a sentence. */
export async function editByForm(
  ctx: Ctx,
  actor: Actor,
  at: { number: string; system: string },
  sent: Sent,
): Promise<Result<DocumentSaved>> {
  const file = await loadCaseFile(ctx.db, actor.site, at.number);
  const after = file && documentOf(file, at.system)?.after;
  const read =
    file && after
      ? opsOfForm(
          {
            document: after.body,
            outcomes: after.outcomes,
            barometer: file.site.barometer,
            by: { person: actor.person.id, on: today(ctx, actor.site) },
          },
          sent.typed,
        )
      : ok({ ops: [] });
  const nothing = read.ok && read.value.ops.length === 0;
  const body = nothing ? fail('SCHEMA', NOTHING) : read;
  const result = await editDocument(ctx, actor, at, { body, version: sent.version });
  return result.ok ? result : withPresent(result.problem, after?.body, sent.typed);
}
