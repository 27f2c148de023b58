/* Signatures and what voids them: rows are only ever added. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findIn, fromColumns, insert, type New } from './mapping';
import { type SignatureRow, SIGNATURES, type VoidRow, VOIDS } from './tables/cases';

export type { SignatureRow, VoidRow } from './tables/cases';

/** A signature with the rows that void it; none: not voided (whether what it binds still stands is the domain's question). */
export type SignatureWithVoids = SignatureRow & { voids: VoidRow[] };

/** Adds a signature. */
export function addSignature(trx: Db, row: New<SignatureRow>): Promise<void> {
  return insert(trx, SIGNATURES, row);
}

/** Voids a signature, with the cause. */
export function voidSignature(trx: Db, row: Omit<New<VoidRow>, 'id'>): Promise<void> {
  return insert(trx, VOIDS, { id: newId('void'), ...row });
}

async function withVoids(db: Db, signatures: SignatureRow[]): Promise<SignatureWithVoids[]> {
  const ids = signatures.map((signature) => signature.id);
  const voids = await findIn(db, VOIDS, 'signatureId', ids);
  return signatures.map((one) => ({ ...one, voids: voids.filter((row) => row.signatureId === one.id) }));
}

async function signaturesWhere(db: Db, where: Record<string, Id>): Promise<SignatureWithVoids[]> {
  const rows = (await db(SIGNATURES.name).where(where).orderBy('at').orderBy('id')) as Record<string, unknown>[];
  return withVoids(
    db,
    rows.map((row) => fromColumns(SIGNATURES, row)),
  );
}

/** The signatures of a case, oldest first. */
export function signaturesOfCase(db: Db, caseId: Id): Promise<SignatureWithVoids[]> {
  return signaturesWhere(db, { case_id: caseId });
}

/** The signatures given for one document, oldest first. */
export function signaturesOfDocument(db: Db, documentId: Id): Promise<SignatureWithVoids[]> {
  return signaturesWhere(db, { document_id: documentId });
}

/** The signatures of a set of site rules, oldest first. */
export function signaturesOfRules(db: Db, rulesId: Id): Promise<SignatureWithVoids[]> {
  return signaturesWhere(db, { rules_id: rulesId });
}

/** The signatures that a person gave, oldest first. */
export function signaturesOfPerson(db: Db, personId: Id): Promise<SignatureWithVoids[]> {
  return signaturesWhere(db, { person_id: personId });
}
