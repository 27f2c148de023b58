/* Signs people of the invented site in, by the list that the seeds keep. */
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { type Role } from '@domain/case';

export type DemoPerson = { email: string; name: string; roles: Role[] };
export type SignIns = { password: string; people: DemoPerson[] };

/** The demonstration sign-ins. */
export function demoSignIns(): SignIns {
  const file = fileURLToPath(new URL('../../seeds/sign-ins.json', import.meta.url));
  return JSON.parse(readFileSync(file, 'utf8')) as SignIns;
}

/** The first person with a role. */
export function personWith(role: Role): DemoPerson {
  const found = demoSignIns().people.find((person) => person.roles.includes(role));
  if (!found) throw new Error(`No demonstration person is ${role}.`);
  return found;
}

/** Signs in by the interface; answers the value of the Cookie header. */
export async function signIn(url: string, email: string, password = demoSignIns().password): Promise<string> {
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
export function signInAs(url: string, role: Role): Promise<string> {
  return signIn(url, personWith(role).email);
}
