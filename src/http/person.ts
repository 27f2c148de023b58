/* Who asks: read from the session cookie through src/auth. */
import { type APIContext } from 'astro';
import { type Runtime } from '../runtime';

export type Who = { id: string };

/** The signed-in person, or undefined. */
export async function currentPerson(_context: APIContext, _runtime: Runtime): Promise<Who | undefined> {
  return Promise.resolve(undefined);
}
