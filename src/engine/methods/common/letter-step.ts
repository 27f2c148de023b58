/* The last step of every sizing by effective area: the orifice letter. */
import { type SheetBuilder, texNumber } from '../../sheet';
import { areaOf, chooseLetter } from '../i-letters/letters';
import { SYSTEM_UNITS, type System } from './system';

/** Chooses the letter for a required area and gives `orifice_letter` and `orifice_effective_area`; warns above T. */
export function letterStep(sheet: SheetBuilder, area: number, system: System): void {
  const unit = SYSTEM_UNITS[system].A;
  const chosen = chooseLetter(area, system);
  if (!chosen) {
    sheet.warn(
      'MORE_THAN_ONE_VALVE',
      `The required area is above the largest letter, T; more than one valve is needed.`,
      `up to T, ${system === 'US' ? '26.0 in²' : '16 774 mm²'}`,
    );
    return;
  }
  const effective = areaOf(chosen, system);
  const square = system === 'US' ? '\\text{in}^2' : '\\text{mm}^2';
  sheet.say({
    symbol: '\\text{orifice}',
    meaning: 'smallest orifice letter with at least this effective area',
    value: chosen.letter,
    tex: `\\text{${chosen.letter}}:\\ ${texNumber(effective)}\\,${square} \\ge ${texNumber(area)}\\,${square}`,
    clause: 'API 526, effective orifice areas',
  });
  sheet.output('orifice_letter', chosen.letter);
  sheet.output('orifice_effective_area', effective, unit);
}
