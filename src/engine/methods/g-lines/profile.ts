/* The course of pressure, velocity, Mach number and temperature along the line of an outlet sheet, for a drawing. */
import {
  adiabaticProfile,
  type DrawnSegment,
  isothermalProfile,
  liquidCurve,
  type LineGas,
  type LinePoint,
  marchedProfile,
} from '../../lines';
import { type Inputs, type SheetBuilder, workSheet } from '../../sheet';
import { readCurve } from './outlet-homogeneous';
import { endPressure } from './pressures';
import { readSegments } from './read';
import { readEach } from './series';

function readGas(sheet: SheetBuilder, temperature: 'T' | 'T0'): Omit<LineGas, 'Z'> {
  return {
    T: sheet.number(temperature, 'K', { above: 0 }),
    M: sheet.number('M', 'kg/kmol', { above: 0 }),
    k: sheet.number('k', '-', { min: 1 }),
  };
}

function readDrawn(sheet: SheetBuilder): DrawnSegment[] {
  const { count, D, W, L, N } = readSegments(sheet);
  const rise = readEach(sheet, 'rise', count, { unit: 'm', bounds: { fallback: 0 }, tex: 'h' });
  return D.map((bore, i) => ({ D: bore, W: W[i] ?? 0, L: L[i] ?? 0, N: N[i] ?? 0, rise: rise[i] ?? 0 }));
}

function pointsOf(sheet: SheetBuilder, topic: string, each: number): LinePoint[] {
  const end = endPressure(sheet) * 1e3;
  const drawn = readDrawn(sheet);
  if (topic === 'g.outlet-isothermal') {
    const Z = readEach(sheet, 'Z', drawn.length, { unit: '-', bounds: { above: 0 }, tex: 'Z' });
    const own = drawn.map((one, i) => ({ ...one, Z: Z[i] ?? 1 }));
    return isothermalProfile(own, { ...readGas(sheet, 'T'), Z: Z[0] ?? 1 }, end, each);
  }
  if (topic === 'g.outlet-fanno') {
    const gas = { ...readGas(sheet, 'T0'), Z: sheet.number('Z', '-', { above: 0 }) };
    return adiabaticProfile(
      drawn,
      gas,
      end,
      sheet.word('enlargement_model', ['static', 'momentum'] as const, 'static'),
      each,
    );
  }
  const liquid = topic === 'g.outlet-liquid';
  const curve = liquid ? liquidCurve(sheet.number('rho', 'kg/m3', { above: 0 })) : readCurve(sheet);
  return marchedProfile(drawn, curve, end, each);
}

/**
 * Points along the line of an outlet sheet, from the device to the end.
 * @param method the id of the sheet's method, with or without its version
 * @param inputs the inputs of the sheet
 * @param each intervals a segment
 * @returns empty for other methods, and where the sheet itself is refused
 */
export function outletProfile(method: string, inputs: Inputs, each = 20): LinePoint[] {
  const topic = method.split('@')[0] ?? method;
  let points: LinePoint[] = [];
  if (!topic.startsWith('g.outlet-')) return points;
  workSheet({ id: topic, version: 1, inputs: [] }, inputs, undefined, (sheet) => {
    points = pointsOf(sheet, topic, each);
  });
  return points;
}
