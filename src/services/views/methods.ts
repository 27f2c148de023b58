/* The methods of the engine, for readers and for programs, and working one of them. */
import { can, type Role, type Who } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { type Method, methodById, METHODS, workMethod } from '@engine/catalog';
import { dimensionOf, type Q, UNITS } from '@engine/quantity';
import { type Inputs, type Worked } from '@engine/sheet';

export type MethodView = Omit<Method, 'work'>;
export type MethodGroup = { name: string; methods: MethodView[] };

const GROUPS: Record<string, string> = {
  a: 'Gas and vapour',
  b: 'Steam',
  c: 'Liquid',
  e: 'Fire',
  f: 'Loads',
  h: 'Limits and settings',
  i: 'Sizes and ratings',
};

function viewOf({ work: _, ...method }: Method): MethodView {
  return method;
}

/** All methods, by what they are for. */
export function methodGroups(): MethodGroup[] {
  const names = [...new Set(METHODS.map((method) => GROUPS[method.id.slice(0, 1)] ?? 'Other'))];
  return names.map((name) => ({
    name,
    methods: METHODS.filter((method) => (GROUPS[method.id.slice(0, 1)] ?? 'Other') === name).map(viewOf),
  }));
}

/** Who asks, with the roles of all their sites. */
export type Asker = Pick<Who, 'id'> & { roles: readonly Role[] };

/** All methods, for programs of those whose roles calculate. */
export function methodList(who: Asker): Result<{ methods: MethodView[] }> {
  const answer = can(who, 'calculate', { seats: [] });
  return answer.ok ? ok({ methods: METHODS.map(viewOf) }) : fail(answer.code, answer.sentence);
}

/** One method by its id. */
export function methodView(id: string): Result<MethodView> {
  const method = methodById(id);
  return method ? ok(viewOf(method)) : fail('UNKNOWN', `There is no method ${id.slice(0, 60)}.`);
}

/** The values that a program may send: a quantity, a word or number, a flag. */
export type SentInputs = Record<string, Q | string | number | boolean>;

function unitErrors(inputs: SentInputs) {
  return Object.entries(inputs).flatMap(([name, value]) =>
    typeof value === 'object' && dimensionOf(value.unit) === undefined
      ? [
          {
            path: `inputs/${name}/unit`,
            code: 'UNIT_UNKNOWN',
            sentence: `"${value.unit.slice(0, 40)}" is not a unit; known are ${Object.keys(UNITS).slice(0, 12).join(', ')} …`,
          },
        ]
      : [],
  );
}

/**
 * Works a method for a program. A refusal of the method is an answer, not an error; UNKNOWN for a topic that is not
 * there, NOT_PERMITTED for someone whose roles do not calculate at any site, SCHEMA for a unit that does not exist.
 */
export function calculate(
  who: Asker,
  asked: { topic: string; inputs: SentInputs; edition?: string | undefined },
): Result<Worked> {
  const answer = can(who, 'calculate', { seats: [] });
  if (!answer.ok) return fail(answer.code, answer.sentence);
  if (!methodById(asked.topic)) return fail('UNKNOWN', `There is no method ${asked.topic.slice(0, 60)}.`);
  const errors = unitErrors(asked.inputs);
  if (errors.length > 0) return fail('SCHEMA', errors[0]?.sentence ?? 'A unit is not known.', { errors });
  const inputs: Inputs = Object.fromEntries(
    Object.entries(asked.inputs).map(([name, value]) => [
      name,
      typeof value === 'number' ? { value, unit: '-' } : value,
    ]),
  );
  return ok(workMethod(asked.topic, inputs, asked.edition));
}
