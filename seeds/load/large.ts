/* A larger plant for the benchmarks: systems varied from the invented ones, each with its own tags and figures, all evaluated. */
import { type Basis, hashOf } from '@domain/basis';
import { projectSystem, type SystemProjection } from '@domain/projections';
import { type Db, transaction } from '@data/connection';
import { pack } from '@data/bodies';
import { keepImports } from '@data/evaluations';
import { insertMany } from '@data/mapping';
import { findSiteBySlug } from '@data/site';
import { DOCUMENTS, REVISIONS } from '@data/tables/documents';
import { P_CONDITIONS, P_POINTS, P_SCENARIOS, P_SYSTEMS, SEARCH_PAGES } from '@data/tables/registers';
import { basisOf, type DemoResults, type DemoSystem, resultsOf, SITE } from '../convert';
import { shiftTo } from '../cases/dates';
import { bind, type Bound } from './bound';
import { seedDemo, type SeedOptions } from './demo';
import { siteRules } from './rules';
import { signGrade } from './signatures';
import { RULES_ID, SITE_ID, type World } from './world';

const VARIED = new Set(['UA', 'rate', 'coefficient', 'duty', 'heat_input', 'rated_flow', 'hydrogen_rate']);
/** Loads of the variants against the invented system, chosen so that some become marginal. */
const FACTORS = [0.96, 0.975, 0.985, 1.01, 1.02, 1.03];
const CHUNK = 100;
const NOTE = 'Made for the benchmarks.';

export type LargeOptions = SeedOptions & { systems?: number };
type Template = { system: DemoSystem; bound: Bound };

function scaledInputs(system: DemoSystem, factor: number): DemoSystem {
  const copy = structuredClone(system);
  for (const answer of copy.causes.flatMap((cause) => cause.answers ?? [])) {
    for (const [name, input] of Object.entries(answer.load.inputs)) {
      if (VARIED.has(name) && typeof input.value === 'number')
        input.value = Number((input.value * factor).toPrecision(4));
    }
  }
  return copy;
}

function scaledResults(results: DemoResults, factor: number): DemoResults {
  const copy = structuredClone(results);
  for (const answer of Object.values(copy.causes).flat()) {
    answer.relief_load.value = Number((answer.relief_load.value * factor).toPrecision(5));
    answer.required_area.value = Number((answer.required_area.value * factor).toPrecision(5));
  }
  return copy;
}

function templatesOf(world: World): Template[] {
  return FACTORS.flatMap((factor) =>
    SITE.systems.map((system) => {
      const varied = scaledInputs(system, factor);
      return {
        system: varied,
        bound: bind(world, basisOf(varied, scaledResults(resultsOf(system.id), factor))),
      };
    }),
  );
}

function tagsOf(body: Basis): string[] {
  const tags = [
    ...body.equipment,
    ...body.reliefPoints,
    ...body.sources,
    ...body.isolations,
    ...body.fieldConditions,
  ];
  return [...new Set(tags.flatMap((item) => item.tag ?? []))].filter((tag) => /\d/.test(tag));
}

/** The n-th body of a template: another document, its own tag, every tag with the number of its plant before it. */
function renamed(body: Basis, n: number): Basis {
  const plant = String(Math.floor(n / SITE.systems.length) + 1).padStart(3, '0');
  const tags = tagsOf(body).toSorted((a, b) => b.length - a.length);
  const pattern = new RegExp(`(?<![\\w-])(${tags.join('|')})(?![\\w-])`, 'g');
  const own = JSON.stringify(body).replaceAll(body.id, `${body.id}x${plant}`);
  const text = own.replace(pattern, (tag) => `${plant}-${tag}`);
  const made = JSON.parse(text) as Basis;
  return { ...made, tag: `${plant}-${body.tag}`, name: `${body.name.slice(0, 180)}, plant ${plant}` };
}

type Made = { body: Basis; template: Template; hash: string };

function documentRow({ body }: Made): object {
  const { id, tag, name, unit, grade } = body;
  return { id, siteId: SITE_ID, kind: 'system', tag, name, unitId: unit, ownerId: null, grade };
}

function revisionRow({ body, template, hash }: Made, at: string): object {
  return {
    id: `rev_${body.id}`,
    documentId: body.id,
    number: 1,
    state: 'in-force',
    documentHash: hash,
    importsHash: template.bound.importsHash,
    rulesId: RULES_ID,
    evaluationKey: null,
    approvedAt: at,
    inPlantFrom: at,
    knownFrom: at,
    held: true,
    note: NOTE,
    body: pack(body),
  };
}

function searchPage({ body }: Made): object {
  const title = `${body.tag} ${body.name}`;
  const text = `${body.service}\n${tagsOf(body).join(' ')}`;
  const place = `systems/${body.tag}`;
  return { kind: 'system', siteId: SITE_ID, ofId: body.id, place, hides: false, title, body: text };
}

/** Register rows of one system; its figures are those of its template, whose numbers are the same. */
function projected({ body, template }: Made, at: string): SystemProjection {
  const { evaluation, outcomes } = template.bound;
  const count = (severity: string): number => outcomes.filter((one) => one.severity === severity).length;
  const facts = { siteId: SITE_ID, revision: 1, inForceSince: at };
  return projectSystem(body, evaluation, 'in-force', {
    ...facts,
    stops: count('stop'),
    justifies: count('justify'),
  });
}

/** Writes the register rows of a chunk at once; these documents have none yet. */
async function project(world: World, made: readonly Made[], at: string): Promise<void> {
  const all = made.map((one) => ({
    head: { documentId: one.body.id, truth: 'in-force' as const },
    rows: projected(one, at),
  }));
  await insertMany(
    world.trx,
    P_SYSTEMS,
    all.map(({ head, rows }) => ({ ...rows.system, ...head })),
  );
  await insertMany(
    world.trx,
    P_POINTS,
    all.flatMap(({ head, rows }) => rows.points.map((row) => ({ ...row, ...head }))),
  );
  await insertMany(
    world.trx,
    P_SCENARIOS,
    all.flatMap(({ head, rows }) => rows.scenarios.map((row) => ({ ...row, ...head }))),
  );
  await insertMany(
    world.trx,
    P_CONDITIONS,
    all.flatMap(({ head, rows }) => rows.conditions.map((row) => ({ ...row, ...head }))),
  );
}

async function writeChunk(world: World, made: readonly Made[], at: string): Promise<void> {
  await insertMany(world.trx, DOCUMENTS, made.map(documentRow) as never);
  for (const { body, template, hash } of made) {
    await signGrade(world, body.id, at, { documentHash: hash, importsHash: template.bound.importsHash });
  }
  await insertMany(world.trx, REVISIONS, made.map((one) => revisionRow(one, at)) as never);
  await world.trx.raw(
    `UPDATE documents SET in_force_id = 'rev_' || id WHERE in_force_id IS NULL AND kind = 'system'`,
  );
  await insertMany(world.trx, SEARCH_PAGES, made.map(searchPage) as never);
  await project(world, made, at);
}

async function grow(world: World, systems: number): Promise<void> {
  const templates = templatesOf(world);
  const at = world.shift.instant('2024-06-03T09:00:00+02:00');
  for (const { bound } of templates) await keepImports(world.trx, bound.importsHash, bound.imports);
  for (let start = 0; start < systems; start += CHUNK) {
    const count = Math.min(CHUNK, systems - start);
    const made = Array.from({ length: count }, (_, k): Made | undefined => {
      const template = templates[(start + k) % templates.length];
      if (!template) return undefined;
      const body = renamed(template.bound.body, start + k);
      return { body, template, hash: hashOf('document', body) };
    });
    await writeChunk(
      world,
      made.filter((one) => one !== undefined),
      at,
    );
  }
}

async function isLarge(db: Db): Promise<boolean> {
  return (await db('revisions').where({ note: NOTE }).first('id')) !== undefined;
}

/**
 * Adds systems (2,000 unless said) to the invented site, which is seeded first when it is not there.
 * @returns how many were added; none when they stand already
 */
export async function seedLarge(db: Db, options: LargeOptions): Promise<number> {
  if (await isLarge(db)) return 0;
  if (!(await findSiteBySlug(db, SITE.site.id))) await seedDemo(db, options);
  const shift = shiftTo(SITE.as_of, options.today);
  const rules = siteRules(shift.day('2026-01-05'));
  const systems = options.systems ?? 2000;
  const world = { shift, rules, judgement: rules.judgement, today: options.today };
  await transaction(db, (trx) => grow({ ...world, trx }, systems));
  return systems;
}
