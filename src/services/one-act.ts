/* The one transaction of an act: answered once per key, written whole or not at all. */
import { type Problem, fail, type Failed, type Result } from '@domain/result';
import { type Db, transaction } from '@data/connection';
import { checkRepeat, keepAnswer } from '@data/idempotency';
import { type Actor, type Ctx, instant } from './context';

/** What makes an act happen once: key, route and body hash of the request. */
export type Once = { key: string; route: string; bodyHash: string };

/**
 * What a request sends to write: its body, the version it was made on, its key. Each is still a result, because the
 * service first says whether the asker may do this at all, and only then what is wrong with what was sent.
 */
export type Write<B> = { body: Result<B>; version: Result<number>; once: Result<Once> };

/** Carries a refusal out of the transaction so that nothing of the act stays. */
class Refused extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail);
  }
}

const REUSED = 'This key was sent before with something else. Take a new key for a new act.';

async function once<T>(
  trx: Db,
  ctx: Ctx,
  personId: string,
  key: Once,
  write: (trx: Db) => Promise<Result<T>>,
): Promise<Result<T>> {
  const repeat = await checkRepeat(trx, { personId, ...key });
  if (repeat.kind === 'other') return fail('KEY_REUSED', REUSED);
  if (repeat.kind === 'same') return { ok: true, value: repeat.answer as T };
  const result = await write(trx);
  if (!result.ok) throw new Refused(result.problem);
  await keepAnswer(trx, { personId, ...key, status: 200, answer: result.value ?? null, at: instant(ctx) });
  return result;
}

/**
 * Runs the writes of one act in one transaction. A refusal rolls everything back; the same key with the same body gives
 * the first answer again. `key` is absent for writes that carry a version instead (PATCH, PUT, DELETE).
 */
export async function inOneAct<T>(
  ctx: Ctx,
  actor: Pick<Actor, 'person'>,
  key: Once | undefined,
  write: (trx: Db) => Promise<Result<T>>,
): Promise<Result<T>> {
  try {
    return await transaction(ctx.db, async (trx) => {
      if (key) return once(trx, ctx, actor.person.id, key, write);
      const result = await write(trx);
      if (!result.ok) throw new Refused(result.problem);
      return result;
    });
  } catch (error) {
    if (error instanceof Refused) return { ok: false, problem: error.problem };
    throw error;
  }
}

/** The first answer to a request that is sent again with its key, or the refusal of a key used for something else; undefined for a new one. */
export async function answeredBefore<T>(
  ctx: Ctx,
  actor: Pick<Actor, 'person'>,
  key: Once,
): Promise<Result<T> | undefined> {
  const repeat = await checkRepeat(ctx.db, { personId: actor.person.id, ...key });
  if (repeat.kind === 'other') return fail('KEY_REUSED', REUSED);
  return repeat.kind === 'same' ? { ok: true, value: repeat.answer as T } : undefined;
}

/** The refusal of a write that was made on an older version than the present one. */
export function stale(what: string, version: number, present: Record<string, unknown> = {}): Failed {
  const detail = `${what} was changed meanwhile: it is now at version ${String(version)}. Look at what changed, then decide.`;
  return fail('STALE', detail, { present: { version, ...present } });
}
