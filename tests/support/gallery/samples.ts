/* Invented figures for the gallery of components; they stand for no plant and prove nothing but the look. */
import { type Step } from '@engine/sheet';
import { type ScenarioLine } from '@components/case/ScenarioTable.astro';

export const SITE = { id: 'ketterwold', name: 'Ketterwold Works' };
export const PERSON = { name: 'I. Fennimore', roles: 'checker' };
export const PRESENT = {
  set: 17.5,
  operating: 15.2,
  reseating: 16.28,
  relieving: 19.25,
  backPressure: 2.1,
  mawp: 19,
  allowed: 20.9,
};
export const PROPOSED = {
  set: 18.2,
  operating: 16,
  reseating: 16.93,
  relieving: 20.02,
  backPressure: 2.6,
  mawp: 19,
  allowed: 20.9,
};
export const SCALE = { max: 2600, width: 208, installed: 2322.6, present: 1840.6 };
export const STAGES = [
  'Draft',
  'Scenario analysis',
  'Calculation check',
  'Approval',
  'Field verification',
  'In force',
].map((name) => ({ name }));
export const GATES = [
  { state: 'passed', word: 'Passed', fact: '6 Mar, originator' },
  { state: 'passed', word: 'Passed', fact: '19 Mar, second pass' },
  { state: 'waiting', word: 'Waiting, 4 open points', fact: 'waits for you', href: '#gate' },
  { state: 'shut', word: 'Shut' },
  { state: 'shut', word: 'Shut' },
] as const;

const credible = (
  number: number,
  name: string,
  load: string,
  area: number,
  before: number,
  check: ScenarioLine['check'],
  more: Partial<ScenarioLine> = {},
): ScenarioLine => ({
  number,
  name,
  disposition: 'credible',
  fluid: 'overhead, relieving',
  accumulation: '10',
  load,
  required: area.toFixed(0).replace(/\B(?=(\d{3})+$)/g, '\u2009'),
  area,
  areaBefore: before,
  used: ((area / SCALE.installed) * 100).toFixed(1),
  verdict: area > SCALE.installed ? 'inadequate' : area > 0.9 * SCALE.installed ? 'marginal' : 'adequate',
  check,
  ...more,
});

export const LINES: ScenarioLine[] = [
  credible(1, 'Closed outlet, overhead vapour line', '38 900', 1751, 1543, { state: 'agreed' }),
  credible(
    2,
    'Loss of overhead cooling, E-102',
    '45 100',
    2030,
    1786,
    { state: 'differs', word: 'Differs 3.9 %' },
    { governs: true },
  ),
  credible(3, 'Loss of reflux, P-103 stops', '43 500', 1958, 1725, { state: 'edited' }),
  credible(4, 'Abnormal heat input, FV-101 wide open', '34 900', 1571, 1384, { state: 'not-begun' }),
  credible(5, 'Tube rupture, E-101', '8 150', 756, 756, { state: 'unseen' }, { hidden: true }),
  credible(6, 'External fire, C-101 and D-102', '24 480', 980, 1018, { state: 'agreed' }),
  {
    number: 9,
    name: 'Instrument air failure',
    disposition: 'not-credible',
    reason: 'Reboiler steam shuts on loss of air; what remains is scenario 2.',
  },
  {
    number: 10,
    name: 'Overfilling of D-102',
    disposition: 'below-limit',
    reason: 'Highest source is P-101 at 14.1 barg, below set.',
  },
  {
    number: 11,
    name: 'Check-valve failure, P-103',
    disposition: 'not-applicable',
    reason: 'No higher pressure downstream of the pump.',
  },
];

export const STEPS: Step[] = [
  {
    symbol: 'P_1',
    meaning: 'relieving pressure',
    tex: 'P_1 = p_\\mathrm{set}\\,(1+\\mathrm{OP}) + p_\\mathrm{atm}',
    worked: 'P_1 = 18.2 \\times 1.10 + 0.918',
    value: 20.938,
    unit: 'bar_abs',
    clause: 'API 520-1, 5.4',
  },
  {
    symbol: 'W',
    meaning: 'relieving load, all reboiler duty to vapour',
    tex: 'W = \\dfrac{Q}{\\lambda}',
    worked: 'W = \\dfrac{3\\,320\\times 3600}{265}',
    value: 45101.9,
    unit: 'kg/h',
    clause: 'API 521, 4.4.3',
  },
  {
    symbol: 'C',
    meaning: 'coefficient of the gas',
    tex: 'C = 0.03948\\sqrt{k\\left(\\dfrac{2}{k+1}\\right)^{(k+1)/(k-1)}}',
    worked: 'C = 0.03948\\sqrt{1.12\\left(\\dfrac{2}{1.12+1}\\right)^{(1.12+1)/(1.12-1)}}',
    value: 0.02497,
    unit: '-',
    clause: 'API 520-1, 5.6.3',
    memory: true,
  },
  {
    symbol: 'A',
    meaning: 'required effective area',
    tex: 'A = \\dfrac{W}{C\\,K_d\\,P_1\\,K_b\\,K_c}\\sqrt{\\dfrac{T\\,Z}{M}}',
    worked:
      'A = \\dfrac{45\\,102}{0.02497 \\times 0.975 \\times 2093.8 \\times 1 \\times 1}\\sqrt{\\dfrac{334.1 \\times 0.690}{43.4}}',
    value: 2039.1,
    unit: 'mm2',
    clause: 'API 520-1, 5.6.3',
  },
];
