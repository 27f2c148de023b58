/* Who may do what: the table of permissions as data, one line a row of the model. */
import { type Role, type SeatRole, type Stage } from './types';

/** What forbids an act whatever role and seat someone has. Letters are seats of the case; words are facts of it. */
export const NEVERS = [
  'o',
  'c',
  'p',
  'the one replaced',
  'not the authoriser',
  'an unseen entry stands',
  'author of the sheet',
  'one who looked first',
  'author of a checked sheet',
  'neither raised nor succeeds',
  'installer of the line',
  'installer of any line',
  'asked for it',
  'signed before',
  'not the owner',
  'the owner',
  'did not ask',
  'who recorded it',
  'drafted or signed first',
  'own roles',
  'hidden',
] as const;
export type Never = (typeof NEVERS)[number];

type Row = {
  acts: readonly string[];
  roles: 'any' | readonly Role[];
  /** Null: no seat is asked for. */
  seats: readonly SeatRole[] | null;
  /** Null: the act is not one of a case. */
  stages: 'all' | readonly Stage[] | null;
  never: readonly Never[];
};

const ROLE: Record<string, Role> = {
  O: 'originator',
  C: 'checker',
  A: 'approver',
  P: 'operations',
  S: 'coordinator',
  U: 'auditor',
};
const SEAT: Record<string, SeatRole> = { o: 'originator', c: 'checker', a: 'approver', p: 'operations' };
const STAGE: Record<string, Stage> = {
  D: 'draft',
  S: 'scenarios',
  K: 'check',
  A: 'approval',
  F: 'field',
  I: 'in-force',
  R: 'due-for-removal',
  X: 'removed',
  H: 'on-hold',
  W: 'withdrawn',
  Z: 'refused',
};

const pick = <T>(letters: string, of: Record<string, T>): T[] =>
  letters.split(' ').flatMap((letter) => of[letter] ?? []);

function row<const A extends string>(
  acts: readonly A[],
  roles: string,
  seats: string,
  stages: string,
  ...never: Never[]
) {
  return {
    acts,
    roles: roles === 'any' ? ('any' as const) : pick(roles, ROLE),
    seats: seats === '–' ? null : pick(seats, SEAT),
    stages: stages === 'all' ? ('all' as const) : stages === '–' ? null : pick(stages, STAGE),
    never,
  } satisfies Row;
}

/** Role and seat are needed where both stand; letters as in the model: O C A P S U, o c a p, D S K A F I R X H W Z. */
export const PERMISSIONS = [
  row(['read', 'session', 'password'], 'any', '–', 'all'),
  row(['calculate', 'ask'], 'O C A P S', '–', 'all'),
  row(['raise'], 'O', '–', '–'),
  row(['copy'], 'O', '–', 'W Z'),
  row(['edit-brief', 'nominate', 'change-systems', 'answer-affected', 'edit-document'], 'O', 'o', 'D S'),
  row(['replace-seat'], 'O A', 'o a', 'D S K A F H', 'the one replaced'),
  row(['PASS-draft'], 'O', 'o', 'D'),
  row(['PASS-draft-graded'], 'A', 'a', 'D', 'o'),
  row(['AUTHORISE-spoken'], 'O P', 'o p', 'D'),
  row(['AUTHORISE'], 'A', '–', 'D', 'o', 'c', 'p'),
  row(['confirm-authorisation'], 'A', '–', 'S K A F', 'not the authoriser'),
  row(['record-acted'], 'P', 'p', 'S K A F', 'o', 'c'),
  row(['PASS-scenarios'], 'O', 'o', 'S'),
  row(['RETURN-own'], 'O', 'o', 'S K', 'an unseen entry stands'),
  row(
    ['unseen', 'reveal', 'reconcile', 'agree', 'undo-agreement'],
    'C',
    'c',
    'K',
    'o',
    'author of the sheet',
    'one who looked first',
  ),
  row(['PASS-check'], 'C', 'c', 'K', 'o', 'author of a checked sheet'),
  row(['raise-finding'], 'C A P', 'c a p', 'K A F', 'o'),
  row(['answer-finding'], 'O', 'o', 'S K A F'),
  row(['close-finding', 'reopen-finding'], 'C A P', 'c a p', 'S K A F', 'neither raised nor succeeds'),
  row(['SIGN', 'REFUSE', 'require'], 'A', 'a', 'A', 'o', 'c'),
  row(['RETURN-check'], 'C', 'c', 'K'),
  row(['RETURN-approval'], 'A', 'a', 'A'),
  row(['RETURN-field'], 'P', 'p', 'F'),
  row(['CARRY_OVER'], 'O', 'o', 'D S K A F'),
  row(['HOLD'], 'O A', 'o a', 'D S K A F'),
  row(['RESUME'], 'O A', 'o a', 'H'),
  row(['WITHDRAW'], 'O', 'o', 'D S K A F H'),
  row(['confirm-approval', 'DROP'], 'A', 'a', 'F', 'o', 'c'),
  row(['enter-field', 'fix', 'see-again'], 'P', '–', 'S K A F I R', 'o', 'c', 'installer of the line'),
  row(['send-back'], 'P', 'p', 'F', 'o', 'c'),
  row(['ISSUE'], 'P', 'p', 'F', 'o', 'c', 'installer of any line'),
  row(['ask-extension'], 'O P', 'o p', 'I R'),
  row(['EXTEND'], 'A', '–', 'I R', 'o', 'c', 'asked for it', 'signed before'),
  row(['begin-removal', 'edit-removal'], 'O', 'o', 'I R'),
  row(['agree-removal'], 'C', 'c', 'R', 'o', 'author of the sheet'),
  row(['sign-removal'], 'A', 'a', 'R', 'o', 'c'),
  row(['REMOVE'], 'P', 'p', 'R', 'o', 'c', 'installer of any line'),
  row(['do-due'], 'O C A P S', '–', 'all', 'not the owner'),
  row(['accept-due', 'reject-due'], 'O C A P S', '–', 'all', 'the owner', 'did not ask'),
  row(['waive-due', 'sign-deficiency'], 'A', '–', 'all', 'the owner', 'o', 'c'),
  row(['record-in-kind', 'record-impairment', 'sight-condition', 'move-device'], 'P', '–', '–'),
  row(['sign-in-kind'], 'O C', '–', '–', 'who recorded it'),
  row(['draft-rules', 'sign-rules-1', 'run-moved-results'], 'S', '–', '–'),
  row(['sign-rules-2'], 'A S', '–', '–', 'drafted or signed first'),
  row(['administer'], 'S', '–', '–', 'own roles'),
  row(['upload', 'attach'], 'O C A P', '–', 'D S K A F I R'),
  row(['export-evidence', 'read-trail-of-case'], 'any', '–', 'all', 'hidden'),
  row(['read-site-trail', 'audit-lists'], 'S U', '–', '–'),
] as const;

export type Act = (typeof PERMISSIONS)[number]['acts'][number];

const ROWS = new Map<string, Row>(
  PERMISSIONS.flatMap((each) => each.acts.map((act) => [act, each] as const)),
);

/** Every act that a person can ask for, in the order of the table. */
export const ACTS: readonly Act[] = PERMISSIONS.flatMap((each) => [...each.acts] as Act[]);

/** The row of an act, or undefined for a word that is no act (system acts are no person's). */
export function rowOf(act: string): Readonly<Row> | undefined {
  return ROWS.get(act);
}
