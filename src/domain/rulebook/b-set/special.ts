/* Rules on set pressures with limits of their own: thermal relief of piping, tank vents, spring ranges. */
import { quantityOf } from '@domain/basis';
import { effectiveArea } from '@domain/evaluate';
import { toSI } from '@engine/quantity';
import { gt, limitOf, onPoint, param, setMembers } from '../reading';
import { type Hit, rule } from '../types';
import { thermalPipingOnly } from './limits';

export const thermalReliefSetHigh = rule(
  {
    code: 'thermal-relief-set-high',
    subject: 'device',
    statement:
      '{device} protects only blocked-in piping and is set above the lesser of the test pressure and 120 % of design.',
    condition:
      'All scenarios of the device are thermal expansion in piping, and it is set above the lesser of the test pressure and 120 % of the design pressure.',
    severity: 'stop',
    gate: 'scenarios',
    source: "ASME B31.3-2016 322.6.3(b)(2) [S]; needs owner's approval for set above VIII-1 limits",
    parameter: 'thermalSetMax',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group) => {
      const limit = limitOf(ctx, group.limiting);
      if (!limit) return [];
      const test = quantityOf(limit.side.pipingTest) ?? quantityOf(limit.side.test);
      const byDesign = param(ctx, 'thermalSetMax', 1.2) * limit.pa;
      const most = test ? Math.min(toSI(test), byDesign) : byDesign;
      return setMembers(ctx, group)
        .filter((member) => thermalPipingOnly(ctx, member.point) && gt(member.pa, most))
        .map((member) =>
          onPoint(member.point, { set: member.set, mawp: limit.mawp }, { worse: member.pa / most }),
        );
    }),
);

const TANK_FACTORS: Record<string, [number, number]> = { 'api-620': [1.1, 1.2] };

export const tankVentSetHigh = rule(
  {
    code: 'tank-vent-set-high',
    subject: 'device',
    statement: '{device} needs {pf} to pass its flow, beyond the design pressure or vacuum of {tank}.',
    condition:
      'The pressure at the required flow is above the tank’s design pressure (for an emergency vent 100 % to API 650; to API 620 120 % in fire and 110 % otherwise), or the vacuum is beyond the design vacuum, or the emergency vent opens no later than the normal one.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 2000 5th (49 CFR 195.264 reprint) [S]; API 650/620 allowances [M]',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const limit = ca.group && limitOf(ctx, ca.group.limiting);
      if (!ca.group || !limit || limit.equipment.kind !== 'storage-tank') return [];
      const [process, fire] = TANK_FACTORS[limit.side.code?.basis ?? ''] ?? [1, 1];
      const vacuum = ca.answer.accumulation === 'tank-vacuum';
      const design = vacuum ? quantityOf(limit.side.designVacuum) : limit.mawp;
      if (!design) return [];
      const most =
        Math.abs(toSI(design)) * (vacuum ? 1 : ca.scenario.key.startsWith('fire') ? fire : process);
      return ca.group.members.flatMap((member) => {
        const point = ctx.lookup.points.get(member.point);
        const flow = quantityOf(vacuum ? point?.fullFlowVacuum : point?.fullFlow);
        if (!point || !flow || !member.credited || !gt(Math.abs(toSI(flow)), most)) return [];
        return [
          onPoint(
            point,
            { pf: flow, tank: limit.equipment.tag, limit: design },
            { worse: Math.abs(toSI(flow)) / most },
          ),
        ];
      });
    }),
);

const RESET_WIDE = 0.1;
const NARROW_ABOVE = 1720e3;

export const setOutsideSpringRange = rule(
  {
    code: 'set-outside-spring-range',
    subject: 'device',
    statement: '{set} lies outside the range of the fitted spring ({lo}–{hi}).',
    condition:
      'The CDTP, or else the set pressure, is outside the range of the spring on the plate. Where the range is unknown: a reset changes the stamped set pressure by more than 10 %, or by more than 5 % above 250 psi (1 720 kPa).',
    severity: 'stop',
    gate: 'scenarios',
    source:
      "46 CFR 162.018-4(f): springs not reset beyond ±10 % [S]; maker's spring chart governs; ±5 % above 250 psi [M]",
    parameter: 'resetBand',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      const set = quantityOf(point.cdtp) ?? quantityOf(point.set);
      const [lo, hi] = [quantityOf(point.spring?.lo), quantityOf(point.spring?.hi)];
      if (!set) return [];
      if (lo && hi) {
        const outside = gt(toSI(set), toSI(hi)) || gt(toSI(lo), toSI(set));
        return outside ? [onPoint(point, { set, lo, hi }, { field: `reliefPoints/${point.id}/set` })] : [];
      }
      const old = quantityOf(ctx.prior?.doc.reliefPoints.find((item) => item.id === point.id)?.set);
      const now = quantityOf(point.set);
      if (!old || !now || effectiveArea(point) === undefined || point.axes.holds !== 'spring') return [];
      const band = toSI(old) > NARROW_ABOVE ? RESET_WIDE / 2 : param(ctx, 'resetBand', RESET_WIDE);
      if (Math.abs(toSI(now) / toSI(old) - 1) <= band * 1.001) return [];
      const values = {
        set: now,
        lo: { value: old.value * (1 - band), unit: old.unit },
        hi: { value: old.value * (1 + band), unit: old.unit },
      };
      return [
        onPoint(point, values, {
          more: 'The spring range is not known, so the band about the stamped set stands for it.',
        }),
      ];
    }),
);
