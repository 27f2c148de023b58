/* Rules on accumulation: how far a pressure may rise and which limit may be used. */
import { quantityOf } from '@domain/basis';
import { type CredibleAnswer, creditedMembers, enFireLimit } from '@domain/evaluate';
import { toSI } from '@engine/quantity';
import {
  allowed,
  gt,
  inUnitOf,
  isFire,
  limitOf,
  onScenario,
  output,
  percent,
  reliefPa,
  setMembers,
} from './reading';
import { type Hit, rule, type RuleContext } from './types';

export const accumulationAboveLimit = rule(
  {
    code: 'accumulation-above-limit',
    subject: 'scenario',
    statement: '{scenario} takes {equipment} to {p1}, above the allowed {maap}.',
    condition:
      'The relieving pressure that the sheet used, not the one typed, is above the allowed accumulated pressure for the MAWP, the code basis, the kind of scenario and the number of devices.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-125(c) [S]; PED Annex I 7.3 [M]',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const maap = output(ctx, `limit:${ca.id}`, 'MAAP');
      const relief = reliefPa(ctx, ca);
      const limit = limitOf(ctx, ca.answer.limiting ?? ca.group?.limiting);
      if (!maap || relief === undefined || !limit) return [];
      const above =
        ca.answer.accumulation === 'tank-vacuum' ? gt(-relief, -toSI(maap)) : gt(relief, toSI(maap));
      if (!above) return [];
      const values = { equipment: limit.equipment.tag, p1: inUnitOf(relief, maap), maap };
      return [onScenario(ca.scenario, values, { worse: relief / toSI(maap) })];
    }),
);

/** Why the limit of an answer is not its to use; nothing when it is. */
function misuse(ctx: RuleContext, ca: CredibleAnswer): { x: string; what: string } | undefined {
  const { accumulation } = ca.answer;
  if ((accumulation === 'fire' || accumulation === 'storage-fire') && !ca.scenario.key.startsWith('fire')) {
    return { x: accumulation === 'fire' ? '121' : '120', what: 'exposure to fire' };
  }
  if (accumulation !== 'several' || !ca.group) return undefined;
  const counted = creditedMembers(ctx.lookup, ca.group, ca.answer);
  if (counted.length < 2)
    return { x: '116', what: 'two or more devices that are counted together; an installed spare is none' };
  const limit = limitOf(ctx, ca.group.limiting);
  const high =
    limit && setMembers(ctx, ca.group).some((member) => !member.fireOnly && gt(member.pa, 1.05 * limit.pa));
  return high === true ? { x: '116', what: 'devices of which none is set above 105 % of MAWP' } : undefined;
}

export const accumulationLimitMisused = rule(
  {
    code: 'accumulation-limit-misused',
    subject: 'scenario',
    statement: '{scenario} uses the {x} % limit, which is only for {what}.',
    condition:
      '116 % with fewer than two required devices counted, or with set pressures outside the 105 % rule; 121 % for a scenario that is not fire; an installed spare counted as the second device.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-125(c)(1),(2) [S]',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const limit = limitOf(ctx, ca.answer.limiting ?? ca.group?.limiting);
      const wrong = limit?.en === true ? undefined : misuse(ctx, ca);
      const field = `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/accumulation`;
      return wrong ? [onScenario(ca.scenario, wrong, { field })] : [];
    }),
);

export const enLimitExceeded = rule(
  {
    code: 'en-limit-exceeded',
    subject: 'scenario',
    statement: "Under the EN basis {scenario} may not exceed 110 % of PS, or the site's fire limit {f} %.",
    condition:
      'The code basis is EN and the relieving pressure is above 110 % of PS, or in fire above the site’s own limit.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'PED 2014/68/EU Annex I 2.11.2, 7.3, 2.12 [M]',
    parameter: 'enFireLimit',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const limit = limitOf(ctx, ca.answer.limiting ?? ca.group?.limiting);
      const relief = reliefPa(ctx, ca);
      if (limit?.en !== true || relief === undefined || ca.answer.accumulation === 'corrected-test')
        return [];
      const factor = isFire(ca) ? enFireLimit(ctx.rules) : 1.1;
      if (!gt(relief, factor * limit.pa)) return [];
      const values = { f: percent(enFireLimit(ctx.rules)), p1: inUnitOf(relief, limit.mawp), ps: limit.mawp };
      return [onScenario(ca.scenario, values, { worse: relief / limit.pa })];
    }),
);

export const storageLimitMisused = rule(
  {
    code: 'storage-limit-misused',
    subject: 'scenario',
    statement:
      'The 120 % limit is only for ambient storage of liquefied compressed gas in fire, and {equipment} is not that.',
    condition:
      'The 120 % limit is chosen and the equipment does not store liquefied gas without refrigeration, or has a permanent supply connection, or the tolerance of the device is not −0/+10 %.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-125(c)(3), UG-134(d)(2) (2015) [S]',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      if (ca.answer.accumulation !== 'storage-fire') return [];
      const limit = limitOf(ctx, ca.answer.limiting ?? ca.group?.limiting);
      const storage = limit?.equipment.storage;
      const store = storage?.liquefied === true && !storage.refrigerated && !storage.permanentSupply;
      const members = ca.group ? creditedMembers(ctx.lookup, ca.group, ca.answer) : [];
      const tolerant = members.every(({ point }) => point.tolerance === 'minus-0-plus-10');
      return limit && !(store && tolerant)
        ? [onScenario(ca.scenario, { equipment: limit.equipment.tag })]
        : [];
    }),
);

/** The causes that may be judged against the corrected test pressure, where the site allows it. */
const TEST_PRESSURE_CAUSES: Readonly<Record<string, string>> = {
  'tube-rupture': 'testPressureTubeRupture',
  'check-valve-reverse-flow': 'testPressureReverseFlow',
  'inadvertent-valve-opening': 'testPressureLockedValve',
};

export const testPressureLimitUsed = rule(
  {
    code: 'test-pressure-limit-used',
    subject: 'scenario',
    statement: '{scenario} is judged against the corrected test pressure instead of the accumulation limit.',
    condition:
      'The scenario is accepted against the corrected test pressure. Tube rupture, reverse flow through a latent check valve and a locked valve opened by mistake may be, with test pressure and stress ratio given; others may not.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'API 521 5th 3.21, 4.3.4.2, 5.19 as quoted publicly [S]; 6th/7th [M]',
    parameter: 'testPressureTubeRupture',
  },
  (ctx) =>
    ctx.answers
      .filter((ca) => ca.answer.accumulation === 'corrected-test')
      .map((ca) => {
        const limit = limitOf(ctx, ca.answer.limiting ?? ca.group?.limiting);
        const stated =
          quantityOf(limit?.side.test) !== undefined && quantityOf(limit?.side.stressRatio) !== undefined;
        const site = TEST_PRESSURE_CAUSES[ca.scenario.key];
        const may = stated && site !== undefined && allowed(ctx, site, false);
        return onScenario(ca.scenario, {}, may ? {} : { severity: 'stop' });
      }),
);
