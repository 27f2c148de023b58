/* The surface of gas-filled vessels that a fire reaches: as stated, or from the shapes of the vessels. */
import { type MethodInput } from '../../catalog/types';
import { fromSI, toSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { numbered } from '../common/numbered';
import { SYSTEM_UNITS, type System } from '../common/system';
import { effectiveHeight, HEADS, ORIENTATIONS, vesselHeight } from './geometry';
import { areaSteps, readShape, vesselCount, vesselLabel } from './vessels';

const CLAUSE = 'exact geometry of shell and heads up to the fire height';

/** Inputs of the exposed surface. */
export const EXPOSED_INPUTS: readonly MethodInput[] = [
  optional('A_exposed', 'surface that the fire reaches (or give the vessels)', 'area', {
    rangeKey: 'wettedArea',
  }),
  optional('tag', 'tag of the vessel (tag_2, tag_3 … for further vessels, and so for all vessel inputs)'),
  optional('orientation', 'how the vessel stands (sphere when there is no L)', undefined, {
    words: [...ORIENTATIONS],
  }),
  optional('D', 'inside diameter', 'length', { rangeKey: 'vesselDiameter' }),
  optional('L', 'length tangent to tangent', 'length', { rangeKey: 'vesselLength' }),
  optional('heads', 'kind of heads', undefined, { words: [...HEADS] }),
  optional('elevation_of_bottom', 'lowest inside point above the base of the fire', 'length', {
    rangeKey: 'elevation',
  }),
  optional('fire_height', 'height that the fire reaches (7.6 m or 25 ft when not given)', 'length'),
];

/** The surface of one vessel below the fire height, in the system's unit. */
function vesselSteps(sheet: SheetBuilder, n: number, fireHeight: number, system: System): number {
  const u = SYSTEM_UNITS[system];
  const { vessel, elevation } = readShape(sheet, n, u.L);
  const name = vesselLabel(sheet, n);
  const full = vesselHeight(vessel);
  const height = effectiveHeight(vessel, { level: full, elevation, fireHeight });
  const sphere = vessel.orientation === 'sphere';
  sheet.keep(`Hv_${n}`, fromSI(full, u.L).value, `H_{v${n}}`);
  sheet.keep(`R_${n}`, fromSI(vessel.D / 2, u.L).value, `\\tfrac{1}{2}D_{${n}}`);
  sheet.step(
    {
      key: `he_${n}`,
      tex: `h_{e${n}}`,
      meaning: `height of ${name} that the fire reaches, not above its inside height`,
      value: fromSI(height, u.L).value,
      unit: u.L,
      clause: CLAUSE,
    },
    (v) => {
      const reach = `${v('fire_height')} - ${v(numbered('elevation_of_bottom', n))}`;
      return `\\max(0,\\ \\min(${v(`Hv_${n}`)},\\ ${sphere ? `\\max(${v(`R_${n}`)},\\ ${reach})` : reach}))`;
    },
  );
  return areaSteps(sheet, { n, vessel, name, height, system, surface: 'exposed' });
}

/** The exposed surface in the system's unit, with its steps; gives `exposed_area`. */
export function exposedArea(sheet: SheetBuilder, system: System): number {
  const u = SYSTEM_UNITS[system];
  if (sheet.has('A_exposed')) {
    const given = sheet.number('A_exposed', u.area, { above: 0 }, "A'");
    sheet.output('exposed_area', given, u.area);
    return given;
  }
  if (!sheet.has('D'))
    sheet.refuse(
      'INPUT_MISSING',
      'A_exposed',
      'The exposed surface (A_exposed) is missing: give it, or the shape of the vessel (orientation, D, L, heads, elevation_of_bottom).',
    );
  const fallback = system === 'SI' ? 7.6 : 25;
  const fireHeight = sheet.number('fire_height', u.L, { above: 0, fallback }, 'H_f');
  const count = vesselCount(sheet);
  const reach = toSI({ value: fireHeight, unit: u.L });
  let sum = 0;
  for (let n = 1; n <= count; n += 1) sum += vesselSteps(sheet, n, reach, system);
  const area = sheet.step(
    {
      key: 'A_exposed',
      tex: "A'",
      meaning: 'surface of all vessels that the fire reaches',
      value: sum,
      unit: u.area,
      clause: CLAUSE,
    },
    (v) => Array.from({ length: count }, (_, i) => v(`A_${i + 1}`)).join(' + '),
  );
  if (area <= 0)
    sheet.refuse('ABOVE_FIRE', 'elevation_of_bottom', 'The vessel stands wholly above the fire height.');
  sheet.output('exposed_area', area, u.area);
  return area;
}
