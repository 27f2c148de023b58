/* Signing in: what it takes, what it refuses and how often, how sessions end. */
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import * as auth from '@auth/index';
import { findAll } from '@data/mapping';
import { findPerson, roleHistory, updatePerson } from '@data/people';
import { TRAIL } from '@data/tables/outbox';
import { SESSIONS } from '@data/tables/people';
import { transaction } from '@data/connection';
import { nowInstant } from '@data/ids';
import { freshDatabase, smallWorld, type World } from '../../support/database';

const EMAIL = 'originator@ketterwold.example';
const PASSWORD = 'slow water over brick';
const from = { ip: '10.0.0.1', agent: 'Test browser' };
let world: World;
let context: auth.Auth;

beforeEach(async () => {
  world = await smallWorld();
  context = auth.openAuth(world.db, { secure: false });
  await updatePerson(world.db, world.people.originator, 1, {
    passwordHash: await auth.hashPassword(PASSWORD),
  });
});
afterEach(() => vi.useRealTimers());

async function signedIn() {
  const result = await auth.signIn(context, EMAIL, PASSWORD, from);
  if (!result.ok) throw new Error(result.problem.detail);
  return { ...result.value, header: result.value.cookie.split(';')[0]! };
}
const later = (hours: number) => vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + hours * 3_600_000 });

describe('a right password', () => {
  test('opens a session whose cookie tells who asks, with sites and roles', async () => {
    const { header, sessionId } = await signedIn();
    const current = await auth.whoAsks(context, `other=1; ${header}`);
    expect(current).toMatchObject({ person: { email: EMAIL }, session: { id: sessionId }, renewed: null });
    expect(auth.rolesAt(current!, 'ketterwold')).toEqual(['originator']);
    expect(auth.rolesAt(current!, 'elsewhere')).toEqual([]);
    expect(JSON.stringify(current)).not.toContain('argon2');
  });

  test('is asked for whatever the case of the e-mail', async () => {
    expect((await auth.signIn(context, ` ${EMAIL.toUpperCase()} `, PASSWORD, from)).ok).toBe(true);
  });

  test('makes a cookie that scripts cannot read and the database cannot give away', async () => {
    const { cookie, header } = await signedIn();
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/);
    expect(cookie).not.toMatch(/Secure/);
    const safe = auth.openAuth(world.db, { secure: true });
    expect((await auth.signIn(safe, EMAIL, PASSWORD, from)) as unknown).toMatchObject({ ok: true });
    expect(safe.lucia.createSessionCookie('x').serialize()).toMatch(/; Secure/);
    const token = header.split('=')[1]!;
    const rows = await findAll(world.db, SESSIONS, {});
    expect(rows).toHaveLength(2);
    expect(JSON.stringify(rows)).not.toContain(token);
    expect(rows.map(({ id }) => id)).toContain(auth.hashToken(token));
    expect(await auth.whoAsks(context, `${auth.SESSION_COOKIE}=${rows[0]!.id}`)).toBeNull();
  });
});

describe('a refused attempt', () => {
  test('reads the same for a wrong password, an unknown e-mail, no password and a retired person', async () => {
    const wrong = await auth.signIn(context, EMAIL, 'not the password', from);
    expect(wrong).toMatchObject({ ok: false, problem: { code: 'PASSWORD_WRONG' } });
    expect(await auth.signIn(context, 'nobody@ketterwold.example', PASSWORD, from)).toEqual(wrong);
    expect(await auth.signIn(context, 'checker@ketterwold.example', '', from)).toEqual(wrong);
    await transaction(world.db, (trx) => auth.deactivate(trx, world.people.originator, nowInstant()));
    expect(await auth.signIn(context, EMAIL, PASSWORD, from)).toEqual(wrong);
  });

  test('five times lets the account rest for 15 minutes, right password or not, known e-mail or not', async () => {
    for (const email of [EMAIL, 'nobody@ketterwold.example']) {
      for (let n = 0; n < 5; n += 1) {
        expect(await auth.signIn(context, email, 'wrong', from)).toMatchObject({
          problem: { code: 'PASSWORD_WRONG' },
        });
      }
      const rested = await auth.signIn(context, email, PASSWORD, { ...from, ip: '10.0.0.2' });
      expect(rested).toMatchObject({
        problem: { code: 'TOO_MANY', detail: expect.stringContaining('15 minutes') },
      });
    }
    later(0.26);
    expect((await auth.signIn(context, EMAIL, PASSWORD, from)).ok).toBe(true);
  });

  test('in parallel counts as often as it was made', async () => {
    const tries = Array.from({ length: 12 }, () => auth.signIn(context, EMAIL, 'wrong', from));
    const codes = (await Promise.all(tries)).map((result) => (result.ok ? 'ok' : result.problem.code));
    expect(codes.filter((code) => code === 'PASSWORD_WRONG')).toHaveLength(5);
    expect(codes.filter((code) => code === 'TOO_MANY')).toHaveLength(7);
  });

  test('from one address over many accounts lets the address rest', async () => {
    let last: unknown;
    for (let n = 0; n < 61; n += 1) last = await auth.signIn(context, `p${n}@x.example`, 'wrong', from);
    expect(last).toMatchObject({ problem: { code: 'TOO_MANY' } });
    expect((await auth.signIn(context, EMAIL, PASSWORD, { ...from, ip: '10.0.0.9' })).ok).toBe(true);
  });

  test('is forgotten after the right password', async () => {
    for (let round = 0; round < 3; round += 1) {
      for (let n = 0; n < 4; n += 1) await auth.signIn(context, EMAIL, 'wrong', from);
      expect((await auth.signIn(context, EMAIL, PASSWORD, from)).ok).toBe(true);
    }
  });

  test('of a signature says that nothing was signed', async () => {
    const id = world.people.originator;
    expect(await auth.confirmPassword(context, id, PASSWORD, from.ip)).toEqual({ ok: true, value: null });
    const refused = await auth.confirmPassword(context, id, 'wrong', from.ip);
    expect(refused).toMatchObject({ problem: { code: 'PASSWORD_WRONG', errors: [{ path: 'password' }] } });
  });
});

describe('a session', () => {
  test('ends 8 hours after its last renewal, and is renewed when used after half of them', async () => {
    const { header } = await signedIn();
    later(3.9);
    expect(await auth.whoAsks(context, header)).toMatchObject({ renewed: null });
    later(0.2);
    const renewed = (await auth.whoAsks(context, header))?.renewed;
    expect(renewed).toContain(header);
    later(7.9);
    expect(await auth.whoAsks(context, header)).not.toBeNull();
    later(8.1);
    expect(await auth.whoAsks(context, header)).toBeNull();
    expect(await findAll(world.db, SESSIONS, {})).toEqual([]);
  });

  test('ends by signing out, and by revoking it from another; not by someone else', async () => {
    const one = await signedIn();
    const two = await signedIn();
    const { originator, checker } = world.people;
    const listed = await auth.listSessions(context, originator, two.sessionId);
    expect(listed.map(({ present }) => present).sort()).toEqual([false, true]);
    expect(await auth.revokeSession(context, checker, one.sessionId)).toMatchObject({
      problem: { code: 'UNKNOWN' },
    });
    expect(await auth.whoAsks(context, one.header)).not.toBeNull();
    expect((await auth.revokeSession(context, originator, one.sessionId)).ok).toBe(true);
    expect(await auth.whoAsks(context, one.header)).toBeNull();
    expect(await auth.signOut(context, two.sessionId)).toContain('Max-Age=0');
    expect(await auth.whoAsks(context, two.header)).toBeNull();
  });

  test('is nothing without a cookie or with an invented one', async () => {
    for (const header of [null, undefined, '', 'x=y', `${auth.SESSION_COOKIE}=invented`]) {
      expect(await auth.whoAsks(context, header)).toBeNull();
    }
  });
});

describe('an account', () => {
  const change = (sessionId: string, next: string, present = PASSWORD) =>
    auth.changePassword(context, {
      personId: world.people.originator,
      sessionId,
      present,
      next,
      ip: from.ip,
    });

  test('changes its password and ends its other sessions', async () => {
    const [one, two] = [await signedIn(), await signedIn()];
    expect(await change(one.sessionId, 'a completely new one')).toEqual({ ok: true, value: { ended: 1 } });
    expect(await auth.whoAsks(context, one.header)).not.toBeNull();
    expect(await auth.whoAsks(context, two.header)).toBeNull();
    expect((await auth.signIn(context, EMAIL, PASSWORD, from)).ok).toBe(false);
    expect((await auth.signIn(context, EMAIL, 'a completely new one', from)).ok).toBe(true);
    const told = await findAll(world.db, TRAIL, { act: 'password.changed' });
    expect(told).toMatchObject([{ byId: world.people.originator, siteId: world.siteId }]);
    expect(JSON.stringify(told)).not.toContain('completely');
  });

  test.each([
    ['too short', 'elevenchars', 'too_short'],
    ['among the most guessed', 'Password1234', 'too_common'],
    ['of one letter', 'aaaaaaaaaaaaaa', 'too_common'],
    ['the e-mail', EMAIL, 'is_email'],
    ['endless', 'xyz1'.repeat(60), 'too_long'],
  ])('refuses a password that is %s', async (_, next, code) => {
    const { sessionId } = await signedIn();
    expect(await change(sessionId, next)).toMatchObject({
      problem: { code: 'SCHEMA', errors: [{ path: 'password', code }] },
    });
    expect(await change(sessionId, 'a completely new one', 'wrong')).toMatchObject({
      problem: { code: 'PASSWORD_WRONG' },
    });
  });

  test('of someone who left has no session, and keeps its history', async () => {
    const { header } = await signedIn();
    await transaction(world.db, (trx) =>
      auth.deactivate(trx, world.people.originator, '2026-03-16T08:00:00.000Z'),
    );
    expect(await auth.whoAsks(context, header)).toBeNull();
    expect(await findPerson(world.db, world.people.originator)).toMatchObject({ name: 'The originator' });
    expect(await roleHistory(world.db, world.people.originator)).toHaveLength(1);
  });

  test('is opened by an invitation, once', async () => {
    const token = await auth.makeToken(world.db, world.people.checker, 'invite');
    expect(await auth.acceptToken(context, token, 'short')).toMatchObject({ problem: { code: 'SCHEMA' } });
    expect((await auth.acceptToken(context, token, 'first password of mine')).ok).toBe(true);
    expect(await auth.acceptToken(context, token, 'second password of mine')).toMatchObject({
      problem: { code: 'UNKNOWN' },
    });
    expect(
      (await auth.signIn(context, 'checker@ketterwold.example', 'first password of mine', from)).ok,
    ).toBe(true);
    const late = await auth.makeToken(world.db, world.people.checker, 'reset');
    later(2.1);
    expect(await auth.acceptToken(context, late, 'third password of mine')).toMatchObject({
      problem: { code: 'UNKNOWN' },
    });
  });
});

test('the first site coordinator of an empty installation, and no second one', async () => {
  const empty = auth.openAuth(await freshDatabase(), { secure: false });
  const barometer = { value: 1.013, unit: 'bar_abs' };
  const site = {
    slug: 'new',
    name: 'New Works',
    timeZone: 'Europe/Vienna',
    barometer,
    facts: { caseLetters: 'NW' },
  };
  const asked = { email: 'first@new.example', name: 'First', password: PASSWORD, site };
  expect(await auth.createFirstCoordinator(empty, { ...asked, password: 'short' })).toMatchObject({
    ok: false,
  });
  expect((await auth.createFirstCoordinator(empty, asked)).ok).toBe(true);
  const second = await auth.createFirstCoordinator(empty, { ...asked, email: 'second@new.example' });
  expect(second).toMatchObject({ problem: { code: 'NOT_PERMITTED' } });
  const signed = await auth.signIn(empty, asked.email, PASSWORD, from);
  const current = signed.ok ? await auth.whoAsks(empty, signed.value.cookie.split(';')[0]) : null;
  expect(auth.rolesAt(current!, 'new')).toEqual(['coordinator']);
  expect(await empty.db('trail').first('act')).toEqual({ act: 'person.first-coordinator' });
});
