/* Due items in words: kind, text without figures where they are hidden, and how late. */
import { daysBetween, isOverdue } from '@domain/dates';
import { maskProse } from '@domain/hidden';
import { type DueRow } from '@data/due';
import { type Hidden } from '../../hidden-view';
import { dayWords, shortDay, weekdayWord } from '../days';

export const DUE_KINDS: Record<DueRow['kind'], string> = {
  'start-up': 'Start-up action',
  'approval-requirement': 'Approval requirement',
  pssr: 'Pre-startup safety review',
  training: 'Training',
  paper: 'Document',
  deficiency: 'Deficiency',
  answer: 'Answer',
  confirmation: 'Confirmation',
  analysis: 'Analysis',
  check: 'Check',
  removal: 'Removal',
  revalidation: 'Revalidation',
  'moved-result': 'Moved result',
  'own-note': 'Own note',
};

/** Kinds whose very words are a result. */
const TELL: ReadonlySet<DueRow['kind']> = new Set(['deficiency', 'moved-result']);

/** The text of a due item; while its case or document is hidden from the reader, results and figures are taken out. */
export function dueText(row: DueRow, hidden: Hidden): string {
  const withheld =
    (row.caseId !== null && hidden.cases.has(row.caseId)) ||
    (row.documentId !== null && hidden.documents.has(row.documentId));
  if (!withheld) return row.text;
  return TELL.has(row.kind) ? 'Its text is hidden until your own figures are in' : maskProse(row.text);
}

/** The margin of a list: weekday and day, or "Today"; late in words. */
export function whenOf(due: string, today: string): { day: string; more: string; late: boolean } {
  const days = daysBetween(today, due);
  if (days === 0) return { day: 'Today', more: shortDay(due), late: true };
  if (isOverdue(due, today)) return { day: lateWords(-days), more: shortDay(due), late: true };
  if (days > 300) return { day: weekdayWord(due), more: dayWords(due), late: false };
  return { day: weekdayWord(due), more: shortDay(due), late: false };
}

/** "2 days late". */
export function lateWords(days: number): string {
  return days === 1 ? '1 day late' : `${String(days)} days late`;
}
