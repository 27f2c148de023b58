/* Method b.rated-capacity: what a valve passes in steam by its actual area and certified coefficient. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { STEAM_FORMS, steamKN } from './factors';

const CLAUSE = 'Napier’s equation, API 520-1 and ASME capacity formula for steam';

/** Rated capacity in the units of the form: A P1 K KN KSH Kc/c, c being the constant of the sizing equation. */
export function ratedSteam(A: number, P1: number, factors: number, system: System): number {
  return (A * P1 * factors) / STEAM_FORMS[system].c;
}

function correction(sheet: SheetBuilder, P1: number, system: System): number {
  const KN = steamKN(P1, system);
  if (KN === undefined)
    return sheet.refuse(
      'OUTSIDE_RANGE',
      'P1',
      'Napier’s equation ends at 22 057 kPa; rate the valve as on a real gas.',
    );
  const [a, b, c, d] = STEAM_FORMS[system].kn;
  return sheet.step(
    {
      key: 'KN',
      tex: 'K_N',
      meaning: 'correction of Napier’s equation',
      value: KN,
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) => (KN === 1 ? '1' : `\\frac{${a} \\, ${v('P1')} - ${b}}{${c} \\, ${v('P1')} - ${d}}`),
  );
}

/** b.rated-capacity: rated capacity in steam service. */
export const RATED_STEAM: Method = {
  id: 'b.rated-capacity',
  version: 1,
  topic: 'b.rated-capacity',
  title: 'Rated capacity in steam from actual area and certified coefficient',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I, steam equation solved for the flow (constants from memory); ASME capacity formula for steam',
  validity:
    'Critical flow of dry saturated or superheated steam up to 22 057 kPa. Actual area with the certified coefficient only; never an actual area with the effective 0.975.',
  inputs: [
    input('A_actual', 'actual flow area', 'area', { rangeKey: 'orificeArea' }),
    input('K_certified', 'certified coefficient of discharge', 'dimensionless', { rangeKey: 'kdGas' }),
    ...RELIEVING_INPUTS,
    optional('KSH', 'superheat correction (1 for saturated steam, when not given)', 'dimensionless'),
    optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('KN', 'correction of Napier’s equation', 'dimensionless'),
    output('W_rated', 'rated capacity', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A_actual']);
      const u = SYSTEM_UNITS[system];
      const A = sheet.number('A_actual', u.A, { above: 0 }, 'A');
      const K = sheet.number('K_certified', '-', { above: 0, max: 1 }, 'K');
      const P1 = relievingAbsolute(sheet, system);
      const KN = correction(sheet, P1, system);
      const KSH = sheet.number('KSH', '-', { above: 0, max: 1, fallback: 1 }, 'K_{SH}');
      const Kc = sheet.number('Kc', '-', { above: 0, max: 1, fallback: 1 }, 'K_c');
      const W = sheet.step(
        {
          key: 'W',
          tex: 'W_{rated}',
          meaning: 'rated capacity',
          value: ratedSteam(A, P1, K * KN * KSH * Kc, system),
          unit: u.W,
          clause: CLAUSE,
          memory: true,
        },
        (v) => {
          const product = ['A_actual', 'P1', 'K_certified', 'KN', 'KSH', 'Kc']
            .map((name) => v(name))
            .join(' \\cdot ');
          return system === 'SI' ? `\\frac{${product}}{190.5}` : `51.5 \\cdot ${product}`;
        },
      );
      sheet.output('KN', KN);
      sheet.output('W_rated', W, u.W);
    });
  },
};
