/* Due items of seeded cases and systems: start-up actions, approval requirements, reviews, emergencies, deficiencies, notes. */
import { type DueKind } from '@domain/case';
import { insert } from '@data/mapping';
import { newId } from '@data/ids';
import { DUE_ITEMS, type DueRow } from '@data/tables/cases';
import { type New } from '@data/mapping';
import { documentId, personId, rich } from '../convert';
import supplement from '../data/supplement/cases.json';
import { moveText } from '../cases/dates';
import { type DemoCase } from '../cases/demo-case-types';
import { type Bound } from './bound';
import { type CasePlan } from './plan';
import { signDeficiency } from './signatures';
import { SITE_ID, type World } from './world';

type Item = Pick<New<DueRow>, 'kind' | 'text' | 'ownerId' | 'due' | 'state' | 'askedBy' | 'askedAt'> &
  Partial<New<DueRow>>;
const NOTE_DAYS = 14;

function dayAfter(day: string, days: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);
}

const done = (state: string): DueRow['state'] => (state === 'done' ? 'accepted' : 'open');

/** Conditions of an approval; each takes owner, day and state from the action that it became. */
function requirements(plan: CasePlan): Item[] {
  const { demo, world } = plan;
  return demo.conditions.map((condition, n) => {
    const bars = condition.text.startsWith('No extension') ? ('extension' as const) : ('start-up' as const);
    const action = bars === 'extension' ? undefined : demo.startup_actions[n];
    const issued = plan.stage === 'in-force' && bars === 'start-up';
    return {
      kind: 'approval-requirement',
      text: moveText(condition.text, world.shift, Number(demo.raised_on.slice(0, 4))),
      ownerId: personId(action?.owner ?? demo.nominated.originator),
      due: world.shift.day(action?.due ?? demo.end ?? world.today),
      bars,
      closes: bars === 'start-up' ? 'field' : null,
      state: issued ? 'accepted' : done(action?.state ?? 'open'),
      askedBy: personId(condition.by),
      askedAt: world.shift.instant(condition.at),
    };
  });
}

/** Actions that no condition asked for. */
function actions(plan: CasePlan): Item[] {
  const { demo, world } = plan;
  const asked = demo.conditions.filter((condition) => !condition.text.startsWith('No extension')).length;
  return demo.startup_actions.slice(asked).map((action) => ({
    kind: plan.stage === 'in-force' ? ('removal' as DueKind) : ('own-note' as DueKind),
    text: action.text,
    ownerId: personId(action.owner),
    due: world.shift.day(action.due),
    state: done(action.state),
    askedBy: personId(demo.nominated.originator),
    askedAt: world.shift.instant(demo.raised_on),
  }));
}

function reviews(plan: CasePlan): Item[] {
  const { demo, world } = plan;
  const on = demo.field_sheet?.on ?? demo.raised_on;
  return (demo.pssr ?? []).map((one) => ({
    kind: one.point.toLowerCase().includes('trained') ? ('training' as DueKind) : ('pssr' as DueKind),
    text: one.state === 'done' ? one.point : `${one.point} (${one.state})`,
    ownerId: personId(one.by),
    due: dayAfter(world.shift.day(on), 7),
    bars: 'start-up',
    closes: 'field',
    state: done(one.state),
    askedBy: personId(demo.nominated.originator),
    askedAt: world.shift.instant(demo.signoffs.at(-1)?.at ?? demo.raised_on),
  }));
}

function emergency(plan: CasePlan): Item[] {
  const { demo, world } = plan;
  if (!demo.emergency) return [];
  const base = {
    askedBy: personId(demo.emergency.authorised_by),
    askedAt: world.shift.instant(demo.emergency.authorised_at),
  };
  const dueAt = world.shift.instant(demo.emergency.debt_due);
  const due = world.shift.day(demo.emergency.debt_due);
  const owed = { due, dueAt, state: 'open' as const, ...base };
  const confirmed = {
    due: world.shift.day(demo.emergency.authorised_at),
    state: 'accepted' as const,
    ...base,
  };
  return [
    {
      kind: 'confirmation',
      text: 'Confirm the authorisation by signature',
      ownerId: personId(demo.emergency.authorised_by),
      ...confirmed,
    },
    {
      kind: 'analysis',
      text: 'Analyse the scenarios of the emergency change and send it to the check',
      ownerId: personId(demo.nominated.originator),
      ...owed,
    },
    { kind: 'check', text: 'Check the emergency change', ownerId: personId(demo.nominated.checker), ...owed },
  ];
}

/** Open points of theirs that no gate derives become notes of the originator. */
function notes(plan: CasePlan): Item[] {
  const { demo, world } = plan;
  return demo.open_points
    .filter((point) => supplement.ownNotes.includes(point.code))
    .map((point) => ({
      kind: 'own-note' as const,
      text: point.sentence,
      ownerId: personId(demo.nominated.originator),
      due: dayAfter(world.today, NOTE_DAYS),
      state: 'open' as const,
      askedBy: personId(demo.nominated.originator),
      askedAt: world.shift.instant(demo.events.at(-1)?.at ?? demo.raised_on),
    }));
}

/** True when nothing that the case owes is left open. */
export function nothingOwed(demo: DemoCase): boolean {
  return demo.end === null && demo.startup_actions.every((action) => action.state === 'done');
}

/** Writes all that a case owes. */
export async function writeDue(plan: CasePlan): Promise<void> {
  const items = [
    ...requirements(plan),
    ...actions(plan),
    ...reviews(plan),
    ...emergency(plan),
    ...notes(plan),
  ];
  for (const item of items) {
    await insert(plan.world.trx, DUE_ITEMS, { id: newId('due'), siteId: SITE_ID, caseId: plan.id, ...item });
  }
}

/** Writes the signed deficiencies of systems that fail a rule today. */
export async function writeDeficiencies(world: World, inForce: ReadonlyMap<string, Bound>): Promise<void> {
  for (const own of supplement.deficiencies) {
    const outcomes = (inForce.get(own.system)?.outcomes ?? []).filter((outcome) => outcome.code === own.code);
    const document = documentId(own.system);
    const at = world.shift.instant(`${own.on}T10:00:00+01:00`);
    for (const outcome of outcomes) {
      await insert(world.trx, DUE_ITEMS, {
        id: newId('due'),
        siteId: SITE_ID,
        kind: 'deficiency',
        documentId: document,
        subject: outcome.subject,
        text: own.text.replace('{tag}', outcome.tag),
        ownerId: personId(own.owner),
        due: world.shift.day(own.due),
        closes: own.code,
        state: 'open',
        interim: rich(own.interim),
        outcome: outcome.hash,
        askedBy: personId(own.signedBy),
        askedAt: at,
        signatureId: await signDeficiency(world, own.signedBy, document, at),
      });
    }
  }
}
