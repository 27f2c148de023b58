/* Which sheets a checker must agree, and which agreements still hold at the present hash. */
import { type Sheet } from '@domain/evaluate';
import { sheetLabel } from '@domain/projections';
import { type OpenPoint } from '@domain/result';
import { type DocumentFacts, type GateFacts, placeIn, point } from './gate-facts';
import { type SheetKey } from './types';

/** Sheets of the working revision that are new or whose method or inputs moved against the base; all for a revalidation. */
export function changedSheets(of: DocumentFacts, all = false): Sheet[] {
  const before = of.baseEvaluation?.sheets ?? {};
  return Object.values(of.evaluation?.sheets ?? {}).filter(
    (sheet) => all || before[sheet.key]?.hash !== sheet.hash,
  );
}

/** How an agreement stands: given at the present hash, given for other inputs, undone, or never given. */
export function agreementOf(
  of: DocumentFacts,
  key: SheetKey,
  facts: Pick<GateFacts, 'agreements'>,
): 'agreed' | 'stale' | 'none' {
  const hash = of.evaluation?.sheets[key]?.hash;
  const given = facts.agreements.filter(
    (each) => each.document === of.document && each.sheet === key && !each.undone,
  );
  if (given.some((each) => each.hash === hash)) return 'agreed';
  return given.length > 0 ? 'stale' : 'none';
}

/** Changed sheets that are not agreed as they stand. Which sheets moved is a result too: a hidden reader is told only that some wait. */
export function agreementPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const points = sheetPoints(of, facts);
  if (!facts.hidden || points.length === 0) return points;
  const sentence = `${of.tag}: the sheets that changed are agreed after the unseen check.`;
  return [point('sheet-not-agreed', sentence, placeIn(facts, 'unseen', of))];
}

function sheetPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  return changedSheets(of, facts.case.class === 'revalidation').flatMap((sheet) => {
    const state = agreementOf(of, sheet.key, facts);
    if (state === 'agreed') return [];
    const where = placeIn(facts, `sheets/${encodeURIComponent(sheet.key)}`, of);
    const name = of.doc ? sheetLabel(of.doc, sheet.key) : sheet.key;
    return state === 'stale'
      ? [
          point(
            'agreement-stale',
            `${of.tag}, ${name}: this sheet changed after it was agreed. Look at it again.`,
            where,
          ),
        ]
      : [point('sheet-not-agreed', `${of.tag}, ${name}: this sheet is not agreed yet.`, where)];
  });
}
