/* The sign-offs of a case: every signature with its words and what it binds, and the acts that move the case without signing. */
import { type ActAnswer, movedParts, type Signature, STAGE_WORDS, type Stage } from '@domain/case';
import { validSignatures, bindFacts } from '../../signed';
import { pageHash, signingOf } from '../../stage/sign';
import { type StageAct } from '../../stage/types';
import { mayAct } from '../../stage/stage-act';
import { nameOf } from './acts';
import { type CaseFrame } from './frame';
import { type OpenedCase } from './open';
import { plainOf } from './prose';
import { shortHash, zonedWords } from './when';

export type SignatureView = {
  id: string;
  gate: string;
  gateWords: string;
  meaning: string;
  name: string;
  role: string;
  /** Whom it was signed for, when someone stood in. */
  standsFor?: string;
  at: string;
  hash: string;
  page: string;
  valid: boolean;
  /** Why it no longer counts. */
  void?: string;
  binds: { part: string; of: string; hash: string; moved: boolean }[];
};
export type MoveView = {
  act: StageAct;
  words: string;
  ok: boolean;
  whyNot?: string;
  /** Stages that a return may lead to. */
  to?: { value: Stage; label: string }[];
};
export type SigningView = { act: StageAct; role: string; meaning: string; page: string; signs: string };
export type SignaturesView = { signatures: SignatureView[]; moves: MoveView[]; signing: SigningView | null };

const PARTS: Record<string, string> = {
  brief: 'the brief',
  document: 'the relief basis',
  imports: 'the pressures taken from headers',
  rules: 'the judgement half of the site rules',
  evaluation: 'the calculation sheets',
  unseen: 'the unseen check',
  findings: 'the findings',
  'field-sheet': 'the field sheet',
};
const GATES: Record<string, string> = { grade: 'first issue for its grade', authorisation: 'authorisation' };
const MOVES: readonly StageAct[] = [
  'RETURN-own',
  'RETURN-check',
  'RETURN-approval',
  'HOLD',
  'RESUME',
  'WITHDRAW',
  'REFUSE',
];
const ORDER: readonly Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field'];

function ofWhat(of: OpenedCase, id: string): string {
  return of.file.documents.find((one) => one.document.id === id)?.document.tag ?? '';
}

function whyVoid(of: OpenedCase, one: Signature, moved: readonly string[]): string {
  const row = of.file.signatures.find((each) => each.id === one.id);
  const cause = row?.voids.at(-1)?.cause;
  if (cause !== undefined) return `No longer counts: ${plainOf(of, cause)}`;
  return `No longer counts: ${[...new Set(moved)].join(', ')} changed since.`;
}

function signatureView(of: OpenedCase, one: Signature & { valid: boolean }): SignatureView {
  const moved = one.valid ? [] : movedParts(one, bindFacts(of.file));
  const words = moved.map((part) => PARTS[part.part] ?? part.part);
  return {
    id: one.id,
    gate: one.gate,
    gateWords: STAGE_WORDS[one.gate as Stage] ?? GATES[one.gate] ?? one.gate.replaceAll('-', ' '),
    meaning: one.meaning,
    name: one.name,
    role: one.role,
    ...(one.for === undefined ? {} : { standsFor: nameOf(of, one.for) }),
    at: zonedWords(one.at, one.zone),
    hash: shortHash(one.hash),
    page: one.page === '' ? '' : shortHash(one.page),
    valid: one.valid,
    ...(one.valid ? {} : { void: whyVoid(of, one, words) }),
    binds: one.bound.map((part) => ({
      part: PARTS[part.part] ?? part.part,
      of: ofWhat(of, part.of),
      hash: shortHash(part.hash),
      moved: moved.some((each) => each.part === part.part && each.of === part.of),
    })),
  };
}

/** Stages before the present one to which an act of returning may lead. */
function targets(of: OpenedCase, act: StageAct): { to?: MoveView['to'] } {
  if (!act.startsWith('RETURN')) return {};
  const before = ORDER.slice(0, Math.max(ORDER.indexOf(of.file.row.stage), 0));
  return { to: before.toReversed().map((value) => ({ value, label: STAGE_WORDS[value] })) };
}

/** The acts that move the case without a signature, each with why not; what the reader has no seat for is left out. */
export function movesOf(of: OpenedCase, acts: readonly ActAnswer[]): MoveView[] {
  return MOVES.flatMap((act) => {
    const words = acts.find((each) => each.act === act)?.words ?? act;
    const may = mayAct(of.file, of.actor, act);
    if (!may.ok && (may.code === 'NOT_PERMITTED' || may.code === 'WRONG_STAGE')) return [];
    return [{ act, words, ok: may.ok, ...(may.ok ? {} : { whyNot: may.sentence }), ...targets(of, act) }];
  });
}

/** True when the reader has given a signature of this gate that still holds: one person signs once. */
function hasSigned(of: OpenedCase, gate: string): boolean {
  return validSignatures(of.file).some(
    (one) => one.gate === gate && one.person === of.actor.person.id && one.valid,
  );
}

/** What the reader may sign here now, with the hash of what is in view; null when it is not theirs. */
export function signingHere(of: OpenedCase, act: StageAct): SigningView | null {
  const signing = signingOf(act);
  if (!signing || !mayAct(of.file, of.actor, act).ok || hasSigned(of, signing.gate)) return null;
  const page = pageHash(of.file, act);
  const { meaning, role } = signing;
  return { act, role, meaning, page, signs: `${of.file.row.number} at hash ${shortHash(page)}` };
}

/** The sign-offs of the case. */
export function signaturesView(of: OpenedCase, frame: Pick<CaseFrame, 'acts'>): SignaturesView {
  return {
    signatures: validSignatures(of.file).map((one) => signatureView(of, one)),
    moves: movesOf(of, frame.acts),
    signing: signingHere(of, 'PASS-check'),
  };
}
