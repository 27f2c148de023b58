/* Hashes of an evaluation: what an agreement binds to (a sheet) and the key under which a whole evaluation is kept. */
import { type Basis, type Hash, hashOf, roundedForHash } from '@domain/basis';
import { type JudgementRules } from '@domain/rules';
import { METHODS } from '@engine/catalog';
import { type Inputs } from '@engine/sheet';
import { type ImportSet } from './types';

/** Resolved inputs as they enter a hash: numbers rounded, what was typed as text left out. */
export function hashable(inputs: Inputs): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(inputs).map(([name, value]) => [
      name,
      typeof value === 'object' ? { value: roundedForHash(value.value), unit: value.unit } : value,
    ]),
  );
}

/** The hash of a sheet: method with its number, edition, resolved inputs. An agreement binds exactly this. */
export function sheetHash(method: string, edition: string | undefined, inputs: Inputs): Hash {
  return hashOf('sheet', { method, edition: edition ?? null, inputs: hashable(inputs) });
}

/** The methods of the engine as `method@n`, sorted. */
export const CATALOG: readonly string[] = METHODS.map(
  (method) => `${method.id}@${String(method.version)}`,
).sort();

let catalog: Hash | undefined;

/** Hash of the engine's methods with their numbers. */
export function catalogHash(): Hash {
  catalog ??= hashOf('catalog', CATALOG);
  return catalog;
}

/** The key of an evaluation: document, imports, judgement half of the site rules, catalog. */
export function evaluationKey(basis: Basis, judgement: JudgementRules, imports: ImportSet): Hash {
  return hashOf('evaluation', {
    document: hashOf('document', basis),
    imports: hashOf('imports', imports),
    judgement: hashOf('judgement', judgement),
    catalog: catalogHash(),
  });
}
