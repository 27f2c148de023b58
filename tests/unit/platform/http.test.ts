/* Origins, versions, keys, answers, public routes and headers. */
import { describe, expect, it } from 'vitest';
import { answer, localPath, onceFrom, readSent, shownFields, textWithLinks, versionFrom } from '@/http';
import { isPublic } from '@/http/access';
import { contentPolicy, secureHeaders } from '@/http/headers';
import { comesFromHere } from '@/http/origin';
import { fail, ok } from '@domain/result';
import { contextOf, FORM_TYPE, JSON_TYPE } from '../../support/context';

describe('comesFromHere', () => {
  it.each<[string, Record<string, string>, boolean]>([
    ['our own page', { 'sec-fetch-site': 'same-origin' }, true],
    ['an address typed by the user', { 'sec-fetch-site': 'none' }, true],
    [
      'another site',
      { 'sec-fetch-site': 'cross-site', origin: 'http://localhost:4321', host: 'localhost:4321' },
      false,
    ],
    ['a neighbour on the same domain', { 'sec-fetch-site': 'same-site' }, false],
    ['an old browser on our page', { origin: 'http://localhost:4321', host: 'localhost:4321' }, true],
    ['an old browser on another port', { origin: 'http://localhost:4000', host: 'localhost:4321' }, false],
    ['a page in a sandbox', { origin: 'null', host: 'localhost:4321' }, false],
    ['a program', { host: 'localhost:4321' }, true],
  ])('%s', (_what, headers, expected) => {
    expect(comesFromHere(new Headers(headers))).toBe(expected);
  });
});

describe('versionFrom', () => {
  const withMatch = (match: string) => versionFrom(contextOf({ headers: { 'If-Match': match } }), 'case');

  it('reads the version of its own kind', () => {
    expect(withMatch('"case-7"')).toEqual(ok(7));
  });

  it.each([
    ['"rules-7"', 'MALFORMED'],
    ['"case-x"', 'MALFORMED'],
    ['W/"case-7"', 'MALFORMED'],
    ['*', 'VERSION_MISSING'],
  ])('refuses %s', (match, code) => {
    const read = withMatch(match);
    expect(read.ok ? '' : read.problem.code).toBe(code);
  });

  it('asks for it when it is missing, and takes that of a form', async () => {
    const bare = versionFrom(contextOf({}), 'case');
    expect(bare.ok ? '' : bare.problem.code).toBe('VERSION_MISSING');
    const form = contextOf({ headers: FORM_TYPE, body: '_version=3' });
    await readSent(form);
    expect(versionFrom(form, 'case')).toEqual(ok(3));
  });
});

describe('onceFrom', () => {
  async function once(body: string, key = 'key-00001') {
    const context = contextOf({ headers: { ...JSON_TYPE, 'Idempotency-Key': key }, body });
    await readSent(context);
    return onceFrom(context);
  }

  it('is the same for the same body however it is written', async () => {
    expect(await once('{"a":1,"b":2}')).toEqual(await once('{ "b": 2, "a": 1 }'));
  });

  it('differs with the body but never holds anything of a password', async () => {
    expect(await once('{"a":1}')).not.toEqual(await once('{"a":2}'));
    expect(await once('{"a":1,"password":"x"}')).toEqual(await once('{"a":1,"password":"y"}'));
  });

  it.each(['', 'short', 'with a blank in it'])('refuses the key "%s"', async (key) => {
    const read = await once('{}', key);
    expect(read.ok ? '' : read.problem.code).toBe('KEY_MISSING');
  });
});

describe('answer', () => {
  it('tells a program the problem by its published shape', async () => {
    const response = await answer(contextOf({}), fail('GATE_SHUT', 'One point is open.', { openPoints: [] }));
    expect(response.status).toBe(409);
    expect(response.headers.get('Content-Type')).toContain('application/problem+json');
    expect(await response.json()).toMatchObject({
      status: 409,
      code: 'GATE_SHUT',
      detail: 'One point is open.',
      id: 'abc',
    });
  });

  it('sends a form on by 303 and never to another site', async () => {
    const context = contextOf({ headers: FORM_TYPE, body: '_back=%2F%2Fevil.example%2Fx' });
    await readSent(context);
    const response = await answer(context, ok({}));
    expect([response.status, response.headers.get('Location')]).toEqual([303, '/']);
  });

  it('shows a refused form the problem page', async () => {
    const context = contextOf({ headers: FORM_TYPE, body: 'name=a' });
    await readSent(context);
    await answer(context, fail('STALE', 'Changed.'));
    expect(context.rewritten).toEqual(['GET /problem']);
    expect(context.locals.problem?.code).toBe('STALE');
  });
});

describe('localPath', () => {
  it.each([
    ['/s/ketterwold?x=1#y', '/s/ketterwold?x=1#y'],
    ['//evil.example', '/'],
    ['/\\evil.example', '/'],
    ['https://evil.example', '/'],
    ['javascript:alert(1)', '/'],
    ['/..//evil.example', '/'],
  ])('%s → %s', (given, expected) => {
    expect(localPath(given)).toBe(expected);
  });
});

describe('isPublic', () => {
  it.each<[string, string, boolean, boolean]>([
    ['/sign-in', 'GET', false, true],
    ['/api/v1/session', 'POST', false, true],
    ['/api/v1/session', 'DELETE', false, false],
    ['/s/[site]', 'GET', false, false],
    ['/mail', 'GET', false, false],
    ['/mail', 'GET', true, true],
    ['/anything-new', 'GET', true, false],
  ])('%s %s', (pattern, method, catcherOpen, expected) => {
    expect(isPublic({ pattern, method }, catcherOpen)).toBe(expected);
  });
});

describe('security headers', () => {
  it('allow no inline script, and inline style in attributes only', () => {
    for (const policy of [
      contentPolicy(null),
      contentPolicy("default-src 'none'; script-src 'self' 'sha256-x'; style-src 'self';"),
    ]) {
      const directives = policy.split(';').map((part) => part.trim());
      expect(directives.filter((part) => part.includes('unsafe'))).toEqual([
        "style-src-attr 'unsafe-inline'",
      ]);
      expect(directives.filter((part) => part.startsWith('script-src'))).toHaveLength(1);
    }
  });

  it('keep answers out of caches unless they say otherwise, and ask for https only where it is used', () => {
    const headers = new Headers();
    secureHeaders(headers, false);
    expect(headers.get('Cache-Control')).toBe('no-store');
    expect(headers.has('Strict-Transport-Security')).toBe(false);
    secureHeaders(headers, true);
    expect(headers.has('Strict-Transport-Security')).toBe(true);
  });
});

describe('what was typed', () => {
  it('is shown again, but nothing secret', () => {
    const typed: [string, string][] = [
      ['reason', 'why'],
      ['password', 'x'],
      ['totpCode', '1'],
      ['empty', ' '],
    ];
    expect(shownFields({ form: true, body: {}, typed })).toEqual([{ name: 'reason', value: 'why' }]);
  });

  it('links addresses only', () => {
    expect(textWithLinks('go to http://x.example/a now')).toEqual([
      { text: 'go to ', link: false },
      { text: 'http://x.example/a', link: true },
      { text: ' now', link: false },
    ]);
  });
});
