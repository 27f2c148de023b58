/* Rules on whether a method suits the fluid that it is used on. */
import { type Fluid } from '@domain/basis';
import { withFluid, isFire, onScenario } from './reading';
import { type Hit, rule } from './types';

const FAMILIES: [RegExp, Fluid['phase'][]][] = [
  [/(^|:)(a\.gas|i\.iso4126-gas)/, ['gas', 'vapour', 'supercritical']],
  [/(^|:)(b\.steam|i\.iso4126-steam)/, ['gas', 'vapour']],
  [/(^|:)(c\.liquid|i\.iso4126-liquid)/, ['liquid']],
  [/(^|:)d\.omega/, ['two-phase', 'flashing-liquid']],
];

export const phaseMismatch = rule(
  {
    code: 'phase-mismatch',
    subject: 'scenario',
    statement: '{scenario} is sized as {a} but {fluid} is {b} at relief.',
    condition:
      'method family ≠ phase at (P1,T1); vapour fraction 0<x<1 with a single-phase method; liquid with Psat(T1) > P2 (or > choke pressure) sized as liquid',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 Annex C 10th [M]; chooser rule trade practice',
  },
  (ctx) =>
    withFluid(ctx).flatMap(({ ca, fluid }): Hit[] => {
      const sheet = ctx.evaluation.sheets[`size:${ca.id}`];
      const family = FAMILIES.find(([name]) => name.test(sheet?.method ?? ''));
      if (!sheet || !family || family[1].includes(fluid.phase)) return [];
      const values = { a: family[1].join(' or '), fluid: fluid.name, b: fluid.phase.replace('-', ' ') };
      return [
        onScenario(ca.scenario, values, {
          field: `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/size`,
        }),
      ];
    }),
);

export const correctionFactorMissing = rule(
  {
    code: 'correction-factor-missing',
    subject: 'scenario',
    statement: '{factor} is left at 1 although {why}.',
    condition:
      'Kv = 1 and Re < 100 000; KSH = 1 and steam > Tsat + 5 K; KN = 1 and 1 500 psi < P1 (10 339 kPa) ≤ 3 200 psi; Kb/Kw = 1 beyond onset; F2 absent when subcritical; Kp absent when op ≠ 25 % in the non-certified liquid method; Kc = 1 with disk',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 7th–10th [M]; method b, c',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const kc = ctx.evaluation.sheets[`size:${ca.id}`]?.inputs['Kc'];
      const disked = ca.group?.members
        .map((member) => ctx.lookup.points.get(member.point))
        .find((point) => point?.with?.side === 'inlet' && point.with.certifiedPair === undefined);
      if (typeof kc !== 'object' || kc.value < 0.999 || !disked) return [];
      const values = { factor: 'Kc', why: `a disk stands below ${disked.tag}` };
      return [
        onScenario(ca.scenario, values, {
          field: `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/size`,
        }),
      ];
    }),
);

const REACTIONS = ['runaway-reaction', 'reaction-upset'];

export const reactionDataMissing = rule(
  {
    code: 'reaction-data-missing',
    subject: 'scenario',
    statement: '{scenario} is a reaction case without calorimetry or a stated equivalent.',
    condition:
      'scenario ∈ {runaway-reaction, reaction-upset}, credible, and no reference of kind calorimetry; or foamy/level-swell flag blank',
    severity: 'stop',
    gate: 'scenarios',
    source: 'HSE CRR 136/1998, DIERS [P]',
  },
  (ctx) =>
    withFluid(ctx).flatMap(({ ca, fluid }): Hit[] => {
      if (!REACTIONS.includes(ca.scenario.key) || isFire(ca)) return [];
      const measured = ctx.doc.references.some((reference) => reference.kind === 'calorimetry');
      return measured && fluid.foamy !== undefined ? [] : [onScenario(ca.scenario, { fluid: fluid.name })];
    }),
);
