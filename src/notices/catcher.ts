/* The local mail catcher: a real SMTP server on loopback that keeps every message to be read on /mail instead of sending it on. */
import { appendFile, mkdir, readFile, writeFile } from 'node:fs/promises';
import { dirname } from 'node:path';
import { type AddressObject, simpleParser } from 'mailparser';
import { SMTPServer, type SMTPServerDataStream } from 'smtp-server';

export type CaughtMail = {
  /** The Message-ID: a message that comes twice is kept once. */
  id: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  at: string;
};

export type Catcher = {
  /** Where the outbox worker sends: smtp://127.0.0.1:<port>. */
  url: string;
  /** All messages kept, the newest first. */
  list(): CaughtMail[];
  close(): Promise<void>;
};

/** How many messages are kept; older ones fall out at the next start. */
const KEPT = 2000;

function addresses(found: AddressObject | AddressObject[] | undefined): string[] {
  return [found ?? []].flat().flatMap(({ value }) => value.map(({ address }) => address ?? ''));
}

async function parse(stream: SMTPServerDataStream, at: string): Promise<CaughtMail> {
  const mail = await simpleParser(stream);
  return {
    id: mail.messageId ?? `<unnamed-${at}>`,
    from: addresses(mail.from)[0] ?? '',
    to: addresses(mail.to),
    subject: mail.subject ?? '',
    text: mail.text ?? '',
    at,
  };
}

/** Reads what was kept before; a line cut off by a crash is left out. */
async function readKept(file: string): Promise<CaughtMail[]> {
  const text = await readFile(file, 'utf8').catch(() => '');
  return text
    .split('\n')
    .flatMap((line) => {
      try {
        return [JSON.parse(line) as CaughtMail];
      } catch {
        return [];
      }
    })
    .slice(-KEPT);
}

/**
 * Starts the catcher on 127.0.0.1.
 * @param port 0 takes any free port
 * @param file where messages are kept between starts, one JSON line each
 */
export async function startCatcher(port: number, file: string, now: () => Date): Promise<Catcher> {
  await mkdir(dirname(file), { recursive: true });
  const kept = await readKept(file);
  await writeFile(file, kept.map((mail) => `${JSON.stringify(mail)}\n`).join(''));
  const keep = async (stream: SMTPServerDataStream) => {
    const mail = await parse(stream, now().toISOString());
    if (kept.some((other) => other.id === mail.id)) return;
    kept.push(mail);
    await appendFile(file, `${JSON.stringify(mail)}\n`);
  };
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: 5_000_000,
    onData(stream, _session, done) {
      keep(stream).then(() => done(), done);
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  server.on('error', () => undefined);
  const address = server.server.address();
  const bound = typeof address === 'object' && address !== null ? address.port : port;
  return {
    url: `smtp://127.0.0.1:${bound}`,
    list: () => [...kept].reverse(),
    close: () =>
      new Promise((resolve) => {
        server.close(resolve);
      }),
  };
}
