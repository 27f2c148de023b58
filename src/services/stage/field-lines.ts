/* Makes the lines of the field sheet from the signed revisions. */
import { fieldLines } from '@domain/field';
import { replaceLines } from '@data/field';
import { type StageWrite } from './types';

/** One line for each thing that operations must see at a changed relief point. */
export async function makeFieldLines(write: StageWrite): Promise<void> {
  for (const of of write.facts.documents) {
    if (!of.doc) continue;
    const lines = fieldLines(of.doc, of.baseDoc);
    await replaceLines(
      write.trx,
      write.file.row.id,
      of.document,
      lines.map((line) => ({
        key: line.key,
        ord: line.order,
        grouped: line.group,
        label: line.label,
        wants: line.wants ?? null,
        photo: line.photo,
        holds: line.holds,
        facts: {},
      })),
    );
  }
}
