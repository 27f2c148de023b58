/* Reads what a request sends: JSON, or a form with its fields `_version`, `_key`, `_back` and `_method`. */
import { type z } from 'zod';
import { fail, fieldErrors, ok, type Result } from '@domain/result';
import { type Context, type Sent } from './context';
import { nested } from './nest';

/** The largest body that is read, in bytes. Files have a route of their own. */
export const BODY_LIMIT = 1_000_000;

const tooLarge = (limit: number) =>
  fail('TOO_LARGE', `The request is larger than ${String(limit / 1_000_000)} MB. Send less at once.`);
const JSON_TYPE = /^application\/(?:[\w.+-]+\+)?json$/;
const FORM_TYPES = ['application/x-www-form-urlencoded', 'multipart/form-data'];

/** Reads the bytes, and stops at the limit whatever the length header says. */
async function readBytes(request: Request, limit: number): Promise<Result<Uint8Array>> {
  if (Number(request.headers.get('content-length') ?? 0) > limit) return tooLarge(limit);
  const parts: Uint8Array[] = [];
  let size = 0;
  if (request.body === null) return ok(new Uint8Array());
  for await (const part of request.body as unknown as AsyncIterable<Uint8Array>) {
    size += part.byteLength;
    if (size > limit) return tooLarge(limit);
    parts.push(part);
  }
  return ok(Buffer.concat(parts));
}

function decode(bytes: Uint8Array): Result<string> {
  try {
    return ok(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    return fail('MALFORMED', 'The body is not UTF-8 text.');
  }
}

function readJson(bytes: Uint8Array): Result<Sent> {
  const text = decode(bytes);
  if (!text.ok) return text;
  try {
    return ok({ form: false, body: text.value === '' ? {} : (JSON.parse(text.value) as unknown), typed: [] });
  } catch {
    return fail('MALFORMED', 'The body is not well-formed JSON.');
  }
}

/** `name` → value; a name given twice, or ending in `[]`, → list of values. */
function gather(typed: [string, string][]): Record<string, string | string[]> {
  const names = new Set(typed.map(([name]) => name));
  return Object.fromEntries(
    [...names].map((name) => {
      const values = typed.filter(([other]) => other === name).map(([, value]) => value);
      const list = values.length > 1 || name.endsWith('[]');
      return [name.replace(/\[\]$/, ''), list ? values : (values[0] ?? '')];
    }),
  );
}

async function readForm(bytes: Uint8Array, type: string): Promise<Result<Sent>> {
  let entries: [string, FormDataEntryValue][];
  try {
    entries = [...(await new Response(bytes as BodyInit, { headers: { 'Content-Type': type } }).formData())];
  } catch {
    return fail('MALFORMED', 'The form cannot be read.');
  }
  const all = entries.filter((entry): entry is [string, string] => typeof entry[1] === 'string');
  const files = entries.filter(
    (entry): entry is [string, File] => entry[1] instanceof File && entry[1].size > 0,
  );
  const own = (name: string) => all.find(([other]) => other === name)?.[1];
  const typed = all.filter(([name]) => !name.startsWith('_'));
  return ok({
    form: true,
    body: nested(gather(typed)),
    typed,
    ...(files.length > 0 ? { files } : {}),
    version: own('_version'),
    key: own('_key'),
    back: own('_back'),
    method: own('_method')?.toUpperCase(),
  });
}

async function read(request: Request, limit: number): Promise<Result<Sent>> {
  const given = request.headers.get('content-type') ?? '';
  const type = (given.split(';')[0] ?? '').trim().toLowerCase();
  const isForm = FORM_TYPES.includes(type);
  if (type !== '' && !isForm && !JSON_TYPE.test(type)) {
    return fail(
      'TYPE_REFUSED',
      `A body of type "${type.slice(0, 80)}" is not taken here; send application/json or a form.`,
    );
  }
  const bytes = await readBytes(request, limit);
  if (!bytes.ok) return bytes;
  if (type === '' && bytes.value.byteLength > 0) {
    return fail(
      'TYPE_REFUSED',
      'The request has a body but no Content-Type; send application/json or a form.',
    );
  }
  return isForm ? readForm(bytes.value, given) : readJson(bytes.value);
}

/** Reads the body once and keeps it at `locals.sent`, where the answer finds what was typed. Forms with files give a limit of their own. */
export async function readSent(context: Context, limit = BODY_LIMIT): Promise<Result<Sent>> {
  if (context.locals.sent) return ok(context.locals.sent);
  const sent = await read(context.request, limit);
  if (sent.ok) context.locals.sent = sent.value;
  return sent;
}

/**
 * Reads the body and parses it by a schema. Answers MALFORMED, TOO_LARGE, TYPE_REFUSED, or SCHEMA with a path and a sentence a field.
 */
export async function readBody<S extends z.ZodType>(
  context: Context,
  schema: S,
): Promise<Result<z.output<S>>> {
  const sent = await readSent(context);
  if (!sent.ok) return sent;
  const parsed = schema.safeParse(sent.value.body);
  if (parsed.success) return ok(parsed.data);
  const errors = fieldErrors(parsed.error.issues);
  const first = errors[0];
  const where = first && first.path !== '' ? `${first.path}: ` : '';
  return fail('SCHEMA', `${where}${first?.sentence ?? 'The body does not fit.'}`, { errors });
}
