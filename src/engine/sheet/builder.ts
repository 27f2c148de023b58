/* Builds a sheet: reads inputs with refusals, keeps symbols, and makes equation and substitution from one template. */
import { convert, dimensionOf, type Q, unitLabel } from '../quantity';
import { checkRange, standing } from '../ranges';
import { texNumber } from './tex';
import { type Inputs, type Refusal, type SheetWarning, type Step, type Worked } from './types';

/** How an input is described to the builder: name, meaning, of what it is given when numbered, and the range it keeps. */
export type Described = { name: string; meaning: string; each?: string; rangeKey?: string };

const named = new WeakMap<readonly Described[], ReadonlyMap<string, Described>>();

/** Descriptions by name, put in order once for each method. */
function byName(described: readonly Described[]): ReadonlyMap<string, Described> {
  const known = named.get(described);
  if (known) return known;
  const made = new Map(described.map((one) => [one.name, one]));
  named.set(described, made);
  return made;
}

/** Ends the work of one sheet; caught by `workSheet`, never seen outside. */
class Refused extends Error {
  constructor(readonly refusal: Refusal) {
    super(refusal.text);
  }
}

/** Where a template asks for a symbol: it gets TeX for the equation, and the number for the substitution. */
export type Show = (key: string) => string;

/** What a step needs beyond its equation. */
export type StepInfo = {
  key: string;
  tex?: string;
  meaning: string;
  value: number;
  unit: string;
  clause?: string;
  memory?: boolean;
};

/** Limits an input must keep, physically: beyond them the sheet refuses. */
export type Bounds = { above?: number; min?: number; max?: number; fallback?: number };

/** One sheet in the making. */
export class SheetBuilder {
  readonly steps: Step[] = [];
  readonly warnings: SheetWarning[] = [];
  readonly outputs: Inputs = {};
  private readonly symbols = new Map<string, { tex: string; value: number }>();

  private readonly described: ReadonlyMap<string, Described>;

  constructor(
    readonly inputs: Inputs,
    described: readonly Described[],
  ) {
    this.described = byName(described);
  }

  /** Stops the sheet with a sentence about one input. */
  refuse(code: string, field: string, text: string): never {
    throw new Refused({ code, field, text });
  }

  /** Adds a warning; `range` names the range that was left. */
  warn(code: string, text: string, range?: string): void {
    this.warnings.push(range === undefined ? { code, text } : { code, text, range });
  }

  /** Whether an input was given at all. */
  has(name: string): boolean {
    return this.inputs[name] !== undefined;
  }

  /** The description of an input; a numbered one (`D_2`) may be described by its bare name. */
  private describedAs(name: string): Described | undefined {
    return this.described.get(name) ?? this.described.get(name.replace(/_\d+$/, ''));
  }

  private meaning(name: string): string {
    const [, index] = name.split(/_(?=\d+$)/);
    const found = this.describedAs(name);
    const place = index === undefined ? '' : ` of ${found?.each ?? 'vessel'} ${index}`;
    return found ? `${found.meaning} (${name})${place}` : name;
  }

  /** The quantity given under a name, or a refusal that it is missing or not a number. */
  quantity(name: string): Q {
    const given = this.inputs[name];
    if (given === undefined) this.refuse('INPUT_MISSING', name, `The ${this.meaning(name)} is missing.`);
    if (typeof given === 'string' || typeof given === 'boolean')
      this.refuse(
        'NOT_A_NUMBER',
        name,
        `The ${this.meaning(name)} must be a number with a unit, not "${given}".`,
      );
    if (!Number.isFinite(given.value))
      this.refuse('NOT_A_NUMBER', name, `The ${this.meaning(name)} is not a number.`);
    return given;
  }

  /** Keeps a symbol for later equations, without a step. */
  keep(key: string, value: number, tex: string = key): number {
    if (!Number.isFinite(value))
      this.refuse('NO_RESULT', key, `${key} has no finite value with these inputs; check them.`);
    this.symbols.set(key, { tex, value });
    return value;
  }

  /** An input in `unit`, checked against bounds and kept as a symbol. `fallback` stands when it was not given. */
  number(name: string, unit: string, bounds: Bounds = {}, tex?: string): number {
    if (!this.has(name) && bounds.fallback !== undefined) return this.keep(name, bounds.fallback, tex);
    const given = this.quantity(name);
    if (given.unit !== unit) this.checkUnit(name, given.unit, unit);
    this.checkPlausible(name, given);
    const value = convert(given, unit);
    if (!Number.isFinite(value))
      this.refuse(
        'VALUE_IMPOSSIBLE',
        name,
        `The ${this.meaning(name)} is too large for a number in ${unitLabel(unit)}.`,
      );
    this.checkBounds(name, value, unit, bounds);
    return this.keep(name, value, tex);
  }

  private checkUnit(name: string, from: string, to: string): void {
    const dimension = dimensionOf(from);
    if (dimension !== undefined && dimension === dimensionOf(to)) return;
    this.refuse(
      'WRONG_UNIT',
      name,
      `The ${this.meaning(name)} is given in ${unitLabel(from) || 'no unit'}; it must be in a unit such as ${unitLabel(to) || 'a plain number'}.`,
    );
  }

  /** Refuses what cannot be, and warns of what is unusual, by the range of the quantity that the input is. */
  private checkPlausible(name: string, given: Q): void {
    const key = this.describedAs(name)?.rangeKey;
    if (key === undefined || standing(key, given) === 'possible') return;
    const atmosphere = this.inputs['atmospheric_pressure'];
    const barometer = typeof atmosphere === 'object' && dimensionOf(atmosphere.unit) === 'pressure-absolute';
    const check = checkRange(key, given, barometer ? { barometer: atmosphere } : {}, this.meaning(name));
    if (check.wrongUnit === true || check.sentence === undefined) return;
    if (check.verdict === 'impossible') this.refuse('VALUE_IMPOSSIBLE', name, check.sentence);
    this.warn('VALUE_UNUSUAL', check.sentence);
  }

  private checkBounds(name: string, value: number, unit: string, { above, min, max }: Bounds): void {
    if (above !== undefined && !(value > above)) this.beyond(name, value, unit, 'must be above', above);
    if (min !== undefined && value < min) this.beyond(name, value, unit, 'cannot be below', min);
    if (max !== undefined && value > max) this.beyond(name, value, unit, 'cannot be above', max);
  }

  private beyond(name: string, value: number, unit: string, relation: string, limit: number): never {
    const label = unitLabel(unit);
    const shown = `${texNumber(value).replace(/\\,/g, '\u2009')} ${label}`.trim();
    const text = `The ${this.meaning(name)} is ${shown}; it ${relation} ${`${limit} ${label}`.trim()}.`;
    this.refuse('VALUE_IMPOSSIBLE', name, text);
  }

  /** A word out of a list, or the fallback. */
  word<T extends string>(name: string, words: readonly T[], fallback?: T): T {
    const given = this.inputs[name];
    if (given === undefined && fallback !== undefined) return fallback;
    const found = words.find((w) => w === given);
    if (found === undefined)
      this.refuse('WORD_UNKNOWN', name, `The ${this.meaning(name)} must be one of: ${words.join(', ')}.`);
    return found;
  }

  /** A yes or no, or the fallback. */
  flag(name: string, fallback: boolean): boolean {
    const given = this.inputs[name];
    if (given === undefined) return fallback;
    if (typeof given !== 'boolean')
      this.refuse('NOT_A_FLAG', name, `The ${this.meaning(name)} must be yes or no.`);
    return given;
  }

  private readonly symbol: Show = (key) => this.symbols.get(key)?.tex ?? key;

  private readonly figure: Show = (key) => {
    const known = this.symbols.get(key);
    return known === undefined ? key : `{${texNumber(known.value)}}`;
  };

  /** Adds a step. The template is written once; symbols give the equation, numbers the substitution. */
  step(info: StepInfo, template: (v: Show) => string): number {
    const tex = info.tex ?? info.key;
    const { value, unit, meaning, clause, memory } = info;
    if (!Number.isFinite(value))
      this.refuse('NO_RESULT', info.key, `The ${meaning} has no finite value with these inputs; check them.`);
    const step: Step = {
      symbol: tex,
      meaning,
      tex: `${tex} = ${template(this.symbol)}`,
      worked: `${tex} = ${template(this.figure)}`,
      value,
      unit,
    };
    if (clause !== undefined) step.clause = clause;
    if (memory !== undefined) step.memory = memory;
    this.steps.push(step);
    return this.keep(info.key, value, tex);
  }

  /** Adds a step whose result is a word (a regime, a letter). */
  say(info: { symbol: string; meaning: string; value: string; tex: string; clause?: string }): void {
    const { symbol, meaning, value, tex, clause } = info;
    this.steps.push({
      symbol,
      meaning,
      tex,
      worked: tex,
      value,
      unit: '-',
      ...(clause === undefined ? {} : { clause }),
    });
  }

  /** Gives a named result; a figure that is not finite is a refusal, never a result. */
  output(name: string, value: number | string | boolean, unit = '-'): void {
    if (typeof value === 'number' && !Number.isFinite(value))
      this.refuse('NO_RESULT', name, `The ${name} has no finite value with these inputs; check them.`);
    this.outputs[name] = typeof value === 'number' ? { value, unit } : value;
  }
}

/** Works one sheet: runs the body, and turns a refusal into the sheet's `refused`. */
export function workSheet(
  method: { id: string; version: number; inputs: readonly Described[] },
  inputs: Inputs,
  edition: string | undefined,
  body: (sheet: SheetBuilder) => void,
): Worked {
  const sheet = new SheetBuilder(inputs, method.inputs);
  const { steps, outputs, warnings } = sheet;
  const worked: Worked = { method: `${method.id}@${method.version}`, steps, outputs, warnings };
  if (edition !== undefined) worked.edition = edition;
  try {
    body(sheet);
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    worked.refused = error.refusal;
  }
  return worked;
}
