/* The systems of a case as tabs of a part, and the one that a page shows. */
import { fail, ok, type Result } from '@domain/result';
import { type CaseDocumentFile } from '../../case-file';
import { documentOf } from '../../stage/revisions';
import { type OpenedCase } from './open';

export type SystemTab = { label: string; href: string; current: boolean };

/** The system named in the address, else the first of the case. */
export function systemOf(of: OpenedCase, tag: string | null): Result<CaseDocumentFile> {
  const one = tag === null || tag === '' ? of.file.documents[0] : documentOf(of.file, tag);
  return one
    ? ok(one)
    : fail('UNKNOWN', `Case ${of.file.row.number} does not hold ${(tag ?? '').slice(0, 60)}.`);
}

/** A tab for each system, when the case holds several. */
export function systemTabs(of: OpenedCase, part: string, current: string): SystemTab[] {
  const { file } = of;
  if (file.documents.length < 2) return [];
  return file.documents.map(({ document }) => ({
    label: document.tag,
    href: `/s/${file.site.slug}/cases/${file.row.number}/${part}?system=${encodeURIComponent(document.tag)}`,
    current: document.tag === current,
  }));
}
