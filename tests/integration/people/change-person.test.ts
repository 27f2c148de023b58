/* Changing people: record, roles, leaving and coming back, each at its version and by who may. */
import { beforeEach, describe, expect, test } from 'vitest';
import * as auth from '@auth/index';
import { newId } from '@data/ids';
import { findPerson, grantRole, roleHistory, rolesOf } from '@data/people';
import { createSite } from '@data/site';
import { readTrail } from '@data/trail';
import { changePerson, setRoles } from '@services/administer/change-person';
import { deactivatePerson, reactivatePerson } from '@services/administer/leave';
import { peopleView, personView } from '@services/administer/views';
import { type Actor, type Ctx } from '@services/context';
import { actorOf, addPersonWith, ctxOfWorld, sentWith } from '../../support/actors';
import { smallWorld, type World } from '../../support/database';

let world: World;
let ctx: Ctx;
let coordinator: Actor;
let checker: string;

beforeEach(async () => {
  world = await smallWorld();
  ctx = ctxOfWorld(world);
  coordinator = await actorOf(world, await addPersonWith(world, 'The coordinator', ['coordinator']), [
    'coordinator',
  ]);
  checker = world.people.checker;
});

const actsOn = async (subject: string) =>
  (await readTrail(world.db, world.siteId, { subject })).map((entry) => entry.act);

async function elsewhere(): Promise<string> {
  const id = newId('site');
  const barometer = { value: 1.0, unit: 'bar_abs' };
  await createSite(world.db, {
    id,
    slug: 'elsewhere',
    name: 'Elsewhere',
    timeZone: 'UTC',
    barometer,
    facts: {},
  });
  return id;
}

describe('the record', () => {
  test('is changed at the version that was read, with old and new in the trail', async () => {
    const result = await changePerson(ctx, coordinator, checker, sentWith({ job: 'Process safety' }, 1));
    expect(result).toEqual({ ok: true, value: { id: checker, name: 'The checker', version: 2 } });
    expect(await findPerson(world.db, checker)).toMatchObject({ job: 'Process safety', version: 2 });
    const [entry] = await readTrail(world.db, world.siteId, { subject: checker });
    expect(entry).toMatchObject({
      act: 'person.changed',
      body: { changes: [{ path: 'job', old: null, new: 'Process safety' }] },
    });
  });

  test('on an older version is refused with what stands now, and a missing version is asked for', async () => {
    await changePerson(ctx, coordinator, checker, sentWith({ job: 'Process safety' }, 1));
    expect(
      await changePerson(ctx, coordinator, checker, sentWith({ job: 'Something else' }, 1)),
    ).toMatchObject({
      problem: { code: 'STALE', present: { version: 2, job: 'Process safety' } },
    });
    expect(await changePerson(ctx, coordinator, checker, sentWith({ job: 'x' }))).toMatchObject({
      problem: { code: 'VERSION_MISSING' },
    });
    expect((await findPerson(world.db, checker))!.job).toBe('Process safety');
  });

  test('that stays the same writes nothing', async () => {
    expect(await changePerson(ctx, coordinator, checker, sentWith({ name: 'The checker' }, 1))).toMatchObject(
      { value: { version: 1 } },
    );
    expect(await actsOn(checker)).toEqual([]);
  });

  test('of someone who is nobody here is unknown', async () => {
    const away = await addPersonWith({ ...world, siteId: await elsewhere() }, 'Far Away', ['checker']);
    for (const id of [away, 'per_nobody'])
      expect(await changePerson(ctx, coordinator, id, sentWith({ job: 'x' }, 1))).toMatchObject({
        problem: { code: 'UNKNOWN' },
      });
  });

  test('of someone who also has roles elsewhere is that site’s too; their roles here are not', async () => {
    const site = await elsewhere();
    await grantRole(world.db, {
      personId: checker,
      siteId: site,
      role: 'checker',
      fromDay: '2026-01-01',
      grantedBy: null,
    });
    expect(await changePerson(ctx, coordinator, checker, sentWith({ job: 'x' }, 1))).toMatchObject({
      problem: { code: 'NOT_PERMITTED' },
    });
    expect(await deactivatePerson(ctx, coordinator, checker, sentWith({}, 1))).toMatchObject({
      problem: { code: 'NOT_PERMITTED' },
    });
    expect((await setRoles(ctx, coordinator, checker, sentWith({ roles: [] }, 1))).ok).toBe(true);
    expect(await rolesOf(world.db, checker)).toEqual([{ siteId: site, role: 'checker' }]);
    await grantRole(world.db, {
      personId: coordinator.person.id,
      siteId: site,
      role: 'coordinator',
      fromDay: '2026-01-01',
      grantedBy: null,
    });
    expect((await changePerson(ctx, coordinator, checker, sentWith({ job: 'x' }, 2))).ok).toBe(true);
  });
});

describe('roles', () => {
  test('are given and ended, one entry each; an ended one stays in the record', async () => {
    expect(
      await setRoles(ctx, coordinator, checker, sentWith({ roles: ['approver', 'auditor'] }, 1)),
    ).toMatchObject({ value: { version: 2 } });
    expect((await rolesOf(world.db, checker)).map((one) => one.role).sort()).toEqual(['approver', 'auditor']);
    expect((await roleHistory(world.db, checker)).find((one) => one.role === 'checker')?.toDay).toMatch(
      /^\d{4}-/,
    );
    expect((await actsOn(checker)).sort()).toEqual(['role.ended', 'role.granted', 'role.granted']);
    expect(await setRoles(ctx, coordinator, checker, sentWith({ roles: [] }, 1))).toMatchObject({
      problem: { code: 'STALE' },
    });
  });

  test('of oneself are never set, not even by a coordinator', async () => {
    const own = await setRoles(
      ctx,
      coordinator,
      coordinator.person.id,
      sentWith({ roles: ['coordinator', 'approver'] }, 1),
    );
    expect(own).toMatchObject({ problem: { code: 'NOT_INDEPENDENT' } });
    expect(await actsOn(coordinator.person.id)).toEqual([]);
  });
});

describe('leaving', () => {
  test('ends the sessions at once and keeps the history; coming back gives the roles back', async () => {
    const signIn = auth.openAuth(world.db, { secure: false });
    const person = (await findPerson(world.db, checker))!;
    const { cookie } = await auth.openSession(signIn, person, 'Test browser');
    expect(await auth.whoAsks(signIn, cookie)).not.toBeNull();
    expect(await deactivatePerson(ctx, coordinator, checker, sentWith({}, 1))).toMatchObject({
      value: { version: 2 },
    });
    expect(await auth.whoAsks(signIn, cookie)).toBeNull();
    expect((await roleHistory(world.db, checker)).map((one) => one.role)).toEqual(['checker']);
    const list = await peopleView(ctx, coordinator);
    expect(list.ok && list.value.people.at(-1)).toMatchObject({
      name: 'The checker',
      active: false,
      roles: ['checker'],
    });
    expect(await reactivatePerson(ctx, coordinator, checker, sentWith({}, 2))).toMatchObject({
      value: { version: 3 },
    });
    expect((await findPerson(world.db, checker))!.retiredAt).toBeNull();
    expect(await actsOn(checker)).toEqual(['person.reactivated', 'person.deactivated']);
  });

  test('is done once, at the version that was read, and never by oneself', async () => {
    expect(await deactivatePerson(ctx, coordinator, checker, sentWith({}, 7))).toMatchObject({
      problem: { code: 'STALE' },
    });
    expect(await deactivatePerson(ctx, coordinator, checker, sentWith({}))).toMatchObject({
      problem: { code: 'VERSION_MISSING' },
    });
    const sent = sentWith({}, 1);
    const first = await deactivatePerson(ctx, coordinator, checker, sent);
    expect(await deactivatePerson(ctx, coordinator, checker, sent)).toEqual(first);
    expect(await deactivatePerson(ctx, coordinator, checker, sentWith({}, 2))).toMatchObject({
      problem: { code: 'SCHEMA' },
    });
    expect(await deactivatePerson(ctx, coordinator, coordinator.person.id, sentWith({}, 1))).toMatchObject({
      problem: { code: 'NOT_INDEPENDENT' },
    });
  });
});

describe('who is not site coordinator', () => {
  test.each(['originator', 'checker', 'approver', 'operations'] as const)(
    '%s reads names, jobs and roles and changes nothing',
    async (role) => {
      const actor = await actorOf(world, world.people[role], [role]);
      const missing = { code: 'NOT_PERMITTED' };
      expect(await changePerson(ctx, actor, checker, sentWith({ job: 'x' }))).toMatchObject({
        problem: missing,
      });
      expect(await setRoles(ctx, actor, checker, sentWith({ roles: [] }))).toMatchObject({
        problem: missing,
      });
      expect(await deactivatePerson(ctx, actor, checker, sentWith({}))).toMatchObject({ problem: missing });
      expect(await reactivatePerson(ctx, actor, checker, sentWith({}))).toMatchObject({ problem: missing });
      const list = await peopleView(ctx, actor);
      const one = await personView(ctx, actor, checker);
      expect(list).toMatchObject({ value: { mayChange: false } });
      expect(JSON.stringify([list, one])).not.toContain('@ketterwold.example');
    },
  );
});
