/* Reads what an editor needs from the server, and what a saved change leaves behind. */
import { applyOps, type Basis, type Op } from '@domain/basis';
import { type Plant } from './work';

export type Loaded = { version: number; plant: Plant };
type Told = { detail?: string };

/** The working revision with all that evaluating it needs, or the sentence that says why not. */
export async function loadPlant(api: string, ask: typeof fetch = fetch): Promise<Loaded | string> {
  try {
    const answer = await ask(api, { headers: { Accept: 'application/json' } });
    if (!answer.ok) {
      const told = (await answer.json().catch(() => ({}))) as Told;
      return told.detail ?? `The server answered ${String(answer.status)} without a reason.`;
    }
    const { version, ...plant } = (await answer.json()) as Plant & { version: number };
    return { version, plant };
  } catch {
    return 'The server does not answer. Try again in a moment.';
  }
}

/** The document after a save, should the server not answer the next read: what was saved on what stood there. */
export function afterSave(document: Basis, ops: readonly Op[]): Basis {
  const applied = applyOps(document, ops);
  return applied.ok ? applied.value : document;
}
