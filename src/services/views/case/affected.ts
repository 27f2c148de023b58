/* The systems that a case reaches beyond its own, each with the answer of the originator. */
import { dayAt } from '../days';
import { nameIn } from '../../case-file';
import { type OpenedCase } from './open';

export type AffectedLine = {
  document: string;
  tag: string;
  name: string;
  href: string;
  why: string[];
  answer: 'included' | 'not-affected' | null;
  reason: string;
  by?: string;
  at?: string;
};

/** The affected systems in the order of their tags. Why a system is reached is told without figures to whom results are hidden. */
export function affectedView(of: OpenedCase): AffectedLine[] {
  const { file } = of;
  return file.affected
    .flatMap((row): AffectedLine[] => {
      const document = file.affectedDocuments.find((one) => one.id === row.documentId);
      if (!document) return [];
      return [
        {
          document: row.documentId,
          tag: document.tag,
          name: document.name,
          href: `/s/${file.site.slug}/systems/${document.tag}`,
          why: of.hidden ? [] : row.why,
          answer: row.answer,
          reason: of.hidden ? '' : (row.reason ?? ''),
          ...(row.byId ? { by: nameIn(file, row.byId) } : {}),
          ...(row.at ? { at: dayAt(row.at, file.site.timeZone) } : {}),
        },
      ];
    })
    .sort((a, b) => a.tag.localeCompare(b.tag));
}
