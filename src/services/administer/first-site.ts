/* The first visit of an empty installation: makes the site with the rulebook's defaults in effect, and its first site coordinator. */
import { readTyped, type Q } from '@engine/quantity';
import { dayIn } from '@domain/dates';
import { fail, ok, type Result } from '@domain/result';
import { checkRange, DEFAULT_RULES, judgementHash, type SiteRules } from '@domain/rules';
import { type Auth, createFirstCoordinator, type From, openSession, type SignedIn } from '@auth/index';
import { newId } from '@data/ids';
import { createRules } from '@data/site';
import { type FirstSite } from './bodies';

/** Units in which a barometric pressure may be given. */
export const BAROMETER_UNITS = ['bar_abs', 'kPa_abs', 'psia'] as const;

function wrong(code: 'SCHEMA' | 'VALUE_IMPOSSIBLE', sentence: string): Result<never> {
  return fail(code, sentence, { errors: [{ path: 'barometer/value', code: 'barometer', sentence }] });
}

/** Reads the barometer as typed, without its text: the hash of the rules must not depend on how it was written. An impossible one is refused beside its field. */
export function readBarometer({ value, unit }: FirstSite['barometer']): Result<Q> {
  if (!BAROMETER_UNITS.some((one) => one === unit))
    return wrong('SCHEMA', 'The barometric pressure is given in bara, kPaa or psia.');
  const read = readTyped(value, { dimension: 'pressure-absolute', unit });
  if (!read.ok) return wrong('SCHEMA', read.sentence);
  const checked = checkRange('barometer', read.q);
  return checked.verdict === 'impossible'
    ? wrong('VALUE_IMPOSSIBLE', checked.sentence ?? 'This pressure is impossible.')
    : ok({ value: read.q.value, unit: read.q.unit });
}

/** The rules that a new site begins with: number 1, the defaults of the rulebook at its own barometer. */
export function firstRules(barometer: Q, from: string): SiteRules {
  const { judgement, conduct } = DEFAULT_RULES;
  return { number: 1, from, judgement: { ...judgement, barometer }, conduct };
}

/** Creates site, rules and first site coordinator in one transaction, and signs the coordinator in. NOT_PERMITTED once anyone exists. */
export async function makeFirstSite(
  auth: Auth,
  body: FirstSite,
  from: From,
): Promise<Result<SignedIn & { slug: string }>> {
  const barometer = readBarometer(body.barometer);
  if (!barometer.ok) return barometer;
  const { slug, site: name, zone: timeZone } = body;
  const site = { slug, name, timeZone, barometer: barometer.value, facts: { caseLetters: body.letters } };
  const made = await createFirstCoordinator(auth, {
    email: body.email,
    name: body.name,
    password: body.password,
    site,
    begin: async (trx, { siteId, personId, at }) => {
      const rules = firstRules(barometer.value, dayIn(at, timeZone));
      await createRules(trx, {
        id: newId('siteRules'),
        siteId,
        number: rules.number,
        state: 'in-effect',
        body: rules,
        judgementHash: judgementHash(rules.judgement),
        fromDay: rules.from,
        draftedBy: personId,
      });
    },
  });
  if (!made.ok) return made;
  return ok({ ...(await openSession(auth, made.value.person, from.agent)), slug });
}
