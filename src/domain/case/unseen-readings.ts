/* Items of the unseen check that are read from drawings, data sheets and plates. */
import {
  type Answer,
  type Basis,
  type Equipment,
  type Group,
  isKnown,
  type Scenario,
  type Source,
} from '@domain/basis';
import { ratingFor } from '@domain/evaluate';
import { type Dimension } from '@engine/quantity';
import { type Id, type Path, type UnseenLayer } from './types';
import { type UnseenQuantity } from './unseen-tolerances';

export type UnseenItem = {
  document: Id;
  /** What the entry is about; also where the originator's value lies. */
  scope: Path;
  layer: UnseenLayer;
  quantity: UnseenQuantity;
  group: Id;
  /** In the reader's words; never names a sheet that the checker has not chosen. */
  label: string;
  ask: { kind: 'quantity'; dimension: Dimension } | { kind: 'word'; choices: readonly string[] };
};
export type Draft = Omit<UnseenItem, 'document' | 'group'>;

export const figure = (
  layer: UnseenLayer,
  scope: Path,
  quantity: UnseenQuantity,
  label: string,
  dimension: Dimension,
): Draft => ({
  scope,
  layer,
  quantity,
  label,
  ask: { kind: 'quantity', dimension },
});
export const word = (
  layer: UnseenLayer,
  scope: Path,
  quantity: UnseenQuantity,
  label: string,
  choices: readonly string[],
): Draft => ({
  scope,
  layer,
  quantity,
  label,
  ask: { kind: 'word', choices },
});

/** MAWP and design temperature of the item that limits a group. */
export function ratingReadings(doc: Basis, group: Group): Draft[] {
  const item = doc.equipment.find((each) => each.id === group.limiting.equipment);
  const side = item?.sides.find((each) => each.id === group.limiting.side) ?? item?.sides[0];
  const rating = side && ratingFor(side, undefined);
  if (!item || !side || !rating) return [];
  const at = `equipment/${item.id}/sides/${side.id}/ratings/${rating.id}`;
  const name = `${item.tag}, ${side.name}`;
  const design = rating.at
    ? [figure('reading', `${at}/at`, 'design-temperature', `Design temperature of ${name}`, 'temperature')]
    : [];
  return [figure('reading', `${at}/mawp`, 'mawp', `MAWP of ${name}`, 'pressure-gauge'), ...design];
}

/** Set pressure, orifice and source of back pressure of each credited relief point. */
export function deviceReadings(doc: Basis, group: Group): Draft[] {
  const ids = group.members.filter((member) => member.credited).map((member) => member.point);
  return doc.reliefPoints
    .filter((point) => ids.includes(point.id))
    .flatMap((point) => {
      const at = `reliefPoints/${point.id}`;
      const outlet = doc.lines.find((line) => line.point === point.id && line.side === 'outlet' && line.end);
      const area = isKnown(point.orifice.actual) ? 'actual' : 'effective';
      return [
        ...(isKnown(point.set)
          ? [figure('reading', `${at}/set`, 'set', `Set pressure of ${point.tag}`, 'pressure-gauge')]
          : []),
        point.orifice.letter
          ? word('reading', `${at}/orifice/letter`, 'letter', `Orifice letter of ${point.tag}`, [
              ...'DEFGHJKLMNPQRT',
            ])
          : figure('reading', `${at}/orifice/${area}`, 'area', `Flow area of ${point.tag}`, 'area'),
        ...(outlet
          ? [
              word(
                'reading',
                `lines/${outlet.id}/end/to`,
                'back-pressure-source',
                `Where ${point.tag} discharges`,
                ['atmosphere', 'header', 'process', 'sewer', 'catch-tank', 'inflow'],
              ),
            ]
          : []),
      ];
    });
}

function sourceReadings(source: Source): Draft[] {
  const at = `sources/${source.id}`;
  const figures: [string, unknown, UnseenQuantity, string, Dimension][] = [
    ['valve/coefficient', source.valve?.coefficient, 'coefficient', 'Flow coefficient', 'flow-coefficient'],
    ['pump/shutoff', source.pump?.shutoff, 'curve-point', 'Pressure at shut-off', 'pressure-difference'],
    ['orifice/bore', source.orifice?.bore, 'bore', 'Bore', 'length'],
    ['heat/duty', source.heat?.duty, 'curve-point', 'Duty', 'power'],
  ];
  return figures
    .filter(([, value]) => isKnown(value as Parameters<typeof isKnown>[0]))
    .map(([path, , quantity, label, dimension]) =>
      figure('reading', `${at}/${path}`, quantity, `${label} of ${source.tag}`, dimension),
    );
}

function levelReading(scenario: Scenario, item: Equipment | undefined): Draft[] {
  if (!item || !scenario.key.includes('fire') || !isKnown(item.levels?.fire)) return [];
  return [
    figure(
      'reading',
      `equipment/${item.id}/levels/fire`,
      'level',
      `Liquid level in fire of ${item.tag}`,
      'length',
    ),
  ];
}

/** Readings behind the load of one answer: its sources, the level in a fire, molar mass or density of its fluid. */
export function parentReadings(doc: Basis, scenario: Scenario, answer: Answer): Draft[] {
  const sources = doc.sources.filter((source) => scenario.sources?.includes(source.id));
  const fluid = doc.fluids.find((each) => each.id === answer.fluid);
  const limiting = answer.limiting ?? doc.groups.find((group) => group.id === answer.group)?.limiting;
  const heavy = fluid && (fluid.phase === 'liquid' || fluid.phase === 'flashing-liquid');
  const at = `fluids/${fluid?.id ?? ''}`;
  const property = heavy
    ? isKnown(fluid.rhoLiquid)
      ? [figure('reading', `${at}/rhoLiquid`, 'liquid-density', `Density of ${fluid.name}`, 'density')]
      : []
    : isKnown(fluid?.M)
      ? [
          figure(
            'reading',
            `${at}/M`,
            'molar-mass',
            `Molar mass of ${fluid?.name ?? 'the fluid'}`,
            'molar-mass',
          ),
        ]
      : [];
  return [
    ...sources.flatMap(sourceReadings),
    ...levelReading(
      scenario,
      doc.equipment.find((each) => each.id === limiting?.equipment),
    ),
    ...property,
  ];
}
