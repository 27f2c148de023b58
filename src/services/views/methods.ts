/* The methods of the engine, for readers and for programs. */
import { can } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { type Method, methodById, METHODS } from '@engine/catalog';
import { type Asker } from '../calculations';

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
