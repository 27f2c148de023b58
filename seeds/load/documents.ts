/* Writes documents with their revisions: older ones by number and note, the one in force with body and signature. */
import { hashOf } from '@domain/basis';
import { type Header } from '@domain/header';
import { createDocument } from '@data/documents';
import { keepImports } from '@data/evaluations';
import { insertRevision } from '@data/revisions';
import { caseId, documentId, headerOf, personId, SITE, systemOf, unitId } from '../convert';
import people from '../data/supplement/site.json';
import { type DemoCase } from '../cases/demo-case-types';
import { type Bound } from './bound';
import { importsHash, importSetOf } from './imports';
import { revisionId } from './plan';
import { signGrade } from './signatures';
import { RULES_ID, SITE_ID, type World } from './world';

const OWNERS: Record<string, string | undefined> = people.people.owners;
const HEADER_ISSUED = '2024-02-12T09:00:00+01:00';

/** Adds every system and header, still without a revision. */
export async function writeDocuments(world: World): Promise<void> {
  const kinds = [
    ...SITE.systems.map((system) => ({ ...system, kind: 'system' as const })),
    ...SITE.headers.map((header) => ({ ...header, kind: 'header' as const })),
  ];
  for (const { id, kind, name, unit } of kinds) {
    const owner = OWNERS[unit];
    await createDocument(world.trx, {
      id: documentId(id),
      siteId: SITE_ID,
      kind,
      tag: id,
      name,
      unitId: unitId(unit),
      ownerId: owner === undefined ? null : personId(owner),
      grade: 'worked',
    });
  }
}

type Issued = { number: number; at: string; note: string };

function historyOf(world: World, tag: string): Issued[] {
  return systemOf(tag).revision_history.map((entry) => ({
    number: entry.revision,
    at: world.shift.instant(`${entry.issued}T09:00:00+01:00`),
    note: `${entry.summary} (${entry.by_case})`,
  }));
}

/** The case here that issued the revision in force of a system, if any. */
function issuerOf(tag: string): DemoCase | undefined {
  const cases = SITE.cases as DemoCase[];
  return cases.find((demo) => demo.issued_revision?.system === tag);
}

type Held = { tag: string; bound: Bound; number: number };

async function insertHeld(
  world: World,
  held: Held,
  when: { at: string; note: string; superseded?: string },
): Promise<void> {
  const { tag, bound, number } = held;
  const current = when.superseded === undefined;
  const issuer = current ? issuerOf(tag) : undefined;
  await keepImports(world.trx, bound.importsHash, bound.imports);
  await insertRevision(world.trx, {
    id: revisionId(tag, number),
    documentId: documentId(tag),
    number,
    state: current ? 'in-force' : 'superseded',
    caseId: issuer ? caseId(issuer.id) : null,
    baseId: issuer ? revisionId(tag, number - 1) : null,
    documentHash: bound.documentHash,
    importsHash: bound.importsHash,
    rulesId: RULES_ID,
    evaluationKey: bound.evaluation.key,
    approvedAt: when.at,
    inPlantFrom: when.at,
    knownFrom: when.at,
    supersededAt: when.superseded ?? null,
    note: when.note,
    body: bound.body,
  });
}

/** Older revisions: those that theirs tells of by number, and the one that a case here began from with its body. */
async function writeOlder(
  world: World,
  tag: string,
  history: readonly Issued[],
  base: Bound | undefined,
): Promise<void> {
  for (const [n, entry] of history.slice(0, -1).entries()) {
    const superseded = history[n + 1]?.at ?? entry.at;
    const held = base && n === history.length - 2;
    if (held) {
      await signGrade(world, documentId(tag), entry.at, base);
      await insertHeld(
        world,
        { tag, bound: base, number: entry.number },
        { at: entry.at, note: entry.note, superseded },
      );
      continue;
    }
    await insertRevision(world.trx, {
      id: revisionId(tag, entry.number),
      documentId: documentId(tag),
      number: entry.number,
      state: 'superseded',
      inPlantFrom: entry.at,
      knownFrom: entry.at,
      supersededAt: superseded,
      note: entry.note,
    });
  }
}

/** Writes the revisions of a system. `base` is the body that the issuing case began from; its field signature stands already. */
export async function writeRevisions(
  world: World,
  tag: string,
  bound: Bound,
  base: Bound | undefined,
): Promise<void> {
  const history = historyOf(world, tag);
  await writeOlder(world, tag, history, base);
  const issuer = issuerOf(tag);
  const last = history.at(-1);
  const at = issuer?.issued_revision
    ? world.shift.instant(issuer.issued_revision.at)
    : (last?.at ?? world.today);
  if (!issuer) await signGrade(world, documentId(tag), at, bound);
  const number = last?.number ?? 1;
  await insertHeld(world, { tag, bound, number }, { at, note: last?.note ?? '' });
  await world
    .trx('documents')
    .where({ id: documentId(tag) })
    .update({ in_force_id: revisionId(tag, number) });
}

async function writeHeader(world: World, header: Header): Promise<void> {
  const at = world.shift.instant(HEADER_ISSUED);
  const hash = hashOf('document', header);
  const none = importSetOf({ imports: [] } as never);
  await keepImports(world.trx, importsHash(none), none);
  await signGrade(world, header.id, at, { documentHash: hash, importsHash: importsHash(none) });
  const id = revisionId(header.tag, 1);
  await insertRevision(world.trx, {
    id,
    documentId: header.id,
    number: 1,
    state: 'in-force',
    documentHash: hash,
    importsHash: importsHash(none),
    rulesId: RULES_ID,
    approvedAt: at,
    inPlantFrom: at,
    knownFrom: at,
    note: `First issue of the header document from the header model of ${header.tag}.`,
    body: header,
  });
  await world.trx('documents').where({ id: header.id }).update({ in_force_id: id });
}

/** Writes revision 1 of both headers. */
export async function writeHeaders(world: World): Promise<void> {
  for (const demo of SITE.headers) await writeHeader(world, headerOf(demo));
}
