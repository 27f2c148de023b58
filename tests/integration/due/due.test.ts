/* Due items by their services: a note to oneself, what an approver asks for, and every turn with who may and may not. */
import { beforeAll, expect, test } from 'vitest';
import { dueEvents, findDue } from '@data/due';
import { askDue } from '@services/due/ask';
import { turnDue } from '@services/due/turn';
import { codeOf, fileOf, plant, type Plant, sent, value } from '../stage/plant';
import { atApproval, impeller, TEAM } from '../stage/hands';

let site: Plant;
let number: string;
beforeAll(async () => {
  site = await plant();
  number = await atApproval(site, TEAM, impeller(204));
}, 120_000);

const ask = (by: string, more: object = {}) =>
  askDue(
    site.ctx,
    site.who(by),
    sent({ kind: 'own-note' as const, text: 'Look at the curve again.', due: '2030-01-31', ...more }),
  );
const turn = async (by: string, id: string, name: 'do' | 'accept' | 'reject' | 'waive', version?: number) =>
  turnDue(
    site.ctx,
    site.who(by),
    { id, turn: name },
    sent(
      { text: 'Done.', reason: 'Not needed any more.' },
      version ?? (await findDue(site.db, id))?.version ?? 0,
    ),
  );

test('a note is for oneself alone, and not for the auditor', async () => {
  const { id } = value(await ask('Owen'));
  expect(await findDue(site.db, id)).toMatchObject({ kind: 'own-note', state: 'open', caseId: null });
  expect(codeOf(await ask('Owen', { owner: site.who('Ilse').person.id }))).toBe('SCHEMA');
  expect(codeOf(await ask('Owen', { kind: 'pssr' }))).toBe('SCHEMA');
  expect(codeOf(await ask('Aoife'))).toBe('NOT_PERMITTED');
  expect(codeOf(await turn('Ilse', id, 'do'))).toBe('NOT_INDEPENDENT');
  expect(value(await turn('Owen', id, 'do')).state).toBe('done');
});

test('an approver asks in the case; the owner does it; the asker rejects once and then accepts', async () => {
  const more = { kind: 'start-up', case: number, owner: site.who('Tomas').person.id, bars: 'start-up' };
  expect(codeOf(await ask('Owen', more))).toBe('NOT_PERMITTED');
  expect(codeOf(await ask('Rufus', more))).toBe('NOT_PERMITTED');
  const { id } = value(await ask('Grace', more));
  expect((await fileOf(site, number)).due.map((item) => item.id)).toContain(id);
  expect(codeOf(await turn('Grace', id, 'accept'))).toBe('WRONG_STAGE');
  value(await turn('Tomas', id, 'do'));
  expect(codeOf(await turn('Tomas', id, 'accept'))).toBe('NOT_INDEPENDENT');
  expect(codeOf(await turn('Rufus', id, 'accept'))).toBe('NOT_INDEPENDENT');
  expect(value(await turn('Grace', id, 'reject')).state).toBe('open');
  value(await turn('Tomas', id, 'do'));
  expect(value(await turn('Grace', id, 'accept')).state).toBe('accepted');
  expect((await dueEvents(site.db, id)).map((event) => event.event)).toEqual([
    'do',
    'reject',
    'do',
    'accept',
  ]);
});

test('only an approver waives, never the owner nor who made or checked the case', async () => {
  const more = { kind: 'approval-requirement', case: number, owner: site.who('Tomas').person.id };
  const { id } = value(await ask('Grace', more));
  expect(codeOf(await turn('Tomas', id, 'waive'))).toBe('NOT_PERMITTED');
  expect(codeOf(await turn('Owen', id, 'waive'))).toBe('NOT_PERMITTED');
  expect(codeOf(await turn('Rufus', id, 'waive', 7))).toBe('STALE');
  expect(value(await turn('Rufus', id, 'waive')).state).toBe('waived');
  expect(codeOf(await turn('Tomas', id, 'do'))).toBe('WRONG_STAGE');
  expect(codeOf(await turn('Rufus', 'due_nowhere', 'waive'))).toBe('UNKNOWN');
});
