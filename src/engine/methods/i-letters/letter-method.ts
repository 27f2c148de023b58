/* Method i.api526-letters: the orifice letter for a required effective area. */
import { type Method } from '../../catalog/types';
import { workSheet } from '../../sheet';
import { input, output } from '../common/describe';
import { systemOf, SYSTEM_UNITS } from '../common/system';
import { letterStep } from '../common/letter-step';
import { areaOf, chooseLetter } from './letters';

/** i.api526-letters: smallest letter with at least the required effective area. */
export const LETTERS: Method = {
  id: 'i.api526-letters',
  version: 1,
  topic: 'i.api526-letters',
  title: 'Orifice letter for a required effective area',
  editions: ['API 526, all editions'],
  source:
    'API Standard 526, effective areas in in² as read in the open library CalebBell/fluids; mm² from memory',
  validity: 'Effective areas only, up to T; an area equal to a letter’s takes that letter.',
  inputs: [input('A_required', 'required effective area', 'area', { rangeKey: 'orificeArea' })],
  outputs: [
    output('letter', 'smallest sufficient letter'),
    output('effective_area', 'its effective area in the unit of the input’s system', 'area'),
    output('orifice_letter', 'the letter, by the name of the sizing sheets'),
    output('orifice_effective_area', 'its area, by the name of the sizing sheets', 'area'),
    output('effective_area_SI', 'its printed effective area in mm²', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A_required']);
      const area = sheet.number('A_required', SYSTEM_UNITS[system].A, { above: 0 }, 'A');
      const chosen = chooseLetter(area, system);
      if (!chosen)
        return sheet.refuse(
          'MORE_THAN_ONE_VALVE',
          'A_required',
          'The required area is above the largest letter, T (26.0 in², 16 774 mm²): more than one valve is needed.',
        );
      letterStep(sheet, area, system);
      sheet.output('letter', chosen.letter);
      sheet.output('effective_area', areaOf(chosen, system), SYSTEM_UNITS[system].A);
      sheet.output('effective_area_SI', chosen.mm2, 'mm2');
    });
  },
};
