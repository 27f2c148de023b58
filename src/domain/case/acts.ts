/* The bodies of the acts of a case: what a page or the interface sends, capped and told in sentences. */
import { z } from 'zod';
import { fail, fieldErrors, ok, type Result } from '@domain/result';
import { briefSchema } from './brief';
import { CAPS, day, id, line, reason, rich } from './text-fields';
import { CASE_CLASSES, DUE_KINDS, SEAT_ROLES, STAGES } from './types';

const quantity = z.strictObject({
  value: z.number({ error: 'A figure must be a number.' }),
  unit: z.string().min(1, 'The unit is missing.').max(24, 'There is no such unit.'),
  text: z.string().max(40, 'A figure has at most 40 characters.').optional(),
});
const hash = z.string().regex(/^[0-9a-f]{64}$/, 'This is not a hash of the program.');
const path = z.string().min(1, 'The place is missing.').max(400, 'There is no such place.');
const ids = (what: string) =>
  z.array(id(what)).max(CAPS.list, `At most ${String(CAPS.list)} are taken at once.`);
const password = z.string().min(1, 'Enter your password again to sign.').max(1_000, 'The password is wrong.');
const seat = z.strictObject({
  role: z.enum(SEAT_ROLES, { error: `A seat is one of ${SEAT_ROLES.join(', ')}.` }),
  person: id('The person'),
});
/** A signature: the password again, and the hash of the page that was on the screen. */
const signed = { password, code: z.string().max(12).optional(), pageHash: hash };
const why = (what = 'The reason') => reason(what);
const empty = z.strictObject({});
const answerField = z.union([
  quantity,
  z.string().trim().min(1, 'Enter what is there.').max(CAPS.line, 'Shorten it to one line.'),
]);

export const raiseSchema = z.strictObject({
  class: z.enum(CASE_CLASSES, { error: `The class is one of ${CASE_CLASSES.join(', ')}.` }),
  title: line('The title', 3),
  systems: ids('The system').min(1, 'Name at least one system that changes.'),
  whatChanges: rich('What changes').optional(),
  ends: day('The end').optional(),
  fromQuestion: id('The relief question').optional(),
});
export const briefOpsSchema = briefSchema.partial();
export const affectedAnswerSchema = z
  .strictObject({
    document: id('The system'),
    answer: z.enum(['included', 'not-affected'], { error: 'Say whether it is included or not affected.' }),
    reason: reason('The reason').optional(),
  })
  .refine((body) => body.answer === 'included' || body.reason !== undefined, {
    error: 'Say why the system is not affected.',
    path: ['reason'],
  });

const unseenEntry = z
  .strictObject({
    document: id('The system'),
    scope: path,
    value: quantity.optional(),
    word: line('The choice').optional(),
    cites: line('What it was read from').optional(),
  })
  .refine((entry) => (entry.value === undefined) !== (entry.word === undefined), {
    error: 'Enter either a figure with its unit or a choice.',
  });

const fieldEntry = z
  .strictObject({
    client: id('The entry'),
    line: path,
    as: z.enum(['installer', 'verifier'], { error: 'Say whether you installed it or verify it.' }),
    installer: line('The installer').optional(),
    seen: answerField.optional(),
    text: reason('The remark').optional(),
    files: ids('The photograph'),
    scan: line('The scanned tag').optional(),
    saw: z.iso.datetime({ error: 'The time at which it was seen is missing.' }),
    device: line('The phone'),
    cannot: z
      .strictObject({
        why: z.enum(['reach', 'painted', 'insulated', 'other'], { error: 'Say why it cannot be read.' }),
        means: line('The second means', 3),
        second: id('The second person'),
      })
      .optional(),
  })
  .refine((entry) => entry.seen !== undefined || entry.cannot !== undefined, {
    error: 'Enter what is there, or say that it cannot be read.',
    path: ['seen'],
  });

/** Body of every act, by the name under which it is posted. */
export const ACT_BODIES = {
  raise: raiseSchema,
  copy: empty,
  nominate: z.strictObject({
    seats: z.array(seat).min(1, 'Name at least one person.').max(20, 'At most 20 people sit in a case.'),
  }),
  'replace-seat': z.strictObject({
    role: seat.shape.role,
    from: id('The person replaced'),
    to: id('The successor'),
    reason: why(),
  }),
  'change-systems': z.strictObject({ add: ids('The system'), remove: ids('The system') }),
  'answer-affected': affectedAnswerSchema,
  PASS: z.strictObject(signed),
  SIGN: z.strictObject({
    ...signed,
    requirements: z
      .array(
        z.strictObject({
          text: reason('The requirement'),
          owner: id('The owner'),
          due: day('The day'),
          bars: z.enum(['start-up', 'extension']).optional(),
        }),
      )
      .max(50, 'At most 50 requirements go with a signature.')
      .default([]),
  }),
  RETURN: z.strictObject({
    to: z.enum(STAGES, { error: 'Say to which stage it is returned.' }),
    reason: why(),
  }),
  REFUSE: z.strictObject({ reason: why() }),
  HOLD: z.strictObject({ reason: why(), review: day('The day of review') }),
  RESUME: empty,
  WITHDRAW: z.strictObject({ reason: why() }),
  CARRY_OVER: z.strictObject({ document: id('The system') }),
  AUTHORISE: z.strictObject({ ...signed, words: reason('What was authorised') }),
  'AUTHORISE-spoken': z.strictObject({
    by: id('The approver who spoke'),
    at: z.iso.datetime({ error: 'The time of the authorisation is missing.' }),
    words: reason('What was said'),
  }),
  'confirm-authorisation': z.strictObject(signed),
  'record-acted': z.strictObject({
    document: id('The system'),
    at: z.iso.datetime({ error: 'The time is missing.' }),
  }),
  ISSUE: z.strictObject({ ...signed, document: id('The system') }),
  DROP: z.strictObject({ document: id('The system'), reason: why() }),
  'confirm-approval': z.strictObject(signed),
  'ask-extension': z.strictObject({ ends: day('The new end'), reason: why() }),
  EXTEND: z.strictObject(signed),
  'begin-removal': empty,
  REMOVE: z.strictObject({ ...signed, document: id('The system') }),
  unseen: z.strictObject({
    entries: z.array(unseenEntry).min(1, 'Enter at least one.').max(CAPS.list, 'Too many entries at once.'),
  }),
  reveal: z.strictObject({ document: id('The system') }),
  reconcile: z.strictObject({ text: rich('The reconciliation') }),
  agree: z.strictObject({ hash }),
  'raise-finding': z.strictObject({
    place: path,
    weight: z.enum(['must-fix', 'should-fix', 'remark', 'question'], {
      error: 'Say whether it must be fixed, should be fixed, or is a remark or a question.',
    }),
    text: rich('The finding'),
  }),
  'answer-finding': z.strictObject({ text: rich('The answer'), change: path.optional() }),
  'close-finding': z.strictObject({ text: rich('The remark').optional() }),
  'reopen-finding': z.strictObject({ text: rich('The reason') }),
  'enter-field': z.strictObject({
    entries: z
      .array(fieldEntry)
      .min(1, 'Enter at least one line.')
      .max(CAPS.list, 'Too many entries at once.'),
  }),
  fix: z.strictObject({ text: reason('What was done') }),
  'see-again': z.strictObject({ entry: fieldEntry }),
  'send-back': z.strictObject({ text: reason('Why it goes back') }),
  'ask-due': z.strictObject({
    kind: z.enum(DUE_KINDS),
    text: reason('What is due'),
    owner: id('The owner'),
    due: day('The day'),
    document: id('The system').optional(),
    subject: path.optional(),
    outcome: hash.optional(),
    interim: rich('The interim measure').optional(),
    bars: z.enum(['start-up', 'extension']).optional(),
  }),
  'do-due': z.strictObject({ text: reason('What was done'), file: id('The file').optional() }),
  'accept-due': empty,
  'reject-due': z.strictObject({ reason: why() }),
  'waive-due': z.strictObject({ reason: why() }),
  'sign-deficiency': z.strictObject(signed),
} as const;

export type ActName = keyof typeof ACT_BODIES;
export type ActBody<A extends ActName> = z.infer<(typeof ACT_BODIES)[A]>;

/** True for a name under which an act can be posted. */
export function isActName(name: string): name is ActName {
  return Object.hasOwn(ACT_BODIES, name);
}

/** Reads the body of an act. Fails with SCHEMA and one sentence for each field that is wrong. */
export function parseAct<A extends ActName>(act: A, body: unknown): Result<ActBody<A>> {
  const parsed = ACT_BODIES[act].safeParse(body);
  if (parsed.success) return ok(parsed.data as ActBody<A>);
  const errors = fieldErrors(parsed.error.issues);
  return fail('SCHEMA', errors[0]?.sentence ?? 'The request is not complete.', { errors });
}
