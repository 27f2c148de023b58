/* Reading bodies: JSON and forms, what is refused and with which sentence. */
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { BODY_LIMIT, readBody, readSent } from '@/http';
import { contextOf, FORM_TYPE, type Given, JSON_TYPE } from '../../support/context';

const schema = z.object({
  name: z.string('must be a text.'),
  set: z.object({ value: z.number('must be a number.') }).optional(),
});

async function codeOf(given: Given): Promise<string> {
  const read = await readBody(contextOf(given), schema);
  return read.ok ? 'OK' : read.problem.code;
}

describe('readBody', () => {
  it.each<[string, Given, string]>([
    ['well-formed JSON', { headers: JSON_TYPE, body: '{"name":"a"}' }, 'OK'],
    [
      'JSON of another dialect',
      { headers: { 'Content-Type': 'application/merge-patch+json' }, body: '{"name":"a"}' },
      'OK',
    ],
    ['a form', { headers: FORM_TYPE, body: 'name=a' }, 'OK'],
    ['broken JSON', { headers: JSON_TYPE, body: '{"name":' }, 'MALFORMED'],
    [
      'bytes that are no UTF-8',
      { headers: JSON_TYPE, body: new Uint8Array([0x22, 0xff, 0x22]) },
      'MALFORMED',
    ],
    [
      'a form without its boundary',
      { headers: { 'Content-Type': 'multipart/form-data' }, body: 'x' },
      'MALFORMED',
    ],
    ['plain text', { headers: { 'Content-Type': 'text/plain' }, body: '{"name":"a"}' }, 'TYPE_REFUSED'],
    ['bytes without a type', { body: new Uint8Array([1]) }, 'TYPE_REFUSED'],
    ['too much', { headers: JSON_TYPE, body: ' '.repeat(BODY_LIMIT + 1) }, 'TOO_LARGE'],
    ['another shape', { headers: JSON_TYPE, body: '[]' }, 'SCHEMA'],
    ['nothing', { headers: JSON_TYPE, body: '' }, 'SCHEMA'],
  ])('answers %s', async (_what, given, code) => {
    expect(await codeOf(given)).toBe(code);
  });

  it('stops at the limit when the length header lies', async () => {
    const stream = new ReadableStream({
      pull(controller) {
        controller.enqueue(new Uint8Array(300_000));
      },
    });
    const request = new Request('http://localhost/', {
      method: 'POST',
      headers: JSON_TYPE,
      body: stream,
      duplex: 'half',
    } as RequestInit);
    const read = await readBody({ ...contextOf({}), request }, schema);
    expect(read.ok ? '' : read.problem.code).toBe('TOO_LARGE');
  });

  it('says the path and a sentence of each field that is wrong', async () => {
    const read = await readBody(
      contextOf({ headers: JSON_TYPE, body: '{"name":"a","set":{"value":"12"}}' }),
      schema,
    );
    expect(read.ok ? [] : read.problem.errors).toEqual([
      { path: 'set/value', code: 'invalid_type', sentence: 'must be a number.' },
    ]);
  });

  it('keeps the fields of ours out of the body of a form', async () => {
    const context = contextOf({
      headers: FORM_TYPE,
      body: '_version=7&_key=key-00001&_back=%2Fs%2Fx&_method=patch&part=a&part=b&one[]=c',
    });
    const sent = await readSent(context);
    expect(sent.ok && sent.value).toMatchObject({
      form: true,
      body: { part: ['a', 'b'], one: ['c'] },
      version: '7',
      key: 'key-00001',
      back: '/s/x',
      method: 'PATCH',
    });
  });
});
