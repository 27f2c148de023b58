/* Register pages at hand: worked once for what is asked, what is hidden and the state of the trail, which every act moves. */
import { type Db } from '@data/connection';
import { trailHead } from '@data/trail';
import { type Actor, type Ctx } from '../../context';
import { type Hidden } from '../../hidden-view';

const MOST = 300;
const held = new WeakMap<Db, Map<string, unknown>>();

/**
 * What `make` gives, or what it gave before: every write that a register shows appends to the trail of the site, so its head
 * says whether a page still stands. The hidden documents are part of the key: no one gets a page made for another's view.
 */
export async function remembered<V>(
  ctx: Ctx,
  actor: Actor,
  hidden: Hidden,
  asked: string,
  make: () => Promise<V>,
): Promise<V> {
  const pages = held.get(ctx.db) ?? new Map<string, unknown>();
  held.set(ctx.db, pages);
  const head = await trailHead(ctx.db, actor.site.id);
  const key = JSON.stringify([actor.site.id, head?.hash, [...hidden.documents].sort(), asked]);
  if (pages.has(key)) return pages.get(key) as V;
  const made = await make();
  const oldest = pages.keys().next();
  if (pages.size >= MOST && !oldest.done) pages.delete(oldest.value);
  pages.set(key, made);
  return made;
}
