/* Rules on capacity: required against installed area of one kind, and what may be counted. */
import { type CredibleAnswer, effectiveArea, INADEQUATE_ABOVE } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import {
  answersOf,
  groupName,
  onGroup,
  onPoint,
  onScenario,
  output,
  param,
  percent,
  scenarioName,
  told,
} from './reading';
import { type Hit, rule, type RuleContext } from './types';

type Use = { ca: CredibleAnswer; use: number; req: Q; inst: Q };

/** The uses of a group's answers that are sized. */
function usesOf(ctx: RuleContext, ca: CredibleAnswer): Use | undefined {
  const use = ctx.evaluation.figures[`sheets/size:${ca.id}#use`];
  const inst = ctx.evaluation.figures[`sheets/size:${ca.id}#installed_area`];
  const req = output(ctx, `size:${ca.id}`, 'A_required');
  if (typeof use !== 'object' || typeof inst !== 'object' || !req) return undefined;
  return { ca, use: use.value, req: told(req.value, req.unit), inst: told(inst.value, inst.unit) };
}

export const capacityShort = rule(
  {
    code: 'capacity-short',
    subject: 'group',
    statement: '{scenario} needs {req}, and {group} offers {inst}.',
    condition:
      'The required area is larger than the installed, or the load larger than the rated capacities together at the relieving pressure (for in-breathing: the volume flow at the allowed vacuum). Devices out of service and spares do not count.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-125, UG-133 [S]; API 2000 for tanks [S]',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const found = usesOf(ctx, ca);
      if (!found || !ca.group || found.use <= INADEQUATE_ABOVE) return [];
      const values = { scenario: scenarioName(ca.scenario), req: found.req, inst: found.inst };
      return [onGroup(ctx, ca.group, values, { worse: found.use, field: `sheets/size:${ca.id}` })];
    }),
);

export const capacityMarginal = rule(
  {
    code: 'capacity-marginal',
    subject: 'group',
    statement: '{scenario} uses {x} % of {group}: within the limit, with little in hand.',
    condition: 'From the site’s share of the installed area up to all of it is used.',
    severity: 'note',
    gate: 'approval',
    source: '[P]: chart reading ±2–3 %, loads ±10 %; one letter step is 21–78 % in area [S]',
    parameter: 'marginalFrom',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const found = usesOf(ctx, ca);
      if (!found || !ca.group || found.use > INADEQUATE_ABOVE || found.use < param(ctx, 'marginalFrom', 0.9))
        return [];
      const values = { scenario: scenarioName(ca.scenario), x: percent(found.use) };
      return [onGroup(ctx, ca.group, values, { worse: found.use, field: `sheets/size:${ca.id}` })];
    }),
);

export const lowLoadChatter = rule(
  {
    code: 'low-load-chatter',
    subject: 'device',
    statement:
      'The smallest credible load is {x} % of what {device} passes: a pop-action valve may cycle or chatter.',
    condition:
      'For pop action: the smallest credible load, thermal expansion aside, is below a quarter of what the first device passes, or even the governing load is below 30 %.',
    severity: 'justify',
    gate: 'check',
    source: 'trade practice (flow < ~25 % rated) [M]; [P]',
    parameter: 'lowLoadRatio',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group): Hit[] => {
      const first = group.members.find((member) => member.place === 'first' && member.credited);
      const point = first && ctx.lookup.points.get(first.point);
      const rated = point && ctx.evaluation.points[point.id]?.rated;
      if (!point || !rated || point.axes.action !== 'pop') return [];
      const loads = answersOf(ctx, group)
        .filter((ca) => ca.scenario.key !== 'thermal-expansion')
        .flatMap((ca) => output(ctx, `load:${ca.id}`, 'relief_load') ?? [])
        .map((q) => toSI(q));
      if (loads.length === 0) return [];
      const [least, most] = [Math.min(...loads) / toSI(rated), Math.max(...loads) / toSI(rated)];
      const even = most < 0.3;
      if (least >= param(ctx, 'lowLoadRatio', 0.25) && !even) return [];
      const more = even ? 'Even the governing load is below 30 % of it.' : undefined;
      return [onPoint(point, { x: percent(least) }, { worse: -least, ...(more ? { more } : {}) })];
    }),
);

const OTHER_MEASURES = ['jet-fire', 'internal-deflagration', 'hydraulic-surge', 'volatile-ingress'];

export const groupMissing = rule(
  {
    code: 'group-missing',
    subject: 'scenario',
    statement: '{scenario} is credible but no group of devices answers it.',
    condition:
      'The scenario is credible and no group answers it, unless another measure does, for a jet fire, deflagration, surge or volatile ingress.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-125(a)(1) [S]',
  },
  (ctx) =>
    ctx.doc.scenarios
      .filter((scenario) => scenario.disposition === 'credible')
      .filter((scenario) => !(scenario.otherMeasure !== undefined && OTHER_MEASURES.includes(scenario.key)))
      .filter(
        (scenario) =>
          scenario.answers.length === 0 ||
          scenario.answers.some((answer) => !ctx.lookup.groups.has(answer.group ?? '')),
      )
      .map((scenario) => onScenario(scenario, {}, { field: `scenarios/${scenario.id}/answers` })),
);

export const spareCredited = rule(
  {
    code: 'spare-credited',
    subject: 'group',
    statement: '{device} is an installed spare behind a closed valve and is counted as capacity.',
    condition: 'A device that is counted is in service as a spare, or its isolation is normally closed.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-135(d)(1) [S]; [P]',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group) =>
      group.members
        .filter((member) => member.credited)
        .flatMap((member): Hit[] => {
          const point = ctx.lookup.points.get(member.point);
          if (!point) return [];
          const shut = ctx.doc.isolations.some(
            (valve) =>
              valve.kept === 'shut' && valve.where !== 'process' && valve.protects.includes(point.id),
          );
          if (point.service !== 'spare' && member.place !== 'spare' && !shut) return [];
          const field = `groups/${group.id}/members/${member.id}/credited`;
          return [onGroup(ctx, group, { device: point.tag }, { field })];
        }),
    ),
);

/** A certified coefficient that meets an effective letter area, or an effective one that meets an actual area. */
export const areaKindMixed = rule(
  {
    code: 'area-kind-mixed',
    subject: 'device',
    statement: 'Effective and actual areas are mixed in the sizing of {device}.',
    condition:
      'A required area from the effective coefficients (0.975, 0.65, 0.62) is compared with an actual area, or a certified coefficient goes with the effective area of a letter.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 526 6th/7th: effective areas valid only with API 520 equations [S]',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const sheet = ctx.evaluation.sheets[`size:${ca.id}`];
      const kd = sheet?.inputs['Kd'];
      if (!sheet || !ca.group || typeof kd !== 'object' || !/^[abc]\./.test(sheet.method)) return [];
      const kind = ctx.evaluation.figures[`sheets/size:${ca.id}#area_kind`];
      const effectiveKd = [0.975, 0.65, 0.62].some((value) => Math.abs(kd.value - value) <= 0.0005);
      const mixed = kind === 'effective' ? !effectiveKd : effectiveKd;
      if (!mixed) return [];
      return ca.group.members.flatMap((member) => {
        const point = ctx.lookup.points.get(member.point);
        if (!point || !member.credited) return [];
        const area = effectiveArea(point) === undefined ? 'actual' : 'effective';
        return [
          onPoint(
            point,
            { scenario: groupName(ctx, ca.group as NonNullable<typeof ca.group>), kd, area },
            { field: `sheets/size:${ca.id}` },
          ),
        ];
      });
    }),
);
