/* Signs an act: who, as what, with which words, bound to exactly what stands there and to what was in view. */
import { boundParts, meaningOf, signatureHash, type SeatRole, type SignedGate } from '@domain/case';
import { hashOf } from '@domain/basis';
import { newId } from '@data/ids';
import { addSignature } from '@data/signatures';
import { type CaseFile } from '../case-file';
import { bindFacts } from '../signed';
import { documentOf, keepBound } from './revisions';
import { type StageAct, type StageWrite } from './types';

type Signing = { gate: SignedGate; role: SeatRole };

const GATES: Partial<Record<StageAct, Signing>> = {
  'PASS-draft': { gate: 'draft', role: 'originator' },
  'PASS-draft-graded': { gate: 'grade', role: 'approver' },
  'PASS-scenarios': { gate: 'scenarios', role: 'originator' },
  'PASS-check': { gate: 'check', role: 'checker' },
  SIGN: { gate: 'approval', role: 'approver' },
  ISSUE: { gate: 'field', role: 'operations' },
};

/** The gate that an act signs, with the words that are signed; undefined for acts that are no signatures. */
export function signingOf(act: StageAct): (Signing & { meaning: string }) | undefined {
  const signing = GATES[act];
  return signing && { ...signing, meaning: meaningOf(signing.gate) };
}

/** Hash of what a person has in view when they sign: the parts that the signature will bind. The page carries it, the act compares it. */
export function pageHash(file: CaseFile, act: StageAct, system?: string): string {
  const signing = GATES[act];
  if (!signing) return '';
  const document = act === 'ISSUE' ? documentOf(file, system)?.document.id : undefined;
  const bound = boundParts(signing.gate, bindFacts(file), document ? { document } : {});
  return hashOf('page', { case: file.row.number, gate: signing.gate, bound });
}

/** Whom the actor signs for: themselves when they hold the seat, else the one they stand in for. */
function signsFor(write: StageWrite, role: SeatRole): string | null {
  const holders = write.file.seats
    .filter((seat) => seat.role === role && !seat.untilAt)
    .map((seat) => seat.personId);
  if (holders.includes(write.actor.person.id)) return null;
  return write.actor.standsFor.find((person) => holders.includes(person)) ?? null;
}

/** Writes the signature of the act and keeps the evaluations that it binds. */
export async function sign(write: StageWrite): Promise<void> {
  const signing = signingOf(write.act);
  if (!signing) return;
  for (const one of write.file.documents) await keepBound(write, one);
  const document =
    write.act === 'ISSUE' ? documentOf(write.file, write.body.document)?.document.id : undefined;
  const bound = boundParts(signing.gate, bindFacts(write.file), document ? { document } : {});
  const { gate, meaning, role } = signing;
  const { timeZone: zone } = write.file.site;
  const page = write.body.pageHash ?? '';
  const content = signatureHash({
    gate,
    person: write.actor.person.id,
    meaning,
    page,
    bound,
    at: write.at,
    zone,
  });
  write.signature = newId('signature');
  await addSignature(write.trx, {
    id: write.signature,
    caseId: write.file.row.id,
    rulesId: write.file.rulesRow.id,
    documentId: document ?? null,
    gate,
    personId: write.actor.person.id,
    name: write.actor.person.name,
    role,
    meaning,
    at: write.at,
    zone,
    bound,
    contentHash: content,
    pageHash: page,
    factor: 'password',
    forId: signsFor(write, role),
  });
}
