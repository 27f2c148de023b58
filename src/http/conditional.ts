/* Versions and keys of a write: which version it was made on (If-Match) and which key makes it happen once (Idempotency-Key). */
import { createHash } from 'node:crypto';
import { canonical } from '@domain/basis';
import { fail, ok, type Result } from '@domain/result';
import { type Context } from './context';

/** The ETag of a versioned thing, `"case-7"`: made from the version, never from content, so that it tells nothing that is hidden. */
export function etagOf(kind: string, version: number): string {
  return `"${kind}-${version}"`;
}

/**
 * The version that a write was made on, from `If-Match: "<kind>-<version>"` or a form's `_version`. VERSION_MISSING when neither is given,
 * MALFORMED when it cannot be one of this kind.
 */
export function versionFrom(context: Context, kind: string): Result<number> {
  const given = context.request.headers.get('if-match') ?? context.locals.sent?.version;
  if (given === undefined || given === '' || given === '*') {
    return fail(
      'VERSION_MISSING',
      `Say which version you changed: send If-Match: "${kind}-<version>" as the answer to your read gave it.`,
    );
  }
  const found = /^(?:"([a-z-]+)-)?(\d{1,9})"?$/.exec(given.trim());
  if (!found || (found[1] !== undefined && found[1] !== kind)) {
    return fail(
      'MALFORMED',
      `"${given.slice(0, 60)}" is not a version of a ${kind}; expected "${kind}-<version>".`,
    );
  }
  return ok(Number(found[2]));
}

/** What makes an act happen once: the same key and body get the first answer again, another body is refused. */
export type Once = { key: string; route: string; bodyHash: string };

const NOT_PART_OF_THE_ACT = ['password', 'currentPassword', 'newPassword'];

/** The body's hash without passwords: a stored hash of a short secret could be guessed. */
function bodyHash(body: unknown): string {
  const told =
    typeof body === 'object' && body !== null && !Array.isArray(body)
      ? Object.fromEntries(Object.entries(body).filter(([name]) => !NOT_PART_OF_THE_ACT.includes(name)))
      : body;
  return createHash('sha256').update(canonical(told)).digest('hex');
}

/** Reads the key of a write from `Idempotency-Key` or a form's `_key`; KEY_MISSING without one. Call it after the body was read. */
export function onceFrom(context: Context): Result<Once> {
  const sent = context.locals.sent;
  const key = context.request.headers.get('idempotency-key') ?? sent?.key;
  if (key === undefined || !/^[\w:.-]{8,100}$/.test(key)) {
    return fail(
      'KEY_MISSING',
      'Send an Idempotency-Key of 8 to 100 letters, digits, "-", "_", ":" or "." with this request, so that it happens once.',
    );
  }
  const method = sent?.method ?? context.request.method;
  return ok({ key, route: `${method} ${context.url.pathname}`, bodyHash: bodyHash(sent?.body ?? {}) });
}
