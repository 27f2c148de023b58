/* Rules on capacity, lines, isolation valves and cold settings (sections F, G, I and J). */
import {
  fire,
  first,
  group,
  heat,
  heatAnswer,
  lineSheet,
  point,
  q,
  second,
  side,
  tryRules,
  type Change,
} from './kit';

const power =
  (kW: number): Change =>
  (b) =>
    void (heatAnswer(b).load = { by: 'method', method: 'f.vaporisation', inputs: { Q: q(kW, 'kW') } });
const loss =
  (bar: number): Change =>
  (b) =>
    lineSheet(b, 'inlet', { loss: q(bar, 'bar') });

tryRules('F. Capacity', [
  // Area in proportion to the heat: 900 kW → 1 534.6 mm²; L is 1 841 mm²: 1 079.7 kW fills it.
  {
    code: 'capacity-short',
    source: 'ASME VIII-1 UG-133; letter L = 1 841 mm² (API 526)',
    fires: power(1090),
    says: 'Abnormal heat or vapour input needs 1\u2009859 mm², and G1 offers 1\u2009841 mm²',
    quiet: power(1079),
  },
  {
    code: 'capacity-marginal',
    source: 'use from 0.90',
    fires: power(972),
    says: 'uses 90 % of G1',
    quiet: power(970),
  },
  {
    code: 'group-missing',
    source: 'ASME VIII-1 UG-125(a)(1)',
    fires: (b) => delete heatAnswer(b).group,
    says: 'Abnormal heat or vapour input is credible but no group of devices answers it',
  },
  {
    code: 'low-load-chatter',
    // Rated 9 175 kg/h: 25 % is 2 294 kg/h.
    source: 'flow below about 25 % of rated (from memory)',
    fires: (b) => void (first(fire(b).answers).load = { by: 'given', figure: q(2200, 'kg/h') }),
    says: 'The smallest credible load is 24 % of what PSV-1 passes',
  },
  {
    code: 'spare-credited',
    source: 'behind a valve that is kept shut',
    fires: (b) =>
      void b.isolations.push({
        id: 'is_1',
        where: 'inlet',
        protects: ['rp_1'],
        kind: 'gate',
        kept: 'shut',
        lock: { kind: 'lock', number: 'L-1', keeper: 'Shift' },
      }),
  },
  {
    code: 'area-kind-mixed',
    source: 'API 526: effective areas only with the equations of API 520',
    fires: (b) =>
      void (heatAnswer(b).size = { by: 'method', method: 'a.gas', inputs: { Kd: q(0.868, '-') } }),
    says: 'Effective and actual areas are mixed in the sizing of PSV-1',
  },
]);

tryRules('G. Lines', [
  // 3 % of 3.5 barg = 0.105 bar.
  {
    code: 'inlet-loss-high',
    source: '3 % of set, API 520-2',
    fires: loss(0.11),
    says: 'The inlet loss of PSV-1 is 3.14 % of set, above 3 %',
    quiet: loss(0.105),
  },
  // Blowdown 7 % less 2 % of reserve: 5 % of 3.5 barg = 0.175 bar.
  {
    code: 'inlet-loss-near-blowdown',
    source: 'loss at or above blowdown less 2 % of set (practice)',
    fires: loss(0.18),
    quiet: loss(0.17),
  },
  {
    code: 'inlet-loss-near-blowdown',
    source: 'EN ISO 4126-9: a third of blowdown, 0.0817 bar (from memory)',
    both: (b) => void (side(b).code = { basis: 'en', units: 'SI' }),
    fires: loss(0.083),
    severity: 'justify',
    quiet: loss(0.081),
  },
  {
    code: 'line-loss-missing',
    source: 'API 520-2 (from memory)',
    both: (b) => {
      b.segments.push({ id: 'sg_1', bore: q(100, 'mm'), length: q(1, 'm'), fittings: [] });
      b.lines.push({ id: 'ln_1', point: 'rp_1', side: 'inlet', path: ['sg_1'] });
    },
    fires: () => undefined,
    says: 'No loss is calculated for the inlet line of PSV-1',
    quiet: loss(0.05),
  },
]);

const gate =
  (more: object): Change =>
  (b) =>
    void b.isolations.push({
      id: 'is_1',
      tag: 'HV-1',
      where: 'inlet',
      protects: ['rp_1'],
      kind: 'gate',
      kept: 'open',
      lock: { kind: 'car-seal', number: 'S-12', keeper: 'Shift' },
      ...more,
    });

tryRules('I. Isolation valves', [
  {
    code: 'isolation-unlocked',
    source: 'ASME VIII-1 App. M',
    fires: gate({ lock: { kind: 'car-seal' } }),
    says: 'HV-1 has no lock or seal, or no number',
    quiet: gate({}),
  },
  {
    code: 'isolation-restricts',
    source: 'B31.3-2016 322.6.1: less than full bore if it does no harm',
    fires: gate({ fullBore: false, k: q(2, '-') }),
    says: 'HV-1 in the relief path of PSV-1 is not full bore',
    quiet: gate({ fullBore: true }),
  },
  {
    code: 'isolation-restricts',
    source: 'its loss is not counted',
    fires: gate({ fullBore: false }),
    severity: 'stop',
    quiet: gate({ fullBore: true }),
  },
]);

tryRules('J. Cold setting', [
  {
    code: 'cdtp-missing',
    source: 'API 520-1, definition of CDTP; 66 °C from memory',
    fires: (b) => delete point(b).cdtp,
    says: 'PSV-1 needs a cold setting, because of its relieving temperature',
    quiet: (b) => {
      delete point(b).cdtp;
      b.fluids.forEach((one) => (one.T = q(60, 'degC')));
    },
  },
  {
    code: 'cdtp-mismatch',
    // 3.5 · 1.01 = 3.535 barg; half the tolerance of 15 kPa (ASME VIII-1 2015 UG-134(d)) is 0.075 bar: up to 3.61 barg.
    source: 'API 520-1, definition of CDTP',
    fires: (b) => void (point(b).cdtp = q(3.62, 'bar_g')),
    says: 'CDTP 3.62 barg does not follow from set 3.5 barg, back pressure none and temperature factor 1.01: 3.535 barg',
    quiet: (b) => void (point(b).cdtp = q(3.61, 'bar_g')),
  },
  {
    code: 'cdtp-mismatch',
    // A bellows valve subtracts nothing: (3.5 − 0.5) · 1.01 = 3.03 barg would be the setting of a conventional one.
    source: 'balanced valves subtract no back pressure',
    both: (b) => {
      point(b).axes.balance = 'bellows';
      point(b).superimposed = { min: q(0.5, 'bar_g'), max: q(0.5, 'bar_g') };
    },
    fires: (b) => void (point(b).cdtp = q(3.03, 'bar_g')),
    quiet: (b) => void (point(b).cdtp = q(3.54, 'bar_g')),
  },
]);

tryRules('F. Groups', [
  {
    code: 'accumulation-limit-misused',
    source: 'UG-125(c)(1): none set above 105 % of MAWP',
    fires: (b) => {
      first(heat(b).answers).accumulation = 'several';
      second(b, { set: q(3.7, 'bar_g') });
    },
    says: 'none is set above 105 % of MAWP',
    quiet: (b) => void (group(b).name = 'G1'),
  },
]);
