/* Rules on back pressure against the kind of device. */
import { quantityOf, type ReliefPoint } from '@domain/basis';
import { dimensionOf, type Q, toSI } from '@engine/quantity';
import {
  answersOfPoint,
  gaugePa,
  groupsOf,
  gt,
  inUnitOf,
  limitOf,
  onPoint,
  overpressureOf,
  param,
  percent,
} from '../reading';
import { type Hit, rule, type RuleContext } from '../types';

/** True for a spring-loaded valve without bellows or piston. */
export function isConventional(point: ReliefPoint): boolean {
  const spring = point.axes.actuation.includes('pressure') && point.axes.holds === 'spring';
  return spring && point.axes.balance === 'none' && point.axes.recloses === 'yes';
}

/** The overpressure that every scenario of a device allows it, as a share of set; 10 % where none is known. */
function leastOverpressure(ctx: RuleContext, point: ReliefPoint, setPa: number): number {
  const all = answersOfPoint(ctx, point).flatMap((ca) => overpressureOf(ctx, ca, setPa) ?? []);
  return all.length > 0 ? Math.min(...all) : 0.1;
}

/** The maker's limit of back pressure as a share of set. */
function makersShare(point: ReliefPoint, setPa: number): number | undefined {
  const limit = quantityOf(point.limits?.back);
  if (!limit) return undefined;
  return dimensionOf(limit.unit) === 'dimensionless' ? toSI(limit) : toSI(limit) / setPa;
}

function isEn(ctx: RuleContext, point: ReliefPoint): boolean {
  return groupsOf(ctx, point).some((group) => limitOf(ctx, group.limiting)?.en === true);
}

export const conventionalBuiltUpHigh = rule(
  {
    code: 'conventional-built-up-high',
    subject: 'device',
    statement: 'Built-up back pressure on {device} is {x} % of set, more than its overpressure of {op} %.',
    condition:
      'For a conventional spring valve: built-up back pressure on set pressure is larger than the overpressure (10, 16 or 21 %, or more where it is set below the MAWP). Under EN above 10 %, unless the maker states more.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 10th §5.3 [M]; 10 % public guides [S]',
    parameter: 'conventionalBuiltUp',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const set = quantityOf(point.set);
      const builtUp = ctx.evaluation.points[point.id]?.builtUp;
      if (!isConventional(point) || !set || !builtUp || point.service === 'out-of-service') return [];
      const setPa = toSI(set);
      const most = isEn(ctx, point)
        ? (makersShare(point, setPa) ?? 0.1)
        : leastOverpressure(ctx, point, setPa);
      const limit = Math.min(most, param(ctx, 'conventionalBuiltUp', most));
      const share = toSI(builtUp) / setPa;
      if (!gt(share, limit)) return [];
      return [onPoint(point, { x: percent(share), op: percent(limit), builtUp, set }, { worse: share })];
    }),
);

/** The highest pressure at which a device may open, by its place in the group: MAWP, 105 % or 110 %. */
export function setLimitOf(ctx: RuleContext, point: ReliefPoint): { pa: number; mawp: Q } | undefined {
  for (const group of groupsOf(ctx, point)) {
    const limit = limitOf(ctx, group.limiting);
    const place = group.members.find((member) => member.point === point.id)?.place;
    if (!limit) continue;
    const factor = place === 'additional' ? 1.05 : place === 'supplementary-fire' ? 1.1 : 1;
    return { pa: limit.pa * factor, mawp: limit.mawp };
  }
  return undefined;
}

export const superimposedVariable = rule(
  {
    code: 'superimposed-variable',
    subject: 'device',
    statement: 'Variable back pressure delays the opening of {device} to {po}, above its limit.',
    condition:
      'For a conventional spring valve: the set pressure with the whole swing of the superimposed back pressure is above the highest set pressure that its place in the group allows (MAWP, 105 or 110 %), by more than 0.1 %.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 [M]; trade practice',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const set = quantityOf(point.set);
      const [least, most] = [quantityOf(point.superimposed?.min), quantityOf(point.superimposed?.max)];
      const limit = setLimitOf(ctx, point);
      if (!isConventional(point) || !set || !most || !limit) return [];
      const opens = toSI(set) + gaugePa(ctx, most) - (least ? gaugePa(ctx, least) : 0);
      if (!gt(opens, limit.pa)) return [];
      return [
        onPoint(point, { po: inUnitOf(opens, set), set, mawp: limit.mawp }, { worse: opens / limit.pa }),
      ];
    }),
);

export const balancedTotalHigh = rule(
  {
    code: 'balanced-total-high',
    subject: 'device',
    statement: 'Total back pressure on balanced {device} is {x} % of set, beyond {lim} %.',
    condition:
      'For a balanced valve: total back pressure on set pressure is above the lesser of the maker’s limit and the site’s. The maker’s limit needs a reference where it is the larger.',
    severity: 'justify',
    gate: 'scenarios',
    source:
      "public owner practice: 50 % for new designs, maker's value by approval in revamps [S]; API 520-1 [M]",
    parameter: 'balancedTotal',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const set = quantityOf(point.set);
      const total = ctx.evaluation.points[point.id]?.total;
      if (point.axes.balance === 'none' || !set || !total) return [];
      const share = gaugePa(ctx, total) / toSI(set);
      const site = param(ctx, 'balancedTotal', 0.5);
      const limit = Math.min(makersShare(point, toSI(set)) ?? site, site);
      return gt(share, limit)
        ? [onPoint(point, { x: percent(share), lim: percent(limit), total, set }, { worse: share })]
        : [];
    }),
);
