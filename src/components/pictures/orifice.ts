/* Orifice bar: required against installed area, linear in mm² from zero so that lengths are honest; letters stand where their areas stand. */
import { ORIFICE_LETTERS } from '@engine/methods/i-letters/letters';
import { formatNumber } from '@engine/quantity';
import { path, px, text } from './draw';
import { placeLetters } from './letters';

export type BarScale = {
  /** Area at the right end; all areas of a scale are in its unit, mm² unless it says in². */
  max: number;
  unit?: 'mm²' | 'in²';
  width?: number;
  /** Installed area, or the one installed if the case is accepted, in the unit of the scale. */
  installed: number;
  /** Area installed today when that is another one. */
  present?: number;
};

const WIDTH = 300;
/** Printed areas of letters are rounded, so 1 840.6 and 1 841 mm² are one letter. */
const same = (a: number, b: number | undefined) =>
  b !== undefined && Math.abs(a - b) <= 0.002 * Math.max(a, b);

/** An upper end for the scale: a tenth beyond the larger of required and installed. Any unit. */
export function scaleMax(areas: number[]): number {
  return Math.max(1, ...areas) * 1.1;
}

/** The ruler in a column's head, so that every row of the table shares it. */
export function orificeRuler(scale: BarScale): string {
  const width = scale.width ?? WIDTH;
  const x = (area: number) => px((area / scale.max) * (width - 2) + 1);
  const letters = ORIFICE_LETTERS.map(({ letter, mm2, in2 }) => ({
    letter,
    area: scale.unit === 'in²' ? in2 : mm2,
  }));
  const seen = letters.filter(({ area }) => area <= scale.max);
  const own = [scale.installed, scale.present]
    .filter((area): area is number => area !== undefined && !seen.some((known) => same(known.area, area)))
    .map((area) => ({ letter: formatNumber(area, scale.unit === 'in²' ? 2 : 0), area }));
  const all = [...seen, ...own];
  const kept = (area: number) => same(area, scale.installed) || same(area, scale.present);
  const ticks = all.map(({ area }) => {
    const now = same(area, scale.installed);
    return path(`or-tick${now ? ' now' : ''}`, `M${x(area)} ${kept(area) ? 16 : 22}V28`);
  });
  const places = placeLetters(all.map(({ letter, area }) => ({ letter, x: x(area), kept: kept(area) })));
  const installed = all.find(({ area }) => same(area, scale.installed))?.letter;
  const names = places.map((place) => {
    const role = place.kept === undefined ? '' : place.kept === installed ? ' now' : ' was';
    return text(`or-letter${role}`, place.x, 12, place.label, 'middle');
  });
  return `<svg class="or-ruler" viewBox="0 0 ${width} 28" width="${width}" height="28" aria-hidden="true">${ticks.join('')}${names.join('')}</svg>`;
}

export type BarFigures = {
  /** Required area; absent: not sized. */
  required?: number;
  /** Required area before the change. */
  before?: number;
  height?: number;
};

function barSentence(scale: BarScale, required: number | undefined): string {
  const unit = scale.unit ?? 'mm²';
  const digits = unit === 'in²' ? 3 : 1;
  if (required === undefined) return `not sized, installed ${formatNumber(scale.installed, digits)} ${unit}`;
  const used = formatNumber((required / scale.installed) * 100, 1);
  return `required ${formatNumber(required, digits)} of ${formatNumber(scale.installed, digits)} ${unit}, ${used} %`;
}

/** One row: the bar is the required area, the thick line the installed area; what goes beyond it is a taller block. */
export function orificeBar(scale: BarScale, figures: BarFigures): string {
  const width = scale.width ?? WIDTH;
  const height = figures.height ?? 33;
  const x = (area: number) => px((Math.min(area, scale.max) / scale.max) * (width - 2) + 1);
  const y = height / 2;
  const seat = x(scale.installed);
  const { required, before } = figures;
  let drawn = path('or-base', `M1 ${y + 0.5}H${width - 1}`);
  if (scale.present !== undefined && !same(scale.installed, scale.present)) {
    drawn += path('or-seat was', `M${x(scale.present)} -1V${height + 1}`);
  }
  if (required === undefined) drawn += path('or-none', `M1 ${y + 0.5}H${seat}`);
  else {
    drawn += `<rect class="or-bar" x="1" y="${y - 3}" width="${px(Math.max(0.5, Math.min(x(required), seat) - 1))}" height="6"/>`;
    if (required > scale.installed)
      drawn += path('or-over', `M${seat} ${y - 6}H${x(required)}V${y + 6}H${seat}Z`);
  }
  if (before !== undefined) drawn += path('or-old', `M${x(before)} ${y + 4}l3.5 5h-7Z`);
  drawn += path('or-seat', `M${seat} -1V${height + 1}`);
  return `<svg class="or" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" aria-label="${barSentence(scale, required)}">${drawn}</svg>`;
}

export type RatioFigures = {
  /** Required on installed area, %; absent: not sized. */
  used?: number;
  /** The next smaller letter's area on the installed one, %. */
  smaller?: number;
  width?: number;
  height?: number;
};

/** Register form: each row relative to its own installed area, 0–125 %, so that all seat lines stand in one column. */
export function ratioBar({ used, smaller, width = 120, height = 30 }: RatioFigures): string {
  const x = (percent: number) => px((Math.min(percent, 125) / 125) * (width - 2) + 1);
  const y = height / 2;
  const seat = x(100);
  let drawn = path('or-base', `M1 ${y + 0.5}H${width - 1}`);
  if (smaller !== undefined) drawn += path('or-tick', `M${x(smaller)} ${y + 3}v4`);
  if (used === undefined) drawn += path('or-none', `M1 ${y + 0.5}H${seat}`);
  else {
    drawn += `<rect class="or-bar" x="1" y="${y - 2.5}" width="${px(Math.max(0.5, x(Math.min(used, 100)) - 1))}" height="5"/>`;
    if (used > 100) drawn += path('or-over', `M${seat} ${y - 5}H${x(used)}V${y + 5}H${seat}Z`);
  }
  drawn += path('or-seat', `M${seat} -1V${height + 1}`);
  const label = used === undefined ? 'not sized' : `${formatNumber(used, 0)} % of installed area`;
  return `<svg class="or ratio" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" aria-label="${label}">${drawn}</svg>`;
}
