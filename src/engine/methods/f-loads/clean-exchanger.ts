/* Method f.clean-exchanger: an exchanger as clean as on its first day heats more than its duty. */
import { type Method } from '../../catalog/types';
import { convert } from '../../quantity';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { vaporisationStep } from './latent';

const UNITS: Record<System, { U: string; R: string; T: string; dT: string }> = {
  SI: { U: 'W/(m2.K)', R: 'm2.K/W', T: 'degC', dT: 'dK' },
  US: { U: 'Btu/(h.ft2.degF)', R: 'h.ft2.degF/Btu', T: 'degF', dT: 'dF' },
};

/** Logarithmic mean of two temperature differences, both above 0; their mean where they are equal. */
export function logMean(a: number, b: number): number {
  const ratio = a / b;
  return Math.abs(ratio - 1) < 1e-6 ? (a + b) / 2 : (a - b) / Math.log(ratio);
}

/** The coefficient without its fouling: 1/(1/U − R); Infinity or less than nought when R takes more than there is. */
export function cleanCoefficient(service: number, fouling: number): number {
  return 1 / (1 / service - fouling);
}

function coefficient(sheet: SheetBuilder, system: System): number {
  const u = UNITS[system];
  if (sheet.has('U_clean')) return sheet.number('U_clean', u.U, { above: 0 }, 'U_{clean}');
  if (!sheet.has('U_service'))
    sheet.refuse(
      'INPUT_MISSING',
      'U_clean',
      'The clean coefficient (U_clean) is missing: give it, or U_service with the fouling of both sides.',
    );
  const service = sheet.number('U_service', u.U, { above: 0 }, 'U_{service}');
  const fouling = sheet.number('fouling', u.R, { min: 0 }, 'R_f');
  if (fouling * service >= 1)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'fouling',
      'The fouling resistance is not below 1/U_service: it would leave no resistance at all for the clean exchanger.',
    );
  return sheet.step(
    {
      key: 'U_clean',
      tex: 'U_{clean}',
      meaning: 'coefficient without fouling',
      value: cleanCoefficient(service, fouling),
      unit: u.U,
    },
    (v) => `\\frac{1}{1/${v('U_service')} - ${v('fouling')}}`,
  );
}

/** The mean temperature difference against a liquid that boils at relieving pressure. */
function difference(sheet: SheetBuilder, system: System): number {
  const u = UNITS[system];
  const hot = sheet.number('T_hot_in', u.T, {}, 'T_{h1}');
  const out = sheet.number('T_hot_out', u.T, { fallback: hot }, 'T_{h2}');
  const boil = sheet.number('T_sink', u.T, {}, 'T_b');
  if (Math.min(hot, out) <= boil)
    sheet.refuse(
      'NO_HEAT',
      'T_sink',
      `The heating side at ${texNumber(Math.min(hot, out))} ${u.T === 'degC' ? '°C' : '°F'} is not hotter than the liquid that boils at ${texNumber(boil)}: no heat flows in.`,
    );
  const FT = sheet.number('F_T', '-', { above: 0, max: 1, fallback: 1 }, 'F_T');
  const mean = logMean(hot - boil, out - boil) * FT;
  return sheet.step(
    {
      key: 'dT',
      tex: '\\Delta T_m',
      meaning: 'mean temperature difference at relief',
      value: mean,
      unit: u.dT,
    },
    (v) =>
      hot === out
        ? `${v('F_T')} \\cdot (${v('T_hot_in')} - ${v('T_sink')})`
        : `${v('F_T')} \\cdot \\frac{${v('T_hot_in')} - ${v('T_hot_out')}}{\\ln \\frac{${v('T_hot_in')} - ${v('T_sink')}}{${v('T_hot_out')} - ${v('T_sink')}}}`,
  );
}

/** Heat in, not above what the utility or burner can give; kept under `Qin`. */
function heatStep(sheet: SheetBuilder, system: System): number {
  const u = SYSTEM_UNITS[system];
  const U = coefficient(sheet, system);
  const A = sheet.number('A', u.area, { above: 0 });
  const dT = difference(sheet, system);
  const by = sheet.step(
    { key: 'Qs', tex: 'Q_s', meaning: 'heat through the clean surface', value: U * A * dT, unit: u.heat },
    (v) => `${v('U_clean')} \\cdot ${v('A')} \\cdot ${v('dT')}`,
  );
  if (!sheet.has('Q_max')) return sheet.keep('Qin', by, 'Q_s');
  const most = sheet.number('Q_max', u.heat, { above: 0 }, 'Q_{max}');
  if (most < by)
    sheet.warn(
      'HEAT_LIMITED',
      'The heating side gives less than the clean surface could pass: its greatest heat is taken. Make it a condition of the field.',
    );
  return sheet.step(
    {
      key: 'Qin',
      tex: 'Q_{in}',
      meaning: 'heat in, not above what the heating side can give',
      value: Math.min(by, most),
      unit: u.heat,
    },
    (v) => `\\min(${v('Qs')},\\ ${v('Q_max')})`,
  );
}

/** f.clean-exchanger: abnormal heat input from a clean exchanger. */
export const CLEAN_EXCHANGER: Method = {
  id: 'f.clean-exchanger',
  version: 1,
  topic: 'f.clean-exchanger',
  title: 'Abnormal heat input from a clean exchanger',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521, abnormal heat input: clean exchanger at relieving conditions (approach from memory); Q = U A F ΔT_lm by any heat transfer handbook (Kern; Perry, section 11)',
  validity:
    'Liquid boiling at one temperature at relieving pressure; utility at its greatest pressure and temperature; no fouling; U of the service at relief, also when the boiling mode changes with the temperature difference.',
  inputs: [
    optional('U_clean', 'clean overall coefficient', 'heat-transfer-coefficient'),
    optional(
      'U_service',
      'overall coefficient in service, in place of the clean one',
      'heat-transfer-coefficient',
    ),
    optional('fouling', 'fouling resistance of both sides in U_service', 'fouling-resistance'),
    input('A', 'area of the exchanger', 'area'),
    input('T_hot_in', 'inlet temperature of the heating side', 'temperature'),
    optional(
      'T_hot_out',
      'its outlet temperature at relief (its inlet one, as for condensing steam, when not given)',
      'temperature',
    ),
    input('T_sink', 'boiling temperature at relieving pressure', 'temperature'),
    optional('F_T', 'correction of the mean temperature difference (1 when not given)', 'dimensionless'),
    optional('Q_max', 'greatest heat that the heating side can give', 'power', { rangeKey: 'heatInput' }),
    optional('Q_removed', 'heat still removed', 'power', { rangeKey: 'heatInput' }),
    input('latent_heat', 'latent heat at relief', 'specific-energy', { rangeKey: 'latentHeat' }),
  ],
  outputs: [
    output('heat', 'net heat that boils the liquid', 'power'),
    output('relief_load', 'vapour load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A', 'latent_heat']);
      const u = SYSTEM_UNITS[system];
      const gained = heatStep(sheet, system);
      const removed = sheet.number('Q_removed', u.heat, { min: 0, fallback: 0 }, 'Q_{out}');
      const heat = sheet.step(
        {
          key: 'q',
          tex: 'Q',
          meaning: 'net heat that boils the liquid',
          value: gained - removed,
          unit: u.heat,
        },
        (v) => `${v('Qin')} - ${v('Q_removed')}`,
      );
      if (heat <= 0) sheet.warn('NO_LOAD', 'As much heat is removed as comes in: no vapour is made.');
      const shown = system === 'SI' ? 'kW' : u.heat;
      sheet.output('heat', convert({ value: heat, unit: u.heat }, shown), shown);
      vaporisationStep(sheet, heat, system);
    });
  },
};
