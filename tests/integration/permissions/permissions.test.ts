/* The table of permissions against the real services: every act that can be asked for × 6 roles × 5 seats × 11 stages; and every endpoint is in it. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { beforeAll, describe, expect, test } from 'vitest';
import { type Role } from '@domain/case';
import { DEFAULT_RULES } from '@domain/rules';
import { type Auth, openAuth } from '@auth/index';
import { addDue } from '@data/due';
import { raiseFinding } from '@data/findings';
import { newId, nowInstant } from '@data/ids';
import { createRules, findSite } from '@data/site';
import { type Actor, type Ctx } from '@services/context';
import { STAGE_ACTS } from '@services/stage/types';
import { smallWorld, type World } from '../../support/database';
import { expectedAnswer, permissionTable, ROLES, SEATS, STAGES } from '../../support/permissions-table';
import { addCase } from '../../support/records';
import { BY_NAME, ENDPOINTS, OPEN } from './endpoints';
import { PROBES } from './probes';

const NUMBER = 'KW-2026-001';
const LINES = permissionTable();
const PROBED = LINES.filter((line) => Object.hasOwn(PROBES, line.act));
/** Refusals of permission; any other answer means that permission was passed. */
const DENIALS = ['NOT_PERMITTED', 'NOT_INDEPENDENT', 'HIDDEN', 'WRONG_STAGE'];

let world: World;
let ctx: Ctx;
let auth: Auth;
let actor: Omit<Actor, 'roles'>;
let caseId: string;
const due: Record<string, string> = {};

/** One item for each turn, with owner and asker as the turn needs them: nothing but role and seat can then forbid it. */
async function addDueItems(me: string, someone: string): Promise<void> {
  for (const turn of ['do', 'accept', 'reject', 'waive']) {
    due[turn] = newId('due');
    await addDue(world.db, {
      ...{ id: due[turn], siteId: world.siteId, kind: 'start-up', caseId, text: 'Close the drain.' },
      ...{ ownerId: turn === 'do' ? me : someone, askedBy: turn === 'do' ? someone : me },
      ...{ due: '2030-01-01', state: 'open', askedAt: nowInstant() },
    });
  }
}

beforeAll(async () => {
  world = await smallWorld();
  const { db, siteId, people } = world;
  const me = people.approver;
  caseId = await addCase(world, NUMBER);
  await createRules(db, {
    ...{ id: newId('siteRules'), siteId, number: 1, state: 'in-effect', body: DEFAULT_RULES },
    ...{ judgementHash: 'j', fromDay: '2026-01-01', draftedBy: me },
  });
  await db('seats').insert({
    ...{ id: newId('seat'), case_id: caseId, role: 'originator', person_id: me },
    from_at: nowInstant(),
  });
  await addDueItems(me, people.checker);
  const text = { type: 'doc' as const, content: [] };
  const raised = { weight: 'remark' as const, place: 'brief', state: 'open' as const, raisedBy: me };
  await raiseFinding(
    db,
    { id: newId('finding'), caseId, ...raised, raisedAt: nowInstant(), successorId: null },
    { byId: me, at: nowInstant(), text, changePath: null },
  );
  const site = await findSite(db, siteId);
  if (!site) throw new Error('the small world has no site');
  ctx = { db, now: () => new Date(), baseUrl: 'http://localhost' };
  auth = openAuth(db, { secure: false });
  actor = { person: { id: me, name: 'The approver', email: 'a@ketterwold.example' }, site, standsFor: [] };
}, 60_000);

async function stand(seat: keyof typeof SEATS, stage: keyof typeof STAGES): Promise<void> {
  const held = SEATS[seat];
  const until = held === undefined ? nowInstant() : null;
  // An ended seat of an originator still forbids to judge: "none" is an ended seat of another kind.
  await world
    .db('seats')
    .where({ case_id: caseId })
    .update({ role: held ?? 'operations', until_at: until });
  const heldFrom = stage === 'H' ? 'scenarios' : null;
  await world.db('cases').where({ id: caseId }).update({ stage: STAGES[stage], held_from: heldFrom });
}

async function answerOf(act: string, role: Role): Promise<string> {
  const probe = PROBES[act];
  if (!probe) throw new Error(`no probe for ${act}`);
  const result = await probe({
    ...{ ctx, auth, number: NUMBER },
    actor: { ...actor, roles: [role] },
    dueOf: (turn) => due[turn] ?? '',
  });
  if (result.ok || !DENIALS.includes(result.problem.code)) return 'ok';
  return result.problem.code;
}

/** All answers of one seat and stage that are not the table's. */
async function wrongAt(seat: keyof typeof SEATS, stage: keyof typeof STAGES): Promise<string[]> {
  const wrong: string[] = [];
  for (const line of PROBED)
    for (const [letter, role] of Object.entries(ROLES)) {
      const got = await answerOf(line.act, role);
      const wanted = expectedAnswer(line, letter, seat, stage);
      if (got !== wanted) wrong.push(`${line.act} by ${letter}${seat} at ${stage}: ${got}, not ${wanted}`);
    }
  return wrong;
}

describe('every act that can be asked for answers as the table says', () => {
  const seats = Object.keys(SEATS) as (keyof typeof SEATS)[];
  const stages = Object.keys(STAGES) as (keyof typeof STAGES)[];
  test.each(seats.flatMap((seat) => stages.map((stage) => [seat, stage] as const)))(
    'in seat %s at stage %s',
    async (seat, stage) => {
      await stand(seat, stage);
      expect(await wrongAt(seat, stage)).toEqual([]);
    },
    30_000,
  );

  test('nothing was written by asking', async () => {
    const [trail] = (await world.db('trail').count('* as n')) as [{ n: number }];
    expect(trail.n).toBe(0);
  });
});

const API = fileURLToPath(new URL('../../../src/pages/api/v1', import.meta.url));

function endpointFiles(): string[] {
  return readdirSync(API, { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.ts'));
}

function methodsOf(file: string): string[] {
  const text = readFileSync(join(API, file), 'utf8');
  return [...text.matchAll(/export const (GET|POST|PUT|PATCH|DELETE|ALL)\b/g)].map((found) => found[1] ?? '');
}

describe('every endpoint is in the table', () => {
  test.each(endpointFiles().map((file) => [file.replaceAll('\\', '/').replace(/\.ts$/, ''), file]))(
    '%s',
    (name, file) => {
      const known = ENDPOINTS[name];
      expect(known, `add ${name} to tests/integration/permissions/endpoints.ts`).toBeDefined();
      expect(methodsOf(file).sort()).toEqual(Object.keys(known ?? {}).sort());
    },
  );

  test('with acts that the table has, each of which is tried above or is open to everyone signed in', () => {
    const guards = Object.values(ENDPOINTS).flatMap((methods) => Object.values(methods).flat());
    const acts = guards.flatMap((guard) => (guard === BY_NAME ? [...STAGE_ACTS] : guard));
    const own = ['session', 'password', 'read-trail-of-case', OPEN];
    for (const act of acts) {
      if (act !== OPEN) expect(LINES.map((line) => line.act)).toContain(act);
      if (!own.includes(act)) expect(Object.keys(PROBES)).toContain(act);
    }
    expect(Object.keys(PROBES).every((act) => acts.includes(act))).toBe(true);
  });
});
