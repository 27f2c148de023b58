/* Agreements of a seeded case: every changed sheet at its present hash, but for those that theirs say fell since. */
import { changedSheets } from '@domain/case';
import { addAgreement } from '@data/check';
import { answerId, personId, pointId, scenarioKey } from '../convert';
import { type CaseDoc, type CasePlan, factsOf } from './plan';

/** The sheets that a tick of theirs stands for. */
function sheetsOf(sheet: string): string[] {
  const [, cause = '', third = ''] = sheet.split('/');
  if (cause === 'device') return [`outlet:${pointId(third)}/own`];
  const answer = `${scenarioKey(cause)}/${answerId(third)}`;
  return [`limit:${answer}`, `load:${answer}`, `size:${answer}`];
}

type Given = { sheet: string; hash: string; at: string };

/** Sheets whose agreement fell with a change keep the hash of the revision that the case began from. */
function given(plan: CasePlan, doc: CaseDoc, agreedAt: string): Given[] {
  const ticks = (plan.demo.ticks ?? []).filter((tick) => tick.sheet.startsWith(`${doc.tag}/`));
  const fallen = new Set(
    ticks.filter((tick) => tick.state !== 'valid').flatMap((tick) => sheetsOf(tick.sheet)),
  );
  const alreadyAgreed = new Set(ticks.flatMap((tick) => sheetsOf(tick.sheet)));
  const sheets = doc.working.evaluation.sheets;
  const keys = new Set([...changedSheets(factsOf(doc)).map((sheet) => sheet.key), ...alreadyAgreed]);
  return [...keys].flatMap((key) => {
    const from = fallen.has(key) ? doc.base.evaluation.sheets : sheets;
    const hash = from[key]?.hash;
    const tick = ticks.find((one) => sheetsOf(one.sheet).includes(key));
    return hash === undefined
      ? []
      : [{ sheet: key, hash, at: tick ? plan.world.shift.instant(tick.at) : agreedAt }];
  });
}

function agreedAt(plan: CasePlan, revealedAt: string): string {
  const signed = plan.demo.signoffs.find((one) => one.gate === 'calculation check')?.at;
  const before = signed === undefined ? undefined : Date.parse(plan.world.shift.instant(signed)) - 600_000;
  return new Date(Math.max(before ?? 0, Date.parse(revealedAt))).toISOString();
}

/** Writes the agreements of the documents that were checked. */
export async function writeAgreements(
  plan: CasePlan,
  checks: readonly { doc: CaseDoc; revealedAt: string }[],
): Promise<void> {
  const person = personId(plan.demo.nominated.checker);
  for (const { doc, revealedAt } of checks) {
    for (const { sheet, hash, at } of given(plan, doc, agreedAt(plan, revealedAt))) {
      await addAgreement(plan.world.trx, {
        caseId: plan.id,
        documentId: doc.document,
        sheetKey: sheet,
        sheetHash: hash,
        personId: person,
        at,
      });
    }
  }
}
