/* Writes the invented site itself: units, people with roles and deputies, utilities, site rules. */
import { type Role } from '@domain/case';
import { type Utility } from '@domain/basis';
import { judgementHash } from '@domain/rules';
import { createPerson, grantRole } from '@data/people';
import { createRules, createSite, createUnit, createUtility, updateSite } from '@data/site';
import { compact, documentId, personId, SITE, unitId, utilityId } from '../convert';
import people from '../data/supplement/site.json';
import register from '../data/supplement/utilities.json';
import { RULES_ID, SITE_ID, ZONE, type World } from './world';

const PHONES: Record<string, string | undefined> = people.people.phones;
const DEPUTIES: Record<string, string | undefined> = people.people.deputies;
const ROLE_WORDS: Record<string, string | undefined> = people.people.roleWords;

/** Makes the hash of a password for one person. */
export type HashPassword = (password: string) => Promise<string>;

async function writeSite(world: World): Promise<void> {
  const { site } = SITE;
  await createSite(world.trx, {
    id: SITE_ID,
    slug: site.id,
    name: site.name,
    timeZone: ZONE,
    barometer: world.judgement.barometer,
    elevation: { value: site.elevation.value, unit: site.elevation.unit },
    facts: {
      caseLetters: 'KW',
      tagline: site.tagline,
      operator: site.operator,
      story: site.story,
      invented: true,
      caution: SITE.caution,
    },
  });
  for (const unit of SITE.units) {
    await createUnit(world.trx, {
      id: unitId(unit.id),
      siteId: SITE_ID,
      tag: unit.id,
      name: unit.name,
      units: unit.unit_system,
    });
  }
}

async function writePeople(world: World, hash: (email: string) => Promise<string>): Promise<void> {
  const since = world.shift.day('2020-01-01');
  for (const person of SITE.people) {
    const id = personId(person.id);
    const phone = PHONES[person.id] ?? null;
    await createPerson(world.trx, {
      id,
      email: person.email,
      name: person.name,
      phone,
      job: person.job,
      passwordHash: await hash(person.email),
    });
    for (const role of person.roles) {
      const ours = (ROLE_WORDS[role] ?? role) as Role;
      await grantRole(world.trx, {
        personId: id,
        siteId: SITE_ID,
        role: ours,
        fromDay: since,
        grantedBy: null,
      });
    }
  }
  for (const [person, deputy] of Object.entries(DEPUTIES)) {
    if (deputy === undefined) continue;
    await world
      .trx('people')
      .where({ id: personId(person) })
      .update({ deputy_id: personId(deputy) });
  }
  await updateSite(world.trx, SITE_ID, 1, { managerId: personId(people.people.manager) });
}

/** A utility of the register as it is stored. */
export function utilitiesOf(): Utility[] {
  return register.utilities.map((utility) => ({
    ...compact(utility),
    id: utilityId(utility.tag),
    users: utility.users.map(documentId),
  })) as unknown as Utility[];
}

async function writeUtilities(world: World): Promise<void> {
  for (const utility of utilitiesOf()) {
    const { id, kind, tag, name, ...body } = utility;
    await createUtility(world.trx, { id, siteId: SITE_ID, kind, tag, name, body });
  }
}

async function writeRules(world: World): Promise<void> {
  await createRules(world.trx, {
    id: RULES_ID,
    siteId: SITE_ID,
    number: world.rules.number,
    state: 'in-effect',
    body: world.rules,
    judgementHash: judgementHash(world.rules.judgement),
    fromDay: world.rules.from,
    draftedBy: personId('P-09'),
  });
}

/** Writes site, units, people, utilities and site rules. */
export async function loadSite(world: World, password: string, hashPassword: HashPassword): Promise<void> {
  await writeSite(world);
  await writePeople(world, () => hashPassword(password));
  await writeUtilities(world);
  await writeRules(world);
}
