/* The method file: what sheets are worked by, and by which check values that is trusted. */
import { can } from '@domain/case';
import { catalogHash, ENGINE } from '@domain/evaluate';
import { fail, ok, type Result } from '@domain/result';
import { scenariosServedBy } from '@domain/scenarios';
import { type Method, methodById, METHODS } from '@engine/catalog';
import { type Asker } from '../calculations';
import { checkTotals, methodChecks, type MethodChecks } from './method-checks';

export type MethodView = Omit<Method, 'work'>;
/** A method on its page: its check values, the engine, and the names of the standard scenarios whose load it serves. */
export type MethodPage = MethodView & { checks: MethodChecks; engine: string; serves: string[] };
/** A method in the list: its check values counted, and the worst deviation of those that should reproduce. */
export type MethodLine = MethodView & { values: number; agreeing: number; worst?: number };
export type MethodGroup = { key: string; name: string; methods: MethodLine[]; values: number; worst: number };

/** The whole file: which engine, the groups that were asked for, and the sums over all methods. */
export type MethodFile = {
  engine: string;
  catalogue: string;
  groups: MethodGroup[];
  /** All groups, for the filter. */
  topics: { key: string; name: string }[];
  shown: number;
  total: number;
  values: number;
  agreeing: number;
  worst: number;
};

const GROUPS: Record<string, string> = {
  a: 'Gas and vapour',
  b: 'Steam',
  c: 'Liquid',
  d: 'Two-phase flow',
  e: 'Fire',
  f: 'Loads',
  g: 'Lines',
  h: 'Limits and settings',
  i: 'Sizes and ratings',
  j: 'Devices',
  k: 'Storage tanks',
  p: 'Properties',
};

const keyOf = (method: Method) => method.id.split('.')[0] ?? '';
const nameOf = (key: string) => GROUPS[key] ?? 'Other';

function viewOf({ work: _, ...method }: Method): MethodView {
  return method;
}

function lineOf(method: Method): MethodLine {
  const { values, agreeing, worst } = methodChecks(method.topic);
  return { ...viewOf(method), values, agreeing, ...(worst === undefined ? {} : { worst }) };
}

function groupOf(key: string, methods: readonly Method[]): MethodGroup {
  const topics = methods.map((method) => method.topic);
  const { values, worst } = checkTotals(topics);
  return { key, name: nameOf(key), methods: methods.map(lineOf), values, worst };
}

/** The methods, by what they are for; those of one group where `topic` names it, those whose id or title holds `words`. */
export function methodFile(asked: { topic?: string; words?: string } = {}): MethodFile {
  const keys = [...new Set(METHODS.map(keyOf))].sort();
  const words = (asked.words ?? '').trim().toLowerCase();
  const wanted = METHODS.filter(
    (method) =>
      (asked.topic === undefined || asked.topic === '' || keyOf(method) === asked.topic) &&
      `${method.id} ${method.title}`.toLowerCase().includes(words),
  );
  return {
    engine: ENGINE,
    catalogue: catalogHash().slice(0, 12),
    groups: keys.flatMap((key) => {
      const methods = wanted.filter((method) => keyOf(method) === key);
      return methods.length > 0 ? [groupOf(key, methods)] : [];
    }),
    topics: keys.map((key) => ({ key, name: nameOf(key) })),
    shown: wanted.length,
    total: METHODS.length,
    ...checkTotals(),
  };
}

/** All methods, for programs of those whose roles calculate. */
export function methodList(who: Asker): Result<{ methods: MethodView[] }> {
  const answer = can(who, 'calculate', { seats: [] });
  return answer.ok ? ok({ methods: METHODS.map(viewOf) }) : fail(answer.code, answer.sentence);
}

/** One method by its id, with its check values. */
export function methodView(id: string): Result<MethodPage> {
  const method = methodById(id);
  if (!method) return fail('UNKNOWN', `There is no method ${id.slice(0, 60)}.`);
  const serves = scenariosServedBy(method.id).map(({ name }) => name);
  return ok({ ...viewOf(method), checks: methodChecks(method.topic), engine: ENGINE, serves });
}
