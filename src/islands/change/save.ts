/* Saving a change, and what the server may answer to it. */
import { type Basis, type Op } from '@domain/basis';
import { type FieldError } from '@domain/result';

/** The newer version that a stale save ran into. */
export type Newer = { version: number; document: Basis };
export type Saved =
  | { kind: 'saved'; version: number }
  | { kind: 'stale'; newer: Newer }
  | { kind: 'signed-out' }
  | { kind: 'unreached' }
  | { kind: 'refused'; detail: string; errors: FieldError[] };

type Ask = typeof fetch;
type Told = { code?: string; detail?: string; errors?: FieldError[] };

async function newerAt(api: string, ask: Ask): Promise<Newer | undefined> {
  const answer = await ask(api, { headers: { Accept: 'application/json' } });
  if (!answer.ok) return undefined;
  return (await answer.json()) as Newer;
}

async function refusedBy(answer: Response): Promise<Saved> {
  const told = (await answer.json().catch(() => ({}))) as Told;
  const detail = told.detail ?? `The server answered ${String(answer.status)} without a reason.`;
  return { kind: 'refused', detail, errors: told.errors ?? [] };
}

/** Sends the ops on the version they were made on. Never throws: without an answer it is `unreached`. */
export async function saveOps(
  api: string,
  version: number,
  ops: readonly Op[],
  ask: Ask = fetch,
): Promise<Saved> {
  try {
    const answer = await ask(api, {
      method: 'PATCH',
      headers: {
        'Content-Type': 'application/json',
        Accept: 'application/json',
        'If-Match': `"revision-${String(version)}"`,
      },
      body: JSON.stringify({ ops }),
    });
    if (answer.ok) return { kind: 'saved', version: ((await answer.json()) as { version: number }).version };
    if (answer.status === 401) return { kind: 'signed-out' };
    if (answer.status !== 412) return await refusedBy(answer);
    const newer = await newerAt(api, ask);
    return newer ? { kind: 'stale', newer } : { kind: 'unreached' };
  } catch {
    return { kind: 'unreached' };
  }
}
