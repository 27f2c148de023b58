/* Rules on the lines, isolation valves and cold settings of relief points. */
import { quantityOf, type Line, type ReliefPoint } from '@domain/basis';
import { codeOf, limitingSide, outputOf } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import { blowdownShare } from './b-set/operation';
import { isConventional } from './d-device/back-pressure';
import { answersOfPoint, groupsOf, gt, inUnitOf, onPoint, param, percent, allowed } from './reading';
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
      'spring devices and pilots sensed at the valve: loss/set > 0.03; exempt: remotely sensed pilot; device whose only scenario is thermal expansion (site choice)',
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
    condition: '(a) loss/set ≥ blowdown − 0.02; (b) EN basis: loss/set > blowdown/3',
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
      'line present (length > 0 or any fitting) and no sheet, or sheet older than device, fluid or line data',
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

export const isolationUnlocked = rule(
  {
    code: 'isolation-unlocked',
    subject: 'device',
    statement: '{valve} has no lock or seal, or no number in the lock register.',
    condition:
      'isolation in inlet or outlet path without lock kind, number and keeper; three-way/changeover: without position statement',
    severity: 'stop',
    gate: 'scenarios',
    source: 'App. M; locks and chains accepted [S]; API 576 seal lesson',
  },
  (ctx) =>
    ctx.doc.isolations
      .filter((valve) => valve.where !== 'process')
      .filter((valve) => {
        if (valve.kind === 'three-way') return valve.interlock === undefined && (valve.note ?? '') === '';
        const { lock } = valve;
        return (
          lock === undefined || lock.kind === 'none' || lock.number === undefined || lock.keeper === undefined
        );
      })
      .map((valve): Hit => {
        const tag = valve.tag ?? valvePlace(ctx, valve.where, valve.protects);
        return { subject: `isolations/${valve.id}`, tag, values: { valve: tag } };
      }),
);

/** The name of a valve without a tag: where it stands. */
function valvePlace(ctx: RuleContext, where: string, protects: readonly string[]): string {
  const tags = protects.map((id) => ctx.lookup.points.get(id)?.tag ?? '?');
  return `The valve in the ${where} of ${tags.join(', ')}`;
}

export const isolationRestricts = rule(
  {
    code: 'isolation-restricts',
    subject: 'device',
    statement: '{valve} in the relief path of {device} is not full bore.',
    condition:
      'port area < line area and (a) its loss is counted at rated flow and capacity is kept; (b) it is not',
    severity: 'justify',
    gate: 'scenarios',
    source:
      'ASME VIII-1 App. M full area (trade practice, 1978 interpretation [S]); B31.3-2016 322.6.1 allows less if not harmful [S]',
  },
  (ctx) =>
    ctx.doc.isolations
      .filter((valve) => valve.where !== 'process' && valve.fullBore === false)
      .flatMap((valve) =>
        valve.protects.slice(0, 1).flatMap((id): Hit[] => {
          const point = ctx.lookup.points.get(id);
          if (!point) return [];
          const counted = quantityOf(valve.k) !== undefined;
          const tag = valve.tag ?? valvePlace(ctx, valve.where, valve.protects);
          const hit: Hit = {
            subject: `isolations/${valve.id}`,
            tag,
            values: { valve: tag, device: point.tag },
          };
          return [counted ? hit : { ...hit, severity: 'stop' }];
        }),
      ),
);

function isSpring(point: ReliefPoint): boolean {
  return point.axes.holds === 'spring' && point.axes.recloses === 'yes' && point.axes.direction !== 'under';
}

/** The highest relieving temperature that a device sees. */
function hottest(ctx: RuleContext, point: ReliefPoint): Q | undefined {
  const all = answersOfPoint(ctx, point).flatMap(
    (ca) => quantityOf(ca.answer.T) ?? quantityOf(ctx.lookup.fluids.get(ca.answer.fluid ?? '')?.T) ?? [],
  );
  return all.toSorted((a, b) => toSI(b) - toSI(a))[0];
}

export const cdtpMissing = rule(
  {
    code: 'cdtp-missing',
    subject: 'device',
    statement: '{device} needs a cold setting, because of {reason}, and none is given.',
    condition:
      "spring: (T_relief > 66 °C or maker's threshold, or constant superimposed > 0 on a conventional valve) and CDTP blank",
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 definition [M]; threshold 66 °C/150 °F [M]',
    parameter: 'cdtpFromTemperature',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (!isSpring(point) || quantityOf(point.cdtp)) return [];
      const T = hottest(ctx, point);
      const threshold = param(ctx, 'cdtpFromTemperature', 66) + 273.15;
      const back = quantityOf(point.superimposed?.min);
      const hot = T !== undefined && toSI(T) > threshold;
      const pressed = isConventional(point) && back !== undefined && toSI(back) > 0;
      if (!hot && !pressed) return [];
      const reason = hot ? 'its relieving temperature' : 'the constant back pressure on it';
      return [
        onPoint(
          point,
          { reason, ...(hot ? { T } : { b: back ?? '' }) },
          { field: `reliefPoints/${point.id}/cdtp` },
        ),
      ];
    }),
);

export const cdtpMismatch = rule(
  {
    code: 'cdtp-mismatch',
    subject: 'device',
    statement:
      'CDTP {c} does not follow from set {set}, back pressure {b} and temperature factor {f}: {calc}.',
    condition:
      'abs(CDTP − (set − sc_conventional)·f) > 0.5·setTol; subtraction for balanced or pilot valves fires the same code',
    severity: 'stop',
    gate: 'scenarios',
    source: 'method h.set-tolerance; API 520-1 [M]',
    parameter: 'cdtpBand',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const c = quantityOf(point.cdtp);
      const set = quantityOf(point.set);
      const cold = ctx.evaluation.sheets[`cold:${point.id}`];
      const calc = outputOf(cold, 'CDTP');
      const tolerance = outputOf(cold, 'set_tolerance');
      if (!c || !set || !calc || !tolerance || !isSpring(point)) return [];
      const apart = Math.abs(toSI(c) - toSI(calc));
      if (!gt(apart, param(ctx, 'cdtpBand', 0.5) * toSI(tolerance))) return [];
      const b = quantityOf(point.superimposed?.min) ?? 'none';
      const f = quantityOf(point.temperatureFactor) ?? { value: 1, unit: '-' };
      const values = { c, set, b, f, calc: inUnitOf(toSI(calc), c) };
      return [onPoint(point, values, { worse: apart / toSI(set), field: `reliefPoints/${point.id}/cdtp` })];
    }),
);

export const bonnetVentWrong = rule(
  {
    code: 'bonnet-vent-wrong',
    subject: 'device',
    statement: 'The bonnet vent of {device} is {state}; a balanced valve needs it open to a safe place.',
    condition:
      'balanced: vent ∉ {open, piped to safe place}, or toxic fluid and vent local; conventional in closed system: bonnet plug not stated',
    severity: 'stop',
    gate: 'scenarios',
    source: 'SPS 341 App. C UG-127: vent the bonnet of balanced valves [S]; API 520-1 [M]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (point.axes.balance === 'none' || point.axes.recloses !== 'yes') return [];
      const vent = point.bonnet?.vent;
      const toxic = answersOfPoint(ctx, point).some(
        (ca) => ctx.lookup.fluids.get(ca.answer.fluid ?? '')?.hazards?.toxic === true,
      );
      if (vent === 'piped' || (vent === 'open' && !toxic)) return [];
      const state =
        vent === undefined
          ? 'not stated'
          : vent === 'open'
            ? 'open at the valve, with a toxic fluid'
            : 'plugged';
      return [onPoint(point, { state }, { field: `reliefPoints/${point.id}/bonnet` })];
    }),
);
