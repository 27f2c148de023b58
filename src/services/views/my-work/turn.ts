/* Whose turn a case is: what its stage asks of each seat, in words that tell no result. */
import { STAGE_WORDS, type SeatRole, type Stage } from '@domain/case';
import { type CaseRow, type SeatRow } from '@data/cases';

export const ORDER: readonly Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field', 'in-force'];

/** The seat that a stage waits for. */
const SEAT_OF: Partial<Record<Stage, SeatRole>> = {
  draft: 'originator',
  scenarios: 'originator',
  check: 'checker',
  approval: 'approver',
  field: 'operations',
  'due-for-removal': 'operations',
};

const TASKS: Partial<Record<Stage, string>> = {
  draft: 'Finish the brief',
  scenarios: 'Analyse the scenarios',
  check: 'Check the calculation',
  approval: 'Read and sign',
  field: 'Fill the field sheet',
  'due-for-removal': 'Remove the temporary change',
};

const SEAT_NAMES: Record<SeatRole, string> = {
  originator: 'the originator',
  checker: 'the checker',
  approver: 'the approver',
  operations: 'operations',
};

/** The seat that a case waits for now; none while it rests. */
export function seatInTurn(row: Pick<CaseRow, 'stage'>): SeatRole | undefined {
  return SEAT_OF[row.stage];
}

/** Where the mini rail stands. */
export function railAt(row: Pick<CaseRow, 'stage' | 'heldFrom'>): {
  at?: number;
  held?: boolean;
  words: string;
} {
  const held = row.stage === 'on-hold';
  const at = ORDER.indexOf(held ? (row.heldFrom ?? 'draft') : row.stage);
  const words = STAGE_WORDS[row.stage];
  return {
    ...(at < 0 ? {} : { at }),
    ...(held ? { held: true } : {}),
    words: words.charAt(0).toUpperCase() + words.slice(1),
  };
}

/** Part of the case's page where the turn is taken. */
const PARTS: Partial<Record<Stage, string>> = {
  scenarios: '/scenarios',
  check: '/unseen',
  approval: '/summary',
  field: '/field',
};

/** What a person must do on a case now: their open seats against the stage. */
export function turnOf(
  row: CaseRow,
  seats: readonly SeatRow[],
  persons: readonly string[],
): { task: string; part: string } | undefined {
  const seat = seatInTurn(row);
  const mine = seats.some((one) => one.role === seat && persons.includes(one.personId));
  const task = TASKS[row.stage];
  return seat && mine && task !== undefined ? { task, part: PARTS[row.stage] ?? '' } : undefined;
}

/** For whom a case waits, by name where a seat is taken. */
export function waitsFor(
  row: CaseRow,
  seats: readonly SeatRow[],
  names: ReadonlyMap<string, string>,
): string {
  const seat = seatInTurn(row);
  if (!seat) return row.stage === 'on-hold' ? 'on hold' : 'nobody';
  const holders = seats.filter((one) => one.role === seat).map((one) => names.get(one.personId) ?? '');
  return holders.length > 0 ? holders.join(', ') : SEAT_NAMES[seat];
}
