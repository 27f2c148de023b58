/* What every domain function and service answers: a value, or a problem told in a sentence. */

/** Something that keeps a gate shut: what is missing and the page that mends it (a link below the site, without leading slash). */
export type OpenPoint = { code: string; sentence: string; where: string };

/** The codes of a refusal, as they stand in the problem details of the interface. */
export const PROBLEM_STATUS = {
  MALFORMED: 400,
  KEY_MISSING: 400,
  SIGN_IN: 401,
  NOT_PERMITTED: 403,
  NOT_INDEPENDENT: 403,
  PASSWORD_WRONG: 403,
  UNKNOWN: 404,
  GATE_SHUT: 409,
  WRONG_STAGE: 409,
  DIFFERS: 409,
  HIDDEN: 409,
  STALE: 412,
  TOO_LARGE: 413,
  TYPE_REFUSED: 415,
  SCHEMA: 422,
  VALUE_IMPOSSIBLE: 422,
  UNIT_AMBIGUOUS: 422,
  KEY_REUSED: 422,
  VERSION_MISSING: 428,
  TOO_MANY: 429,
  INTERNAL: 500,
  BUSY: 503,
} as const;

export type ProblemCode = keyof typeof PROBLEM_STATUS;

/** One field that is wrong: where it is, a short code and what would be right. */
export type FieldError = { path: string; code: string; sentence: string };

export type Problem = {
  code: ProblemCode;
  detail: string;
  errors?: FieldError[];
  openPoints?: OpenPoint[];
  /** For STALE and DIFFERS: what stands now. */
  present?: unknown;
};

export type Ok<T> = { ok: true; value: T };
export type Failed = { ok: false; problem: Problem };
export type Result<T> = Ok<T> | Failed;

/** Wraps a value as a success. */
export function ok<T>(value: T): Ok<T> {
  return { ok: true, value };
}

/** Builds a refusal. `detail` is a sentence for the reader: what is wrong, where, and what would be right. */
export function fail(
  code: ProblemCode,
  detail: string,
  extra: Omit<Problem, 'code' | 'detail'> = {},
): Failed {
  return { ok: false, problem: { code, detail, ...extra } };
}

/** The HTTP status that carries a problem code. */
export function statusOf(code: ProblemCode): number {
  return PROBLEM_STATUS[code];
}

type ZodIssue = { path: PropertyKey[]; code: string; message: string; keys?: readonly string[] };

/** Schemas give their own sentences; only for a field that none of them knows zod speaks itself. */
function sentenceOf(issue: ZodIssue): string {
  const { keys = [] } = issue;
  if (issue.code !== 'unrecognized_keys' || keys.length === 0) return issue.message;
  const names = keys.map((key) => `"${key.slice(0, 60)}"`).join(', ');
  return keys.length === 1 ? `There is no field ${names} here.` : `There are no fields ${names} here.`;
}

/** Turns the complaints of a zod schema into field errors; a path is joined by slashes, the root is empty. */
export function fieldErrors(issues: readonly ZodIssue[]): FieldError[] {
  return issues.map((issue) => ({
    path: issue.path.map(String).join('/'),
    code: issue.code,
    sentence: sentenceOf(issue),
  }));
}
