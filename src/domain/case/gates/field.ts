/* Gate of the field verification of one system: all seen, nothing differs, start-up items done. */
import { monthsBetween } from '@domain/dates';
import {
  comparedEntry,
  faultsOfEntry,
  type Discrepancy,
  type FieldEntry,
  type FieldLine,
} from '@domain/field';
import { type OpenPoint } from '@domain/result';
import { type DocumentFacts, type GateFacts, nameOf, placeIn, point } from '../gate-facts';
import { type DueItem } from '../types';
import { movedBasis } from './check';
import { voidedPoints } from './approval';
import { deficiencyPoints, outcomePoints } from './outcomes';

const SETTLED: readonly Discrepancy['state'][] = ['seen-again', 'accepted'];
/** Due items that start-up always waits for; others only when they say so. */
const BEFORE_START_UP: readonly DueItem['kind'][] = ['start-up', 'pssr', 'training'];

/** The verifier's entry that counts for a line: the one seen last. */
export function entryOf(line: FieldLine, facts: Pick<GateFacts, 'field'>): FieldEntry | undefined {
  return facts.field.entries
    .filter((entry) => entry.line === line.key && entry.as === 'verifier')
    .reduce<FieldEntry | undefined>(
      (last, entry) => (!last || entry.saw >= last.saw ? entry : last),
      undefined,
    );
}

/** Who installed what a line is about. */
export function installersOf(line: FieldLine, facts: Pick<GateFacts, 'field'>): string[] {
  return facts.field.entries
    .filter((entry) => entry.line === line.key)
    .flatMap((entry) => [
      ...(entry.as === 'installer' ? [entry.by] : []),
      ...(entry.installer ? [entry.installer] : []),
    ]);
}

/** True when what was seen last on a line is what is signed there now. */
function agreesNow(line: FieldLine, entry: FieldEntry | undefined, facts: GateFacts): boolean {
  return (
    entry !== undefined &&
    comparedEntry(line, entry, facts.barometer && { barometer: facts.barometer })?.agrees === true
  );
}

/** What was seen before the case went back and came again with other figures must be seen again. */
function outdated(line: FieldLine, entry: FieldEntry, facts: GateFacts): string[] {
  if (entry.seen === undefined || agreesNow(line, entry, facts)) return [];
  const told = facts.field.discrepancies.some(
    (each) => each.entry === entry.id || onPlace(each, line, facts),
  );
  return told
    ? []
    : [`${line.group}, ${line.label}: what was seen last is not what is signed now; see it again.`];
}

/** A discrepancy on the same relief point that is still to be settled speaks for its other lines as well, until then. */
function onPlace(each: Discrepancy, line: FieldLine, facts: Pick<GateFacts, 'field'>): boolean {
  const entry = facts.field.entries.find((one) => one.id === each.entry);
  const other = facts.field.lines.find((one) => one.key === entry?.line);
  if (other?.key === line.key) return ['open', 'fixed', 'accepted'].includes(each.state);
  const place = (one: FieldLine): string => one.group.split(' · ')[0] ?? '';
  return other !== undefined && place(other) === place(line) && ['open', 'fixed'].includes(each.state);
}

/** A discrepancy is settled when it was seen again or accepted; one sent back, when what is signed now is what is there. */
function isSettled(each: Discrepancy, line: FieldLine | undefined, facts: GateFacts): boolean {
  if (SETTLED.includes(each.state)) return true;
  return each.state === 'sent-back' && line !== undefined && agreesNow(line, entryOf(line, facts), facts);
}

/** The block of the field sheet that shows a line; it opens by the line's key. */
function placeOfLine(facts: GateFacts, line: FieldLine, anchor = `line-${String(line.order)}`): string {
  return `cases/${facts.case.number}/field?line=${encodeURIComponent(line.key)}#${anchor}`;
}

function linePoints(line: FieldLine, facts: GateFacts): OpenPoint[] {
  const where = placeOfLine(facts, line);
  const entry = entryOf(line, facts);
  if (!entry) return [point('field-line-missing', `${line.group}, ${line.label}: not seen yet.`, where)];
  const faults = [
    ...faultsOfEntry(line, entry).map((sentence) => point('field-evidence-missing', sentence, where)),
    ...outdated(line, entry, facts).map((sentence) => point('field-line-missing', sentence, where)),
  ];
  const judges = facts.case.seats.filter(
    (seat) => !seat.until && ['originator', 'checker'].includes(seat.role),
  );
  const apart =
    !judges.some((seat) => seat.person === entry.by) && !installersOf(line, facts).includes(entry.by);
  if (apart) return faults;
  const name = nameOf(facts, entry.by);
  return [
    ...faults,
    point(
      'field-verifier',
      `${line.label}: ${name} installed this or made the case, and cannot be the one who verifies it.`,
      where,
    ),
  ];
}

function discrepancyPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const keys = new Set(
    facts.field.lines.filter((line) => line.document === of.document).map((line) => line.key),
  );
  const mine = new Map(
    facts.field.entries.filter((entry) => keys.has(entry.line)).map((entry) => [entry.id, entry]),
  );
  return facts.field.discrepancies
    .filter((each) => each.holds && mine.has(each.entry))
    .map((each) => ({
      each,
      line: facts.field.lines.find((one) => one.key === mine.get(each.entry)?.line),
    }))
    .filter(({ each, line }) => !isSettled(each, line, facts))
    .map(({ each, line }) => {
      const sentence = `Discrepancy ${String(each.number)} (${line?.label ?? 'field sheet'}) holds start-up. ${each.clears}`;
      const anchor = `discrepancy-${String(each.number)}`;
      const where = line ? placeOfLine(facts, line, anchor) : placeIn(facts, 'field', of, anchor);
      return point('discrepancy-open', sentence, where);
    });
}

function startUpPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const where = `cases/${facts.case.number}/field?at=start-up`;
  return facts.dueItems
    .filter((item) => item.case === facts.case.id && item.state === 'open')
    .filter((item) => !item.document || item.document === of.document)
    .filter(
      (item) => item.bars === 'start-up' || (item.bars === undefined && BEFORE_START_UP.includes(item.kind)),
    )
    .map((item) =>
      point('start-up-action-open', `${item.text} is not done, and start-up waits for it.`, where),
    );
}

function aged(facts: GateFacts, of: DocumentFacts): OpenPoint[] {
  const signed = facts.signatures
    .filter((each) => ['approval', 'confirm-approval'].includes(each.gate) && each.valid)
    .map((each) => each.at);
  const latest = signed.sort().at(-1);
  const months = latest ? monthsBetween(latest, facts.today) : 0;
  if (months < facts.rules.approvalAge) return [];
  const sentence = `The approval is ${String(months)} months old and the change is not in the field: an approver must confirm that it still holds.`;
  return [point('approval-aged', sentence, placeIn(facts, 'summary', of))];
}

/** All that keeps one signed system from being put in force. */
export function fieldPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const lines = facts.field.lines.filter((line) => line.document === of.document);
  const grade =
    of.doc && of.doc.grade !== 'worked'
      ? [
          point(
            'grade-not-worked',
            `${of.tag} is not worked here yet; start-up needs a worked basis.`,
            placeIn(facts, 'changes', of),
          ),
        ]
      : [];
  return [
    ...voidedPoints(facts, ['check', 'approval']),
    ...grade,
    ...movedBasis(of, facts),
    ...lines.flatMap((line) => linePoints(line, facts)),
    ...discrepancyPoints(of, facts),
    ...startUpPoints(of, facts),
    ...aged(facts, of),
    ...deficiencyPoints(of, facts, true),
    ...outcomePoints('field', of, facts),
  ];
}
