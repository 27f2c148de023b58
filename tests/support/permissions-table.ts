/* Reads the model's own table of permissions from its transcription; shares nothing with the code under test. */
import { readFileSync } from 'node:fs';

export type PermissionLine = {
  act: string;
  roles: string[] | 'any';
  /** Null: no seat is asked for. */
  seats: string[] | null;
  /** Null: the act is not one of a case. */
  stages: string[] | 'all' | null;
  never: string;
};

export const ROLES = {
  O: 'originator',
  C: 'checker',
  A: 'approver',
  P: 'operations',
  S: 'coordinator',
  U: 'auditor',
} as const;
export const SEATS = {
  none: undefined,
  o: 'originator',
  c: 'checker',
  a: 'approver',
  p: 'operations',
} as const;
export const STAGES = {
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

const letters = (cell: string): string[] => cell.split(' ').filter(Boolean);

function linesOf(row: string): PermissionLine[] {
  const [acts = '', role = '', seat = '', stages = '', never = ''] = row
    .slice(1, -1)
    .split('|')
    .map((cell) => cell.trim());
  const names = acts
    .replace(/ \(.*\)$/, '')
    .replace(/ \(projected\)/, '')
    .split(', ');
  return names.map((act) => ({
    act,
    roles: role === 'any' ? 'any' : letters(role),
    seats: seat === '–' ? null : letters(seat),
    stages: stages === 'all' ? 'all' : stages === '–' ? null : letters(stages),
    never: never === '–' ? '' : never,
  }));
}

/** One line for each act. */
export function permissionTable(): PermissionLine[] {
  const text = readFileSync(new URL('../reference/permissions-table.md', import.meta.url), 'utf8');
  return text
    .split('\n')
    .filter((line) => line.startsWith('| ') && !/^\| (acts|---)/.test(line))
    .flatMap(linesOf);
}

/** Letters that stand alone in the cell "never" are seats; the words around them are facts. */
function neverSeats(line: PermissionLine): string[] {
  return line.never.split(/[,;] /).filter((part) => /^[ocap]$/.test(part));
}

/** The one answer of the table, while no fact in words forbids: the code of the refusal, or "ok". */
export function expectedAnswer(line: PermissionLine, role: string, seat: string, stage: string): string {
  if (line.roles !== 'any' && !line.roles.includes(role)) return 'NOT_PERMITTED';
  if (line.seats && !line.seats.includes(seat)) return 'NOT_PERMITTED';
  if (neverSeats(line).includes(seat)) return 'NOT_INDEPENDENT';
  if (line.stages && line.stages !== 'all' && !line.stages.includes(stage)) return 'WRONG_STAGE';
  return 'ok';
}
