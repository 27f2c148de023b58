/* The field sheet of a signed revision: what changed on the plant against its base, line by line in walking order. */
import {
  type Basis,
  canonical,
  type Equipment,
  type FieldCondition,
  quantityOf,
  type ReliefPoint,
  type Source,
} from '@domain/basis';
import { type Draft, pointLines } from './point-lines';
import { type FieldLine } from './types';

/** A value without where its figures come from: a better origin changes nothing on the plant. */
function bare(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(bare);
  if (typeof value !== 'object' || value === null) return value;
  const kept = Object.entries(value).filter(([key]) => key !== 'origin' && key !== 'note' && key !== 'text');
  return Object.fromEntries(kept.map(([key, each]) => [key, bare(each)]));
}
const same = (one: unknown, other: unknown): boolean => canonical(bare(one)) === canonical(bare(other));
const byId = <T extends { id: string }>(list: readonly T[] | undefined, id: string): T | undefined =>
  list?.find((each) => each.id === id);

/** What hangs around a relief point: itself, its valves, its lines with their segments. */
function surroundings(point: ReliefPoint, basis: Basis): unknown {
  const lines = basis.lines.filter((line) => line.point === point.id);
  const segments = lines.flatMap((line) => line.path.map((id) => byId(basis.segments, id)));
  return [point, lines, segments, basis.isolations.filter((valve) => valve.protects.includes(point.id))];
}

/** Relief points that are new or differ from the base, in themselves or in what hangs around them. */
export function changedPoints(basis: Basis, base: Basis | undefined): ReliefPoint[] {
  return basis.reliefPoints.filter((point) => {
    const before = byId(base?.reliefPoints, point.id);
    return !before || !base || !same(surroundings(point, basis), surroundings(before, base));
  });
}

function equipmentLines(item: Equipment, before: Equipment | undefined): Draft[] {
  if (before && same(item.sides, before.sides) && same(item.shape, before.shape)) return [];
  const at = `equipment/${item.id}`;
  const rated = item.sides.flatMap((side) =>
    side.ratings.flatMap((rating) => {
      const mawp = quantityOf(rating.mawp);
      const label = `MAWP on the plate, ${side.name}`;
      return mawp
        ? [
            {
              at: `${at}/sides/${side.id}/ratings/${rating.id}/mawp`,
              group: 'equipment',
              label,
              wants: mawp,
              photo: true,
            },
          ]
        : [];
    }),
  );
  return [
    { at: `${at}/tag`, group: 'equipment', label: 'Equipment plate', wants: item.tag, photo: true },
    ...rated,
  ];
}

function sourceLines(source: Source, before: Source | undefined): Draft[] {
  if (before && same(source, before)) return [];
  const at = `sources/${source.id}`;
  const figures: [string, string, Parameters<typeof quantityOf>[0]][] = [
    ['pump/impeller', 'Impeller diameter', source.pump?.impeller],
    ['valve/coefficient', 'Coefficient on the plate', source.valve?.coefficient],
    ['valve/stop/kv', 'Coefficient at the travel stop', source.valve?.stop?.kv],
    ['orifice/bore', 'Bore of the orifice', source.orifice?.bore],
  ];
  const lines = figures.flatMap(([path, label, figure]) => {
    const wants = quantityOf(figure);
    const old = before && quantityOf(figureOf(before, path));
    if (!wants || (old && same(wants, old))) return [];
    return [
      {
        at: `${at}/${path}`,
        group: 'sources',
        label: `${source.tag}: ${label.toLowerCase()}`,
        wants,
        photo: true,
      },
    ];
  });
  return lines;
}

function figureOf(source: Source, path: string): Parameters<typeof quantityOf>[0] {
  if (path === 'pump/impeller') return source.pump?.impeller;
  if (path === 'valve/coefficient') return source.valve?.coefficient;
  return path === 'valve/stop/kv' ? source.valve?.stop?.kv : source.orifice?.bore;
}

function conditionLines(condition: FieldCondition, before: FieldCondition | undefined): Draft[] {
  if (before && same(condition, before)) return [];
  const at = `fieldConditions/${condition.id}`;
  const group = 'field conditions';
  const wants = quantityOf(condition.requires.figure) ?? condition.requires.words;
  return [
    {
      at: `${at}/requires`,
      group,
      label: `${condition.tag}: ${condition.kind.replace(/-/g, ' ')}`,
      photo: condition.photo,
      ...(wants === undefined ? {} : { wants }),
    },
    ...(condition.lock
      ? [
          {
            at: `${at}/lock/number`,
            group,
            label: `${condition.tag}: number of the lock`,
            wants: condition.lock.number,
            photo: condition.photo,
          },
        ]
      : []),
  ];
}

/**
 * The lines that operations must see before a revision goes in force: a full sheet for each changed relief point, the
 * plates of changed equipment and sources, changed field conditions. Empty when nothing on the plant changes.
 * @param base the revision it began from; absent for a first issue, which is seen whole
 */
export function fieldLines(basis: Basis, base?: Basis): FieldLine[] {
  const points = changedPoints(basis, base).flatMap((point) =>
    pointLines(point, basis).map((draft) => ({ ...draft, group: `${point.tag} · ${draft.group}` })),
  );
  const drafts: Draft[] = [
    ...points,
    ...basis.equipment.flatMap((item) => equipmentLines(item, byId(base?.equipment, item.id))),
    ...basis.sources.flatMap((source) => sourceLines(source, byId(base?.sources, source.id))),
    ...basis.fieldConditions.flatMap((condition) =>
      conditionLines(condition, byId(base?.fieldConditions, condition.id)),
    ),
  ];
  const once = drafts.filter((draft, index) => drafts.findIndex((each) => each.at === draft.at) === index);
  return once.map((draft, index) => ({
    key: `${basis.id}:${draft.at}`,
    document: basis.id,
    order: index + 1,
    group: draft.group,
    label: draft.label,
    ...(draft.wants === undefined ? {} : { wants: draft.wants }),
    photo: draft.photo === true,
    holds: true,
  }));
}

/** Whether the revision changes something that a field sheet would see; without it a case skips field verification. */
export function changesPlant(basis: Basis, base: Basis | undefined): boolean {
  return fieldLines(basis, base).length > 0;
}
