/* Nominates the people of a case: checker, approvers, operations; each told, each independent. */
import { type ActBody, can, conflictsOfSeat, type Role, type SeatRole } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { endSeat, takeSeat, seatsOf as seatRows, updateCase } from '@data/cases';
import { viewsOf } from '@data/check';
import { peopleOfSite } from '@data/people';
import { appendTrail } from '@data/trail';
import { type CaseFile, domainSeats, loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { noticeSeats, notify } from '../notify';
import { answeredBefore, inOneAct, stale, type Write } from '../one-act';

export type Nominated = { number: string; version: number };
type Wanted = { role: SeatRole; person: string };

/** Seats that a nomination gives anew and takes away; the originator's is never changed by it. */
function plan(file: CaseFile, wanted: readonly Wanted[]): { given: Wanted[]; taken: CaseFile['seats'] } {
  const open = file.seats.filter((seat) => !seat.untilAt && seat.role !== 'originator');
  const roles = new Set(wanted.map((one) => one.role));
  return {
    given: wanted.filter(
      (one) =>
        one.role !== 'originator' &&
        !open.some((seat) => seat.role === one.role && seat.personId === one.person),
    ),
    taken: open.filter(
      (seat) =>
        roles.has(seat.role) && !wanted.some((one) => one.role === seat.role && one.person === seat.personId),
    ),
  };
}

async function lookers(ctx: Ctx, file: CaseFile, persons: readonly string[]): Promise<string[]> {
  const documents = file.documents.map((one) => one.document.id);
  const views = await Promise.all(persons.map((person) => viewsOf(ctx.db, person, documents)));
  return views.flat().flatMap((view) => (view.caseId === file.row.id ? [view.personId] : []));
}

async function conflicts(
  ctx: Ctx,
  file: CaseFile,
  given: readonly Wanted[],
  taken: CaseFile['seats'],
): Promise<Result<null>> {
  const people = await peopleOfSite(ctx.db, file.site.id);
  const roles: Record<string, readonly Role[]> = Object.fromEntries(
    people.map((one) => [one.id, one.retiredAt ? [] : one.roles]),
  );
  const names = Object.fromEntries(people.map((one) => [one.id, one.name]));
  const kept = domainSeats(file.seats).filter((seat) => !taken.some((one) => one.id === seat.id));
  const seats = [...kept, ...given.map((one) => ({ id: '', ...one }))];
  const lookedFirst = await lookers(
    ctx,
    file,
    given.filter((one) => one.role === 'checker').map((one) => one.person),
  );
  const found = given.flatMap((one) =>
    conflictsOfSeat(one.person, one.role, { seats, roles, names, lookedFirst }),
  );
  if (found.length === 0) return ok(null);
  const errors = found.map((one) => ({
    path: `seats/${one.role}`,
    code: 'not-independent',
    sentence: one.sentence,
  }));
  return fail('NOT_INDEPENDENT', found[0]?.sentence ?? 'These people are not independent.', { errors });
}

/** Fills the seats of the roles named; who held one of them and is not named again leaves it. */
export async function nominate(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Write<ActBody<'nominate'>>,
): Promise<Result<Nominated>> {
  const before = sent.once.ok ? await answeredBefore<Nominated>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = can(whoOf(actor), 'nominate', onFile(file));
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.version.ok) return sent.version;
  if (!sent.once.ok) return sent.once;
  if (file.row.version !== sent.version.value) return stale(`Case ${number}`, file.row.version);
  const { given, taken } = plan(file, sent.body.value.seats);
  const free = await conflicts(ctx, file, given, taken);
  if (!free.ok) return free;
  const at = instant(ctx);
  return inOneAct(ctx, actor, sent.once.value, async (trx) => {
    for (const seat of taken) await endSeat(trx, seat.id, at);
    for (const one of given)
      await takeSeat(trx, { caseId: file.row.id, role: one.role, personId: one.person, fromAt: at });
    if (!(await updateCase(trx, file.row.id, file.row.version, {})))
      return stale(`Case ${number}`, file.row.version + 1);
    await appendTrail(trx, {
      siteId: file.site.id,
      at,
      act: 'seats.nominated',
      byId: actor.person.id,
      seat: 'originator',
      caseId: file.row.id,
      subject: `cases/${number}`,
      body: {
        changes: [
          ...taken.map((one) => ({ path: `seats/${one.role}`, old: one.personId })),
          ...given.map((one) => ({ path: `seats/${one.role}`, new: one.person })),
        ],
      },
      hides: false,
    });
    const seats = await seatRows(trx, file.row.id);
    const told = (await noticeSeats(trx, seats)).filter((seat) =>
      given.some((one) => one.role === seat.role && one.person === seat.person.id),
    );
    if (told.length > 0) await notify(trx, ctx, actor, file, { event: 'case.nominated', seats: told }, seats);
    return ok({ number, version: file.row.version + 1 });
  });
}
