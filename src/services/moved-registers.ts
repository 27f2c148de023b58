/* What moved against the registers: for revisions whose evaluation no signature has bound, the figures that the registers show. */
import { projectSystem } from '@domain/projections';
import { formatNumber, formatQuantity, fromSI } from '@engine/quantity';
import { type Db } from '@data/connection';
import { type DocumentRow } from '@data/documents';
import { findAll } from '@data/mapping';
import { P_POINTS, P_SCENARIOS } from '@data/tables/registers';
import { type RevisionRow } from '@data/revisions';
import { type Evaluated } from './evaluate-document';

/** One result that moved: what it is, as stored and as worked now, the change, and whether a verdict changed. */
export type MovedLine = { what: string; old: string; now: string; shift: string; verdict: boolean };

/** A change as a signed percentage. */
export function shiftWords(shift: number | undefined): string {
  return shift === undefined ? '' : `${shift > 0 ? '+' : ''}${formatNumber(shift * 100, 2)} %`;
}

type Row = Record<string, unknown>;
type Field = { key: string; words: string; unit?: string };

/** Figures of the registers; `unit` names the column that says in which unit they are shown. */
const SCENARIO: readonly Field[] = [
  { key: 'loadSi', words: 'relief load', unit: 'loadUnit' },
  { key: 'requiredSi', words: 'required area', unit: 'requiredUnit' },
  { key: 'relievingSi', words: 'relieving pressure', unit: 'relievingUnit' },
];
const POINT: readonly Field[] = [
  { key: 'ratedSi', words: 'rated capacity', unit: 'ratedUnit' },
  { key: 'inletLoss', words: 'inlet loss over set pressure' },
  { key: 'backSi', words: 'back pressure', unit: 'backUnit' },
];

function shown(row: Row, { key, unit }: Field): string {
  const value = row[key];
  if (typeof value !== 'number') return 'no result';
  const name = unit === undefined ? '-' : row[unit];
  return formatQuantity(fromSI(value, typeof name === 'string' ? name : '-'));
}

function figureLine(what: string, field: Field, old: Row, now: Row, share: number): MovedLine[] {
  const [a, b] = [old[field.key] ?? null, now[field.key] ?? null];
  if (a === b) return [];
  const shift = typeof a === 'number' && typeof b === 'number' && a !== 0 ? b / a - 1 : undefined;
  if (shift !== undefined && Math.abs(shift) <= share) return [];
  return [
    {
      what: `${what}, ${field.words}`,
      old: shown(old, field),
      now: shown(now, field),
      shift: shiftWords(shift),
      verdict: false,
    },
  ];
}

function verdictLine(what: string, old: Row, now: Row): MovedLine[] {
  const [a, b] = [String(old['verdict']), String(now['verdict'])];
  return a === b ? [] : [{ what: `${what}, verdict`, old: a, now: b, shift: '', verdict: true }];
}

function lines(
  stored: readonly Row[],
  present: readonly Row[],
  fields: readonly Field[],
  share: number,
): MovedLine[] {
  return stored.flatMap((old) => {
    const now = present.find(
      (one) => one['elementId'] === old['elementId'] && (one['key'] ?? null) === (old['key'] ?? null),
    );
    if (!now) return [];
    const what = String(old['tag'] || old['name']);
    return [
      ...fields.flatMap((field) => figureLine(what, field, old, now, share)),
      ...verdictLine(what, old, now),
    ];
  });
}

/** The lines that moved against the registers, or undefined where these hold nothing of the revision. */
export async function movedRegisters(
  db: Db,
  document: DocumentRow,
  revision: RevisionRow,
  { body, evaluation }: Evaluated,
  share: number,
): Promise<MovedLine[] | undefined> {
  const { state } = revision;
  if (state !== 'in-force' && state !== 'approved') return undefined;
  const where = { documentId: document.id, truth: state };
  const [scenarios, points] = await Promise.all([
    findAll(db, P_SCENARIOS, where, 'ord'),
    findAll(db, P_POINTS, where, 'tag'),
  ]);
  if (scenarios.length + points.length === 0) return undefined;
  const facts = { siteId: document.siteId, stops: 0, justifies: 0 };
  const now = projectSystem(body, evaluation, state, facts);
  return [
    ...lines(scenarios as never, now.scenarios as never, SCENARIO, share),
    ...lines(points as never, now.points as never, POINT, share),
  ];
}
