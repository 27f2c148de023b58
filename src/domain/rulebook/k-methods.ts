/* Rules on whether a method suits the fluid that it is used on. */
import { type Fluid } from '@domain/basis';
import { withFluid, isFire, onScenario } from './reading';
import { type Hit, rule } from './types';

const FAMILIES: [RegExp, Fluid['phase'][]][] = [
  [/(^|:)(a\.gas|i\.iso4126-gas)/, ['gas', 'vapour', 'supercritical']],
  [/(^|:)(b\.steam|i\.iso4126-steam)/, ['gas', 'vapour']],
  [/(^|:)(c\.liquid|i\.iso4126-liquid)/, ['liquid']],
  [/(^|:)d\.omega/, ['two-phase', 'flashing-liquid']],
  [/(^|:)d\.real-gas-size/, ['gas', 'vapour', 'supercritical']],
];

export const phaseMismatch = rule(
  {
    code: 'phase-mismatch',
    subject: 'scenario',
    statement: '{scenario} is sized as {a} but {fluid} is {b} at relief.',
    condition:
      'The method is for another phase than the fluid has at relieving conditions, or for one phase where there are two, or for liquid that flashes on its way through the valve.',
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
      'A factor stands at 1, or is absent, where it should act: viscosity below a Reynolds number of 100 000; superheat more than 5 K above saturation; the Napier correction from 1 500 to 3 200 psi; back pressure beyond its onset; the subcritical coefficient; overpressure other than 25 % for valves without liquid certificate; a disk upstream.',
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
      'A runaway or an upset reaction is credible and no reference of the kind calorimetry stands here, or nothing says whether the contents foam or swell.',
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
