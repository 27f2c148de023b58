/* Findings of a seeded case with their threads, each tied to a place of the document or of the case. */
import { type Finding } from '@domain/case';
import { insert } from '@data/mapping';
import { newId } from '@data/ids';
import { FINDING_POSTS, FINDINGS } from '@data/tables/check';
import { documentId, groupId, idOf, personId, pointId, rich, scenarioKey } from '../convert';
import { ONCE_CAUSES } from '../convert/keys';
import { type DemoFinding } from '../cases/demo-case-types';
import { type CasePlan } from './plan';

type Place = (rest: string[]) => string;

function causePlace([cause = '']: string[]): string {
  const once = ONCE_CAUSES[cause];
  return once === undefined ? `scenarios/${scenarioKey(cause)}` : `once/${once}`;
}

const PLACES: Record<string, Place> = {
  lines: ([device = '', side = '']) => `lines/${idOf('ln', `${device}/${side}`)}`,
  causes: causePlace,
  devices: ([tag = '', part]) => `reliefPoints/${pointId(tag)}${part === undefined ? '' : `/${part}`}`,
  groups: ([group = '']) => `groups/${groupId(group)}`,
  fluids: ([fluid = '']) => `fluids/${idOf('fl', fluid)}`,
};

/** A place of theirs as a path: of the document it lies in, of an affected system, or of the brief. */
export function placeOf(plan: CasePlan, place: string): string {
  const [first = '', ...rest] = place.split('/');
  if (first === 'ripple') return `affected/${documentId(rest[0] ?? '')}`;
  if (first === 'technical_basis') return 'brief/technicalBasis';
  const document = plan.documents[0]?.document ?? '';
  return `${document}:${PLACES[first]?.(rest) ?? place}`;
}

function postsOf(demo: DemoFinding): { person: string; at: string; text: string }[] {
  const [first, ...rest] = demo.thread;
  const opened = first && first.person === demo.raised_by ? first : undefined;
  const opening = {
    person: demo.raised_by,
    at: first?.at ?? '',
    text: opened ? `${demo.text}\n${opened.text}` : demo.text,
  };
  return [opening, ...(opened ? rest : demo.thread)];
}

/** The findings of a case as the domain reads them. */
export function findingsOf(plan: CasePlan): Finding[] {
  const { instant } = plan.world.shift;
  return plan.demo.findings.map((demo) => ({
    id: newId('finding'),
    case: plan.id,
    number: demo.number,
    weight: demo.must_fix ? 'must-fix' : 'should-fix',
    place: placeOf(plan, demo.place),
    state: demo.state,
    raisedBy: personId(demo.raised_by),
    posts: postsOf(demo).map((post) => ({
      by: personId(post.person),
      at: instant(post.at),
      text: rich(post.text),
    })),
  }));
}

/** Writes findings and posts. */
export async function writeFindings(plan: CasePlan, findings: readonly Finding[]): Promise<void> {
  const { trx } = plan.world;
  for (const finding of findings) {
    const { id, number, weight, place, state, raisedBy } = finding;
    const raisedAt = finding.posts[0]?.at ?? plan.world.shift.instant(plan.demo.raised_on);
    await insert(trx, FINDINGS, { id, caseId: plan.id, number, weight, place, state, raisedBy, raisedAt });
    for (const post of finding.posts) {
      await insert(trx, FINDING_POSTS, {
        id: newId('post'),
        findingId: id,
        byId: post.by,
        at: post.at,
        text: post.text,
      });
    }
  }
}
