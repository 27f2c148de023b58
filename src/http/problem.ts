/* Refusals as problem details (RFC 9457): one shape for every error of the interface. */
import { type Problem, type ProblemCode, statusOf } from '@domain/result';

const TITLES: Record<ProblemCode, string> = {
  MALFORMED: 'The request cannot be read',
  KEY_MISSING: 'The request has no key',
  SIGN_IN: 'Sign in first',
  NOT_PERMITTED: 'Not permitted',
  NOT_INDEPENDENT: 'Not independent',
  PASSWORD_WRONG: 'The password is wrong',
  UNKNOWN: 'Not found',
  GATE_SHUT: 'The gate is shut',
  WRONG_STAGE: 'The case is in another stage',
  DIFFERS: 'It differs',
  HIDDEN: 'Results are hidden from you',
  STALE: 'Someone changed this meanwhile',
  TOO_LARGE: 'Too large',
  TYPE_REFUSED: 'This kind of content is not taken',
  SCHEMA: 'Something entered is not right',
  VALUE_IMPOSSIBLE: 'A value is impossible',
  UNIT_AMBIGUOUS: 'A unit can be read in two ways',
  KEY_REUSED: 'The key was used for something else',
  VERSION_MISSING: 'The version is missing',
  TOO_MANY: 'Too many attempts',
  INTERNAL: 'Something failed here',
  BUSY: 'Busy',
};

export type ProblemDetails = Problem & { type: string; title: string; status: number; id: string };

/** Fills a problem up to its published shape; `id` is the request's, which the log carries too. */
export function problemDetails(problem: Problem, id: string): ProblemDetails {
  const name = problem.code.toLowerCase().replaceAll('_', '-');
  return {
    type: `urn:setwright:problem:${name}`,
    title: TITLES[problem.code],
    status: statusOf(problem.code),
    ...problem,
    id,
  };
}

/** Answers a problem as `application/problem+json`. */
export function problemResponse(problem: Problem, id: string): Response {
  const details = problemDetails(problem, id);
  return new Response(JSON.stringify(details), {
    status: details.status,
    headers: { 'Content-Type': 'application/problem+json; charset=utf-8', 'Cache-Control': 'no-store' },
  });
}
