/* Makes sheets: worked by the engine, refused with a sentence, or stated by the user. */
import { type Path } from '@domain/basis';
import { methodById, workMethod } from '@engine/catalog';
import { type Q } from '@engine/quantity';
import { type Inputs, type Step } from '@engine/sheet';
import { type Missing } from './inputs';
import { sheetHash } from './keys';
import { type Sheet, type SheetKey } from './types';

export type Made = { inputs: Inputs; from: Record<string, Path> };

/** A sheet without a result: why in a sentence, and the field that mends it. */
export function refusedSheet(
  key: SheetKey,
  method: string,
  made: Made,
  code: string,
  text: string,
  field: Path,
): Sheet {
  const hash = sheetHash(method, undefined, made.inputs);
  return { key, method, ...made, steps: [], hash, outputs: {}, warnings: [], refused: { code, text, field } };
}

/** A sheet refused because an entered input has no value. */
export function missingSheet(key: SheetKey, method: string, made: Made, missing: Missing): Sheet {
  return refusedSheet(key, method, made, 'INPUT_MISSING', missing.text, missing.field);
}

/**
 * Works a method of the engine into a sheet. An unknown method gives a sheet that says so; a refusal of the method names
 * the field its input came from.
 * @param at path of the calculation in the document, for inputs that came from nowhere
 */
export function workedSheet(
  key: SheetKey,
  method: string,
  edition: string | undefined,
  made: Made,
  at: Path,
): Sheet {
  const known = methodById(method);
  if (!known) {
    const text = `The method ${method} is not worked by this program yet: attach an external sheet with its figures.`;
    return refusedSheet(key, method, made, 'METHOD_UNKNOWN', text, at);
  }
  const worked = workMethod(known.id, made.inputs, edition);
  const name = `${known.id}@${String(known.version)}`;
  const sheet: Sheet = {
    key,
    method: name,
    ...made,
    steps: worked.steps,
    hash: sheetHash(name, edition, made.inputs),
    outputs: worked.outputs,
    warnings: worked.warnings,
  };
  const used = worked.edition ?? edition;
  if (used !== undefined) sheet.edition = used;
  if (worked.refused) {
    const { code, text, field } = worked.refused;
    sheet.refused = { code, text, field: made.from[field] ?? `${at}/inputs/${field}` };
  }
  return sheet;
}

/** A sheet of one stated figure. */
export function statedSheet(
  key: SheetKey,
  method: string,
  name: string,
  q: Q,
  from: Path,
  meaning: string,
): Sheet {
  const step: Step = { symbol: name, meaning, tex: '', worked: '', value: q.value, unit: q.unit };
  const inputs: Inputs = { [name]: q };
  return {
    key,
    method,
    inputs,
    from: { [name]: from },
    steps: [step],
    hash: sheetHash(method, undefined, inputs),
    outputs: { [name]: q },
    warnings: [],
  };
}

/** The quantity among a sheet's outputs, or nothing when it is absent or the sheet is refused. */
export function outputOf(sheet: Sheet | undefined, ...names: string[]): Q | undefined {
  if (!sheet || sheet.refused) return undefined;
  for (const name of names) {
    const value = sheet.outputs[name];
    if (typeof value === 'object') return value;
  }
  return undefined;
}
