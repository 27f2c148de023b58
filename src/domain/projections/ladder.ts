/* The pressures of a relief point on one scale, for the pressure ladder and the relief point's own page. */
import { type Basis, type Id, quantityOf } from '@domain/basis';
import { type Evaluation, limitingSide, lookupOf, outputOf, ratingFor } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import { leadingGroup } from './read';

export type RungKind =
  | 'operating'
  | 'operating-max'
  | 'reseating'
  | 'set'
  | 'mawp'
  | 'maap'
  | 'relieving'
  | 'back-pressure'
  | 'burst';
/** One rung: Pa gauge for its place, the quantity as it is shown. */
export type Rung = { kind: RungKind; pa: number; shown: Q };

/** Facts of a relief point that its page shows beside the ladder. */
export type PointFacts = {
  rungs: Rung[];
  /** Tag of the item that its group is judged against. */
  protects?: string;
  /** Maximum operating pressure as a share of set. */
  operatingShare?: number;
  blowdownShare?: number;
  testInterval?: Q;
};

/** The rungs and facts of a relief point; what is not known is left out. Vacuum devices have no ladder. */
export function pointFacts(doc: Basis, evaluation: Evaluation, id: Id): PointFacts | undefined {
  const point = doc.reliefPoints.find((one) => one.id === id);
  if (!point) return undefined;
  const ids = doc.groups
    .filter(({ members }) => members.some((member) => member.point === id))
    .map((group) => group.id);
  const group = leadingGroup(doc, evaluation, ids);
  const found = group && limitingSide(lookupOf(doc), group.limiting);
  const limit =
    evaluation.sheets[
      (group ? (evaluation.groups[group.id]?.governing ?? '') : '').replace(/^size:/, 'limit:')
    ];
  const set = quantityOf(point.set);
  const operating = quantityOf(found?.side.operating?.normal);
  const most = quantityOf(found?.side.operating?.max);
  const rungs: [RungKind, Q | undefined][] = [
    ['operating', operating],
    ['operating-max', most],
    ['reseating', outputOf(evaluation.sheets[`cold:${id}`], 'reseat_pressure')],
    ['set', set],
    ['burst', quantityOf(point.disk?.burst)],
    ['mawp', found && ratingFor(found.side, undefined)?.mawp],
    ['maap', outputOf(limit, 'MAAP')],
    ['relieving', outputOf(limit, 'relieving_pressure')],
    ['back-pressure', evaluation.points[id]?.total],
  ];
  const top = most ?? operating;
  const interval = quantityOf(point.test?.interval);
  const blowdown = quantityOf(point.blowdown);
  return {
    rungs:
      point.axes.direction === 'under'
        ? []
        : rungs.flatMap(([kind, shown]) => (shown ? [{ kind, pa: toSI(shown), shown }] : [])),
    ...(found ? { protects: found.equipment.tag } : {}),
    ...(top && set ? { operatingShare: toSI(top) / toSI(set) } : {}),
    ...(blowdown ? { blowdownShare: toSI(blowdown) } : {}),
    ...(interval ? { testInterval: interval } : {}),
  };
}
