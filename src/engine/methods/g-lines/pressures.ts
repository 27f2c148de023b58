/* Pressures of a line sheet: worked in kPa, given in the unit of the sheet's system. */
import { fromSI, toSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { absoluteIn } from '../common/pressures';
import { type System, systemOf } from '../common/system';

/** The unit system of a line sheet: that of its flow, else of its bores. */
export function lineSystem(sheet: SheetBuilder): System {
  return systemOf(sheet.inputs, ['set_pressure', 'W', 'P_exit_ambient', 'P0', 'D']);
}

/** Gives a pressure worked in kPa as an output in the unit of the sheet's system. */
export function pressureOutput(
  sheet: SheetBuilder,
  name: string,
  kPa: number,
  kind: 'absolute' | 'difference',
): void {
  const [us, si] = kind === 'absolute' ? ['psia', 'kPa_abs'] : ['psi', 'kPa'];
  const unit = lineSystem(sheet) === 'US' ? us : si;
  sheet.output(name, fromSI(toSI({ value: kPa, unit: si }), unit).value, unit);
}

/** The pressure beyond the end of the line, kPa absolute. */
export function endPressure(sheet: SheetBuilder): number {
  return absoluteIn(sheet, 'P_exit_ambient', 'p_e', 'kPa_abs');
}

/** Built-up back pressure as a fraction of set, where a set pressure is given. */
export function fractionOfSet(
  sheet: SheetBuilder,
  key: string,
  of: { output: string; tex: string; meaning: string; value: number },
): number | undefined {
  if (!sheet.has('set_pressure')) return undefined;
  const set = sheet.number('set_pressure', 'kPa_g', { above: 0 }, 'p_{set}');
  const share = sheet.step(
    { key: `${key} share`, tex: of.tex, meaning: of.meaning, value: of.value / set, unit: '-' },
    (v) => `\\frac{${v(key)}}{${v('set_pressure')}}`,
  );
  sheet.output(of.output, share);
  return share;
}
