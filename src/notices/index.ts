/* The public face of the notices: drafts for services, worker and catcher for the server. */
export * from './events';
export { startCatcher, type CaughtMail, type Catcher } from './catcher';
export { makeMailer, type Mailer, type OutgoingMail } from './mailer';
export { databaseOutbox, queueNotices } from './outbox';
export {
  BACK_OFF,
  nextTry,
  sendDue,
  startWorker,
  type Outbox,
  type QueuedMail,
  type Worker,
  type WorkerLog,
} from './worker';
