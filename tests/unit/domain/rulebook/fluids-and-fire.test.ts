/* Rules on fluids, methods and fire (sections K and L). */
import { type Input, richFromText } from '@domain/basis';
import {
  equipment,
  fireAnswer,
  first,
  fluid,
  heat,
  heatAnswer,
  q,
  scenario,
  tryRules,
  type Change,
} from './kit';

const k =
  (value: number): Change =>
  (b) =>
    void (fluid(b).k = q(value, '-'));
const Z =
  (value: number): Change =>
  (b) =>
    void (fluid(b).Z = q(value, '-'));

tryRules('K. Fluids', [
  {
    code: 'k-outside-range',
    source: 'API 520-1 task force 2008: ideal-gas ratio, warned below 1.05',
    fires: k(1.04),
    says: 'K = 1.04 of Acetone vapour is outside 1.05–1.667',
    quiet: k(1.05),
  },
  {
    code: 'k-outside-range',
    source: 'a real-gas ratio in the ideal formula',
    fires: (b) => void (fluid(b).kIs = 'real'),
  },
  {
    code: 'z-outside-range',
    source: 'API 520-1 Annex B: 0.8 to 1.1 (from memory)',
    fires: Z(0.79),
    says: 'Z = 0.79: outside 0.8–1.1',
    quiet: Z(0.8),
  },
  {
    code: 'density-inconsistent',
    // ρ = P M/(Z R T) = 486 325 · 58.08/(0.87 · 8 314.46 · 383.15) = 10.19 kg/m³; 3 % above is 10.50.
    source: 'ρ Z R T/(P M) = 1 within 3 %',
    both: (b) => void (fluid(b).P = q(4.863, 'bar_abs')),
    fires: (b) => void (fluid(b).rhoVapour = q(10.6, 'kg/m3')),
    says: 'do not agree (4.02 %)',
    quiet: (b) => void (fluid(b).rhoVapour = q(10.45, 'kg/m3')),
  },
  {
    code: 'density-inconsistent',
    source: 'ρ and relative density differ by more than 1 %: 0.69 · 999 = 689 kg/m³ against 678',
    fires: (b) => void (fluid(b).relativeDensity = q(0.69, '-')),
    quiet: (b) => void (fluid(b).relativeDensity = q(0.68, '-')),
  },
  {
    code: 'latent-heat-low',
    source: 'floor of 115 kJ/kg (50 Btu/lb)',
    fires: (b) => void (fluid(b).latentHeat = q(110, 'kJ/kg')),
    says: 'The latent heat of Acetone vapour is 110 kJ/kg',
    quiet: (b) => void (fluid(b).latentHeat = q(115, 'kJ/kg')),
  },
  {
    code: 'state-not-at-relief',
    // Relieving 4.863 bara (heat) and 5.248 bara (fire): only the first is tried here.
    source: 'pressure within 2 % of the relieving pressure',
    both: (b) => void (fireAnswer(b).fluid = 'none'),
    fires: (b) => void (fluid(b).P = q(4.7, 'bar_abs')),
    says: 'not at the relieving conditions of Abnormal heat',
    quiet: (b) => void (fluid(b).P = q(4.8, 'bar_abs')),
  },
  {
    code: 'phase-mismatch',
    source: 'API 520-1 Annex C (from memory)',
    fires: (b) => void (fluid(b).phase = 'two-phase'),
    says: 'is sized as gas or vapour or supercritical but Acetone vapour is two phase at relief',
  },
  {
    code: 'reaction-data-missing',
    source: 'HSE CRR 136/1998, DIERS',
    both: (b) => {
      const reaction = scenario(b, 'runaway-reaction');
      reaction.disposition = 'credible';
      reaction.answers = [{ ...heatAnswer(b), id: 'an_r' }];
      fluid(b).foamy = 'no';
    },
    fires: () => undefined,
    says: 'is a reaction case without calorimetry',
    quiet: (b) =>
      void b.references.push({ id: 're_c', title: 'Calorimetry CAL-31', names: [], kind: 'calorimetry' }),
  },
]);

const fireInputs =
  (inputs: Record<string, Input>): Change =>
  (b) =>
    void (fireAnswer(b).load = { by: 'method', method: 'e.fire-wetted', inputs });
const insulated =
  (hoseStream: boolean): Change =>
  (b) => {
    fireInputs({ F: q(0.3, '-') })(b);
    equipment(b).insulation = {
      material: 'cellular glass',
      fireCredit: true,
      intactHot: true,
      hoseStream,
      banded: true,
    };
  };

tryRules('L. Fire', [
  {
    code: 'fire-drainage-unsupported',
    source: 'API 521: 43 200 only with drainage and fire fighting (from memory)',
    fires: (b) => delete equipment(b).fire?.drainageRef,
    says: 'The lower heat-input constant is used for C-1',
    quiet: fireInputs({ adequate_drainage: { flag: false } }),
  },
  {
    code: 'fire-insulation-credit',
    source: 'API 521: intact at 904 °C for 2 h, hose stream, banding (from memory)',
    fires: insulated(false),
    says: 'C-1 takes credit F = 0.3',
    quiet: insulated(true),
  },
  {
    code: 'fire-insulation-credit',
    source: 'F below 0.026',
    fires: (b) => {
      insulated(true)(b);
      fireInputs({ F: q(0.02, '-') })(b);
    },
  },
  {
    code: 'fire-zone-missing',
    source: 'header cases are summed by fire zone',
    fires: (b) => delete equipment(b).fire?.zone,
    says: 'C-1 but it belongs to no fire zone',
  },
]);

tryRules('P. Calculations', [
  {
    code: 'calculation-unsound',
    source: 'Z below 0.8 leaves the range of the ideal nozzle',
    fires: Z(0.79),
    says: 'left the range of a.gas@1 (0.8 to 1.1)',
    quiet: Z(0.8),
  },
  {
    code: 'group-missing',
    source: 'a jet fire is answered by another measure',
    both: (b) => void Object.assign(scenario(b, 'jet-fire'), { disposition: 'credible', answers: [] }),
    fires: () => undefined,
    quiet: (b) => void (scenario(b, 'jet-fire').otherMeasure = richFromText('Depressuring and water spray.')),
  },
  {
    code: 'capacity-short',
    source: 'a circle of two answers: first of them named twice its load',
    fires: (b) => void (first(heat(b).answers).load = { by: 'given', figure: q(9100, 'kg/h') }),
  },
]);
