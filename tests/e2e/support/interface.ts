/* The HTTP interface as a program of a person uses it, for what a test needs before the browser comes in. */
import { randomUUID } from 'node:crypto';
import { type TestServer } from '../../support/server';
import { demoSignIns } from '../../support/sign-in';
import { API, SITE, someone } from './people';

export type Told = {
  status: number;
  type: string;
  etag: string;
  text: string;
  body: Record<string, unknown>;
};
export type Program = {
  name: string;
  cookie: string;
  get(path: string): Promise<Told>;
  send(method: string, path: string, body?: unknown, headers?: Record<string, string>): Promise<Told>;
};

async function told(response: Response): Promise<Told> {
  const text = await response.text();
  const type = response.headers.get('content-type') ?? '';
  const body = type.includes('json') ? (JSON.parse(text) as Record<string, unknown>) : {};
  return { status: response.status, type, etag: response.headers.get('etag') ?? '', text, body };
}

/** A program that is signed in as a person. */
export async function program(server: TestServer, name: string): Promise<Program> {
  const { cookie } = await someone(server, name);
  const own = { Cookie: cookie, Origin: server.url };
  return {
    name,
    cookie,
    get: async (path) => told(await fetch(`${server.url}${path}`, { headers: own, redirect: 'manual' })),
    send: async (method, path, body, headers = {}) =>
      told(
        await fetch(`${server.url}${path}`, {
          method,
          redirect: 'manual',
          headers: {
            ...own,
            'Content-Type': 'application/json',
            'Idempotency-Key': randomUUID(),
            ...headers,
          },
          ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
        }),
      ),
  };
}

/** A rich text of one paragraph. */
export const words = (text: string) => ({
  type: 'doc',
  content: [{ type: 'paragraph', content: [{ type: 'text', text }] }],
});

/** Sends a write on a case at the version that it has now; throws when it is refused. */
export async function write(
  by: Program,
  number: string,
  method: string,
  part: string,
  body: unknown,
): Promise<Told> {
  const { etag } = await by.get(`${API}/cases/${number}`);
  const answer = await by.send(method, `${API}/cases/${number}/${part}`, body, { 'If-Match': etag });
  if (answer.status >= 300) throw new Error(`${method} ${part}: ${answer.status} ${answer.text}`);
  return answer;
}

/** Signs an act with the hash of the page that carries its form. */
export async function signBy(by: Program, number: string, act: string, page: string): Promise<Told> {
  const { text } = await by.get(`${SITE}/cases/${number}${page}`);
  const form = text.slice(text.indexOf(`acts/${act}"`));
  const pageHash = /name="pageHash" value="([0-9a-f]{64})"/.exec(form)?.[1];
  const { password } = await demoSignIns();
  return write(by, number, 'POST', `acts/${act}`, { password, pageHash });
}

export const TEAM = [
  { role: 'checker', person: 'per_p04' },
  { role: 'approver', person: 'per_p05' },
  { role: 'operations', person: 'per_p07' },
];

/** Raises a permanent case on SYS-101 as a draft; answers its number. */
export async function drafted(by: Program, title: string): Promise<string> {
  const answer = await by.send('POST', `${API}/cases`, { class: 'permanent', title, systems: ['SYS-101'] });
  if (answer.status !== 201) throw new Error(`raise: ${answer.status} ${answer.text}`);
  return String(answer.body['number']);
}

/** A case in scenario analysis: briefed, people nominated, affected systems answered, the draft signed. */
export async function briefed(by: Program, title: string): Promise<string> {
  const number = await drafted(by, title);
  await write(by, number, 'PATCH', 'brief', {
    whatChanges: words('The feed pump gets a larger impeller; the reboiler boils up more.'),
    technicalBasis: words('Pump curve and rating sheet were worked again.'),
    effect: words('Loss of cooling water makes more vapour than before.'),
    timeNeeded: 'One shift',
    papers: [
      {
        id: 'el_paper',
        kind: 'drawing',
        reference: '101-P-001',
        from: 'rev 8',
        to: 'rev 9',
        when: 'after',
        state: 'drafted',
      },
    ],
  });
  await write(by, number, 'POST', 'seats', { seats: TEAM });
  const { body } = await by.get(`${API}/cases/${number}/affected`);
  for (const { document } of body['affected'] as { document: string }[]) {
    await write(by, number, 'POST', 'affected', {
      document,
      answer: 'not-affected',
      reason: 'The header was sized for more than this load.',
    });
  }
  await signBy(by, number, 'PASS-draft', '');
  return number;
}

/** Changes figures of SYS-101's working revision in a case. */
export async function proposed(
  by: Program,
  number: string,
  figures: Record<string, [number, string]>,
): Promise<void> {
  const path = `${API}/cases/${number}/documents/SYS-101`;
  const { etag } = await by.get(path);
  const ops = Object.entries(figures).map(([at, [value, unit]]) => ({
    op: 'set',
    path: at,
    value: { value, unit, origin: { kind: 'maker', ref: 'Data sheet of the new part' } },
  }));
  const answer = await by.send('PATCH', path, { ops }, { 'If-Match': etag });
  if (answer.status >= 300) throw new Error(`propose: ${answer.status} ${answer.text}`);
}

/** A case in the calculation check, its results hidden from Ilse Fennimore. */
export async function atCheck(by: Program, title: string): Promise<string> {
  const number = await briefed(by, title);
  await proposed(by, number, {
    'sources/src_p101/pump/impeller': [224, 'mm'],
    'sources/src_e101/heat/ua': [125, 'kW/K'],
  });
  await signBy(by, number, 'PASS-scenarios', '/scenarios');
  return number;
}
