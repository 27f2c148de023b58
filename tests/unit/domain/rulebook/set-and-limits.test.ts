/* Rules on set pressure, staggering and accumulation (sections B and C). */
import {
  equipment,
  fireAnswer,
  first,
  group,
  heat,
  heatAnswer,
  point,
  q,
  scenario,
  second,
  set,
  side,
  tryRules,
} from './kit';

tryRules('B. Set pressure', [
  // MAWP 3.5 barg; 0.1 % absorbs the rounding of units: 3.5035 is silent, 3.51 fires.
  {
    code: 'set-above-mawp',
    source: 'ASME VIII-1 UG-134(a)',
    fires: set(3.51),
    says: 'PSV-1 is set at 3.51 barg, above the MAWP of C-1 (3.5 barg)',
    quiet: set(3.503),
  },
  {
    code: 'set-additional-above-105',
    source: 'ASME VIII-1 UG-134(a): 1.05 · 3.5 = 3.675 barg',
    fires: (b) => second(b, { set: q(3.7, 'bar_g') }),
    says: 'PSV-2 is an additional device set at 3.7 barg',
    quiet: (b) => second(b, { set: q(3.675, 'bar_g') }),
  },
  {
    code: 'set-fire-supplement',
    source: 'ASME VIII-1 UG-134(b): 1.10 · 3.5 = 3.85 barg (from memory)',
    fires: (b) => second(b, { set: q(3.9, 'bar_g'), purpose: 'supplementary-fire' }, 'supplementary-fire'),
    says: 'PSV-2 is set above 105 % of MAWP',
    quiet: (b) => second(b, { set: q(3.85, 'bar_g'), purpose: 'supplementary-fire' }, 'supplementary-fire'),
  },
  {
    code: 'sets-not-staggered',
    // Fire load 2 931 kg/h against two valves of about 9 200 kg/h: below half; a spread of 1 % staggers them.
    source: 'common practice: spread below 1 % of set',
    fires: (b) => second(b, { set: q(3.51, 'bar_g') }),
    says: 'The 2 devices of G1 all open together',
    quiet: (b) => second(b, { set: q(3.55, 'bar_g') }),
  },
  {
    code: 'operating-margin-small',
    // max(10 % of 3.5, 35 kPa) = 0.35 bar: 3.16 barg leaves 0.34 bar, 3.1 barg leaves 0.4 bar.
    source: 'API 520-1: 10 % or 35 kPa for a metal seat (from memory)',
    fires: (b) => void (side(b).operating = { max: q(3.16, 'bar_g') }),
    says: 'C-1 operates at 3.16 barg, only 9.71 % below the set pressure of PSV-1',
    quiet: (b) => void (side(b).operating = { max: q(3.1, 'bar_g') }),
  },
  {
    code: 'operating-margin-small',
    source: 'opens in normal operation',
    fires: (b) => void (side(b).operating = { max: q(3.5, 'bar_g') }),
    severity: 'stop',
    says: 'It opens in normal operation',
  },
  {
    code: 'reseat-below-operating',
    source: 'reseats at 3.5 · (1 − 0.07) = 3.255 barg',
    fires: (b) => void (side(b).operating = { normal: q(3.3, 'bar_g') }),
    says: 'PSV-1 reseats at 3.255 barg, below the normal operating pressure 3.3 barg',
    quiet: (b) => void (side(b).operating = { normal: q(3.2, 'bar_g') }),
  },
  {
    code: 'blowdown-outside-range',
    // Compressible 2 % to max(15 %, 30 kPa): at 3.5 barg 15 % = 52.5 kPa.
    source: 'ISO 4126-1:2013/Amd 1:2016',
    fires: (b) => void (point(b).blowdown = q(0.16, '-')),
    says: 'The blowdown of PSV-1, 16 %',
    quiet: (b) => void (point(b).blowdown = q(0.15, '-')),
  },
  {
    code: 'set-outside-spring-range',
    source: '46 CFR 162.018-4(f): beyond ± 10 % of the stamped set',
    changed: true,
    fires: set(3.1),
    says: 'The spring range is not known',
    quiet: set(3.2),
  },
  {
    code: 'set-outside-spring-range',
    source: "maker's spring chart: 3.0 to 3.5 barg",
    fires: (b) => void (point(b).spring = { lo: q(3, 'bar_g'), hi: q(3.5, 'bar_g') }),
    says: '3.54 barg lies outside the range of the fitted spring (3 barg–3.5 barg)',
    quiet: (b) => void (point(b).spring = { lo: q(3, 'bar_g'), hi: q(4, 'bar_g') }),
  },
  {
    code: 'thermal-relief-set-high',
    // min(test 5.3, 1.20 · 3.5 = 4.2) = 4.2 barg.
    source: 'ASME B31.3-2016 322.6.3(b)(2)',
    both: (b) => {
      equipment(b).kind = 'piping';
      const thermal = scenario(b, 'thermal-expansion');
      thermal.disposition = 'credible';
      thermal.answers = [heatAnswer(b)];
      b.scenarios
        .filter((one) => one !== thermal)
        .forEach((one) => Object.assign(one, { disposition: 'not-applicable', answers: [] }));
    },
    fires: set(4.3),
    says: 'PSV-1 protects only blocked-in piping',
    quiet: set(4.2),
  },
  {
    code: 'tank-vent-set-high',
    source: 'API 650: full flow at or below the design pressure (from memory)',
    both: (b) => {
      equipment(b).kind = 'storage-tank';
      first(side(b).ratings).mawp = q(20, 'mbar_g');
    },
    fires: (b) => void (point(b).fullFlow = q(24, 'mbar_g')),
    says: 'PSV-1 needs 24 mbarg to pass its flow',
    quiet: (b) => void (point(b).fullFlow = q(20, 'mbar_g')),
  },
]);

tryRules('C. Accumulation', [
  {
    code: 'accumulation-above-limit',
    // P1 entered as 5.0 bara = 3.987 barg, above 1.10 · 3.5 = 3.85 barg.
    source: 'ASME VIII-1 UG-125(c)',
    fires: (b) =>
      void (heatAnswer(b).size = { by: 'method', method: 'a.gas', inputs: { P1: q(5, 'bar_abs') } }),
    says: 'takes C-1 to 3.987 barg, above the allowed 3.85 barg',
    quiet: (b) =>
      void (heatAnswer(b).size = { by: 'method', method: 'a.gas', inputs: { P1: q(4.86, 'bar_abs') } }),
  },
  {
    code: 'accumulation-limit-misused',
    source: 'ASME VIII-1 UG-125(c)(1): 116 % needs two devices; a spare is none',
    fires: (b) => {
      heatAnswer(b).accumulation = 'several';
      second(b, { service: 'spare' }, 'spare');
    },
    says: 'uses the 116 % limit, which is only for two or more devices',
    quiet: (b) => {
      heatAnswer(b).accumulation = 'several';
      second(b, { set: q(3.6, 'bar_g') });
    },
  },
  {
    code: 'accumulation-limit-misused',
    source: 'UG-125(c)(2): 121 % is for fire',
    fires: (b) => void (heatAnswer(b).accumulation = 'fire'),
    says: 'uses the 121 % limit, which is only for exposure to fire',
  },
  {
    code: 'en-limit-exceeded',
    source: 'PED 2014/68/EU Annex I 7.3: 110 % of PS (from memory)',
    both: (b) => void (side(b).code = { basis: 'en', units: 'SI' }),
    fires: (b) =>
      void (heatAnswer(b).size = { by: 'method', method: 'a.gas', inputs: { P1: q(5, 'bar_abs') } }),
    says: 'may not exceed 110 % of PS',
  },
  {
    code: 'storage-limit-misused',
    source: 'ASME VIII-1 UG-125(c)(3) (from memory)',
    fires: (b) => void (fireAnswer(b).accumulation = 'storage-fire'),
    says: 'C-1 is not that',
    quiet: (b) => {
      fireAnswer(b).accumulation = 'storage-fire';
      equipment(b).storage = { liquefied: true, refrigerated: false, permanentSupply: false };
      point(b).tolerance = 'minus-0-plus-10';
    },
  },
  {
    code: 'test-pressure-limit-used',
    source: 'API 521 5th ed. 3.21, as quoted publicly: three causes only',
    fires: (b) => void (heatAnswer(b).accumulation = 'corrected-test'),
    severity: 'stop',
    quiet: (b) => void (group(b).note = heat(b).key),
  },
]);
