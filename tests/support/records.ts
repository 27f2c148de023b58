/* Small valid records for tests of the data layer: a document, a case, a signature, a revision body. */
import { type Basis } from '@domain/basis';
import { emptyBrief } from '@domain/case';
import { createCase } from '@data/cases';
import { createDocument } from '@data/documents';
import { newId, nowInstant } from '@data/ids';
import { addSignature } from '@data/signatures';
import { type World } from './database';

/** A body that stands for a relief basis; the data layer does not look into it. */
export const bodyNamed = (name: string): Basis => ({ schema: 1, name }) as unknown as Basis;

/** Adds a system; gives its id. */
export async function addSystem({ db, siteId, unitId }: World, tag: string): Promise<string> {
  const id = newId('document');
  await createDocument(db, {
    id,
    siteId,
    kind: 'system',
    tag,
    name: `System ${tag}`,
    unitId,
    grade: 'worked',
  });
  return id;
}

/** Adds a case at its draft; gives its id. */
export async function addCase({ db, siteId, people }: World, number: string): Promise<string> {
  const id = newId('case');
  const at = nowInstant();
  await createCase(db, {
    ...{
      id,
      siteId,
      number,
      title: 'New impeller',
      class: 'permanent',
      stage: 'draft',
      snapshot: { value: 'draft' },
    },
    ...{
      brief: emptyBrief('New impeller'),
      briefHash: 'b',
      raisedBy: people.originator,
      raisedAt: at,
      stageAt: at,
    },
  });
  return id;
}

/** Signs a gate; gives the signature's id. */
export async function sign(
  { db, people }: World,
  on: { gate: string; caseId?: string; documentId?: string },
): Promise<string> {
  const id = newId('signature');
  await addSignature(db, {
    ...{
      id,
      personId: people.approver,
      name: 'The approver',
      role: 'approver',
      meaning: 'I sign.',
      bound: [],
    },
    ...{ at: nowInstant(), zone: 'Europe/Vienna', contentHash: 'c', pageHash: 'p', factor: 'password' },
    ...on,
  });
  return id;
}
