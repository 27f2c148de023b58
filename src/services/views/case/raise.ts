/* What the form that raises a case offers: the systems of the site by unit. */
import { listDocuments } from '@data/documents';
import { listUnits } from '@data/site';
import { type Actor, type Ctx } from '../../context';

/** The systems that a case can be raised on, by unit, in the order of their tags. */
export async function systemChoices(
  ctx: Ctx,
  actor: Actor,
): Promise<{ value: string; label: string; group?: string }[]> {
  const units = new Map((await listUnits(ctx.db, actor.site.id)).map((unit) => [unit.id, unit]));
  const systems = await listDocuments(ctx.db, actor.site.id, 'system');
  return systems
    .filter((one) => one.retiredAt === null)
    .map((one) => {
      const unit = units.get(one.unitId);
      return {
        value: one.tag,
        label: `${one.tag} ${one.name}`,
        ...(unit ? { group: `${unit.tag} ${unit.name}` } : {}),
      };
    });
}
