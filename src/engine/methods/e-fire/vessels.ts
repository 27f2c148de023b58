/* Reading the vessels of a wetted-fire sheet and showing the wetted area of each. */
import { fromSI, toSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { numbered } from '../common/numbered';
import { SYSTEM_UNITS, type System } from '../common/system';
import {
  effectiveHeight,
  headDepth,
  HEADS,
  type Heads,
  ORIENTATIONS,
  type Orientation,
  type Vessel,
  vesselHeight,
  wettedParts,
} from './geometry';

const CLAUSE = 'API 521, effect of fire on the wetted surface';

/** The most vessels one sheet takes. */
export const MAX_VESSELS = 20;

/** How many vessels the inputs describe: the first gap ends the list. */
export function vesselCount(sheet: SheetBuilder): number {
  let count = 1;
  while (count < MAX_VESSELS && sheet.has(numbered('D', count + 1))) count += 1;
  return count;
}

function length(
  sheet: SheetBuilder,
  name: string,
  unit: string,
  bounds: { above?: number; min?: number; fallback?: number },
  tex: string,
): number {
  return toSI({ value: sheet.number(name, unit, bounds, tex), unit });
}

/** The n-th vessel in metres, and the height of its lowest point above the base of the fire, which may lie below it. */
export function readShape(
  sheet: SheetBuilder,
  n: number,
  unit: string,
): { vessel: Vessel; elevation: number } {
  const at = (name: string) => numbered(name, n);
  const orientation = sheet.word<Orientation>(
    at('orientation'),
    ORIENTATIONS,
    sheet.has(at('L')) ? undefined : 'sphere',
  );
  const D = length(sheet, at('D'), unit, { above: 0 }, `D_{${n}}`);
  const sphere = orientation === 'sphere';
  const L = sphere ? 0 : length(sheet, at('L'), unit, { min: 0 }, `L_{${n}}`);
  const heads = sphere ? 'hemispherical' : sheet.word<Heads>(at('heads'), HEADS);
  const elevation = length(sheet, at('elevation_of_bottom'), unit, {}, `z_{${n}}`);
  return { vessel: { orientation, D, L, heads }, elevation };
}

/** The tag given for the n-th vessel, or its number. */
export function vesselLabel(sheet: SheetBuilder, n: number): string {
  const tag = sheet.inputs[numbered('tag', n)];
  return typeof tag === 'string' ? tag : `vessel ${n}`;
}

/** The height of one vessel that the fire wets. */
function heightStep(
  sheet: SheetBuilder,
  n: number,
  vessel: Vessel,
  name: string,
  height: number,
  unit: string,
): void {
  sheet.keep('R', fromSI(vessel.D / 2, unit).value, `\\tfrac{1}{2}D_{${n}}`);
  sheet.step(
    {
      key: `he_${n}`,
      tex: `h_{e${n}}`,
      meaning: `wetted height of ${name} that the fire reaches`,
      value: height,
      unit,
      clause: CLAUSE,
    },
    (v) => {
      const reach = `${v('fire_height')} - ${v(numbered('elevation_of_bottom', n))}`;
      const cap = vessel.orientation === 'sphere' ? `\\max(${v('R')},\\ ${reach})` : reach;
      return `\\max(0,\\ \\min(${v(numbered('liquid_level', n))},\\ ${cap}))`;
    },
  );
}

/** What the heads of a vessel add, in words a checker can rework; the surface of a curved head is found by quadrature. */
const HEAD_SURFACE: Record<Heads, string> = {
  ellipsoidal: 'part of two 2:1 ellipsoidal heads, surface of revolution by quadrature',
  hemispherical: 'part of two hemispherical heads, surface of revolution by quadrature',
  flat: 'part of the flat ends',
};

/** A vessel whose surface up to a height (m) is shown: wetted by its liquid, or exposed to the fire. */
export type Part = {
  n: number;
  vessel: Vessel;
  name: string;
  height: number;
  system: System;
  surface: 'wetted' | 'exposed';
};

/** Its wetted shell. */
function shellStep(sheet: SheetBuilder, { n, vessel, name, system, surface }: Part, shell: number): void {
  const b = fromSI(headDepth(vessel.heads, vessel.D), SYSTEM_UNITS[system].L).value;
  sheet.keep(`b_${n}`, b, `b_{${n}}`);
  sheet.step(
    {
      key: `As_${n}`,
      tex: `A_{s${n}}`,
      meaning: `${surface} shell of ${name}, ${shapeWords(vessel.orientation, vessel.heads)}`,
      value: shell,
      unit: SYSTEM_UNITS[system].area,
      clause: 'exact geometry',
    },
    (v) => {
      const [D, L, h] = [v(numbered('D', n)), v(numbered('L', n)), v(`he_${n}`)];
      return vessel.orientation === 'horizontal'
        ? `${D} \\cdot ${L} \\cdot \\arccos\\left(1 - \\frac{2 \\cdot ${h}}{${D}}\\right)`
        : `\\pi \\cdot ${D} \\cdot \\min(\\max(0,\\ ${h} - ${v(`b_${n}`)}),\\ ${L})`;
    },
  );
}

/** Its area up to the height kept under `he_n`: the shell by its equation, the heads by theirs, and their sum under `A_n`. */
export function areaSteps(sheet: SheetBuilder, part: Part): number {
  const { n, vessel, name, height, system, surface } = part;
  const unit = SYSTEM_UNITS[system].area;
  const si = wettedParts(vessel, height);
  const area = fromSI(si.shell + si.heads, unit).value;
  const total = { key: `A_${n}`, tex: `A_{${n}}`, meaning: `${surface} area of ${name}`, value: area, unit };
  if (vessel.orientation === 'sphere')
    return sheet.step(
      { ...total, meaning: `${surface} area of ${name}, sphere`, clause: 'exact geometry' },
      (v) => `\\pi \\cdot ${v(numbered('D', n))} \\cdot ${v(`he_${n}`)}`,
    );
  shellStep(sheet, part, fromSI(si.shell, unit).value);
  sheet.step(
    {
      key: `Ah_${n}`,
      tex: `A_{h${n}}`,
      meaning: `${surface} ${HEAD_SURFACE[vessel.heads]}`,
      value: fromSI(si.heads, unit).value,
      unit,
      clause: 'exact geometry',
    },
    (v) => `A_{head}(${v(numbered('D', n))},\\ ${v(`he_${n}`)})`,
  );
  return sheet.step(total, (v) => `${v(`As_${n}`)} + ${v(`Ah_${n}`)}`);
}

/** The steps of one vessel; its wetted area in the system's unit. */
function vesselSteps(sheet: SheetBuilder, n: number, fireHeight: number, system: System): number {
  const u = SYSTEM_UNITS[system];
  const { vessel, elevation } = readShape(sheet, n, u.L);
  const level = length(sheet, numbered('liquid_level', n), u.L, { min: 0 }, `h_{${n}}`);
  const name = vesselLabel(sheet, n);
  const full = vesselHeight(vessel);
  if (level > full * 1.0001)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      numbered('liquid_level', n),
      `The liquid level of ${name} is above its inside height of ${fromSI(full, u.L).value.toFixed(2)} ${u.L}.`,
    );
  const si = effectiveHeight(vessel, { level, elevation, fireHeight });
  const height = fromSI(si, u.L).value;
  heightStep(sheet, n, vessel, name, height, u.L);
  const area = areaSteps(sheet, { n, vessel, name, height: si, system, surface: 'wetted' });
  sheet.output(n === 1 ? 'effective_wetted_height' : `effective_wetted_height_${n}`, height, u.L);
  sheet.output(`wetted_area_${n}`, area, u.area);
  if (si === 0 && level > 0)
    sheet.warn('ABOVE_FIRE', `${name} stands above the fire height: no part of its wetted surface counts.`);
  return area;
}

function shapeWords(orientation: Orientation, heads: Heads): string {
  return orientation === 'sphere' ? 'sphere' : `${orientation}, ${heads} heads`;
}

/** The wetted area of all vessels in the system's unit, in m² or ft², with a step for each. */
export function vesselsArea(sheet: SheetBuilder, system: System): number {
  const unit = SYSTEM_UNITS[system].L;
  const fallback = system === 'SI' ? 7.6 : 25;
  const fireHeight = length(sheet, 'fire_height', unit, { above: 0, fallback }, 'H_f');
  let sum = 0;
  for (let n = 1; n <= vesselCount(sheet); n += 1) sum += vesselSteps(sheet, n, fireHeight, system);
  return sum;
}
