/* Rules on isolation valves, cold settings and bonnet vents of relief points. */
import { quantityOf, type ReliefPoint } from '@domain/basis';
import { outputOf } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import { isConventional } from './d-device/back-pressure';
import { answersOfPoint, gt, inUnitOf, onPoint, param } from './reading';
import { type Hit, rule, type RuleContext } from './types';

export const isolationUnlocked = rule(
  {
    code: 'isolation-unlocked',
    subject: 'device',
    statement: '{valve} has no lock or seal, or no number in the lock register.',
    condition:
      'An isolation in the inlet or outlet path has no kind of lock, number or keeper; a changeover valve has no statement of its position.',
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
      'The port of the valve is smaller than the line. It asks for a reason where its loss is counted at the rated flow and the capacity is kept, and stops where not.',
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
      'A spring valve relieves above 66 °C or the maker’s threshold, or is conventional under constant superimposed back pressure, and the CDTP is blank.',
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
      'The CDTP differs, by more than half the set tolerance, from set pressure less constant superimposed back pressure (conventional valves only) times the temperature factor. Taking it off for a balanced or pilot valve is the same mistake.',
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
      'On a balanced valve the vent is neither open nor piped to a safe place, or is local with a toxic fluid; on a conventional valve in a closed system the plug of the bonnet is not stated.',
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
