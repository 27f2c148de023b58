/* What every request carries in `locals`; set by src/middleware.ts. */
import { type Current } from '@auth/index';
import { type Problem } from '@domain/result';
import { type Sent } from './http/context';
import { type Log } from './http/log';
import { type Runtime } from './runtime';

declare global {
  namespace App {
    interface Locals extends Pick<Runtime, 'db' | 'auth' | 'config' | 'clock' | 'version' | 'catcher'> {
      /** Stands in the log, in the header X-Request-Id and in every problem. */
      requestId: string;
      log: Log;
      /** The person who is signed in; undefined on public routes only. */
      who: Current | undefined;
      /** The body, once it was read. */
      sent?: Sent;
      /** What the problem page and the page of an error tell. */
      problem?: Problem;
    }
  }
}
