/* Method e.fire-wetted: pool fire on the wetted surface of one or several vessels, heat input and vapour load. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { vaporisationStep } from '../f-loads/latent';
import { drainageAdequate, FIRE_CREDIT_INPUTS, fireFactor } from './credits';
import { HEADS, ORIENTATIONS } from './geometry';
import { FIRE_FORMS, fireHeat } from './heat';
import { vesselCount, vesselsArea } from './vessels';

const CLAUSE = 'API 521, heat absorption of wetted surfaces';

/** The whole wetted area: the vessels and an allowance for piping. */
function totalArea(sheet: SheetBuilder, system: System): number {
  const u = SYSTEM_UNITS[system];
  const vessels = vesselsArea(sheet, system);
  const allowance = sheet.number('piping_allowance', '-', { min: 0, max: 2, fallback: 0 }, 'x_{pipe}');
  const terms = Array.from({ length: vesselCount(sheet) }, (_, i) => `A_${i + 1}`);
  const area = sheet.step(
    {
      key: 'A',
      meaning: 'wetted area with the allowance for piping',
      value: vessels * (1 + allowance),
      unit: u.area,
      clause: CLAUSE,
    },
    (v) => `(${terms.map(v).join(' + ')}) \\cdot (1 + ${v('piping_allowance')})`,
  );
  sheet.output('wetted_area', area, u.area);
  if (area <= 0)
    sheet.refuse(
      'NO_WETTED_AREA',
      'liquid_level',
      'The fire wets nothing: no liquid lies below the fire height. Work the vessel as unwetted.',
    );
  return area;
}

/** e.fire-wetted: fire on wetted vessels. */
export const FIRE_WETTED: Method = {
  id: 'e.fire-wetted',
  version: 1,
  topic: 'e.fire-wetted',
  title: 'Fire on wetted vessels: heat input and vapour load',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'API Standard 521, heat absorption 43 200 / 70 900 F A^0.82 (SI) and 21 000 / 34 500 F A^0.82 (US), constants from memory; exact surface geometry',
  validity:
    'Open pool fire up to the fire height (7.6 m, 25 ft); liquid that boils at relieving pressure; F = 1 without credit for insulation.',
  inputs: [
    optional('tag', 'tag of the vessel (tag_2, tag_3 … for further vessels, and so for all vessel inputs)'),
    optional('orientation', 'how the vessel stands (sphere when there is no L)', undefined, {
      words: [...ORIENTATIONS],
    }),
    input('D', 'inside diameter', 'length', { rangeKey: 'vesselDiameter' }),
    optional('L', 'length tangent to tangent', 'length', { rangeKey: 'vesselLength' }),
    optional('heads', 'kind of heads', undefined, { words: [...HEADS] }),
    input('liquid_level', 'liquid level above the lowest inside point', 'length'),
    input('elevation_of_bottom', 'lowest inside point above the base of the fire', 'length', {
      rangeKey: 'elevation',
    }),
    optional('fire_height', 'height that the fire reaches (7.6 m or 25 ft when not given)', 'length'),
    optional(
      'piping_allowance',
      'allowance for wetted piping as a fraction of the vessels’ area',
      'dimensionless',
    ),
    ...FIRE_CREDIT_INPUTS,
    optional('latent_heat', 'latent heat at relief', 'specific-energy', { rangeKey: 'latentHeat' }),
  ],
  outputs: [
    output('effective_wetted_height', 'wetted height of the first vessel that the fire reaches', 'length'),
    output('wetted_area_1', 'wetted area of the first vessel (wetted_area_2 … of the others)', 'area'),
    output('wetted_area', 'wetted area of all with the allowance', 'area'),
    output('F', 'environment factor', 'dimensionless'),
    output('heat_input', 'heat input', 'power'),
    output('relief_load', 'vapour load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['D']);
      const u = SYSTEM_UNITS[system];
      const area = totalArea(sheet, system);
      const F = fireFactor(sheet);
      const drained = drainageAdequate(sheet);
      const constant = drained ? FIRE_FORMS[system].drained : FIRE_FORMS[system].undrained;
      const heat = sheet.step(
        {
          key: 'q',
          meaning: `heat absorbed from the fire, ${drained ? 'adequate' : 'no adequate'} drainage`,
          value: fireHeat(area, F, drained, system),
          unit: u.heat,
          clause: CLAUSE,
          memory: true,
        },
        (v) => `${constant} \\cdot ${v('F')} \\cdot ${v('A')}^{0.82}`,
      );
      sheet.output('heat_input', heat, u.heat);
      if (sheet.has('latent_heat')) vaporisationStep(sheet, heat, system);
    });
  },
};
