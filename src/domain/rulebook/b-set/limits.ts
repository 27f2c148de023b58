/* Rules on set pressures against the MAWP and against each other. */
import { quantityOf, type Group, type ReliefPoint } from '@domain/basis';
import { toSI } from '@engine/quantity';
import {
  answersOf,
  answersOfPoint,
  gt,
  groupsOf,
  isFire,
  limitOf,
  onGroup,
  onPoint,
  output,
  param,
  percent,
  type SetMember,
  setMembers,
} from '../reading';
import { type Hit, rule, type RuleContext } from '../types';

/** True for a device whose every credible scenario is thermal expansion of shut-in piping: B31.3 sets its own limit. */
export function thermalPipingOnly(ctx: RuleContext, point: ReliefPoint): boolean {
  const answers = answersOfPoint(ctx, point);
  if (answers.length === 0 || answers.some((ca) => ca.scenario.key !== 'thermal-expansion')) return false;
  return groupsOf(ctx, point).every(
    (group) => ctx.lookup.equipment.get(group.limiting.equipment)?.kind === 'piping',
  );
}

function isTank(ctx: RuleContext, group: Group): boolean {
  return ctx.lookup.equipment.get(group.limiting.equipment)?.kind === 'storage-tank';
}

export const setAboveMawp = rule(
  {
    code: 'set-above-mawp',
    subject: 'device',
    statement: '{device} is set at {set}, above the MAWP of {equipment} ({mawp}).',
    condition:
      'The set pressure of the first device is above the MAWP by more than 0.1 %, alike under ASME, EN and B31.3. Storage tanks have their own rule.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-134(a) [S]; EN ISO 4126-9 / EN 764-7: set ≤ PS [M]',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group): Hit[] => {
      const limit = limitOf(ctx, group.limiting);
      const first = setMembers(ctx, group).find((member) => !member.fireOnly);
      if (
        !limit ||
        !first ||
        isTank(ctx, group) ||
        thermalPipingOnly(ctx, first.point) ||
        !gt(first.pa, limit.pa)
      )
        return [];
      const values = { set: first.set, equipment: limit.equipment.tag, mawp: limit.mawp };
      return [
        onPoint(first.point, values, {
          worse: first.pa / limit.pa,
          field: `reliefPoints/${first.point.id}/set`,
        }),
      ];
    }),
);

/** The devices of a group after the first, with its limit. */
function furtherOf(
  ctx: RuleContext,
  group: Group,
): { limit: NonNullable<ReturnType<typeof limitOf>>; members: SetMember[] } | undefined {
  const limit = limitOf(ctx, group.limiting);
  return limit && !isTank(ctx, group) ? { limit, members: setMembers(ctx, group).slice(1) } : undefined;
}

export const setAdditionalAbove105 = rule(
  {
    code: 'set-additional-above-105',
    subject: 'group',
    statement: '{device} is an additional device set at {set}, above 105 % of MAWP.',
    condition:
      'A further device that answers a scenario other than fire is set above 105 % of MAWP; under EN also when its pressure at full lift is above 110 % of PS.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-134(a) [S]; EN 764-7 [M]',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group) => {
      const further = furtherOf(ctx, group);
      if (!further || !answersOf(ctx, group).some((ca) => !isFire(ca))) return [];
      const { limit } = further;
      return further.members
        .filter((member) => !member.fireOnly)
        .filter(
          (member) => gt(member.pa, 1.05 * limit.pa) || (limit.en && gt(fullLiftPa(member), 1.1 * limit.pa)),
        )
        .map((member) => {
          const values = { device: member.point.tag, set: member.set, mawp: limit.mawp };
          return onGroup(ctx, group, values, {
            worse: member.pa / limit.pa,
            field: `reliefPoints/${member.point.id}/set`,
          });
        });
    }),
);

function fullLiftPa(member: SetMember): number {
  const over = quantityOf(member.point.overpressure);
  return member.pa * (1 + (over ? toSI(over) : 0.1));
}

export const setFireSupplement = rule(
  {
    code: 'set-fire-supplement',
    subject: 'group',
    statement:
      '{device} is set above 105 % of MAWP, which is allowed only for a supplementary fire device, up to 110 %.',
    condition:
      'A device that answers fire only is set above 105 % of MAWP without being marked as supplementary for fire, or above 110 %, or the code basis is EN.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-134(b) [M]; EN: not available [M]',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group) => {
      const limit = limitOf(ctx, group.limiting);
      if (!limit || isTank(ctx, group)) return [];
      return setMembers(ctx, group)
        .filter((member) => member.fireOnly || fireAlone(ctx, member.point))
        .filter((member) => gt(member.pa, 1.05 * limit.pa))
        .filter((member) => !member.fireOnly || limit.en || gt(member.pa, 1.1 * limit.pa))
        .map((member) => {
          const values = { device: member.point.tag, set: member.set, mawp: limit.mawp };
          return onGroup(ctx, group, values, {
            worse: member.pa / limit.pa,
            field: `reliefPoints/${member.point.id}/set`,
          });
        });
    }),
);

function fireAlone(ctx: RuleContext, point: ReliefPoint): boolean {
  const answers = answersOfPoint(ctx, point);
  return answers.length > 0 && answers.every(isFire);
}

export const setsNotStaggered = rule(
  {
    code: 'sets-not-staggered',
    subject: 'group',
    statement: 'The {n} devices of {group} all open together, which favours chatter at small loads.',
    condition:
      'Two or more pop-action devices in service are set within 1 % of each other, and the smallest credible load is less than half of what they pass together.',
    severity: 'note',
    gate: 'check',
    source: 'trade practice; [P]',
    parameter: 'staggerSpread',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group): Hit[] => {
      const pops = setMembers(ctx, group).filter((member) => member.point.axes.action === 'pop');
      const [low, high] = [pops[0], pops.at(-1)];
      if (pops.length < 2 || !low || !high || high.pa / low.pa - 1 >= param(ctx, 'staggerSpread', 0.01))
        return [];
      const loads = answersOf(ctx, group).flatMap((ca) => output(ctx, `load:${ca.id}`, 'relief_load') ?? []);
      const rated = pops.flatMap((member) => ctx.evaluation.points[member.point.id]?.rated ?? []);
      if (loads.length === 0 || rated.length < pops.length) return [];
      const least = Math.min(...loads.map((q) => toSI(q)));
      const all = rated.reduce((sum, q) => sum + toSI(q), 0);
      return least < 0.5 * all
        ? [onGroup(ctx, group, { n: String(pops.length), x: percent(least / all) })]
        : [];
    }),
);
