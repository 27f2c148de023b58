/* Seeds the invented site: everything in one transaction, dates moved to the day on which it is seeded. */
import { transaction, type Db } from '@data/connection';
import { basisOf, resultsOf, SITE } from '../convert';
import { shiftTo } from '../cases/dates';
import { bind, type Bound } from './bound';
import { planCases, recordsOf, writeCase, writeCaseRow } from './cases';
import { writeDevices } from './devices';
import { writeDocuments, writeHeaders, writeRevisions } from './documents';
import { writeDeficiencies } from './due';
import { type StoreFile } from './photos';
import { type CasePlan } from './plan';
import { writeRegisters } from './registers';
import { siteRules } from './rules';
import { writeSignatures } from './signatures';
import { type HashPassword, loadSite } from './site';
import { writeTrail } from './trail';
import { type World } from './world';

/** The one password of all demonstration sign-ins; a real installation gives everyone their own. */
export const DEMO_PASSWORD = 'ketterwold-on-the-plateau';

export type SeedOptions = {
  today: string;
  hashPassword: HashPassword;
  password?: string;
  /** Keeps the stand-ins for photographs; without it only their rows are written. */
  storeFile?: StoreFile;
};
/** Who may sign in, for the line that the start prints. */
export type SeededSite = {
  site: string;
  password: string;
  people: { name: string; email: string; roles: string[] }[];
};

function inForceOf(world: World): Map<string, Bound> {
  return new Map(
    SITE.systems.map((system) => [system.id, bind(world, basisOf(system, resultsOf(system.id)))]),
  );
}

/** Bodies that cases in force here began from, by system. */
function basesOf(plans: readonly CasePlan[]): Map<string, Bound> {
  const issued = plans.flatMap((plan) => plan.documents.filter((doc) => doc.issued !== undefined));
  return new Map(issued.map((doc) => [doc.tag, doc.base]));
}

async function load(world: World, options: SeedOptions): Promise<void> {
  await loadSite(world, options.password ?? DEMO_PASSWORD, options.hashPassword);
  await writeDocuments(world);
  const inForce = inForceOf(world);
  const plans = planCases(world, inForce);
  const records = new Map(plans.map((plan) => [plan.id, recordsOf(plan)]));
  for (const plan of plans) {
    await writeCaseRow(plan);
    const own = records.get(plan.id);
    if (own) await writeSignatures(plan, own);
  }
  const bases = basesOf(plans);
  for (const [tag, bound] of inForce) await writeRevisions(world, tag, bound, bases.get(tag));
  await writeHeaders(world);
  for (const plan of plans) {
    const own = records.get(plan.id);
    if (own) await writeCase(plan, own);
  }
  await writeDevices(world);
  await writeDeficiencies(world, inForce);
  await writeTrail(world, plans);
  await writeRegisters(world, inForce, plans);
}

/**
 * Fills an empty, migrated database with the invented site.
 * @param options.today the day of seeding (ISO); dates of the site are moved by whole days so that what ends in nine days still does
 */
export async function seedDemo(db: Db, options: SeedOptions): Promise<SeededSite> {
  const shift = shiftTo(SITE.as_of, options.today);
  const rules = siteRules(shift.day('2026-01-05'));
  await transaction(db, (trx) =>
    load(
      {
        trx,
        shift,
        rules,
        judgement: rules.judgement,
        today: options.today,
        ...(options.storeFile ? { storeFile: options.storeFile } : {}),
      },
      options,
    ),
  );
  return {
    site: SITE.site.id,
    password: options.password ?? DEMO_PASSWORD,
    people: SITE.people.map(({ name, email, roles }) => ({
      name,
      email,
      roles: roles.map((role) => (role === 'steward' ? 'site coordinator' : role)),
    })),
  };
}
