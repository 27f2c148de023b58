/* The local mail catcher is a real SMTP server: nodemailer talks to it, and it keeps each message once. */
import { appendFile, mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { makeMailer, startCatcher, type Catcher } from '@notices/index';

const now = () => new Date('2026-03-16T07:00:00.000Z');
const LETTER = {
  messageId: '<mail_1@setwright>',
  to: 'cem@example.org',
  subject: 'KW-2026-003: waits for your check',
  text: 'Cem,\n\n10 °C ≤ Δ\n',
};
let folder: string;
let catcher: Catcher;

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'setwright-mail-'));
  catcher = await startCatcher(0, join(folder, 'mails.jsonl'), now);
});
afterEach(async () => {
  await catcher.close();
  await rm(folder, { recursive: true, force: true });
});

async function send(letter = LETTER): Promise<void> {
  const mailer = makeMailer(catcher.url, 'Setwright <setwright@example.org>');
  await mailer.send(letter);
  mailer.close();
}

it('keeps what was sent, text and signs intact', async () => {
  await send();
  expect(catcher.list()).toEqual([
    {
      id: LETTER.messageId,
      from: 'setwright@example.org',
      to: ['cem@example.org'],
      subject: LETTER.subject,
      text: LETTER.text,
      at: '2026-03-16T07:00:00.000Z',
    },
  ]);
});

it('keeps a message that comes twice once: the Message-ID is the same at each try', async () => {
  await send();
  await send();
  expect(catcher.list()).toHaveLength(1);
});

it('finds its messages again after a restart, and leaves out a line that a crash cut off', async () => {
  await send();
  await catcher.close();
  const file = join(folder, 'mails.jsonl');
  await appendFile(file, '{"id":"<cut');
  catcher = await startCatcher(0, file, now);
  await send({ ...LETTER, messageId: '<mail_2@setwright>', subject: 'second' });
  expect(catcher.list().map((mail) => mail.subject)).toEqual(['second', LETTER.subject]);
  expect((await readFile(file, 'utf8')).trim().split('\n')).toHaveLength(2);
});

it('lets no line break in a subject become a header', async () => {
  await send({ ...LETTER, subject: 'a\r\nBcc: x@example.org' });
  const [mail] = catcher.list();
  expect(mail?.to).toEqual(['cem@example.org']);
  expect(mail?.subject).not.toContain('\n');
});
