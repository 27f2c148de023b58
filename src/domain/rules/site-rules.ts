/* The rules of a site: what it has changed in the rulebook, in the half that is judged by and the half that is lived by. */
import { z } from 'zod';
import { hashOf } from '@domain/basis/canonical';
import { daySchema, quantitySchema, statusSchema, STATUSES, type Hash } from '@domain/basis/figures';
import { RANGES } from '@engine/ranges';
import { SCENARIOS } from '@domain/scenarios/list';
import { fail, ok, type FieldError, type Result } from '@domain/result';
import { CONDUCT_PARAMETERS } from './parameters-conduct';
import { DEVICE_PARAMETERS } from './parameters-devices';
import { PROCESS_PARAMETERS } from './parameters-process';
import { type Parameter, type ParameterValue } from './parameter-row';

const JUDGEMENT_PARAMETERS = [...DEVICE_PARAMETERS, ...PROCESS_PARAMETERS];
export const PARAMETERS: readonly Parameter[] = [...JUDGEMENT_PARAMETERS, ...CONDUCT_PARAMETERS];

const valuesSchema = z.record(z.string().max(60), z.union([z.number(), z.string().max(200), z.boolean()]));

export const judgementSchema = z.strictObject({
  barometer: quantitySchema,
  parameters: valuesSchema,
  statuses: z.array(statusSchema),
  scenarios: z.array(z.strictObject({ key: z.string().min(1).max(80), added: daySchema })),
  ranges: z.record(z.string().max(60), z.tuple([z.number(), z.number(), z.number(), z.number()])),
  editions: z.record(z.string().max(80), z.string().max(80)),
  confirmed: z.array(
    z.strictObject({ constant: z.string().max(120), by: z.tuple([z.string().max(80), z.string().max(80)]) }),
  ),
});
/** What results, outcomes and signatures depend on. `ranges` holds only what the site has changed. */
export type JudgementRules = z.infer<typeof judgementSchema>;

export const siteRulesSchema = z.strictObject({
  number: z.number().int().min(0),
  from: daySchema,
  judgement: judgementSchema,
  conduct: valuesSchema,
});
export type SiteRules = z.infer<typeof siteRulesSchema>;

function defaultsOf(parameters: readonly Parameter[]): Record<string, ParameterValue> {
  return Object.fromEntries(parameters.map((parameter) => [parameter.key, parameter.default]));
}

/** The rules of a site that has changed nothing: defaults of the rulebook at the standard atmosphere. */
export const DEFAULT_RULES: SiteRules = {
  number: 0,
  from: '2000-01-01',
  judgement: {
    barometer: { value: 1.01325, unit: 'bar_abs' },
    parameters: defaultsOf(JUDGEMENT_PARAMETERS),
    statuses: [...STATUSES],
    scenarios: SCENARIOS.map((scenario) => ({ key: scenario.key, added: '2000-01-01' })),
    ranges: {},
    editions: {},
    confirmed: [],
  },
  conduct: defaultsOf(CONDUCT_PARAMETERS),
};

/** The hash of the judgement half: what a signature binds of the site rules. */
export function judgementHash(rules: JudgementRules): Hash {
  return hashOf('judgement', rules);
}

/** The value of a parameter at a site, or its default; throws for a key that the rulebook does not have: a bug. */
export function parameter(rules: SiteRules | { judgement: JudgementRules }, key: string): ParameterValue {
  const row = PARAMETERS.find((one) => one.key === key);
  if (!row) throw new RangeError(`There is no parameter "${key}".`);
  const values =
    row.half === 'judgement' ? rules.judgement.parameters : 'conduct' in rules ? rules.conduct : {};
  return values[key] ?? row.default;
}

/** The value of a numeric parameter; throws when it is not one: a bug. */
export function numberOf(rules: SiteRules | { judgement: JudgementRules }, key: string): number {
  const value = parameter(rules, key);
  if (typeof value !== 'number') throw new RangeError(`The parameter "${key}" is not a number.`);
  return value;
}

function faultOfParameter(row: Parameter, value: ParameterValue): string | undefined {
  if (typeof value !== typeof row.default) return `${row.key} should be a ${typeof row.default}.`;
  if (!row.bounds) return undefined;
  const [least, most] = row.bounds;
  if (typeof value === 'number' && typeof least === 'number' && typeof most === 'number') {
    return value < least || value > most
      ? `${row.key} is ${String(value)}; the rulebook allows ${String(least)} to ${String(most)}.`
      : undefined;
  }
  const words = row.bounds.map(String);
  return words.includes(String(value))
    ? undefined
    : `${row.key} is "${String(value)}"; it is one of ${words.join(', ')}.`;
}

function faultsOfValues(
  values: Record<string, ParameterValue>,
  half: Parameter['half'],
  at: string,
): FieldError[] {
  return Object.entries(values).flatMap(([key, value]) => {
    const row = PARAMETERS.find((one) => one.key === key && one.half === half);
    const fault = row ? faultOfParameter(row, value) : `The rulebook has no parameter "${key}" here.`;
    return fault ? [{ path: `${at}/${key}`, code: 'BOUNDS', sentence: fault }] : [];
  });
}

function faultsOfRanges(ranges: JudgementRules['ranges']): FieldError[] {
  return Object.entries(ranges).flatMap(([key, [least, low, high, most]]) => {
    const row = Object.hasOwn(RANGES, key) ? RANGES[key] : undefined;
    const path = `judgement/ranges/${key}`;
    if (!row) return [{ path, code: 'UNKNOWN', sentence: `There is no range "${key}".` }];
    const ordered = least <= low && low <= high && high <= most;
    if (ordered && least >= row.range[0] && most <= row.range[3]) return [];
    return [
      {
        path,
        code: 'BOUNDS',
        sentence: `The range of ${row.meaning} must rise and stay within the possible range of the rulebook.`,
      },
    ];
  });
}

function faultsOfScenarios(scenarios: JudgementRules['scenarios']): FieldError[] {
  const missing = SCENARIOS.filter((scenario) => !scenarios.some((one) => one.key === scenario.key));
  return missing.map((scenario) => ({
    path: 'judgement/scenarios',
    code: 'BOUNDS',
    sentence: `A site may add scenarios and never remove one: "${scenario.name}" is missing.`,
  }));
}

/** Site rules from outside: shape, bounds of parameters and ranges, no standard scenario removed. */
export function parseSiteRules(input: unknown): Result<SiteRules> {
  const parsed = siteRulesSchema.safeParse(input);
  if (!parsed.success) {
    const errors = parsed.error.issues.map((issue) => ({
      path: issue.path.map(String).join('/'),
      code: issue.code ?? 'SCHEMA',
      sentence: issue.message,
    }));
    return fail('SCHEMA', 'The site rules are not in their form.', { errors });
  }
  const { judgement, conduct } = parsed.data;
  const errors = [
    ...faultsOfValues(judgement.parameters, 'judgement', 'judgement/parameters'),
    ...faultsOfValues(conduct, 'conduct', 'conduct'),
    ...faultsOfRanges(judgement.ranges),
    ...faultsOfScenarios(judgement.scenarios),
  ];
  return errors.length === 0 ? ok(parsed.data) : fail('SCHEMA', errors[0]?.sentence ?? '', { errors });
}
