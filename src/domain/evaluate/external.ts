/* External sheets: calculations made elsewhere, found for a relief point and turned into sheets like ours. */
import {
  type Basis,
  type ExternalSheet,
  getAt,
  type Hash,
  hashOf,
  type Id,
  isFigure,
  type Path,
  type ReliefPoint,
  quantityOf,
} from '@domain/basis';
import { type Q } from '@engine/quantity';
import { type Inputs, type Step } from '@engine/sheet';
import { resolveInputs } from './inputs';
import { sheetHash } from './keys';
import { type Sheet, type SheetKey } from './types';
import { type Work } from './work';

/** The external sheets about one thing (outlet, inlet, rated, force) of a relief point: those whose input `point` lists or names it. */
export function externalsFor(work: Work, about: ExternalSheet['about'], point: ReliefPoint): ExternalSheet[] {
  return work.basis.externalSheets.filter((sheet) => sheet.about === about && namesPoint(sheet, point));
}

function namesPoint(sheet: ExternalSheet, point: ReliefPoint): boolean {
  const named = sheet.inputs['point'];
  if (!named) return false;
  if ('list' in named) return named.list.includes(point.id);
  if ('word' in named) return named.word === point.tag;
  return 'use' in named && named.use.startsWith(`reliefPoints/${point.id}`);
}

/** The first of several figures of an external sheet that is known, with its path. */
export function externalFigure(sheet: ExternalSheet, ...names: string[]): { q: Q; path: Path } | undefined {
  for (const name of names) {
    const q = quantityOf(sheet.figures[name]);
    if (q) return { q, path: `externalSheets/${sheet.id}/figures/${name}` };
  }
  return undefined;
}

/** The hash of the inputs that an external sheet stands on now; `madeOf` keeps that of the day it was made. */
export function externalInputsHash(basis: Basis, sheet: ExternalSheet): Hash {
  const named = Object.entries(sheet.inputs).map(([name, input]) => [
    name,
    'use' in input ? valueIn(basis, input.use) : input,
  ]);
  return hashOf('external-inputs', Object.fromEntries(named));
}

function valueIn(basis: Basis, path: Path): unknown {
  const found = getAt(basis, path);
  return isFigure(found) ? quantityOf(found) : found;
}

/** An external sheet as a sheet: its inputs as entered, a step for each figure, words among the outputs. */
export function externalAsSheet(work: Work, key: SheetKey, sheet: ExternalSheet): Sheet {
  const at = `externalSheets/${sheet.id}`;
  const { inputs, from } = resolveInputs(work, at, sheet.inputs, () => undefined);
  const outputs: Inputs = {};
  const steps: Step[] = [];
  for (const [name, figure] of Object.entries(sheet.figures)) {
    const q = quantityOf(figure);
    if (!q) continue;
    outputs[name] = { value: q.value, unit: q.unit };
    from[name] = `${at}/figures/${name}`;
    steps.push(externalStep(sheet, name, q));
  }
  Object.assign(outputs, sheet.words ?? {});
  const method = `external:${sheet.method}`;
  const hash = sheetHash(method, sheet.edition, { ...inputs, ...outputs });
  const made: Sheet = { key, method, inputs, from, steps, hash, outputs, warnings: [] };
  return sheet.edition === undefined ? made : { ...made, edition: sheet.edition };
}

function externalStep(sheet: ExternalSheet, name: string, q: Q): Step {
  const meaning = `from the external sheet “${sheet.title}” by ${sheet.author}`;
  return { symbol: name, meaning, tex: '', worked: '', value: q.value, unit: q.unit };
}

/** The external sheet with this id, or nothing. */
export function externalById(work: Work, id: Id): ExternalSheet | undefined {
  return work.lookup.external.get(id);
}
