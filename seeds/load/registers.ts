/* Fills the registers and the search: systems through the one function that projects them, headers and cases beside. */
import { type FieldCondition } from '@domain/basis';
import { type Header } from '@domain/header';
import { plainText } from '@domain/text';
import { addSighting } from '@data/field';
import { type New } from '@data/mapping';
import { type HeaderRow } from '@data/tables/registers';
import { markConditionSeen, writeProjection } from '@data/projections';
import { writeSearch } from '@data/search';
import { projectDocument } from '@services/projections';
import { documentId, headerOf, personId, plainQ, RESULTS, SITE, unitId } from '../convert';
import { toSI } from '@engine/quantity';
import { type Bound } from './bound';
import { type CasePlan } from './plan';
import { SITE_ID, type World } from './world';

const OPERATIONS: Record<string, string> = { U300: 'P-08', U400: 'P-08' };
const DAY = 86_400_000;

/** The highest node pressure of a header over its common causes. */
function worstNode(tag: string): { cause: string; si: number; unit: string } | undefined {
  const causes = Object.entries(RESULTS.headers[tag] ?? {}).flatMap(([cause, stored]) =>
    Object.values(stored.nodes).map((q) => ({ cause, si: toSI(plainQ(q)), unit: q.unit })),
  );
  return causes.toSorted((a, b) => b.si - a.si)[0];
}

type DemoHeaderFile = (typeof SITE.headers)[number];

function headerRow(demo: DemoHeaderFile, header: Header): Omit<New<HeaderRow>, 'documentId' | 'truth'> {
  const worst = worstNode(demo.id);
  const name = demo.scenarios.find((one) => one.id === worst?.cause)?.name;
  const cause = header.causes.find((candidate) => candidate.name === name);
  return {
    elementId: '',
    siteId: SITE_ID,
    unitId: unitId(demo.unit),
    tag: demo.id,
    name: demo.name,
    revision: 1,
    service: demo.service,
    disposesTo: demo.disposes_to,
    members: header.members.length,
    causes: header.causes.length,
    governing: cause?.id ?? null,
    governingName: cause?.name ?? null,
    backSi: worst?.si ?? null,
    backUnit: worst?.unit ?? null,
    verdict: 'not-sized',
  };
}

async function writeHeaderRows(world: World): Promise<void> {
  for (const demo of SITE.headers) {
    const header = headerOf(demo);
    await writeProjection(world.trx, header.id, 'in-force', { headers: [headerRow(demo, header)] });
    const body = `${demo.service}\n${demo.disposes_to}\n${header.causes.map((one) => one.name).join('\n')}`;
    const page = { kind: 'header', siteId: SITE_ID, place: `headers/${demo.id}`, hides: false };
    await writeSearch(world.trx, header.id, [{ ...page, title: `${demo.id} ${demo.name}`, body }]);
  }
}

async function writeCaseSearch(plan: CasePlan): Promise<void> {
  const { demo, brief, world } = plan;
  const place = `cases/${demo.id}`;
  const systems = plan.documents.map((doc) => doc.tag).join(' ');
  await writeSearch(world.trx, plan.id, [
    {
      kind: 'case',
      siteId: SITE_ID,
      place,
      hides: false,
      title: `${demo.id} ${demo.title}`,
      body: `${systems}\n${plainText(brief.whatChanges as never)}`,
    },
    {
      kind: 'brief',
      siteId: SITE_ID,
      place: `${place}/brief`,
      hides: true,
      title: `${demo.id}, technical basis`,
      body: plainText(brief.technicalBasis as never),
    },
  ]);
}

/** Rounds of field conditions: each was seen within its interval, so that the register does not begin empty. */
async function sight(world: World, tag: string, condition: FieldCondition, n: number): Promise<void> {
  const interval = (condition.roundMonths ?? 12) * 30;
  const ago = 5 + ((n * 37) % Math.max(interval - 10, 10));
  const at = new Date(Date.parse(`${world.today}T07:30:00Z`) - ago * DAY).toISOString();
  const system = SITE.systems.find((candidate) => candidate.id === tag);
  const byId = personId(OPERATIONS[system?.unit ?? ''] ?? 'P-07');
  await addSighting(world.trx, {
    documentId: documentId(tag),
    condition: condition.id,
    at,
    byId,
    agrees: true,
  });
  await markConditionSeen(world.trx, documentId(tag), condition.id, { at, agrees: true });
}

/** Projects every document and writes what search finds. */
export async function writeRegisters(
  world: World,
  inForce: ReadonlyMap<string, Bound>,
  plans: readonly CasePlan[],
): Promise<void> {
  for (const [tag, bound] of inForce) {
    await projectDocument(world.trx, documentId(tag), world.rules);
    for (const [n, condition] of bound.body.fieldConditions.entries()) await sight(world, tag, condition, n);
  }
  await writeHeaderRows(world);
  for (const plan of plans) await writeCaseSearch(plan);
}
