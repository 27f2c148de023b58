/* Generated from the model's own table of permissions: every act × 6 roles × 5 seats × 11 stages has exactly one answer. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { ACTS, CASE_ACTS, actsFor, can, type Act, type On, type Seat, type Who } from '@domain/case';

type Line = {
  act: string;
  roles: string[] | 'any';
  seats: string[] | null;
  stages: string[] | 'all' | null;
  never: string;
};

const letters = (cell: string): string[] => cell.split(' ').filter(Boolean);

/** Reads the transcription of the table; shares nothing with the code under test. */
function table(): Line[] {
  const text = readFileSync(new URL('../../../reference/permissions-table.md', import.meta.url), 'utf8');
  const rows = text.split('\n').filter((line) => line.startsWith('| ') && !/^\| (acts|---)/.test(line));
  return rows.flatMap((line) => {
    const [acts = '', role = '', seat = '', stages = '', never = ''] = line
      .slice(1, -1)
      .split('|')
      .map((cell) => cell.trim());
    const names = acts
      .replace(/ \(.*\)$/, '')
      .replace(/ \(projected\)/, '')
      .split(', ');
    return names.map((act) => ({
      act,
      roles: role === 'any' ? ('any' as const) : letters(role),
      seats: seat === '–' ? null : letters(seat),
      stages: stages === 'all' ? ('all' as const) : stages === '–' ? null : letters(stages),
      never: never === '–' ? '' : never,
    }));
  });
}

const ROLES = {
  O: 'originator',
  C: 'checker',
  A: 'approver',
  P: 'operations',
  S: 'coordinator',
  U: 'auditor',
} as const;
const SEATS = { none: undefined, o: 'originator', c: 'checker', a: 'approver', p: 'operations' } as const;
const STAGES = {
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
} as const;

/** Facts under which no condition of the column "never" but the seats forbids, for this act. */
function quiet(act: string): Partial<On> {
  return {
    replaced: { person: 'someone', role: 'operations' },
    authoriser: 'me',
    unseenStands: false,
    authors: ['someone'],
    lookedFirst: ['someone'],
    raisedBy: 'me',
    installers: ['someone'],
    askedBy: /due$/.test(act) ? 'me' : 'someone',
    signedBefore: ['someone'],
    owner: act === 'do-due' ? 'me' : 'someone',
    recordedBy: 'someone',
    drafters: ['someone'],
    subject: 'someone',
    hidden: false,
  };
}

function seatsFor(held: string | undefined): Seat[] {
  const role = held as Seat['role'] | undefined;
  return role ? [{ id: 's1', role, person: 'me' }] : [];
}

/** Letters that stand alone in the cell "never" are seats; the words around them are facts, tried further down. */
const neverSeats = (line: Line): string[] =>
  line.never.split(/[,;] /).filter((part) => /^[ocap]$/.test(part));

function expected(line: Line, role: string, seat: string, stage: string): string {
  if (line.roles !== 'any' && !line.roles.includes(role)) return 'NOT_PERMITTED';
  if (line.seats && !line.seats.includes(seat)) return 'NOT_PERMITTED';
  if (neverSeats(line).includes(seat)) return 'NOT_INDEPENDENT';
  if (line.stages && line.stages !== 'all' && !line.stages.includes(stage)) return 'WRONG_STAGE';
  return 'ok';
}

const LINES = table();

describe('the table of permissions', () => {
  it('has the same acts in the model and in the code, in the same order', () => {
    expect(LINES.map((line) => line.act)).toEqual([...ACTS]);
    expect(LINES.length).toBeGreaterThan(70);
  });

  it.each(LINES.map((line) => [line.act, line] as const))(
    'answers %s for every role, seat and stage',
    (act, line) => {
      let asked = 0;
      for (const [roleLetter, role] of Object.entries(ROLES))
        for (const [seatLetter, seat] of Object.entries(SEATS))
          for (const [stageLetter, stage] of Object.entries(STAGES)) {
            const who: Who = { id: 'me', roles: [role] };
            const answer = can(who, act as Act, { stage, seats: seatsFor(seat), ...quiet(act) });
            const got = answer.ok ? 'ok' : answer.code;
            expect(got, `${act} by ${roleLetter} in seat ${seatLetter} at ${stageLetter}`).toBe(
              expected(line, roleLetter, seatLetter, stageLetter),
            );
            if (!answer.ok) expect(answer.sentence).toMatch(/^[A-Z].*\.$/);
            asked += 1;
          }
      expect(asked).toBe(6 * 5 * 11);
    },
  );
});

type Trial = { acts: string[]; facts: Partial<On>; code?: string };
/** One trial for each condition in words; the key is how the table says it. */
const WORDS: Record<string, Trial> = {
  'the one replaced in c or a, if the act is theirs to judge': {
    acts: ['replace-seat'],
    facts: { stage: 'approval', replaced: { person: 'me', role: 'approver' } },
  },
  'who is not the authoriser': { acts: ['confirm-authorisation'], facts: { authoriser: 'someone' } },
  'in K once an unseen entry stands': { acts: ['RETURN-own'], facts: { stage: 'check', unseenStands: true } },
  'author of the sheet or its external calculation': {
    acts: ['unseen', 'reveal', 'reconcile', 'agree', 'undo-agreement'],
    facts: { authors: ['me'] },
  },
  'one who looked first': { acts: ['unseen', 'agree'], facts: { lookedFirst: ['me'] } },
  'author of any checked sheet': { acts: ['PASS-check'], facts: { authors: ['me'] } },
  'who neither raised it nor succeeds': {
    acts: ['close-finding', 'reopen-finding'],
    facts: { raisedBy: 'someone', successor: 'another' },
  },
  "the verifier's line: installer": {
    acts: ['enter-field', 'fix', 'see-again'],
    facts: { installers: ['me'] },
  },
  'installer of any of its lines': { acts: ['ISSUE', 'REMOVE'], facts: { installers: ['me'] } },
  'who asked': { acts: ['EXTEND'], facts: { askedBy: 'me' } },
  'who signed the approval or an extension before': { acts: ['EXTEND'], facts: { signedBefore: ['me'] } },
  author: { acts: ['agree-removal'], facts: { authors: ['me'] } },
  'who is not the owner': { acts: ['do-due'], facts: { owner: 'someone' } },
  'the owner': { acts: ['accept-due', 'reject-due', 'waive-due', 'sign-deficiency'], facts: { owner: 'me' } },
  'who did not ask': { acts: ['accept-due', 'reject-due'], facts: { askedBy: 'someone' } },
  'who recorded it': { acts: ['sign-in-kind'], facts: { recordedBy: 'me' } },
  'who drafted or signed first': { acts: ['sign-rules-2'], facts: { drafters: ['me'] } },
  'own roles': { acts: ['administer'], facts: { subject: 'me' } },
  hidden: { acts: ['export-evidence', 'read-trail-of-case'], facts: { hidden: true }, code: 'HIDDEN' },
};

/** A role, seat and stage that the table allows for the act. */
function allowed(line: Line): { role: Who['roles']; seats: Seat[]; stage: On['stage'] } {
  const role = ROLES[(line.roles === 'any' ? 'O' : (line.roles[0] ?? 'O')) as keyof typeof ROLES];
  const seat = line.seats?.find((letter) => !neverSeats(line).includes(letter));
  const stage = Array.isArray(line.stages) ? (line.stages[0] as keyof typeof STAGES) : 'D';
  return {
    role: [role],
    seats: seatsFor(seat ? SEATS[seat as keyof typeof SEATS] : undefined),
    stage: STAGES[stage],
  };
}

describe('what forbids an act whatever the seat', () => {
  it('has a trial for every condition that the table says in words', () => {
    const whole = Object.keys(WORDS);
    for (const line of LINES) {
      let rest = line.never;
      for (const words of [...whole].sort((a, b) => b.length - a.length)) rest = rest.replace(words, '');
      expect(rest.replace(/\b[ocap]\b|[,; ]/g, ''), line.act).toBe('');
    }
  });

  it.each(Object.entries(WORDS))('refuses "%s"', (_words, trial) => {
    for (const act of trial.acts) {
      const line = LINES.find((each) => each.act === act);
      if (!line) throw new Error(`no such act: ${act}`);
      const { role, seats, stage } = allowed(line);
      const who: Who = { id: 'me', roles: role };
      expect(can(who, act as Act, { stage, seats, ...quiet(act) }).ok, act).toBe(true);
      const answer = can(who, act as Act, { stage, seats, ...quiet(act), ...trial.facts });
      expect(answer, act).toMatchObject({ ok: false, code: trial.code ?? 'NOT_INDEPENDENT' });
    }
  });

  it('holds for whom one stands in for', () => {
    const seats: Seat[] = [
      { id: 's1', role: 'checker', person: 'me' },
      { id: 's2', role: 'originator', person: 'absent' },
    ];
    const who: Who = { id: 'me', roles: ['checker'], standsFor: ['absent'] };
    expect(can(who, 'PASS-check', { stage: 'check', seats, ...quiet('PASS-check') })).toMatchObject({
      code: 'NOT_INDEPENDENT',
      sentence: expect.stringContaining('stand in'),
    });
  });

  it('lets a stand-in act in the seat, but only with the role', () => {
    const seats: Seat[] = [{ id: 's1', role: 'checker', person: 'absent' }];
    const on: On = { stage: 'check', seats, ...quiet('PASS-check') };
    expect(can({ id: 'me', roles: ['checker'], standsFor: ['absent'] }, 'PASS-check', on).ok).toBe(true);
    expect(can({ id: 'me', roles: ['operations'], standsFor: ['absent'] }, 'PASS-check', on).ok).toBe(false);
  });

  it('keeps a replaced originator from judging, and gives an ended seat no right', () => {
    const seats: Seat[] = [
      { id: 's1', role: 'originator', person: 'me', until: '2026-03-01T08:00:00.000Z' },
      { id: 's2', role: 'approver', person: 'me' },
    ];
    const who: Who = { id: 'me', roles: ['originator', 'approver'] };
    expect(can(who, 'SIGN', { stage: 'approval', seats })).toMatchObject({ code: 'NOT_INDEPENDENT' });
    expect(can(who, 'PASS-scenarios', { stage: 'scenarios', seats })).toMatchObject({
      code: 'NOT_PERMITTED',
    });
  });

  it('forbids when a fact that the row names was left out', () => {
    const bare: On = { stage: 'scenarios', seats: [] };
    expect(can({ id: 'me', roles: ['approver'] }, 'confirm-authorisation', bare).ok).toBe(false);
    expect(can({ id: 'me', roles: ['operations'] }, 'do-due', bare).ok).toBe(false);
    expect(can({ id: 'me', roles: ['coordinator'] }, 'sign-rules-2', bare).ok).toBe(false);
  });
});

describe('the acts of a page', () => {
  it('says of every act of a case whether it may be done and why not', () => {
    const seats: Seat[] = [{ id: 's1', role: 'originator', person: 'me' }];
    const answers = actsFor(
      { id: 'me', roles: ['originator'] },
      { stage: 'scenarios', seats },
      { 'PASS-scenarios': [{ code: 'scenario-undecided', sentence: 'One has no decision.', where: 'x' }] },
    );
    expect(answers.map((each) => each.act)).toEqual([...CASE_ACTS]);
    expect(answers.find((each) => each.act === 'edit-document')).toMatchObject({ ok: true });
    expect(answers.find((each) => each.act === 'PASS-scenarios')).toMatchObject({
      ok: false,
      code: 'GATE_SHUT',
    });
    expect(answers.find((each) => each.act === 'SIGN')).toMatchObject({ ok: false, code: 'NOT_PERMITTED' });
    expect(answers.filter((each) => !each.ok).every((each) => Boolean(each.sentence))).toBe(true);
  });
});
