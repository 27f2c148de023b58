/* Adding people: who may, what is written, who is invited, what is refused. */
import { beforeEach, describe, expect, test } from 'vitest';
import * as auth from '@auth/index';
import { findPersonByEmail, rolesOf, updatePerson } from '@data/people';
import { createSite } from '@data/site';
import { newId, nowInstant } from '@data/ids';
import { readTrail, verifyTrail } from '@data/trail';
import { acceptInvitation } from '@services/administer/account';
import { addPerson } from '@services/administer/add-person';
import { addPersonSchema, type AddPerson } from '@services/administer/bodies';
import { inviteAgain } from '@services/administer/invite';
import { type Actor, type Ctx } from '@services/context';
import { actorOf, addPersonWith, ctxOfWorld, sentWith } from '../../support/actors';
import { smallWorld, type World } from '../../support/database';

const BODY: AddPerson = {
  name: 'Wenke Oduya',
  email: 'Wenke@ketterwold.example',
  job: 'Process engineer',
  phone: null,
  deputy: null,
  roles: ['originator', 'checker'],
};
const PASSWORD = 'brick over slow water';
const FROM = { ip: '10.0.0.9', agent: 'Test browser' };
let world: World;
let ctx: Ctx;
let coordinator: Actor;

beforeEach(async () => {
  world = await smallWorld();
  ctx = ctxOfWorld(world);
  coordinator = await actorOf(world, await addPersonWith(world, 'The coordinator', ['coordinator']), [
    'coordinator',
  ]);
});

async function letters(): Promise<{ to_id: string; body: string }[]> {
  return world.db('notices').where({ event: 'person.invited' }).orderBy('id');
}
const tokenIn = (body: string) => /\/invite\/([\w-]+)/.exec(body)?.[1] ?? '';

describe('adding a person', () => {
  test('writes record, roles, trail and invitation in one act', async () => {
    const added = await addPerson(ctx, coordinator, sentWith(BODY));
    expect(added).toMatchObject({ ok: true, value: { name: 'Wenke Oduya', version: 1, invited: true } });
    const person = await findPersonByEmail(world.db, 'wenke@ketterwold.example');
    expect(person).toMatchObject({ job: 'Process engineer', passwordHash: null, retiredAt: null });
    expect((await rolesOf(world.db, person!.id)).map((one) => one.role)).toEqual(['originator', 'checker']);
    const [entry] = await readTrail(world.db, world.siteId, { subject: person!.id });
    expect(entry).toMatchObject({ act: 'person.added', byId: coordinator.person.id });
    expect(entry!.body.changes).toContainEqual({ path: 'roles', new: ['originator', 'checker'] });
    expect((await verifyTrail(world.db, world.siteId)).ok).toBe(true);
    const [letter] = await letters();
    expect(letter).toMatchObject({ to_id: person!.id });
    expect(letter!.body).toContain('https://setwright.example/invite/');
  });

  test('invites by a link that works once and is kept nowhere but in the mail', async () => {
    await addPerson(ctx, coordinator, sentWith(BODY));
    const token = tokenIn((await letters())[0]!.body);
    for (const table of ['tokens', 'idempotency', 'trail'])
      expect(JSON.stringify(await world.db(table))).not.toContain(token);
    const signIn = auth.openAuth(world.db, { secure: false });
    expect(await acceptInvitation(signIn, { token, password: 'short' }, FROM)).toMatchObject({
      problem: { code: 'SCHEMA', errors: [{ path: 'password', code: 'too_short' }] },
    });
    expect(await acceptInvitation(signIn, { token, password: PASSWORD }, FROM)).toMatchObject({
      ok: true,
      value: { person: { name: 'Wenke Oduya' } },
    });
    expect(await acceptInvitation(signIn, { token, password: PASSWORD }, FROM)).toMatchObject({
      problem: { code: 'UNKNOWN' },
    });
    expect((await auth.signIn(signIn, 'wenke@ketterwold.example', PASSWORD, FROM)).ok).toBe(true);
  });

  test('a second invitation ends the first; none goes to someone who has a password', async () => {
    const added = await addPerson(ctx, coordinator, sentWith(BODY));
    const id = added.ok ? added.value.id : '';
    expect((await inviteAgain(ctx, coordinator, id, sentWith({}))).ok).toBe(true);
    const [first, second] = (await letters()).map((letter) => tokenIn(letter.body));
    const signIn = auth.openAuth(world.db, { secure: false });
    const accept = (token = '') => acceptInvitation(signIn, { token, password: PASSWORD }, FROM);
    expect(await accept(first)).toMatchObject({ problem: { code: 'UNKNOWN' } });
    expect((await accept(second)).ok).toBe(true);
    expect(await inviteAgain(ctx, coordinator, id, sentWith({}))).toMatchObject({
      problem: { code: 'SCHEMA' },
    });
    expect(await letters()).toHaveLength(2);
  });

  test('sent twice with one key adds once and answers the same', async () => {
    const sent = sentWith(BODY);
    const first = await addPerson(ctx, coordinator, sent);
    expect(await addPerson(ctx, coordinator, sent)).toEqual(first);
    expect(await letters()).toHaveLength(1);
    const other = {
      ...sent,
      once: { ok: true as const, value: { ...(sent.once.ok ? sent.once.value : never()), bodyHash: 'x' } },
    };
    expect(await addPerson(ctx, coordinator, other)).toMatchObject({ problem: { code: 'KEY_REUSED' } });
  });
});

function never(): never {
  throw new Error('The key is given.');
}

describe('an e-mail that is known', () => {
  test('at this site is refused beside the field and nothing is written', async () => {
    const before = await readTrail(world.db, world.siteId);
    const known = { ...BODY, email: 'checker@ketterwold.example' };
    expect(await addPerson(ctx, coordinator, sentWith(known))).toMatchObject({
      problem: { code: 'SCHEMA', errors: [{ path: 'email' }] },
    });
    expect(await readTrail(world.db, world.siteId)).toEqual(before);
  });

  test('from another site joins with the same record; with a password there is no invitation', async () => {
    const other = newId('site');
    const barometer = { value: 1.0, unit: 'bar_abs' };
    await createSite(world.db, {
      id: other,
      slug: 'elsewhere',
      name: 'Elsewhere',
      timeZone: 'UTC',
      barometer,
      facts: {},
    });
    const id = await addPersonWith({ ...world, siteId: other }, 'Far Away', ['checker']);
    await updatePerson(world.db, id, 1, { passwordHash: 'set' });
    const body = { ...BODY, email: 'far.away@ketterwold.example' };
    expect(await addPerson(ctx, coordinator, sentWith(body))).toMatchObject({
      value: { id, name: 'Far Away', invited: false },
    });
    expect(await letters()).toHaveLength(0);
    expect((await rolesOf(world.db, id)).filter((one) => one.siteId === world.siteId)).toHaveLength(2);
  });

  test('one’s own gives no role to oneself', async () => {
    const body = { ...BODY, email: coordinator.person.email };
    expect(await addPerson(ctx, coordinator, sentWith(body))).toMatchObject({
      problem: { code: 'NOT_INDEPENDENT' },
    });
  });

  test('of a deactivated person is refused', async () => {
    await world.db('people').where({ id: world.people.checker }).update({ retired_at: nowInstant() });
    const body = { ...BODY, email: 'checker@ketterwold.example' };
    expect(await addPerson(ctx, coordinator, sentWith(body))).toMatchObject({ problem: { code: 'SCHEMA' } });
  });
});

describe('what is refused', () => {
  test.each(['originator', 'checker', 'approver', 'operations'] as const)('%s adds nobody', async (role) => {
    const actor = await actorOf(world, world.people[role], [role]);
    const bad = {
      ...sentWith(BODY),
      once: { ok: false as const, problem: { code: 'KEY_MISSING' as const, detail: '' } },
    };
    expect(await addPerson(ctx, actor, bad)).toMatchObject({ problem: { code: 'NOT_PERMITTED' } });
  });

  test('a deputy from nowhere is told beside its field', async () => {
    expect(await addPerson(ctx, coordinator, sentWith({ ...BODY, deputy: 'per_nobody' }))).toMatchObject({
      problem: { code: 'SCHEMA', errors: [{ path: 'deputy' }] },
    });
    expect(await findPersonByEmail(world.db, BODY.email)).toBeUndefined();
  });

  test.each([
    ['no name', { ...BODY, name: '  ' }, 'name'],
    ['an oversize name', { ...BODY, name: 'n'.repeat(121) }, 'name'],
    ['no e-mail', { ...BODY, email: 'nobody' }, 'email'],
    ['a mail header', { ...BODY, email: 'a@b.example\nBcc: c@d.example' }, 'email'],
    ['no role', { ...BODY, roles: [] }, 'roles'],
    ['an unknown role', { ...BODY, roles: ['king'] }, 'roles.0'],
  ])('%s', (_what, body, path) => {
    const parsed = addPersonSchema.safeParse(body);
    expect(parsed.error?.issues[0]?.path.join('.')).toBe(path);
    expect(parsed.error?.issues[0]?.message).toMatch(/\.$/);
  });
});
