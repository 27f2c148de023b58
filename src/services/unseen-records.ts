/* Rows of the unseen check as the domain reads them. */
import { type UnseenEntry } from '@domain/case';
import { type UnseenWithFate } from '@data/check';

function asDomain(entry: UnseenWithFate): UnseenEntry {
  const reconciled = entry.reconciliations.at(-1);
  return {
    id: entry.id,
    case: entry.caseId,
    document: entry.documentId,
    scope: entry.scope,
    layer: entry.layer,
    quantity: entry.quantity,
    ...(entry.value ? { value: entry.value } : {}),
    ...(entry.word !== null ? { word: entry.word } : {}),
    ...(entry.cites !== null ? { cites: entry.cites } : {}),
    round: entry.round,
    by: entry.byId,
    at: entry.at,
    ...(entry.firstView ? { firstView: entry.firstView } : {}),
    ...(entry.route ? { route: entry.route } : {}),
    ...(entry.comparison?.against != null ? { against: entry.comparison.against } : {}),
    ...(entry.comparison?.deviation != null ? { deviation: entry.comparison.deviation } : {}),
    ...(reconciled ? { reconciled: { text: reconciled.text, by: reconciled.byId, at: reconciled.at } } : {}),
  };
}

/** The unseen entries of a case, oldest first. */
export function unseenEntries(file: { unseen: readonly UnseenWithFate[] }): UnseenEntry[] {
  return file.unseen.map(asDomain);
}
