/* Signatures of seeded cases and bases, bound to the true hashes of what stood when they were given. */
import { hashOf } from '@domain/basis';
import {
  type BindFacts,
  type BoundPart,
  boundParts,
  briefHash,
  type Finding,
  meaningOf,
  type SignedGate,
  type UnseenEntry,
  signatureHash,
} from '@domain/case';
import { type FieldFacts } from '@domain/field';
import { judgementHash } from '@domain/rules';
import { addSignature, voidSignature } from '@data/signatures';
import { type New } from '@data/mapping';
import { type SignatureRow } from '@data/tables/cases';
import { newId } from '@data/ids';
import { personId, SITE } from '../convert';
import { type Bound } from './bound';
import { type CasePlan } from './plan';
import { RULES_ID, type World, ZONE } from './world';

const GATES: Record<string, SignedGate> = {
  draft: 'draft',
  'scenario analysis': 'scenarios',
  'calculation check': 'check',
  approval: 'approval',
  'field verification': 'field',
  'emergency authorisation': 'authorisation',
};

/** What a signature of a case binds beside its documents. */
export type CaseRecords = { unseen: readonly UnseenEntry[]; findings: readonly Finding[]; field: FieldFacts };

const hashesOf = (bound: Bound): string[] =>
  Object.values(bound.evaluation.sheets).map((sheet) => sheet.hash);

function bindFacts(plan: CasePlan, records: CaseRecords): BindFacts {
  return {
    case: plan.id,
    brief: plan.brief,
    rules: { id: RULES_ID, judgementHash: judgementHash(plan.world.judgement) },
    documents: plan.documents.map((doc) => ({
      document: doc.document,
      documentHash: doc.working.documentHash,
      importsHash: doc.working.importsHash,
      sheetHashes: hashesOf(doc.working),
    })),
    ...records,
  };
}

type Signed = {
  gate: SignedGate;
  person: string;
  role: string;
  at: string;
  bound: BoundPart[];
  caseId: string | null;
  documentId: string | null;
};

/** The row of a signature. */
function rowOf(signed: Signed): New<SignatureRow> {
  const { gate, person, role, at, bound, caseId, documentId } = signed;
  const signer = personId(person);
  const name = SITE.people.find((candidate) => candidate.id === person)?.name ?? person;
  const meaning = meaningOf(gate);
  const pageHash = hashOf('page', { caseId, documentId, gate, at });
  const contentHash = signatureHash({ gate, person: signer, meaning, page: pageHash, bound, at, zone: ZONE });
  return {
    id: newId('signature'),
    caseId,
    documentId,
    gate,
    personId: signer,
    name,
    role,
    meaning,
    at,
    zone: ZONE,
    bound,
    contentHash,
    pageHash,
    factor: 'password',
  };
}

/** The signatures of a case in the order in which they were given; a refusal is no signature. */
export async function writeSignatures(plan: CasePlan, records: CaseRecords): Promise<void> {
  const facts = bindFacts(plan, records);
  const given = plan.demo.signoffs.filter((one) => !one.meaning.startsWith('I refuse'));
  const returnedAt = plan.demo.returned?.[0]?.at;
  for (const one of given) {
    const gate = GATES[one.gate];
    if (!gate) continue;
    const document = gate === 'field' ? (plan.documents[0]?.document ?? null) : null;
    const narrow = document === null ? {} : { document };
    const bound = boundParts(gate, facts, narrow);
    const row = rowOf({
      gate,
      person: one.person,
      role: one.role,
      at: plan.world.shift.instant(one.at),
      bound,
      caseId: plan.id,
      documentId: document,
    });
    await addSignature(plan.world.trx, row);
    const fell = returnedAt !== undefined && gate !== 'draft' && one.at < returnedAt;
    if (fell)
      await voidSignature(plan.world.trx, {
        signatureId: row.id,
        at: plan.world.shift.instant(returnedAt),
        cause: plan.demo.returned?.[0]?.reason ?? 'returned',
      });
  }
}

/** The signature with which a basis or header that no case here issued was accepted for its grade. */
export async function signGrade(
  world: World,
  document: string,
  at: string,
  bound: Pick<Bound, 'documentHash' | 'importsHash'>,
): Promise<void> {
  const parts: BoundPart[] = [
    { part: 'document', of: document, hash: bound.documentHash },
    { part: 'imports', of: document, hash: bound.importsHash },
    { part: 'rules', of: RULES_ID, hash: judgementHash(world.judgement) },
  ];
  await addSignature(
    world.trx,
    rowOf({
      gate: 'grade',
      person: 'P-05',
      role: 'approver',
      at,
      bound: parts,
      caseId: null,
      documentId: document,
    }),
  );
}

/** An approver's signature on a deficiency; gives its id. */
export async function signDeficiency(
  world: World,
  person: string,
  document: string,
  at: string,
): Promise<string> {
  const row = rowOf({
    gate: 'deficiency',
    person,
    role: 'approver',
    at,
    bound: [],
    caseId: null,
    documentId: document,
  });
  await addSignature(world.trx, row);
  return row.id;
}

export { briefHash };
