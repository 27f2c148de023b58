/* Sends what waits in the outbox, one message at a time: `sending` is committed before the SMTP talk, failures come again later and later. */
import { type Mailer, type OutgoingMail } from './mailer';

export type QueuedMail = OutgoingMail & {
  id: string;
  /** How often it was tried before. */
  tries: number;
};

/** What the worker needs of the outbox; `outbox.ts` provides it on the database. */
export type Outbox = {
  /** Puts back what a crash left in `sending`: the Message-ID stays, so a receiver that got it already can tell. */
  recover(now: Date): Promise<void>;
  /** The next message that is due, committed as `sending`; undefined when none is. */
  take(now: Date): Promise<QueuedMail | undefined>;
  delivered(id: string, now: Date): Promise<void>;
  /** `next` absent: given up, the message is dead. */
  failed(id: string, error: string, now: Date, next: Date | undefined): Promise<void>;
};

export type WorkerLog = {
  info(fields: object, text: string): void;
  warn(fields: object, text: string): void;
  error(fields: object, text: string): void;
};

export type Worker = {
  /** Looks at the outbox now instead of at the next turn. */
  wake(): void;
  /** Finishes the message it is at and stops. */
  stop(): Promise<void>;
};

const SECOND = 1_000;
const MINUTE = 60 * SECOND;
/** Waits before the second, third … try; after the last one the message is dead. */
export const BACK_OFF: readonly number[] = [
  10 * SECOND,
  MINUTE,
  5 * MINUTE,
  30 * MINUTE,
  2 * 60 * MINUTE,
  8 * 60 * MINUTE,
  24 * 60 * MINUTE,
];

/** When a message that failed comes again; undefined when it has been tried often enough. `tries` counts the one that just failed. */
export function nextTry(tries: number, now: Date): Date | undefined {
  const wait = BACK_OFF[tries - 1];
  return wait === undefined ? undefined : new Date(now.getTime() + wait);
}

/** Only the reason of a failure, without anything of the address's credentials. */
function reason(error: unknown): string {
  const text = error instanceof Error ? error.message : String(error);
  return text.replace(/\/\/[^\s/@]+@/g, '//').slice(0, 300);
}

/** Sends one message and records how it went. */
async function deliver(
  mail: QueuedMail,
  outbox: Outbox,
  mailer: Mailer,
  now: () => Date,
  log: WorkerLog,
): Promise<void> {
  try {
    await mailer.send(mail);
  } catch (error) {
    const next = nextTry(mail.tries + 1, now());
    await outbox.failed(mail.id, reason(error), now(), next);
    const fields = { mail: mail.id, tries: mail.tries + 1, next: next?.toISOString(), reason: reason(error) };
    log.warn(fields, next ? 'notice not delivered, tried again later' : 'notice given up');
    return;
  }
  await outbox.delivered(mail.id, now());
  log.info({ mail: mail.id }, 'notice delivered');
}

/** Sends everything that is due; answers how many messages were tried. */
export async function sendDue(
  outbox: Outbox,
  mailer: Mailer,
  now: () => Date,
  log: WorkerLog,
  goOn: () => boolean = () => true,
): Promise<number> {
  let tried = 0;
  while (goOn()) {
    const mail = await outbox.take(now());
    if (!mail) break;
    await deliver(mail, outbox, mailer, now, log);
    tried += 1;
  }
  return tried;
}

/** Starts the worker; it looks at the outbox every `pause` milliseconds. A failing database is logged, and tried again at the next turn. */
export function startWorker(
  outbox: Outbox,
  mailer: Mailer,
  now: () => Date,
  log: WorkerLog,
  pause = 500,
): Worker {
  let stopped = false;
  let wakeUp = (): void => undefined;
  const sleep = () =>
    new Promise<void>((resolve) => {
      const timer = setTimeout(resolve, pause);
      wakeUp = () => {
        clearTimeout(timer);
        resolve();
      };
    });
  let recovered = false;
  const turn = async () => {
    try {
      if (!recovered) await outbox.recover(now());
      recovered = true;
      await sendDue(outbox, mailer, now, log, () => !stopped);
    } catch (error) {
      log.error({ err: error }, 'the outbox could not be read or written');
    }
  };
  const run = async () => {
    while (!stopped) {
      await turn();
      if (!stopped) await sleep();
    }
    mailer.close();
  };
  const running = run();
  return {
    wake: () => {
      wakeUp();
    },
    async stop() {
      stopped = true;
      wakeUp();
      await running;
    },
  };
}
