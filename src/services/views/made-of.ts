/* What became of the inputs of an external sheet between two documents: names instead of the hash that binds them. */
import { type Basis, getAt, isFigure, quantityOf } from '@domain/basis';

const MADE_OF = /^externalSheets\/([^/]+)\/madeOf$/;

function inputsOf(doc: Basis, id: string): Record<string, string> {
  const sheet = doc.externalSheets.find((one) => one.id === id);
  const named = Object.entries(sheet?.inputs ?? {}).map(([name, input]) => {
    const found = 'use' in input ? getAt(doc, input.use) : input;
    return [name, JSON.stringify((isFigure(found) ? quantityOf(found) : found) ?? null)];
  });
  return Object.fromEntries(named) as Record<string, string>;
}

/** For the hash of an external sheet's inputs, the inputs that moved in words; undefined for any other path. */
export function madeOfWords(base: Basis, now: Basis, path: string): string | undefined {
  const id = MADE_OF.exec(path)?.[1];
  if (id === undefined) return undefined;
  const [old, present] = [inputsOf(base, id), inputsOf(now, id)];
  const names = [...new Set([...Object.keys(old), ...Object.keys(present)])];
  const moved = names.filter((name) => old[name] !== present[name]).map((name) => name.replaceAll('_', ' '));
  return moved.length === 0 ? 'the inputs as they now stand' : `made anew; moved: ${moved.join(', ')}`;
}
