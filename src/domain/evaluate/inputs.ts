/* Resolves the inputs of a calculation: what was entered, what is used from elsewhere in the basis, and where each came from. */
import { type Id, type Input, type Path, getAt, isFigure, quantityOf } from '@domain/basis';
import { type Q } from '@engine/quantity';
import { type Inputs } from '@engine/sheet';
import { type Work } from './work';

export type Value = Q | string | boolean;
export type Found = { value: Value; path: Path };
export type Resolved = {
  inputs: Inputs;
  from: Record<string, Path>;
  lists: Record<string, Id[]>;
  missing: Missing[];
};
/** An input that is entered but gives no value: its name and a sentence why. */
export type Missing = { name: string; text: string; field: Path };

/** Makes the sheet with this key when it can still be made; the caller gives it so that sheets may use sheets. */
export type Ensure = (key: string) => void;

const RESULT = /^sheets\/(.+)#([^#]+)$/;

/** The value at a path: a figure, word or flag of the document, or an output of a sheet made before (`sheets/load:x/y#relief_load`). */
export function valueAt(work: Work, path: Path, ensure: Ensure): Value | undefined {
  const result = RESULT.exec(path);
  if (result) {
    const [, key = '', output = ''] = result;
    ensure(key);
    const sheet = work.sheets[key];
    return sheet && !sheet.refused ? sheet.outputs[output] : undefined;
  }
  const found = getAt(work.basis, path);
  if (typeof found === 'string' || typeof found === 'boolean') return found;
  if (typeof found === 'number') return { value: found, unit: '-' };
  return isFigure(found) ? quantityOf(found) : undefined;
}

function resolveOne(work: Work, input: Input, here: Path, ensure: Ensure): Found | string {
  if ('use' in input) {
    const value = valueAt(work, input.use, ensure);
    return value === undefined
      ? `nothing is known at ${input.use}, which it uses`
      : { value, path: input.use };
  }
  if ('word' in input) return { value: input.word, path: here };
  if ('flag' in input) return { value: input.flag, path: here };
  if ('list' in input) return { value: input.list.join(' '), path: here };
  const q = quantityOf(input);
  if (q) return { value: q, path: here };
  return `it is not known (${'unknown' in input ? input.unknown : 'no value'})`;
}

/**
 * Resolves entered inputs.
 * @param at the path of the calculation, for `from` (`scenarios/fire-wetted/answers/a1/load`)
 */
export function resolveInputs(
  work: Work,
  at: Path,
  entered: Record<string, Input>,
  ensure: Ensure,
): Resolved {
  const resolved: Resolved = { inputs: {}, from: {}, lists: {}, missing: [] };
  for (const [name, input] of Object.entries(entered)) {
    const here = `${at}/inputs/${name}`;
    if ('list' in input) resolved.lists[name] = input.list;
    const found = resolveOne(work, input, here, ensure);
    if (typeof found === 'string') {
      resolved.missing.push({ name, text: `${name} has no value: ${found}.`, field: here });
      continue;
    }
    if ('list' in input) continue;
    resolved.inputs[name] = found.value;
    resolved.from[name] = found.path;
  }
  return resolved;
}
