/* Which signatures of a case still hold: what each binds is compared with what stands now. */
import { type BindFacts, isValid, type Signature } from '@domain/case';
import { hashOf } from '@domain/basis';
import { NO_IMPORTS } from '@domain/evaluate';
import { type CaseFile, domainSignature } from './case-file';
import { findingAsDomain } from './case-records';
import { judgementHashOf } from './evaluate-document';
import { discrepanciesAsDomain, entriesAsDomain, linesAsDomain } from './field-records';
import { unseenEntries } from './unseen-records';

const NONE = hashOf('imports', NO_IMPORTS);

/** Present hashes of everything that a signature of this case can bind. */
export function bindFacts(file: CaseFile): BindFacts {
  return {
    case: file.row.id,
    brief: file.row.brief,
    rules: { id: file.rulesRow.id, judgementHash: judgementHashOf(file.rules) },
    documents: file.documents.flatMap((one) =>
      one.working?.documentHash
        ? [
            {
              document: one.document.id,
              documentHash: one.working.documentHash,
              importsHash: one.working.importsHash ?? NONE,
              sheetHashes: Object.values(one.after?.evaluation.sheets ?? {}).map((sheet) => sheet.hash),
            },
          ]
        : [],
    ),
    unseen: unseenEntries(file),
    findings: file.findings.map(findingAsDomain),
    field: {
      lines: linesAsDomain(file.lines),
      entries: entriesAsDomain(file.entries),
      discrepancies: discrepanciesAsDomain(file.discrepancies),
    },
  };
}

/** Every signature of the case with whether it still holds. A signature of an issued system binds what was issued then, and holds for ever. */
export function validSignatures(file: CaseFile): (Signature & { valid: boolean })[] {
  const facts = bindFacts(file);
  const settled =
    file.documents.length > 0 &&
    file.documents.every((one) => one.row.state === 'issued' || one.row.state === 'dropped');
  return file.signatures.map((one) => {
    const signature = domainSignature(one);
    const voided = one.voids.length > 0 ? [one.id] : [];
    return { ...signature, valid: settled ? voided.length === 0 : isValid(signature, facts, voided) };
  });
}
