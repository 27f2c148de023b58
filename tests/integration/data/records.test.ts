/* The records of a case and of the field: what is added once stands, what is replaced is replaced by rows of its own. */
import { expect, test } from 'vitest';
import * as check from '@data/check';
import * as devices from '@data/devices';
import * as due from '@data/due';
import * as field from '@data/field';
import * as files from '@data/files';
import * as findings from '@data/findings';
import { newId } from '@data/ids';
import * as people from '@data/people';
import { findByFormerTag, findDocument, updateDocument } from '@data/documents';
import { smallWorld } from '../../support/database';
import { addCase, addSystem } from '../../support/records';

const at = '2026-03-16T08:00:00.000Z';
const text = { type: 'doc' as const, content: [] };

async function oneCase() {
  const world = await smallWorld();
  return { world, caseId: await addCase(world, 'KW-2026-001'), documentId: await addSystem(world, 'SYS-101') };
}

test('an agreement stands until a row undoes it, and may be given again', async () => {
  const { world, caseId, documentId } = await oneCase();
  const { db, people: who } = world;
  const agreement = { caseId, documentId, sheetKey: 'size:fire/ans_1', sheetHash: 'h', personId: who.checker, at };
  await check.addAgreement(db, agreement);
  const [stands] = await check.agreementsOf(db, caseId);
  await check.undoAgreement(db, stands!, who.checker, at);
  expect(await check.agreementsOf(db, caseId)).toEqual([]);
  await expect(check.undoAgreement(db, stands!, who.checker, at)).rejects.toThrow(/UNIQUE/);
  await check.addAgreement(db, agreement);
  expect(await check.agreementsOf(db, caseId)).toHaveLength(1);
  expect(await check.agreementRecord(db, caseId)).toHaveLength(3);
});

test('an unseen entry keeps its comparison and how the difference was reconciled; only a first look counts', async () => {
  const { world, caseId, documentId } = await oneCase();
  const { db, people: who } = world;
  const id = newId('unseen');
  const entry = { id, caseId, documentId, scope: 'reliefPoints/rp_1', layer: 'reading' as const, quantity: 'set', round: 1 };
  await check.addUnseen(db, [{ ...entry, value: { value: 12, unit: 'bar_g' }, byId: who.checker, at }]);
  const reveal = { id: newId('reveal'), caseId, documentId, personId: who.checker, round: 1, sheets: {}, at };
  const against = { value: 12.5, unit: 'bar_g' };
  await check.addReveal(db, reveal, [{ entryId: id, against, deviation: 0.04, within: false }]);
  await check.addReconciliation(db, { entryId: id, byId: who.checker, at, text });
  const [kept] = await check.unseenOf(db, caseId);
  expect(kept).toMatchObject({ value: { value: 12 }, comparison: { against, within: false } });
  expect(kept?.reconciliations).toHaveLength(1);
  const view = { personId: who.checker, caseId, documentId, what: 'results' };
  await check.noteView(db, { ...view, at });
  await check.noteView(db, { ...view, at: '2027-01-01T00:00:00.000Z' });
  expect(await check.viewsOf(db, who.checker, [documentId])).toMatchObject([{ at }]);
});

test('findings are numbered within a case and keep their thread', async () => {
  const { world, caseId } = await oneCase();
  const { db, people: who } = world;
  const post = { byId: who.checker, at, text };
  const finding = { caseId, weight: 'must-fix' as const, place: 'fluids/f_1/M', state: 'open' as const, raisedAt: at };
  const id = newId('finding');
  expect(await findings.raiseFinding(db, { ...finding, id, raisedBy: who.checker }, post)).toBe(1);
  expect(await findings.raiseFinding(db, { ...finding, id: newId('finding'), raisedBy: who.checker }, post)).toBe(2);
  await findings.addPost(db, id, { ...post, byId: who.originator, changePath: 'fluids/f_1/M' });
  expect(await findings.updateFinding(db, id, 1, { state: 'answered' })).toBe(true);
  expect((await findings.findFinding(db, caseId, 1))?.posts.map((one) => one.byId)).toEqual([who.checker, who.originator]);
  expect((await findings.findingsOf(db, caseId)).map(({ state }) => state)).toEqual(['answered', 'open']);
});

test('a due item moves with an event, at the version that was read', async () => {
  const { world, caseId } = await oneCase();
  const { db, siteId, people: who } = world;
  const id = newId('due');
  const item = { id, siteId, caseId, kind: 'pssr' as const, text: 'Walk the line', ownerId: who.operations, due: '2026-03-20' };
  await due.addDue(db, { ...item, state: 'open', askedBy: who.approver, askedAt: at });
  const event = { at, byId: who.operations, event: 'due.done' };
  expect(await due.moveDue(db, id, 1, { state: 'done', evidence: { text: 'Walked' } }, event)).toBe(true);
  expect(await due.moveDue(db, id, 1, { state: 'done' }, event)).toBe(false);
  expect(await due.dueEvents(db, id)).toHaveLength(1);
  expect(await due.listDue(db, { ownerId: who.operations, states: ['done'], until: '2026-03-20' })).toHaveLength(1);
  expect(await due.listDue(db, { ownerId: who.operations, until: '2026-03-19' })).toEqual([]);
});

test('a field entry sent twice is stored once; lines are made anew, entries stay', async () => {
  const { world, caseId, documentId } = await oneCase();
  const { db, people: who } = world;
  const line = { key: 'reliefPoints/rp_1/set', ord: 1, grouped: 'PSV-1', label: 'Set', photo: false, holds: true, facts: {} };
  await field.replaceLines(db, caseId, documentId, [{ ...line, wants: { value: 12, unit: 'bar_g' } }]);
  const entry = {
    ...{ id: newId('fieldEntry'), clientId: 'phone-1', caseId, documentId, line: line.key, asWhat: 'verifier' as const },
    ...{ seen: { value: 11.8, unit: 'bar_g' }, files: [], byId: who.operations, saw: at, got: at, device: 'phone', agrees: false },
  };
  expect(await field.addEntry(db, entry)).toMatchObject({ fresh: true, entry: { agrees: false } });
  const again = await field.addEntry(db, { ...entry, id: newId('fieldEntry') });
  expect(again).toMatchObject({ fresh: false, entry: { id: entry.id } });
  const discrepancy = { id: newId('discrepancy'), caseId, documentId, entryId: entry.id, holds: true, state: 'open' as const };
  expect(await field.addDiscrepancy(db, { ...discrepancy, ownerId: who.operations, clears: 'Reset it.' })).toBe(1);
  await field.replaceLines(db, caseId, documentId, [{ ...line, wants: null }]);
  expect(await field.linesOf(db, caseId)).toMatchObject([{ wants: null, holds: true }]);
  expect(await field.entriesOf(db, caseId)).toHaveLength(1);
  expect(await field.discrepanciesOf(db, caseId)).toMatchObject([{ number: 1, posts: [] }]);
});

test('a device sits where it was last known to sit', async () => {
  const { world, documentId } = await oneCase();
  const { db, siteId } = world;
  for (const serial of ['A', 'B']) await devices.addDevice(db, { id: `fd_${serial}`, siteId, serial, plate: {} });
  const place = { documentId, point: 'rp_1' };
  await devices.addPlace(db, { ...place, deviceId: 'fd_A', fromDay: '2020-01-01', knownAt: at });
  await devices.addTest(db, { deviceId: 'fd_A', onDay: '2020-01-01', body: {} });
  await devices.addTest(db, { deviceId: 'fd_A', onDay: '2024-01-01', body: { shop: 'Own shop' } });
  expect(await devices.fittedAt(db, [documentId])).toMatchObject([{ device: { serial: 'A' }, lastTest: { onDay: '2024-01-01' } }]);
  const later = '2026-03-17T08:00:00.000Z';
  await devices.addPlace(db, { ...place, deviceId: 'fd_A', fromDay: '2020-01-01', toDay: '2026-03-17', knownAt: later });
  await devices.addPlace(db, { ...place, deviceId: 'fd_B', fromDay: '2026-03-17', knownAt: later });
  expect(await devices.fittedAt(db, [documentId])).toMatchObject([{ device: { serial: 'B' }, lastTest: null }]);
  expect(await devices.placesOf(db, 'fd_A')).toMatchObject([{ toDay: '2026-03-17' }]);
});

test('the same bytes are one file; what is attached is not swept', async () => {
  const { db, siteId, people: who } = await smallWorld();
  const file = { siteId, sha256: 'abc', bytes: 3, type: 'image/png', name: 'plate.png', state: 'held' as const, at };
  const first = await files.noteFile(db, { id: newId('file'), ...file });
  expect(await files.noteFile(db, { id: newId('file'), ...file })).toEqual(first);
  expect(await files.unreferredFiles(db, '2027')).toHaveLength(1);
  const attachment = { id: newId('attachment'), fileId: first!.id, ofId: 'fe_1', shows: 'evidence' as const };
  await files.attach(db, { ...attachment, byId: who.operations, at });
  expect(await files.unreferredFiles(db, '2027')).toEqual([]);
  expect(await files.attachmentsOf(db, 'fe_1')).toHaveLength(1);
});

test('a role ends and stays in the record; someone stands in on the days given', async () => {
  const { db, siteId, people: who } = await smallWorld();
  const grant = { personId: who.checker, siteId, role: 'checker' as const };
  await people.grantRole(db, { ...grant, fromDay: '2026-01-01', grantedBy: null });
  expect(await people.rolesOf(db, who.checker)).toHaveLength(1);
  expect((await people.peopleWithRole(db, siteId, 'checker')).map(({ id }) => id)).toEqual([who.checker]);
  await people.endRole(db, who.checker, siteId, 'checker', '2026-03-16');
  expect(await people.rolesOf(db, who.checker)).toEqual([]);
  expect(await people.roleHistory(db, who.checker)).toMatchObject([{ toDay: '2026-03-16' }]);
  expect(await people.peopleOfSite(db, siteId)).toHaveLength(4);
  const days = { fromDay: '2026-03-01', toDay: '2026-03-31' };
  await people.addDelegation(db, { fromId: who.approver, toId: who.operations, role: 'approver', siteId, ...days });
  expect(await people.standsInFor(db, who.operations, '2026-03-31')).toHaveLength(1);
  expect(await people.standsInFor(db, who.operations, '2026-04-01')).toEqual([]);
});

test('a system that was renamed is found by its former tag', async () => {
  const { world, documentId } = await oneCase();
  const { db, siteId } = world;
  const before = (await findDocument(db, documentId))!;
  expect(await updateDocument(db, before, { tag: 'SYS-111' })).toBe(true);
  expect(await updateDocument(db, before, { tag: 'SYS-112' })).toBe(false);
  expect(await findByFormerTag(db, siteId, 'system', 'SYS-101')).toMatchObject({ id: documentId, tag: 'SYS-111' });
  expect(await updateDocument(db, (await findDocument(db, documentId))!, { tag: 'SYS-101' })).toBe(true);
  expect(await findByFormerTag(db, siteId, 'system', 'SYS-101')).toBeUndefined();
});
