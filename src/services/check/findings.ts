/* Findings as threads: raised at a place, answered by the originator, closed by who raised them. */
import { type Act, type ActBody } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { cleanRich, type Rich } from '@domain/text';
import { addPost, type FindingWithPosts, raiseFinding as raiseRow, updateFinding } from '@data/findings';
import { newId } from '@data/ids';
import { findingMachine } from '@workflows/finding';
import { step } from '@workflows/next';
import { type CaseFile } from '../case-file';
import { type Actor, type Ctx, instant } from '../context';
import { notify, noticePerson } from '../notify';
import { type Write } from '../one-act';
import { caseWrite } from './case-write';

export type FindingAnswer = { number: string; version: number; finding: number };

function seatFor(file: CaseFile, actor: Actor): 'checker' | 'approver' | 'operations' {
  const seat = file.seats.find(
    (one) => one.personId === actor.person.id && !one.untilAt && one.role !== 'originator',
  );
  return seat?.role === 'approver' || seat?.role === 'operations' ? seat.role : 'checker';
}

/** Raises a finding at a place; the originator is told. */
export function raiseFinding(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Write<ActBody<'raise-finding'>>,
): Promise<Result<FindingAnswer>> {
  return caseWrite(ctx, actor, { number, act: 'raise-finding', sent }, async (trx, of) => {
    const { file, body } = of;
    const at = instant(ctx);
    const row = {
      id: newId('finding'),
      caseId: file.row.id,
      weight: body.weight,
      place: body.place,
      state: 'open' as const,
      raisedBy: actor.person.id,
      raisedAt: at,
      successorId: null,
    };
    const finding = await raiseRow(trx, row, {
      byId: actor.person.id,
      at,
      text: cleanRich(body.text),
      changePath: null,
    });
    await notify(trx, ctx, actor, file, {
      event: 'case.finding-raised',
      finding,
      mustFix: body.weight === 'must-fix',
    });
    const changes = [{ path: `findings/${String(finding)}`, new: body.weight }];
    return ok({
      tell: { act: 'finding.raised', seat: seatFor(file, actor), changes, hides: true },
      answer: { finding },
    });
  });
}

const EVENTS = { 'answer-finding': 'ANSWER', 'close-finding': 'CLOSE', 'reopen-finding': 'REOPEN' } as const;
const TOLD = {
  'answer-finding': 'finding.answered',
  'close-finding': 'finding.closed',
  'reopen-finding': 'finding.reopened',
} as const;
type Turn = keyof typeof EVENTS;

function findingOf(file: CaseFile, finding: number): FindingWithPosts | undefined {
  return file.findings.find((one) => one.number === finding);
}

function factsOf(finding: number) {
  return (file: CaseFile) => {
    const found = findingOf(file, finding);
    return found
      ? { raisedBy: found.raisedBy, ...(found.successorId ? { successor: found.successorId } : {}) }
      : {};
  };
}

/** Answers, closes or reopens a finding. WRONG_STAGE when its thread does not stand there. */
export function turnFinding(
  ctx: Ctx,
  actor: Actor,
  at: { number: string; finding: number; turn: Turn },
  sent: Write<{ text?: Rich; change?: string }>,
): Promise<Result<FindingAnswer>> {
  const act: Act = at.turn;
  return caseWrite(
    ctx,
    actor,
    { number: at.number, act, sent, facts: factsOf(at.finding) },
    async (trx, of) => {
      const found = findingOf(of.file, at.finding);
      if (!found) return fail('UNKNOWN', `This case has no finding ${String(at.finding)}.`);
      const next = step(findingMachine, found.state, { type: EVENTS[at.turn] });
      if (!next.can) return fail('WRONG_STAGE', `Finding ${String(at.finding)} is ${found.state}.`);
      if (!(await updateFinding(trx, found.id, found.version, { state: next.state })))
        return fail('STALE', `Finding ${String(at.finding)} was changed meanwhile.`);
      const { text, change } = of.body;
      if (text)
        await addPost(trx, found.id, {
          byId: actor.person.id,
          at: instant(ctx),
          text: cleanRich(text),
          changePath: change ?? null,
        });
      if (at.turn === 'answer-finding') {
        await notify(trx, ctx, actor, of.file, {
          event: 'case.finding-answered',
          finding: found.number,
          raisedBy: noticePerson(of.file, found.raisedBy),
        });
      }
      const seat = at.turn === 'answer-finding' ? 'originator' : seatFor(of.file, actor);
      const changes = [{ path: `findings/${String(found.number)}`, old: found.state, new: next.state }];
      return ok({
        tell: { act: TOLD[at.turn], seat, changes, hides: true },
        answer: { finding: found.number },
      });
    },
  );
}
