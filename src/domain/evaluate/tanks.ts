/* Storage tanks: what the methods of topic k take from the tank, its load sheet and the class of its answer. */
import { type Equipment, quantityOf } from '@domain/basis';
import { type Q } from '@engine/quantity';
import { type Found } from './inputs';
import { type Values } from './implicit';
import { outputOf } from './sheets';
import { type CredibleAnswer, limitingSide, type Work } from './work';

/** True for the methods of storage tanks and their vents. */
export function isTankMethod(method: string): boolean {
  return method.startsWith('k.');
}

function wettedHeight(tank: Equipment): { q: Q; field: string } | undefined {
  for (const field of ['fire', 'high', 'normal'] as const) {
    const q = quantityOf(tank.levels?.[field]);
    if (q && q.unit !== '-' && q.unit !== '%') return { q, field: `levels/${field}` };
  }
  return undefined;
}

/** Shape, volume and design pressure of the tank that limits an answer, under the names that methods use. */
export function tankValues(work: Work, ca: CredibleAnswer): Values {
  const found = limitingSide(work.lookup, ca.answer.limiting ?? ca.group?.limiting);
  if (!found) return {};
  const { equipment: tank } = found;
  const at = (q: Q | undefined, field: string) => (): Found | undefined =>
    q && { value: q, path: `equipment/${tank.id}/${field}` };
  const height = wettedHeight(tank);
  const limit = `limit:${ca.id}`;
  const design = outputOf(work.sheets[limit], 'MAWP');
  return {
    tank_volume: at(quantityOf(tank.volume), 'volume'),
    D: at(quantityOf(tank.shape?.diameter), 'shape/diameter'),
    H: at(height?.q, height?.field ?? 'levels/fire'),
    elevation_of_bottom: at(quantityOf(tank.elevation), 'elevation'),
    design_pressure: () => design && { value: design, path: `sheets/${limit}#MAWP` },
  };
}

/** The air that the load sheet asks of the vents, in place of a mass flow, and the direction that the class means. */
export function ventValues(work: Work, ca: CredibleAnswer): Values {
  const load = `load:${ca.id}`;
  const air = outputOf(work.sheets[load], 'air_equivalent');
  const direction = ca.answer.accumulation === 'tank-vacuum' ? 'in' : 'out';
  const { accumulation } = ca.answer;
  const said: Values =
    accumulation === 'tank' || accumulation === 'tank-vacuum'
      ? {
          direction: () => ({
            value: direction,
            path: `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/accumulation`,
          }),
        }
      : {};
  if (!air) return said;
  return {
    ...said,
    air_equivalent: () => ({ value: air, path: `sheets/${load}#air_equivalent` }),
    W: () => undefined,
  };
}
