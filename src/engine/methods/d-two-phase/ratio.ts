/* The critical pressure ratio of a saturated or two-phase inlet on a sheet, by the root or by the printed fit. */
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { OMEGA_CLAUSE } from './common';
import { omegaRatio, omegaRatioFit } from './omega';

/** The printed ways to the critical pressure ratio. */
export const RATIO_FORMS = ['root', 'explicit fit'] as const;

/** The choice of the way to the critical pressure ratio. */
export const RATIO_INPUT = optional(
  'critical_ratio_form',
  'how the critical pressure ratio is found: root of the equation, or the explicit fit of the standard',
  undefined,
  { words: [...RATIO_FORMS] },
);

/** The critical pressure ratio of a saturated or two-phase inlet, in the way that the sheet says. */
export function ratioStep(sheet: SheetBuilder, omega: number): number {
  const fit = sheet.word('critical_ratio_form', RATIO_FORMS, 'root') === 'explicit fit' && omega > 0;
  if (fit && (omega < 0.5 || omega > 100))
    sheet.warn(
      'FIT_OUTSIDE_RANGE',
      `The explicit fit of the critical pressure ratio is good for omega from 0.5 to 100; here it is ${omega.toPrecision(3)}.`,
      '0.5 to 100',
    );
  const info = {
    key: 'eta_c',
    tex: '\\eta_c',
    meaning: 'critical pressure ratio',
    unit: '-',
    clause: OMEGA_CLAUSE,
    memory: true,
  };
  if (fit)
    return sheet.step(
      { ...info, value: omegaRatioFit(omega) },
      (v) =>
        `\\left[1 + (1.0446 - 0.0093431 \\cdot ${v('omega')}^{0.5}) ${v('omega')}^{-0.56261}\\right]^{-0.70356 + 0.014685 \\ln ${v('omega')}}`,
    );
  return sheet.step(
    { ...info, value: omegaRatio(omega) },
    (v) =>
      `\\text{root of } \\eta^2 + (${v('omega')}^2 - 2 \\cdot ${v('omega')})(1-\\eta)^2 + 2 \\cdot ${v('omega')}^2 \\ln\\eta + 2 \\cdot ${v('omega')}^2 (1-\\eta) = 0`,
  );
}
