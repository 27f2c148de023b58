/* Calculations for programs: the shapes of the command line, signed in, permitted, limited in size and time. */
import { type APIContext } from 'astro';
import { describe, expect, it } from 'vitest';
import { CASES_AT_MOST, TIME_AT_MOST, workCases } from '@services/calculations';
import { type Role } from '@domain/case';
import { BODY_LIMIT } from '@/http';
import { POST } from '@/pages/api/v1/calculations';

const VAPORISATION = {
  id: 'boil',
  topic: 'f.vaporisation',
  inputs: { Q: { value: 1000, unit: 'kW' }, latent_heat: { value: 360, unit: 'kJ/kg' } },
  want: { relief_load: 't/h' },
};
const BAD = { id: 'bad', topic: 'a.gas', inputs: {} };

const asker = (roles: readonly Role[]) => ({ id: 'p', roles });

/** Posts a body as a person with these roles, or as nobody. */
async function post(
  body: string,
  roles?: readonly Role[],
): Promise<{ status: number; type: string | null; body: unknown }> {
  const request = new Request('http://localhost/api/v1/calculations', {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body,
  });
  const who = roles && { person: { id: 'p' }, sites: [{ roles }], standsInFor: [] };
  const context = { request, url: new URL(request.url), locals: { who, requestId: 'r' } };
  const response = await POST(context as unknown as APIContext);
  return { status: response.status, type: response.headers.get('content-type'), body: await response.json() };
}

describe('POST /api/v1/calculations', () => {
  it('answers the shapes of the command line, one bad case beside good ones', async () => {
    const { status, body } = await post(JSON.stringify({ cases: [BAD, VAPORISATION] }), ['checker']);
    expect(status).toBe(200);
    expect(body).toMatchObject({
      results: [
        {
          id: 'bad',
          topic: 'a.gas',
          outputs: {},
          warnings: [],
          error: { code: 'INPUT_MISSING', field: 'W' },
        },
        // W = Q/λ = 1000 kW / 360 kJ/kg = 2.778 kg/s = 10 t/h, by hand.
        { id: 'boil', outputs: { relief_load: { unit: 't/h' } } },
      ],
    });
    const { results } = body as {
      results: { outputs: Record<string, { value: number }>; error?: unknown }[];
    };
    expect(results[1]?.outputs['relief_load']?.value).toBeCloseTo(10, 6);
    expect(results[1]).not.toHaveProperty('error');
    expect(results[1]).not.toHaveProperty('steps');
  });

  it('adds the steps when they are asked for', async () => {
    const { body } = await post(JSON.stringify({ cases: [VAPORISATION], sheet: true }), ['originator']);
    expect(body).toMatchObject({
      results: [
        {
          steps: [
            { symbol: 'Q', unit: 'W' },
            { symbol: 'W', unit: 'kg/h' },
          ],
        },
      ],
    });
  });

  it.each([
    ['nobody who is signed in', '{"cases": []}', undefined, 401, 'SIGN_IN'],
    ['an auditor, who does not calculate', '{"cases": []}', ['auditor'], 403, 'NOT_PERMITTED'],
    ['what is not JSON', '{', ['checker'], 400, 'MALFORMED'],
    ['a document without cases', '{"topic": "a.gas", "inputs": {}}', ['checker'], 422, 'SCHEMA'],
    ['a body beyond the limit', `{"cases": ["${'x'.repeat(BODY_LIMIT)}"]}`, ['checker'], 413, 'TOO_LARGE'],
    [
      'more cases than one request may hold',
      JSON.stringify({ cases: Array(CASES_AT_MOST + 1).fill(1) }),
      ['checker'],
      413,
      'TOO_LARGE',
    ],
  ] as const)('refuses %s as a problem', async (_who, sent, roles, expected, code) => {
    const { status, type, body } = await post(sent, roles);
    expect({ status, type }).toEqual({ status: expected, type: 'application/problem+json; charset=utf-8' });
    expect(body).toMatchObject({ code, status: expected });
  });
});

describe('the time of a request', () => {
  it('is limited: what is not reached in it is said to be so, and what was worked stands', async () => {
    let clock = 0;
    const slow = () => (clock += TIME_AT_MOST / 4);
    const answer = await workCases(asker(['checker']), { cases: Array(6).fill(VAPORISATION) }, slow);
    const errors = answer.ok ? answer.value.results.map((one) => one.error?.code) : [];
    expect(errors[0]).toBeUndefined();
    expect(errors.at(-1)).toBe('TIME_LIMIT');
    expect(errors).toHaveLength(6);
  });
});
