/* Writes the ten cases of the invented site, each in its stage with everything that came before it. */
import { hashOf } from '@domain/basis';
import { createCase, putCaseDocument, raiseCaseCounter, takeSeat } from '@data/cases';
import { keepImports } from '@data/evaluations';
import { insert } from '@data/mapping';
import { newId } from '@data/ids';
import { insertRevision } from '@data/revisions';
import { AFFECTED, type CaseRow } from '@data/tables/cases';
import { caseId, documentId, personId, SITE } from '../convert';
import { briefOf } from '../cases/brief';
import { type DemoCase } from '../cases/demo-case-types';
import { type Sides } from '../cases/live';
import { snapshotOf, stored } from '../cases/machine';
import { writeAgreements } from './agreements';
import { type Bound } from './bound';
import { nothingOwed, writeDue } from './due';
import { fieldOf, writeField } from './field-sheet';
import { findingsOf, writeFindings } from './findings';
import { writeNotices } from './notices';
import { type CaseDoc, type CasePlan, documentsOf, seatsOf, stageOf } from './plan';
import { briefHash, type CaseRecords } from './signatures';
import { type DocumentCheck, reconcile, unseenOf, writeUnseen } from './unseen';
import { RULES_ID, SITE_ID, type World } from './world';

const ANSWER_AGE = 60 * 86_400_000;

/** All cases in the order in which they were raised, worked out and not yet written. */
export function planCases(world: World, inForce: ReadonlyMap<string, Bound>): CasePlan[] {
  const cases = (SITE.cases as DemoCase[]).toSorted((a, b) => (a.raised_on < b.raised_on ? -1 : 1));
  return cases.map((demo) => {
    const documents = documentsOf(world, demo, inForce);
    const sides = new Map<string, Sides>(
      documents.map((doc) => [doc.tag, { base: doc.base.evaluation, this: doc.working.evaluation }]),
    );
    return {
      world,
      demo,
      id: caseId(demo.id),
      stage: stageOf(demo),
      documents,
      brief: briefOf(demo, world.shift, sides),
    };
  });
}

function stageAt(plan: CasePlan): string {
  const moves = plan.demo.events.filter((event) =>
    /gate\.passed|case\.(raised|returned|withdrawn|refused)|basis\.issued|emergency\.authorised/.test(
      event.event,
    ),
  );
  return plan.world.shift.instant(moves.at(-1)?.at ?? plan.demo.raised_on);
}

function authorisedOf(plan: CasePlan): CaseRow['authorised'] {
  const emergency = plan.demo.emergency;
  if (!emergency) return null;
  const by = personId(emergency.authorised_by);
  return {
    by,
    how: 'signed',
    recordedBy: by,
    at: plan.world.shift.instant(emergency.authorised_at),
    words: emergency.authorisation,
  };
}

async function writeSeats({ demo, id, world }: CasePlan, fromAt: string): Promise<void> {
  for (const { role, person } of seatsOf(demo)) {
    await takeSeat(world.trx, { caseId: id, role, personId: personId(person), fromAt });
  }
  const [, year = '', number = ''] = demo.id.split('-');
  await raiseCaseCounter(world.trx, SITE_ID, Number(year), Number(number));
}

/** Writes the row of a case and its seats. */
export async function writeCaseRow(plan: CasePlan): Promise<void> {
  const { demo, world, brief } = plan;
  const { instant } = world.shift;
  const at = stageAt(plan);
  const closed =
    plan.stage === 'withdrawn' ||
    plan.stage === 'refused' ||
    (plan.stage === 'in-force' && nothingOwed(demo));
  const raisedAt = instant(demo.events[0]?.at ?? demo.raised_on);
  await createCase(world.trx, {
    id: plan.id,
    siteId: SITE_ID,
    number: demo.id,
    title: demo.title,
    class: demo.class as CaseRow['class'],
    stage: plan.stage,
    snapshot: stored(
      snapshotOf(
        demo,
        plan.documents.map((doc) => doc.document),
        brief.ends,
      ),
    ),
    brief,
    briefHash: briefHash(brief),
    startsOn: brief.starts ?? null,
    endsOn: brief.ends ?? null,
    actedAt: demo.emergency ? instant(demo.emergency.acted_at) : null,
    closedAt: closed ? at : null,
    raisedBy: personId(demo.nominated.originator),
    raisedAt,
    stageAt: at,
    rulesId: RULES_ID,
    authorised: authorisedOf(plan),
  });
  await writeSeats(plan, raisedAt);
}

async function writeWorking(plan: CasePlan, doc: CaseDoc): Promise<void> {
  if (doc.issued !== undefined) return;
  const { world, demo } = plan;
  const approved = doc.state === 'approved';
  const signedAt = demo.signoffs.find((one) => one.gate === 'approval')?.at;
  const acted = demo.emergency ? world.shift.instant(demo.emergency.acted_at) : null;
  await keepImports(world.trx, doc.working.importsHash, doc.working.imports);
  await insertRevision(world.trx, {
    id: doc.workingRevision,
    documentId: doc.document,
    number: null,
    state: doc.state === 'dropped' ? 'dropped' : approved ? 'approved' : 'working',
    caseId: plan.id,
    baseId: doc.baseRevision,
    documentHash: doc.working.documentHash,
    importsHash: doc.working.importsHash,
    rulesId: RULES_ID,
    evaluationKey: doc.working.evaluation.key,
    approvedAt: approved && signedAt !== undefined ? world.shift.instant(signedAt) : null,
    inPlantFrom: acted,
    knownFrom: acted,
    body: doc.working.body,
  });
}

/** What a case holds: working revisions, and what it says of each document. */
async function writeDocumentsOf(plan: CasePlan): Promise<void> {
  const acted = plan.demo.emergency ? plan.world.shift.instant(plan.demo.emergency.acted_at) : null;
  for (const doc of plan.documents) {
    await writeWorking(plan, doc);
    await putCaseDocument(plan.world.trx, {
      caseId: plan.id,
      documentId: doc.document,
      why: doc.why,
      baseId: doc.baseRevision,
      workingId: doc.workingRevision,
      state: doc.state,
      actedAt: acted,
    });
  }
}

const LEAST_REASON = 40;

/** A short answer says beside what it was looked at for. */
function reasonOf(one: DemoCase['ripple'][number]): string | null {
  if (one.verdict === null || one.verdict.length >= LEAST_REASON) return one.verdict;
  return `${one.verdict} It was looked at because of this: ${one.why}.`;
}

/** The systems that the change may affect, with the originator's answers; answers are given anew before they grow old. */
async function writeAffected(plan: CasePlan): Promise<void> {
  const { demo, world } = plan;
  const signed = demo.signoffs.find((one) => one.gate === 'draft')?.at ?? demo.raised_on;
  const young = Date.parse(world.today) - ANSWER_AGE;
  const given = Date.parse(world.shift.instant(signed));
  const live = ['scenarios', 'check', 'approval', 'field'].includes(plan.stage);
  const at = new Date(live ? Math.max(given, young) : given).toISOString();
  for (const one of demo.ripple) {
    const included = one.changes.length > 0;
    const answered = one.reviewed ? { byId: personId(demo.nominated.originator), at } : {};
    await insert(world.trx, AFFECTED, {
      id: newId('affected'),
      caseId: plan.id,
      documentId: documentId(one.system),
      why: [one.why],
      figuresHash: hashOf('affected', { document: documentId(one.system), why: [one.why] }),
      answer: one.reviewed ? (included ? 'included' : 'not-affected') : null,
      reason: reasonOf(one),
      ...answered,
    });
  }
}

/** The records of a case in memory: what its signatures bind. */
export type Records = CaseRecords & { checks: DocumentCheck[] };

/** Works out the unseen check, findings and field sheet of a case. */
export function recordsOf(plan: CasePlan): Records {
  const checks = unseenOf(plan);
  const unseen = checks.flatMap(({ entries }) => entries.map(({ entry }) => entry));
  return { checks, unseen, findings: findingsOf(plan), field: fieldOf(plan) };
}

/** Writes everything of a case that refers to its revisions. Row, seats and signatures stand already. */
export async function writeCase(plan: CasePlan, records: Records): Promise<void> {
  await writeDocumentsOf(plan);
  await writeAffected(plan);
  await writeFindings(plan, records.findings);
  await writeUnseen(plan, records.checks);
  await reconcile(plan, records.checks);
  await writeAgreements(plan, records.checks);
  await writeField(plan, records.field);
  await writeDue(plan);
  await writeNotices(plan);
}
