/* The steps of a control valve between reducers that the gas and the liquid sheets share. */
import { type SheetBuilder, type Show } from '../../sheet';
import { COEFFICIENTS, type CoefficientType, type Fittings, fittingSums } from './control-valve';

const CLAUSE = 'IEC 60534-2-1:2011, piping geometry';

/** (C/d²)² of the valve with its fittings, in TeX. */
export function velocityTex(v: Show): string {
  return `\\left(\\frac{${v('coefficient')}}{${v('d')}^2}\\right)^2`;
}

/** Loss and Bernoulli terms of a reducer from the valve to the pipe D, in TeX. */
const loss = (v: Show, D: string) => `\\left(1 - \\frac{${v('d')}^2}{${v(D)}^2}\\right)^2`;
const bernoulli = (v: Show, D: string) => `\\frac{${v('d')}^4}{${v(D)}^4}`;

function pipingStep(sheet: SheetBuilder, FP: number, type: CoefficientType): void {
  sheet.step(
    {
      key: 'FP',
      tex: 'F_P',
      meaning: 'piping geometry factor',
      value: FP,
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) => `\\left[1 + \\frac{${v('za')}}{${COEFFICIENTS[type].N2}} ${velocityTex(v)}\\right]^{-1/2}`,
  );
  sheet.output('FP', FP);
}

/** Keeps the sums of the fittings as symbols, and shows them and the piping geometry factor FP. */
export function fittingSteps(
  sheet: SheetBuilder,
  FP: number,
  type: CoefficientType,
  fittings: Fittings,
): void {
  const { all, inlet } = fittingSums(fittings);
  sheet.step(
    {
      key: 'zi',
      tex: '\\zeta_i',
      meaning: 'loss and Bernoulli coefficients of the inlet',
      value: inlet,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `0.5 ${loss(v, 'D1')} + 1 - ${bernoulli(v, 'D1')}`,
  );
  sheet.step(
    {
      key: 'za',
      tex: '\\Sigma\\zeta',
      meaning: 'coefficients of both ends',
      value: all,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `${v('zi')} + ${loss(v, 'D2')} - \\left(1 - ${bernoulli(v, 'D2')}\\right)`,
  );
  pipingStep(sheet, FP, type);
}
