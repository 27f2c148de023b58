/* What a bug or a busy database looks like from outside: a sentence and an id. The stack goes to the log only. */
import { type APIContext } from 'astro';
import { type Problem } from '@domain/result';
import { refuse } from './answer';
import { problemResponse } from './problem';

function problemOf(error: unknown): Problem {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  const busy =
    code.startsWith('SQLITE_BUSY') || (error instanceof Error && error.name === 'KnexTimeoutError');
  if (busy)
    return { code: 'BUSY', detail: 'The database is busy. Nothing was written; try again in a moment.' };
  return {
    code: 'INTERNAL',
    detail:
      'Something failed here. It is in the log under the id of this answer; give that id to whoever looks after Setwright.',
  };
}

/** Answers what nobody expected: problem details for programs and forms, the page of an error otherwise. */
export async function unexpected(context: APIContext, error: unknown, api: boolean): Promise<Response> {
  const problem = problemOf(error);
  const { locals } = context;
  locals.log.error({ err: error }, problem.code === 'BUSY' ? 'database busy' : 'unexpected error');
  try {
    if (api || locals.sent?.form === true) return await refuse(context, problem);
    locals.problem = problem;
    return await context.rewrite('/500');
  } catch (again) {
    locals.log.error({ err: again }, 'the page of an error failed too');
    return problemResponse(problem, locals.requestId);
  }
}
