/* The vessels of a fire load: shape, level and elevation of each, from the equipment that the load names. */
import { type Equipment, type Id, type Path, quantityOf } from '@domain/basis';
import { type Q } from '@engine/quantity';
import { type Resolved, type Value } from './inputs';
import { type Made } from './sheets';
import { type CredibleAnswer, type Work } from './work';

/** Metres: the engine's own default (25 ft in US units); only a site that asks for more says so on the sheet. */
const USUAL_FIRE_HEIGHT = 7.6;

type Entry = [name: string, value: Value | undefined, field: string];

/** The equipment that a load names under `vessels` or `equipment`, else the limiting item of its answer or group. */
export function exposedIds(ca: CredibleAnswer, resolved: Pick<Resolved, 'lists'>): Id[] {
  const named = [...(resolved.lists['vessels'] ?? []), ...(resolved.lists['equipment'] ?? [])];
  const limiting = ca.answer.limiting?.equipment ?? ca.group?.limiting.equipment;
  return named.length > 0 || limiting === undefined ? named : [limiting];
}

/** A level above the lowest inside point: as entered, or its share of the inside height of the shell. */
function levelOf(equipment: Equipment): { q: Q; field: string } | undefined {
  for (const field of ['fire', 'high', 'normal'] as const) {
    const q = quantityOf(equipment.levels?.[field]);
    if (!q) continue;
    if (q.unit !== '-' && q.unit !== '%' && q.unit !== 'fraction') return { q, field: `levels/${field}` };
    const upright = equipment.shape?.orientation === 'vertical';
    const height = quantityOf(upright ? equipment.shape?.length : equipment.shape?.diameter);
    const share = q.unit === '%' ? q.value / 100 : q.value;
    return height && { q: { value: share * height.value, unit: height.unit }, field: `levels/${field}` };
  }
  return undefined;
}

function entriesOf(equipment: Equipment): Entry[] {
  const level = levelOf(equipment);
  return [
    ['tag', equipment.tag, 'tag'],
    ['orientation', equipment.shape?.orientation, 'shape/orientation'],
    ['D', quantityOf(equipment.shape?.diameter), 'shape/diameter'],
    ['L', quantityOf(equipment.shape?.length), 'shape/length'],
    ['heads', equipment.shape?.heads, 'shape/heads'],
    ['liquid_level', level?.q, level?.field ?? 'levels/fire'],
    ['elevation_of_bottom', quantityOf(equipment.elevation), 'elevation'],
  ];
}

/** Adds the vessels of a fire load: bare names for the first, `_2`, `_3` … for further ones; an entered input wins. */
export function fillVessels(
  work: Work,
  ca: CredibleAnswer,
  method: string,
  resolved: Resolved,
  made: Made,
): Made {
  const wetted = method.startsWith('e.fire-wetted');
  if (!wetted && !method.startsWith('e.fire-unwetted')) return made;
  const filled: Made = { inputs: { ...made.inputs }, from: { ...made.from } };
  const add = (name: string, value: Value | undefined, path: Path) => {
    if (value === undefined || name in filled.inputs) return;
    filled.inputs[name] = value;
    filled.from[name] = path;
  };
  const vessels = exposedIds(ca, resolved).flatMap((id) => work.lookup.equipment.get(id) ?? []);
  vessels.forEach((equipment, index) => {
    for (const [name, value, field] of entriesOf(equipment)) {
      if (name === 'liquid_level' && !wetted) continue;
      add(index === 0 ? name : `${name}_${String(index + 1)}`, value, `equipment/${equipment.id}/${field}`);
    }
  });
  const drained = vessels.length > 0 && vessels.every((equipment) => equipment.fire?.drainage === true);
  if (wetted) add('adequate_drainage', drained, `equipment/${vessels[0]?.id ?? ''}/fire/drainage`);
  const height = work.rules.parameters['fireHeight'];
  if (typeof height === 'number' && height !== USUAL_FIRE_HEIGHT)
    add('fire_height', { value: height, unit: 'm' }, 'rules/fireHeight');
  return filled;
}
