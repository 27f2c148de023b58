/* Signs people of the invented site in, by the list that the seed writes. */
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { type Role, ROLE_WORDS, ROLES } from '@domain/case';
import { ensureTemplate } from './prepare';

export type DemoPerson = { email: string; name: string; roles: Role[] };
export type SignIns = { password: string; people: DemoPerson[] };

type Written = { password: string; people: (Omit<DemoPerson, 'roles'> & { roles: string[] })[] };

/** The demonstration sign-ins, as the seed wrote them beside its database, where roles stand in words. */
export async function demoSignIns(): Promise<SignIns> {
  const file = join(dirname(await ensureTemplate('demo')), 'sign-ins.json');
  const { password, people } = JSON.parse(readFileSync(file, 'utf8')) as Written;
  const rolesOf = (words: string[]) => ROLES.filter((role) => words.includes(ROLE_WORDS[role]));
  return { password, people: people.map((person) => ({ ...person, roles: rolesOf(person.roles) })) };
}

/** The first person with a role. */
export async function personWith(role: Role): Promise<DemoPerson> {
  const found = (await demoSignIns()).people.find((person) => person.roles.includes(role));
  if (!found) throw new Error(`No demonstration person is ${role}.`);
  return found;
}

/** Signs in by the interface; answers the value of the Cookie header. */
export async function signIn(url: string, email: string, given?: string): Promise<string> {
  const password = given ?? (await demoSignIns()).password;
  const response = await fetch(`${url}/api/v1/session`, {
    method: 'POST',
    redirect: 'manual',
    headers: { 'Content-Type': 'application/json', 'Idempotency-Key': `sign-in-${Date.now()}` },
    body: JSON.stringify({ email, password }),
  });
  const cookie = response.headers
    .getSetCookie()
    .map((set) => set.split(';')[0] ?? '')
    .join('; ');
  if (cookie === '')
    throw new Error(`${email} could not sign in: ${response.status} ${await response.text()}`);
  return cookie;
}

/** Signs in the first demonstration person with a role. */
export async function signInAs(url: string, role: Role): Promise<string> {
  return signIn(url, (await personWith(role)).email);
}
