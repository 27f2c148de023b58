/* Photographs that a form of the field sheet brings: kept first, then named in the entry, as a program would send it. */
import { type Result, ok } from '@domain/result';
import { type Actor, type Ctx } from '@services/context';
import { keepPhotograph, PHOTOGRAPH_LIMIT } from '@services/field/photographs';
import { type APIContext } from 'astro';
import { readSent } from './body';
import { type Sent } from './context';

/** Adds an id to the list `files` of the entry whose field `<place>.photo` brought the file. */
function name(body: unknown, field: string, id: string): void {
  const parts = field.split('.').slice(0, -1);
  const entry = parts.reduce<unknown>(
    (value, part) => (typeof value === 'object' && value !== null ? Reflect.get(value, part) : undefined),
    body,
  );
  if (typeof entry !== 'object' || entry === null) return;
  const files: unknown = Reflect.get(entry, 'files');
  Reflect.set(entry, 'files', [...(Array.isArray(files) ? (files as unknown[]) : []), id]);
}

async function keepAll(
  context: Pick<APIContext, 'locals'>,
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Sent,
): Promise<Result<null>> {
  for (const [field, file] of sent.files ?? []) {
    const bytes = new Uint8Array(await file.arrayBuffer());
    const of = { number, folder: context.locals.config.dataDir };
    const kept = await keepPhotograph(ctx, actor, of, { name: file.name, bytes });
    if (!kept.ok) return kept;
    name(sent.body, field, kept.value);
  }
  return ok(null);
}

/** Reads the request with its photographs, keeps these, and names them in the body. */
export async function withPhotographs(
  context: Pick<APIContext, 'request' | 'locals' | 'url' | 'rewrite'>,
  ctx: Ctx,
  actor: Actor,
  number: string,
): Promise<Result<null>> {
  const sent = await readSent(context, PHOTOGRAPH_LIMIT * 2);
  return sent.ok ? keepAll(context, ctx, actor, number, sent.value) : sent;
}
