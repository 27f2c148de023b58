/* Rebuilds what the registers show of a document, from its revisions in force and approved. The one function that writes projections. */
import { type SiteRules } from '@domain/rules';
import { projectSystem, type Truth } from '@domain/projections';
import { type Db } from '@data/connection';
import { findDocument, type DocumentRow } from '@data/documents';
import { clearProjection, writeProjection } from '@data/projections';
import { findRevision, revisionsOf, type RevisionRow } from '@data/revisions';
import { writeSearch } from '@data/search';
import { plainText } from '@domain/text';
import { type Evaluated, evaluateRevision } from './evaluate-document';

async function project(
  trx: Db,
  document: DocumentRow,
  revision: RevisionRow,
  truth: Truth,
  evaluated: Evaluated,
): Promise<void> {
  const { body, evaluation, outcomes } = evaluated;
  const rows = projectSystem(body, evaluation, truth, {
    siteId: document.siteId,
    ...(revision.number !== null ? { revision: revision.number } : {}),
    ...(revision.caseId ? { caseId: revision.caseId } : {}),
    ...(document.ownerId ? { ownerId: document.ownerId } : {}),
    ...(revision.inPlantFrom ? { inForceSince: revision.inPlantFrom } : {}),
    stops: outcomes.filter((outcome) => outcome.severity === 'stop').length,
    justifies: outcomes.filter((outcome) => outcome.severity === 'justify').length,
  });
  await writeProjection(trx, document.id, truth, {
    systems: [rows.system],
    points: rows.points,
    scenarios: rows.scenarios,
    conditions: rows.conditions,
  });
}

/** What search finds of a system: tags and names, and on a page of its own the reasons, which may tell results. */
async function makeSearchable(trx: Db, document: DocumentRow, { body }: Evaluated): Promise<void> {
  const { id, siteId, tag, name } = document;
  const reasons = body.scenarios.map((one) => plainText(one.reason)).join('\n');
  const tags = [...body.equipment, ...body.sources, ...body.fieldConditions].map((one) => one.tag).join(' ');
  await writeSearch(trx, id, [
    {
      kind: 'system',
      siteId,
      place: `systems/${tag}`,
      hides: false,
      title: `${tag} ${name}`,
      body: `${body.service}\n${tags}`,
    },
    {
      kind: 'scenarios',
      siteId,
      place: `systems/${tag}/scenarios`,
      hides: true,
      title: `${tag}, scenarios`,
      body: reasons,
    },
    ...body.reliefPoints.map((point) => ({
      kind: 'relief-point',
      siteId,
      place: `systems/${tag}/relief-points#${point.id}`,
      hides: false,
      title: `${point.tag} ${point.name ?? ''}`.trim(),
      body: `${tag} ${point.maker ?? ''} ${point.model ?? ''}`.trim(),
    })),
  ]);
}

/** Projects one system anew: its revision in force, and the approved one that waits to be installed where there is one. */
export async function projectDocument(trx: Db, documentId: string, rules: SiteRules): Promise<void> {
  const document = await findDocument(trx, documentId);
  if (document?.kind !== 'system') return;
  const inForce = document.inForceId ? await findRevision(trx, document.inForceId) : undefined;
  const evaluated = inForce && (await evaluateRevision(trx, inForce, rules));
  if (inForce && evaluated) {
    await project(trx, document, inForce, 'in-force', evaluated);
    await makeSearchable(trx, document, evaluated);
  } else await clearProjection(trx, documentId, 'in-force');
  const approved = (await revisionsOf(trx, documentId, 'approved'))[0];
  const pending = approved && (await evaluateRevision(trx, approved, rules, inForce));
  if (approved && pending) await project(trx, document, approved, 'approved', pending);
  else await clearProjection(trx, documentId, 'approved');
}
