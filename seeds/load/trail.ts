/* The trail of the seeded site: acts of all cases in the order of time, chained as if they had been done here. */
import { difference } from '@domain/difference';
import { appendTrail, type NewTrailEntry } from '@data/trail';
import { moveText } from '../cases/dates';
import { personId } from '../convert';
import { type CasePlan, seatsOf } from './plan';
import { SITE_ID, type World } from './world';

const ACTS: Record<string, string> = {
  'case.raised': 'raise',
  'draft.saved': 'edit-brief',
  'measure.recorded': 'edit-brief',
  'sheet.saved': 'edit-document',
  'case.returned': 'RETURN-check',
  'blind_check.entered': 'unseen',
  'case.signed': 'SIGN',
  'discrepancy.found': 'enter-field',
  'discrepancy.closed': 'see-again',
  'basis.issued': 'ISSUE',
  'emergency.authorised': 'AUTHORISE',
  'field.acted': 'record-acted',
  'finding.raised': 'raise-finding',
  'case.withdrawn': 'WITHDRAW',
  'case.refused': 'REFUSE',
};

function passedAct(text: string): string {
  if (text.startsWith('Draft')) return 'PASS-draft';
  if (text.startsWith('Scenario')) return 'PASS-scenarios';
  return text.startsWith('Calculation') ? 'PASS-check' : 'SIGN';
}

/** The events of a case as trail entries. */
function eventsOf(plan: CasePlan): NewTrailEntry[] {
  const { demo, world } = plan;
  const year = Number(demo.raised_on.slice(0, 4));
  return demo.events.map((event) => ({
    siteId: SITE_ID,
    at: world.shift.instant(event.at),
    act: event.event === 'gate.passed' ? passedAct(event.text) : (ACTS[event.event] ?? event.event),
    byId: personId(event.person),
    seat: seatsOf(demo).find((seat) => seat.person === event.person)?.role ?? null,
    caseId: plan.id,
    subject: `cases/${demo.id}`,
    body: { changes: [], why: moveText(event.text, world.shift, year) },
    hides: event.event === 'blind_check.entered',
  }));
}

/** What the originator changed in each document: one entry a document, so that authors of sheets are known. */
function editsOf(plan: CasePlan): NewTrailEntry[] {
  const { demo, world } = plan;
  const draft = demo.signoffs.find((one) => one.gate === 'draft')?.at ?? demo.events[0]?.at ?? demo.raised_on;
  const at = new Date(Date.parse(world.shift.instant(draft)) + 3_600_000).toISOString();
  return plan.documents.map((doc) => ({
    siteId: SITE_ID,
    at,
    act: 'edit-document',
    byId: personId(demo.nominated.originator),
    seat: 'originator',
    caseId: plan.id,
    subject: doc.document,
    body: {
      changes: difference(doc.base.body, doc.working.body).map((change) => ({
        path: `${doc.document}:${change.path}`,
        ...(change.old === undefined ? {} : { old: change.old }),
        ...(change.now === undefined ? {} : { new: change.now }),
      })),
    },
    hides: true,
  }));
}

/** Appends the acts of all cases in the order of time. */
export async function writeTrail(world: World, plans: readonly CasePlan[]): Promise<void> {
  const entries = plans.flatMap((plan) => [...eventsOf(plan), ...editsOf(plan)]);
  entries.sort((a, b) => (a.at < b.at ? -1 : a.at > b.at ? 1 : 0));
  for (const entry of entries) await appendTrail(world.trx, entry);
}
