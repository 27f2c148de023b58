/* Rules on the inlet and outlet lines of relief points. */
import { quantityOf, type Line, type ReliefPoint } from '@domain/basis';
import { codeOf, limitingSide } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import { blowdownShare } from './b-set/operation';
import { answersOfPoint, groupsOf, gt, onPoint, param, percent, allowed } from './reading';
import { type Hit, rule, type RuleContext } from './types';

/** The inlet loss of a relief point as a share of set. */
function inletShare(ctx: RuleContext, point: ReliefPoint): { share: number; loss: Q } | undefined {
  const loss = ctx.evaluation.points[point.id]?.inletLoss;
  const set = quantityOf(point.set);
  return loss && set ? { share: toSI(loss) / toSI(set), loss } : undefined;
}

export const inletLossHigh = rule(
  {
    code: 'inlet-loss-high',
    subject: 'inlet line',
    statement: 'The inlet loss of {device} is {x} % of set, above {lim} %.',
    condition:
      'For spring valves and pilots sensed at the valve: the loss is above 3 % of set. Exempt are pilots sensed remotely and, by the site’s choice, devices for thermal expansion only.',
    severity: 'justify',
    gate: 'scenarios',
    source:
      '3 % of set, ASME VIII-1 App. M / API 520-2 [S]; OSHA 2010: more only with engineering analysis [S]',
    parameter: 'inletLoss',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const found = inletShare(ctx, point);
      const remote = point.axes.actuation.includes('pilot') && point.pilot?.sensing === 'remote';
      if (!found || remote || point.axes.recloses !== 'yes') return [];
      const answers = answersOfPoint(ctx, point);
      const thermal = answers.length > 0 && answers.every((ca) => ca.scenario.key === 'thermal-expansion');
      if (thermal && allowed(ctx, 'thermalExempt', false)) return [];
      const limit = param(ctx, 'inletLoss', 0.03);
      if (!gt(found.share, limit)) return [];
      return [
        onPoint(
          point,
          { x: percent(found.share), lim: percent(limit), loss: found.loss },
          { worse: found.share, field: lineOf(ctx, point, 'inlet') },
        ),
      ];
    }),
);

function lineOf(ctx: RuleContext, point: ReliefPoint, side: Line['side']): string {
  const line = ctx.doc.lines.find((item) => item.point === point.id && item.side === side);
  return line ? `lines/${line.id}` : `reliefPoints/${point.id}`;
}

export const inletLossNearBlowdown = rule(
  {
    code: 'inlet-loss-near-blowdown',
    subject: 'inlet line',
    statement: 'The inlet loss of {device} is so near its blowdown that it cannot stay open.',
    condition:
      'The loss on set pressure comes within 2 % of the blowdown; under EN it is above a third of the blowdown.',
    severity: 'stop',
    gate: 'scenarios',
    source: '[P], force balance; EN ISO 4126-9: ≤ 3 % or ⅓ of blowdown [M]',
    parameter: 'blowdownReserve',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const found = inletShare(ctx, point);
      const blowdown = blowdownShare(point);
      if (!found || blowdown === undefined || point.axes.recloses !== 'yes') return [];
      const values = { x: percent(found.share), bd: percent(blowdown) };
      const extra = { worse: found.share / blowdown, field: lineOf(ctx, point, 'inlet') };
      if (found.share >= blowdown - param(ctx, 'blowdownReserve', 0.02))
        return [onPoint(point, values, extra)];
      const en = groupsOf(ctx, point).some((group) => isEnGroup(ctx, group.limiting));
      return en && gt(found.share, blowdown / 3)
        ? [onPoint(point, values, { ...extra, severity: 'justify' })]
        : [];
    }),
);

function isEnGroup(ctx: RuleContext, limiting: { equipment: string; side?: string }): boolean {
  const found = limitingSide(ctx.lookup, limiting);
  return found !== undefined && codeOf(found.side, ctx.doc).basis === 'en';
}

export const lineLossMissing = rule(
  {
    code: 'line-loss-missing',
    subject: 'inlet line',
    statement: 'No loss is calculated for the {side} line of {device}.',
    condition:
      'There is a line, with length or fittings, and no sheet for it, or the sheet is older than the data of device, fluid or line.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice; API 520-2 [M]',
  },
  (ctx) =>
    ctx.doc.lines.flatMap((line): Hit[] => {
      const point = ctx.lookup.points.get(line.point);
      const key = line.side === 'inlet' ? `inlet:${line.point}` : `outlet:${line.point}/own`;
      const sheet = ctx.evaluation.sheets[key];
      if (!point || line.path.length === 0 || (sheet && !sheet.refused) || point.service !== 'in-service')
        return [];
      return [{ ...onPoint(point, { side: line.side }), subject: `lines/${line.id}` }];
    }),
);
