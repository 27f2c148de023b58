/* One's own account: what is shown, and the change of the password. */
import { beforeEach, describe, expect, test } from 'vitest';
import * as auth from '@auth/index';
import { addDelegation, findPerson, updatePerson } from '@data/people';
import { accountView, changeOwnPassword } from '@services/administer/account';
import { agentWords } from '@services/administer/agent-words';
import { passwordSchema } from '@services/administer/bodies';
import { smallWorld, type World } from '../../support/database';

const OLD = 'slow water over brick';
const NEXT = 'quick brick under water';
/* As the browsers of their day named themselves; written from memory. */
const FIREFOX = 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0';
const CHROME =
  'Mozilla/5.0 (Linux; Android 10; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36';
const SAFARI =
  'Mozilla/5.0 (iPhone; CPU iPhone OS 18_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.5 Mobile/15E148 Safari/604.1';
const EDGE =
  'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36 Edg/140.0.0.0';

let world: World;
let context: auth.Auth;
let here: auth.Current;
let other: string;

beforeEach(async () => {
  world = await smallWorld();
  context = auth.openAuth(world.db, { secure: false });
  const id = world.people.originator;
  await updatePerson(world.db, id, 1, { passwordHash: await auth.hashPassword(OLD) });
  const person = (await findPerson(world.db, id))!;
  other = (await auth.openSession(context, person, CHROME)).cookie;
  const { cookie } = await auth.openSession(context, person, FIREFOX);
  here = (await auth.whoAsks(context, cookie))!;
});

describe('the account', () => {
  test('says who one is, where, for whom one stands in, and from where one is signed in', async () => {
    const { people, siteId } = world;
    const today = new Date().toISOString().slice(0, 10);
    const days = { fromDay: today, toDay: today, grantedBy: null };
    await addDelegation(world.db, {
      fromId: people.approver,
      toId: people.originator,
      role: 'approver',
      siteId,
      ...days,
    });
    const who = {
      ...here,
      standsInFor: [
        {
          id: 'd',
          fromId: people.approver,
          toId: people.originator,
          role: 'approver' as const,
          siteId,
          ...days,
        },
      ],
    };
    const view = await accountView(context, who);
    expect(view.sites).toEqual([{ slug: 'ketterwold', name: 'Ketterwold Works', roles: 'originator' }]);
    expect(view.standsInFor).toEqual([{ name: 'The approver', role: 'approver', until: today }]);
    expect(view.sessions.map(({ where, here: present }) => [where, present])).toEqual([
      ['Firefox on Linux', true],
      ['Chrome on Android', false],
    ]);
  });

  test.each([
    [FIREFOX, 'Firefox on Linux'],
    [CHROME, 'Chrome on Android'],
    [SAFARI, 'Safari on iOS'],
    [EDGE, 'Edge on Windows'],
    ['curl/8.5.0', 'the program curl'],
    ['', 'an unnamed program'],
  ])('reads %s', (agent, words) => {
    expect(agentWords(agent)).toBe(words);
  });
});

describe('a change of the password', () => {
  test('ends the other sessions, says how many, and keeps this one', async () => {
    const changed = await changeOwnPassword(context, here, { current: OLD, password: NEXT }, '10.0.0.1');
    expect(changed).toEqual({ ok: true, value: { ended: 1 } });
    expect(await auth.whoAsks(context, other)).toBeNull();
    expect(await auth.listSessions(context, here.person.id, here.session.id)).toHaveLength(1);
    const from = { ip: '10.0.0.2', agent: '' };
    expect((await auth.signIn(context, here.person.email, OLD, from)).ok).toBe(false);
    expect((await auth.signIn(context, here.person.email, NEXT, from)).ok).toBe(true);
  });

  test('with a wrong present password is told beside that field, six times over it rests', async () => {
    const attempt = () =>
      changeOwnPassword(context, here, { current: 'not it at all', password: NEXT }, '10.0.0.1');
    for (let n = 0; n < 5; n += 1)
      expect(await attempt()).toMatchObject({
        problem: { code: 'PASSWORD_WRONG', errors: [{ path: 'current' }] },
      });
    expect(await attempt()).toMatchObject({ problem: { code: 'TOO_MANY' } });
    expect(await auth.whoAsks(context, other)).not.toBeNull();
  });

  test('needs the same new password twice', () => {
    const parsed = passwordSchema.safeParse({
      current: OLD,
      password: NEXT,
      again: 'quick brick over water',
    });
    expect(parsed.error?.issues).toMatchObject([{ path: ['again'] }]);
    expect(passwordSchema.safeParse({ current: OLD, password: NEXT }).success).toBe(true);
  });
});
