/* What a schema complains of, in sentences for the person who typed it. */
import type { z } from 'zod';
import type { FieldError } from '@domain/result';
import { describePath } from './describe';
import { capital } from './fields';
import { childOf, pathOfIndexes } from './paths';

type Issue = z.core.$ZodIssue;

const MOST_ERRORS = 25;

/** The complaint of a choice that fits best: the option with the fewest complaints; the others are of another kind. */
function nearest(issue: Issue): { issue: Issue; path: PropertyKey[] }[] {
  if (issue.code !== 'invalid_union' || issue.errors.length === 0) return [{ issue, path: issue.path }];
  const options = issue.errors.map((option) => ({
    option,
    strange: option.filter((one) => one.path.length === 0).length,
  }));
  const best = options.reduce((one, other) => (weigh(other) < weigh(one) ? other : one));
  return best.option.flatMap((inner) =>
    nearest(inner).map((one) => ({ issue: one.issue, path: [...issue.path, ...one.path] })),
  );
}

function weigh(choice: { option: readonly Issue[]; strange: number }): number {
  return choice.option.length + 2 * choice.strange;
}

const KINDS: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'yes or no',
  array: 'a list',
  object: 'a set of fields',
  record: 'a set of fields',
};

/** What would be right, after the name of the field. */
function remedy(issue: Issue, present: unknown): string {
  if (present === undefined && issue.code !== 'unrecognized_keys') return 'is missing';
  switch (issue.code) {
    case 'invalid_type':
      return `should be ${KINDS[issue.expected] ?? issue.expected}`;
    case 'unrecognized_keys':
      return `does not have ${issue.keys.map((key) => `"${key}"`).join(', ')}`;
    case 'invalid_value':
      return `should be one of: ${issue.values.map(String).join(', ')}`;
    case 'too_big':
      return issue.origin === 'string'
        ? `may have ${String(issue.maximum)} characters at most`
        : `may be ${String(issue.maximum)} at most`;
    case 'too_small':
      return issue.origin === 'string' || issue.origin === 'array'
        ? 'is empty'
        : `should be ${String(issue.minimum)} or more`;
    default:
      return `is not right: ${issue.message}`;
  }
}

function readAt(document: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, part) =>
      Array.isArray(value) ? (value as unknown[])[Number(part)] : childOf(value, String(part)),
    document,
  );
}

/** The complaints of a schema about a document as field errors: id-paths, codes, sentences. At most 25. */
export function errorsOf(issues: readonly Issue[], document: unknown): FieldError[] {
  return issues
    .flatMap((issue) => nearest(issue))
    .slice(0, MOST_ERRORS)
    .map(({ issue, path }) => {
      const named = pathOfIndexes(document, path);
      const { label } = describePath(document, named);
      return {
        path: named,
        code: issue.code,
        sentence: `${capital(label)} ${remedy(issue, readAt(document, path))}.`,
      };
    });
}
