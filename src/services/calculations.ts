/* Works the cases that a program sends; nothing is kept. */
import { setImmediate } from 'node:timers/promises';
import { can, type Role, type Who } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { type CaseResult, workCase } from '@engine/calc';

/** Who asks, with the roles of all their sites. */
export type Asker = Pick<Who, 'id'> & { roles: readonly Role[] };

/** The most cases that one request may hold. */
export const CASES_AT_MOST = 500;
/** How long one request may be worked, ms. */
export const TIME_AT_MOST = 5000;
/** After so many ms others are let in: the arithmetic of one request never holds up the server. */
const TURN = 20;

const LATE = {
  code: 'TIME_LIMIT',
  message: `The request was worked for ${TIME_AT_MOST / 1000} seconds, the most that one request may take; send this case in the next.`,
  field: 'cases',
};

/** The head of a case that was not reached. */
function lateResult(given: unknown): CaseResult {
  const { id, topic } = Object(given) as { id?: unknown; topic?: unknown };
  return {
    id: typeof id === 'string' || typeof id === 'number' ? String(id) : '',
    topic: typeof topic === 'string' ? topic : '',
    outputs: {},
    warnings: [],
    error: LATE,
  };
}

/**
 * Works cases `{ id, topic, inputs, want | expected }` in their order; one bad case never stops the others.
 * NOT_PERMITTED for someone whose roles do not calculate at any site, TOO_LARGE beyond CASES_AT_MOST. Cases that are not
 * reached within TIME_AT_MOST come back with the error TIME_LIMIT.
 * @param now milliseconds that only rise
 */
export async function workCases(
  who: Asker,
  asked: { cases: readonly unknown[]; sheet?: boolean | undefined },
  now: () => number = () => performance.now(),
): Promise<Result<{ results: CaseResult[] }>> {
  const answer = can(who, 'calculate', { seats: [] });
  if (!answer.ok) return fail(answer.code, answer.sentence);
  const { cases, sheet = false } = asked;
  if (cases.length > CASES_AT_MOST) {
    return fail(
      'TOO_LARGE',
      `The request holds ${cases.length} cases; at most ${CASES_AT_MOST} are worked at once. Send them in parts.`,
    );
  }
  const end = now() + TIME_AT_MOST;
  const results: CaseResult[] = [];
  let turn = now() + TURN;
  for (const one of cases) {
    const at = now();
    if (at > turn) {
      await setImmediate();
      turn = now() + TURN;
    }
    results.push(at > end ? lateResult(one) : workCase(one, { sheet }));
  }
  return ok({ results });
}
