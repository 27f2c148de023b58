/* The friction factors of a line on a sheet: given, or worked from the roughness. */
import { frictionFactor, reynolds } from '../../lines';
import { type SheetBuilder } from '../../sheet';
import { nameAt, ofSegment, readEach, symbolAt } from './series';

/** Darcy friction factors, one a segment, and the Reynolds numbers where they were worked. */
export function readFriction(
  sheet: SheetBuilder,
  count: number,
  W: number[],
  D: number[],
): { f: number[]; Re: number[] } {
  if (sheet.has('f_darcy') || !sheet.has('roughness')) {
    const bounds = { min: 0, max: 1, ...(sheet.has('L') ? {} : { fallback: 0 }) };
    return { f: readEach(sheet, 'f_darcy', count, { unit: '-', bounds, tex: 'f' }), Re: [] };
  }
  const rough = readEach(sheet, 'roughness', count, { unit: 'm', bounds: { min: 0 }, tex: '\\varepsilon' });
  const mu = readEach(sheet, 'mu', count, { unit: 'Pa.s', bounds: { above: 0 }, tex: '\\mu' });
  const Re: number[] = [];
  const f = D.map((bore, i) => {
    if ((rough[i] ?? 0) >= bore)
      sheet.refuse(
        'VALUE_IMPOSSIBLE',
        nameAt('roughness', i),
        'The roughness is as large as the bore; check its unit.',
      );
    const Reynolds = reynolds(W[i] ?? 0, bore, mu[i] ?? 1);
    Re.push(Reynolds);
    return frictionStep(sheet, i, count, Reynolds, (rough[i] ?? 0) / bore);
  });
  return { f, Re };
}

function frictionStep(sheet: SheetBuilder, i: number, count: number, Re: number, relative: number): number {
  sheet.step(
    {
      key: `Re ${i}`,
      tex: symbolAt('Re', i, count),
      meaning: `Reynolds number${ofSegment(i, count)}`,
      value: Re,
      unit: '-',
    },
    (v) =>
      `\\frac{4 \\, ${v(nameAt('W', i))}}{\\pi \\cdot ${v(nameAt('D', i))} \\cdot ${v(nameAt('mu', i))}}`,
  );
  const value = frictionFactor(Re, relative);
  const key = nameAt('f_darcy', i);
  const info = {
    key,
    tex: symbolAt('f', i, count),
    meaning: `Darcy friction factor${ofSegment(i, count)}`,
    value,
    unit: '-',
    clause:
      Re < 2300
        ? 'laminar flow'
        : Re < 4000
          ? 'between laminar and turbulent flow, on a straight line'
          : 'Colebrook–White',
  };
  sheet.keep(key, value, info.tex);
  if (Re < 2300) return sheet.step(info, (v) => `\\frac{64}{${v(`Re ${i}`)}}`);
  if (Re < 4000)
    return sheet.step(info, (v) => `f(2300) + \\frac{${v(`Re ${i}`)} - 2300}{1700} \\, (f(4000) - f(2300))`);
  return sheet.step(
    info,
    (v) =>
      `\\left[-2 \\log_{10}\\left(\\frac{${v(nameAt('roughness', i))}}{3.7 \\, ${v(nameAt('D', i))}} + \\frac{2.51}{${v(`Re ${i}`)} \\sqrt{${v(key)}}}\\right)\\right]^{-2}`,
  );
}
