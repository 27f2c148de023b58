/* Rules on how near a set pressure stands to operation, and on blowdown. */
import { quantityOf, type ReliefPoint } from '@domain/basis';
import { dimensionOf, type Q, toSI } from '@engine/quantity';
import { groupsOf, gt, inUnitOf, limitOf, onPoint, param, percent, told } from '../reading';
import { type Hit, rule, type RuleContext } from '../types';

const FLOOR = { US: 5 * 6894.757293168, SI: 35e3 };

type Operated = {
  point: ReliefPoint;
  set: Q;
  setPa: number;
  normal?: Q;
  max?: Q;
  equipment: string;
  units: 'US' | 'SI';
  tank: boolean;
};

/** Relief points with their set and the operating pressures of what they protect. */
function operated(ctx: RuleContext): Operated[] {
  return ctx.doc.reliefPoints.flatMap((point) => {
    const set = quantityOf(point.set);
    const limit = groupsOf(ctx, point).map((group) => limitOf(ctx, group.limiting))[0];
    if (!set || !limit || point.axes.direction === 'under') return [];
    const normal = quantityOf(limit.side.operating?.normal);
    const max = quantityOf(limit.side.operating?.max) ?? normal;
    return [
      {
        point,
        set,
        setPa: toSI(set),
        equipment: limit.equipment.tag,
        units: limit.side.code?.units ?? ctx.doc.units,
        tank: limit.equipment.kind === 'storage-tank',
        ...(normal ? { normal } : {}),
        ...(max ? { max } : {}),
      },
    ];
  });
}

/** The share of set that must lie between operation and set, by the kind of device. */
function marginShare(ctx: RuleContext, point: ReliefPoint): { share: number; floored: boolean } {
  if (point.axes.holds === 'supplementary') return { share: 0.03, floored: false };
  if (point.axes.actuation.includes('pilot'))
    return {
      share: point.axes.action === 'modulating' ? 0.02 : param(ctx, 'marginPilot', 0.05),
      floored: false,
    };
  if (point.seat === 'soft') return { share: 0.07, floored: false };
  return { share: param(ctx, 'marginSpring', 0.1), floored: true };
}

export const operatingMarginSmall = rule(
  {
    code: 'operating-margin-small',
    subject: 'device',
    statement: '{equipment} operates at {pop}, only {m} % below the set pressure of {device}.',
    condition:
      'The gap between set pressure and the highest operating pressure is too small: 10 % of set and at least 5 psi (35 kPa) for a spring valve with metal seat, 7 % with soft seat, 5 % for a pop pilot, 2 % for a modulating pilot, 3 % where supplementary-loaded; or the valve would open in normal operation.',
    severity: 'justify',
    gate: 'scenarios',
    source:
      'API 520-1 10th, API 527 (tightness tested at 90 % of set) [M]; trade practice (≤ 90 % or 25 psi)',
    parameter: 'marginSpring',
  },
  (ctx) =>
    operated(ctx).flatMap((item): Hit[] => {
      if (!item.max || item.point.axes.recloses !== 'yes') return [];
      const { share, floored } = marginShare(ctx, item.point);
      const needed = Math.max(share * item.setPa, floored && !item.tank ? FLOOR[item.units] : 0);
      const margin = item.setPa - toSI(item.max);
      if (!gt(needed, margin)) return [];
      const opens = margin <= 0;
      const values = {
        equipment: item.equipment,
        pop: item.max,
        m: percent(margin / item.setPa),
        set: item.set,
      };
      const more = opens ? 'It opens in normal operation.' : undefined;
      return [
        onPoint(item.point, values, {
          worse: -margin / item.setPa + 1,
          ...(opens ? { severity: 'stop' as const } : {}),
          ...(more ? { more } : {}),
        }),
      ];
    }),
);

/** Blowdown as a share of set, from a fraction or a pressure. */
export function blowdownShare(point: ReliefPoint): number | undefined {
  const blowdown = quantityOf(point.blowdown);
  const set = quantityOf(point.set);
  if (!blowdown) return undefined;
  if (dimensionOf(blowdown.unit) !== 'pressure-difference') return toSI(blowdown);
  return set && toSI(blowdown) / toSI(set);
}

export const reseatBelowOperating = rule(
  {
    code: 'reseat-below-operating',
    subject: 'device',
    statement:
      '{device} reseats at {reseat}, below the normal operating pressure {pop}: once open it may not close.',
    condition:
      'The set pressure less the blowdown is below the normal operating pressure. The blowdown is the certificate’s, else the maker’s maximum, else assumed as 7 % for gas and 20 % for liquid (the sentence then says so).',
    severity: 'justify',
    gate: 'scenarios',
    source: 'API 520-1 [M]; physics [P]',
    parameter: 'assumedBlowdownGas',
  },
  (ctx) =>
    operated(ctx).flatMap((item): Hit[] => {
      if (!item.normal || item.point.axes.recloses !== 'yes') return [];
      const known = blowdownShare(item.point);
      const assumed =
        item.point.duty === 'liquid'
          ? param(ctx, 'assumedBlowdownLiquid', 0.2)
          : param(ctx, 'assumedBlowdownGas', 0.07);
      const reseat = item.setPa * (1 - (known ?? assumed));
      if (!gt(toSI(item.normal), reseat)) return [];
      const values = { reseat: inUnitOf(reseat, item.set), pop: item.normal, set: item.set };
      const more =
        known === undefined
          ? `Its blowdown is not known and ${String(assumed * 100)} % of set is assumed.`
          : undefined;
      return [onPoint(item.point, values, { worse: toSI(item.normal) / reseat, ...(more ? { more } : {}) })];
    }),
);

export const blowdownOutsideRange = rule(
  {
    code: 'blowdown-outside-range',
    subject: 'device',
    statement: 'The blowdown of {device}, {bd} %, is outside the usual range for its service.',
    condition:
      'Gas or vapour: below 2 %, or above the larger of 15 % and 30 kPa. Liquid: below 2.5 %, or above the larger of 20 % and 60 kPa. The lower limit does not bind proportional and modulating valves; a blowdown of nought or none is a note.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'ISO 4126-1:2013/Amd 1:2016 [S]',
    parameter: 'blowdownMax',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const share = blowdownShare(point);
      const set = quantityOf(point.set);
      if (share === undefined || !set || point.axes.recloses !== 'yes') return [];
      const liquid = point.duty === 'liquid';
      const most = Math.max(
        liquid ? 0.2 : param(ctx, 'blowdownMax', 0.15),
        (liquid ? 60e3 : 30e3) / toSI(set),
      );
      const least = liquid ? 0.025 : 0.02;
      const gradual = point.axes.action !== 'pop' || point.axes.lift === 'low';
      if (!gt(share, most) && (gradual || !gt(least, share))) return [];
      const values = { bd: percent(share), least: percent(least), most: told(most * 100, '%') };
      return [
        onPoint(point, values, {
          worse: gt(share, most) ? share : -share,
          field: `reliefPoints/${point.id}/blowdown`,
        }),
      ];
    }),
);
