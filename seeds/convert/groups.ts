/* Groups, isolations and interlocks, read from the sentences of the invented site. */
import { type Group, type Interlock, type Isolation } from '@domain/basis';
import equipment from '../data/supplement/equipment.json';
import isolations from '../data/supplement/isolations.json';
import { type DemoDevice, type DemoGroup, type DemoSystem } from './demo-types';
import { placeOf } from './equipment';
import { compact } from './figures';
import { idOf, personId, slug } from './ids';
import { pointId } from './points';

const COVERS: Record<string, string[] | undefined> = equipment.covers;
const LOCKS: Record<string, string[] | undefined> = isolations.locks;
const SHUT_TOGETHER: Record<string, string[][] | undefined> = isolations.shutTogether;
const TAG = /\b(CV|KI)-\d+\b/;

/** The id of a group of a system. */
export const groupId = (id: string): string => idOf('gr', id);

function placeInGroup(group: DemoGroup, tag: string): Group['members'][number]['place'] {
  if (!group.credited.includes(tag)) return 'spare';
  return group.credited[0] === tag ? 'first' : 'additional';
}

/** One group: limiting item, what it covers, members with their place. */
export function groupOf(group: DemoGroup, system: DemoSystem): Group {
  const id = groupId(group.id);
  const covers = COVERS[`${system.id}/${group.id}`] ?? [];
  return {
    id,
    name: group.id,
    note: group.staggering,
    limiting: placeOf(group.limiting_equipment),
    covers: covers.map((name) => ({ id: idOf('cv', group.id, ...name.split('/')), ...placeOf(name) })),
    members: group.devices.map((tag) => ({
      id: idOf('mb', group.id, tag),
      point: pointId(tag),
      credited: group.credited.includes(tag),
      place: placeInGroup(group, tag),
    })),
  };
}

/** The interlocks that the groups of a system describe. */
export function interlocksOf(system: DemoSystem): Interlock[] {
  return system.groups.flatMap((group) => {
    const tag = group.interlock === null ? undefined : TAG.exec(group.interlock)?.[0];
    if (tag === undefined || group.interlock === null) return [];
    const sets = (SHUT_TOGETHER[tag] ?? []).filter((points) =>
      points.every((point) => group.devices.includes(point)),
    );
    return [
      {
        id: idOf('il', tag),
        tag,
        kind: tag.startsWith('CV') ? ('changeover' as const) : ('key' as const),
        text: group.interlock,
        shutTogether: sets.map((points, n) => ({
          id: `st_${slug(tag)}_${String(n + 1)}`,
          points: points.map(pointId),
        })),
      },
    ];
  });
}

const KINDS: [RegExp, Isolation['kind']][] = [
  [/three-way/, 'three-way'],
  [/gate/, 'gate'],
  [/ball/, 'ball'],
];

function lockKind(sentence: string): NonNullable<Isolation['lock']>['kind'] {
  if (sentence.includes('key interlock')) return 'key';
  if (sentence.includes('three-way')) return 'pin';
  return sentence.includes('locked') ? 'lock' : 'none';
}

type Valve = {
  key: string;
  sentence: string;
  where: 'inlet' | 'outlet';
  tag: string | undefined;
  points: string[];
};

/** A changeover body stands in two lines and is one isolation; every other valve is its own. */
function valvesOf(devices: DemoDevice[]): Valve[] {
  const valves = new Map<string, Valve>();
  for (const device of devices) {
    for (const where of ['inlet', 'outlet'] as const) {
      const sentence = device.isolation?.[where];
      if (sentence === undefined || sentence.startsWith('none')) continue;
      const tag = TAG.exec(sentence)?.[0];
      const body = tag?.startsWith('CV') === true ? tag : undefined;
      const key = `${body ?? device.tag}/${where}`;
      const known = valves.get(key);
      if (known) known.points.push(device.tag);
      else valves.set(key, { key, sentence, where, tag, points: [device.tag] });
    }
  }
  return [...valves.values()];
}

function isolationOf(valve: Valve): Isolation {
  const [number, keeper] = LOCKS[valve.key] ?? [];
  const body = valve.tag?.startsWith('CV') === true ? valve.tag : undefined;
  const kept = valve.sentence.endsWith('closed') ? ('shut' as const) : ('open' as const);
  return compact({
    id: idOf('iso', ...valve.key.split('/')),
    tag:
      body ??
      `HV-${valve.key.replace('PSV-', '').replace('PRV-', '').replace('/inlet', 'I').replace('/outlet', 'O')}`,
    where: valve.where,
    protects: valve.points.map(pointId),
    kind: KINDS.find(([pattern]) => pattern.test(valve.sentence))?.[1] ?? 'other',
    fullBore: true,
    stem: 'horizontal',
    kept,
    interlock: valve.tag === undefined ? undefined : idOf('il', valve.tag),
    note: valve.sentence,
    controls: isolations.controls,
    lock: compact({ kind: lockKind(valve.sentence), number, keeper: keeper && personId(keeper) }),
    class: 'maintenance' as const,
  });
}

/** The isolation valves between equipment, relief points and where they discharge. */
export function isolationsOf(system: DemoSystem): Isolation[] {
  return valvesOf(system.devices).map(isolationOf);
}
