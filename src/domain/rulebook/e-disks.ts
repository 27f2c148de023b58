/* Rules on rupture disks, alone and with a valve. */
import { quantityOf, type ReliefPoint } from '@domain/basis';
import { dimensionOf, type Q, toSI } from '@engine/quantity';
import { setLimitOf } from './d-device/back-pressure';
import { groupsOf, gt, inUnitOf, limitOf, onPoint, param, percent, told } from './reading';
import { type Hit, rule, type RuleContext } from './types';

const RATIOS = { plain: 0.7, composite: 0.8, graphite: 0.8, scored: 0.85, reverse: 0.9 } as const;

/** Half of a manufacturing range as a pressure: it is entered as a total width, in pressure or as a share of burst. */
function halfRange(point: ReliefPoint, burst: number): number {
  const range = quantityOf(point.disk?.range);
  if (!range) return 0;
  return (dimensionOf(range.unit) === 'dimensionless' ? toSI(range) * burst : toSI(range)) / 2;
}

/** Burst tolerance of ASME VIII-1: 2 psi or 15 kPa up to 40 psi or 300 kPa, 5 % above. */
function burstTolerance(burst: number, us: boolean): number {
  const psi = 6894.757293168;
  const [floor, upTo] = us ? [2 * psi, 40 * psi] : [15e3, 300e3];
  return burst <= upTo ? floor : 0.05 * burst;
}

export const diskBurstAboveLimit = rule(
  {
    code: 'disk-burst-above-limit',
    subject: 'device',
    statement: '{device} can be marked to burst at {pmax}, above its limit {lim}.',
    condition:
      'The top of the manufacturing range, or the marked burst pressure, at the temperature that goes with it and with the constant back pressure, is above what the disk’s place allows: MAWP alone, else 105 or 110 %.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-127(a)(1), UG-134(a) [S]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const burst = quantityOf(point.disk?.burst);
      const limit = setLimitOf(ctx, point);
      if (!burst || !limit) return [];
      const back = quantityOf(point.superimposed?.min);
      const top = toSI(burst) + halfRange(point, toSI(burst)) + (back ? Math.max(0, toSI(back)) : 0);
      if (!gt(top, limit.pa)) return [];
      return [
        onPoint(
          point,
          { pmax: inUnitOf(top, burst), lim: inUnitOf(limit.pa, burst) },
          { worse: top / limit.pa },
        ),
      ];
    }),
);

export const diskOperatingRatio = rule(
  {
    code: 'disk-operating-ratio',
    subject: 'device',
    statement: '{equipment} operates at {x} % of the lowest pressure at which {device} may burst.',
    condition:
      'The highest operating pressure, on the bottom of the range less the burst tolerance (2 psi or 15 kPa up to 40 psi or 300 kPa, 5 % above), is more than 70 % for plain disks, 70 to 80 % for graphite and composite, 85 % for scored, 90 % for reverse-acting, or the maker’s own ratio.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'tolerance ASME VIII-1 2015 UG-134(e) [S]; ratios trade practice, maker governs [M]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const burst = quantityOf(point.disk?.burst);
      const limit = groupsOf(ctx, point).map((group) => limitOf(ctx, group.limiting))[0];
      const operating = quantityOf(limit?.side.operating?.max) ?? quantityOf(limit?.side.operating?.normal);
      if (!burst || !operating || !limit) return [];
      const us = ctx.doc.units === 'US';
      const lowest = toSI(burst) - halfRange(point, toSI(burst)) - burstTolerance(toSI(burst), us);
      const own = quantityOf(point.disk?.ratio);
      const type = point.disk?.type ?? 'plain';
      const allowed = own ? toSI(own) : param(ctx, `ratio.${type}`, RATIOS[type]);
      const share = toSI(operating) / lowest;
      if (lowest > 0 && !gt(share, allowed)) return [];
      return [
        onPoint(
          point,
          { equipment: limit.equipment.tag, x: percent(share), most: percent(allowed) },
          { worse: share },
        ),
      ];
    }),
);

type Pair = { valve: ReliefPoint; disk: ReliefPoint };

/** Valves with a disk on their inlet, and that disk. */
function pairs(ctx: RuleContext): Pair[] {
  return ctx.doc.reliefPoints.flatMap((valve) => {
    const disk = valve.with?.side === 'inlet' ? ctx.lookup.points.get(valve.with.disk) : undefined;
    return disk ? [{ valve, disk }] : [];
  });
}

export const diskCombinationFactor = rule(
  {
    code: 'disk-combination-factor',
    subject: 'device',
    statement: '{device} under a disk is sized with Kc = {kc} without a certified combination.',
    condition:
      'With a disk upstream, the combination factor is above 0.90 without a certified pair, or the certified pair names another disk or valve than stands here.',
    severity: 'stop',
    gate: 'scenarios',
    source: '0.9 default ; older text 0.8 (Ludwig, trade practice) [P]',
    parameter: 'kcDefault',
  },
  (ctx) =>
    pairs(ctx).flatMap(({ valve }): Hit[] => {
      const kc = quantityOf(valve.k?.kc);
      if (!kc || !gt(toSI(kc), param(ctx, 'kcDefault', 0.9)) || valve.with?.certifiedPair !== undefined)
        return [];
      return [onPoint(valve, { kc }, { worse: toSI(kc), field: `reliefPoints/${valve.id}/k/kc` })];
    }),
);

export const diskSpaceUnmonitored = rule(
  {
    code: 'disk-space-unmonitored',
    subject: 'device',
    statement: 'Nothing shows whether pressure has built up between the disk and {device}.',
    condition:
      'A disk stands below a valve, or two disks in series, and the space between has no gauge, try cock, free vent or tell-tale with alarm.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-127(a)(3)(b) [M], same wording for pin devices [S]',
  },
  (ctx) =>
    pairs(ctx)
      .filter(({ valve }) => valve.with?.space === undefined || valve.with.space === 'none')
      .map(({ valve }) => onPoint(valve, {}, { field: `reliefPoints/${valve.id}/with/space` })),
);

/** Least bore area of a disk and inlet area of the valve, m². */
function areas({ valve, disk }: Pair): { net: number; inlet: number } | undefined {
  const net = quantityOf(disk.disk?.netArea);
  const bore = quantityOf(valve.inlet?.bore);
  return net && bore ? { net: toSI(net), inlet: (Math.PI / 4) * toSI(bore) ** 2 } : undefined;
}

export const diskObstructsValve = rule(
  {
    code: 'disk-obstructs-valve',
    subject: 'device',
    statement: 'The disk under {device} can fragment or is smaller than the valve inlet.',
    condition:
      'The disk below the valve can fragment, or its smallest net flow area is less than the inlet of the valve.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-127(a)(3) [M]',
  },
  (ctx) =>
    pairs(ctx).flatMap((pair): Hit[] => {
      const both = areas(pair);
      const narrow = both !== undefined && gt(both.inlet, both.net);
      return pair.disk.disk?.fragments === true || narrow
        ? [onPoint(pair.valve, { disk: pair.disk.tag })]
        : [];
    }),
);

export const diskValvePressureGap = rule(
  {
    code: 'disk-valve-pressure-gap',
    subject: 'device',
    statement: 'The disk bursts at {pb} and the valve is set at {ps}: they should be within 90–110 %.',
    condition:
      'The burst pressure is below 90 % or above 110 % of the set pressure. It is never above the disk’s own limit.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'combination testing practice ASME VIII-1 UG-132/XIII [M]',
    parameter: 'gap',
  },
  (ctx) =>
    pairs(ctx).flatMap(({ valve, disk }): Hit[] => {
      const [pb, ps]: (Q | undefined)[] = [quantityOf(disk.disk?.burst), quantityOf(valve.set)];
      if (!pb || !ps) return [];
      const ratio = toSI(pb) / toSI(ps);
      const gap = param(ctx, 'gap', 0.1);
      if (!gt(1 - gap, ratio) && !gt(ratio, 1 + gap)) return [];
      return [onPoint(valve, { pb, ps, ratio: told(ratio, '-') }, { worse: Math.abs(ratio - 1) })];
    }),
);
