/* Answers of a scenario in a form: a new one, one that goes, the way its load or size is had, what it depends on. */
import { type Answer, type Basis, type Calc, getAt, type Op, type Path, type Scenario } from '@domain/basis';
import { newId } from '@data/ids';
import { type Asked, own } from './fields';

type Typed = readonly (readonly [string, string])[];

/** The way of a calculation as one word: `method:f.vaporisation`, `external:xs_1`, `given`, `none`, `sum`. */
export function wayOf(calc: Calc): string {
  if (calc.by === 'method') return `method:${calc.method}`;
  return calc.by === 'external' ? `external:${calc.sheet}` : calc.by;
}

/** A calculation had in another way; a change of method keeps the inputs entered so far. */
function calcOf(way: string, before: Calc | undefined): Calc {
  const [by = 'none', rest = ''] = way.split(/:(.*)/s);
  if (by === 'method') return { by, method: rest, inputs: before?.by === 'method' ? before.inputs : {} };
  if (by === 'external') return { by, sheet: rest };
  if (by === 'given') return { by, figure: { unknown: 'not stated yet' } };
  return { by: 'none' };
}

/** The operation that a chosen way means; none when it is had that way already. */
export function readCalc(document: Basis, path: Path, asked: Asked): Op[] {
  const found = getAt(document, path) as Calc | undefined;
  const way = asked.calc ?? '';
  if (way === '' || way === 'sum' || (found && wayOf(found) === way)) return [];
  return [{ op: 'set', path, value: calcOf(way, found), was: found ?? null }];
}

/** The field conditions that a scenario depends on, chosen by their ids; those it names by tag alone stay. */
export function readDepends(document: Basis, path: Path, chosen: readonly string[]): Op[] {
  const found = getAt(document, path) as Scenario['dependsOn'];
  const kept = (found ?? []).filter((one) => one.condition === undefined || chosen.includes(one.condition));
  const added = chosen
    .filter((id) => !kept.some((one) => one.condition === id))
    .flatMap((id) => document.fieldConditions.find((one) => one.id === id) ?? [])
    .map((one) => ({ id: newId('element'), kind: one.kind, tag: one.tag, condition: one.id }));
  if (added.length === 0 && kept.length === (found ?? []).length) return [];
  return [{ op: 'set', path, value: [...kept, ...added], was: found ?? null }];
}

function filled(typed: Typed, name: string): string | undefined {
  const value = own(typed, `new.${name}`)?.trim();
  return value === '' ? undefined : value;
}

/** The answer that the form adds to the scenario named by `add`. */
export function readNewAnswer(document: Basis, typed: Typed): Op[] {
  const at = own(typed, 'add');
  const scenario = document.scenarios.find((one) => `scenarios/${one.id}/answers` === at);
  if (!scenario || at === undefined) return [];
  const fluid = filled(typed, 'fluid');
  const group = filled(typed, 'group');
  const name = filled(typed, 'name');
  const answer: Answer = {
    id: newId('element'),
    ...(name ? { name } : {}),
    ...(fluid ? { fluid } : {}),
    ...(group ? { group } : {}),
    load: calcOf(filled(typed, 'load') ?? 'none', undefined),
    size: calcOf(filled(typed, 'size') ?? 'none', undefined),
    accumulation: (filled(typed, 'accumulation') ?? 'single') as Answer['accumulation'],
  };
  return [{ op: 'add', path: at, value: answer }];
}

/** The element that the form takes away. */
export function readRemoved(document: Basis, typed: Typed): Op[] {
  const path = own(typed, 'remove');
  const found = path === undefined ? undefined : getAt(document, path);
  return path === undefined || found === undefined ? [] : [{ op: 'remove', path, was: found }];
}
