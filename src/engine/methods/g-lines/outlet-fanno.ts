/* Method g.outlet-fanno: back pressure of a gas line without exchange of heat, as to the atmosphere or a catch tank. */
import { type Method } from '../../catalog/types';
import { adiabaticLine, boreArea, type Enlargement } from '../../lines';
import { workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { type Joint, fannoSegmentSteps } from './fanno-steps';
import { backPressureSteps, OUTLET_INPUTS, OUTLET_OUTPUTS, segmentOutputs } from './outlet';
import { endPressure, pressureOutput } from './pressures';
import { fluxStep, readSegments } from './read';

const MODELS: readonly Enlargement[] = ['static', 'momentum'];

/** How the pressure at the end of segment `i` follows from what lies beyond it. */
function jointOf(D: readonly number[], i: number, model: Enlargement): Joint {
  const [here, next] = [D[i] ?? 0, D[i + 1]];
  if (next === undefined) return 'end';
  if (next < here * (1 - 1e-9)) return 'reduction';
  return next > here * (1 + 1e-9) ? model : 'static';
}

/** g.outlet-fanno: back pressure by adiabatic flow with friction, marched from the end of the line. */
export const OUTLET_FANNO: Method = {
  id: 'g.outlet-fanno',
  version: 1,
  topic: 'g.outlet-fanno',
  title: 'Outlet line of a gas: back pressure, adiabatic',
  editions: ['API 521, 6th and 7th edition'],
  source: 'Fanno relations, textbook of gas dynamics; adiabatic form of API Standard 521 (from memory)',
  validity:
    'Ideal gas with constant k, Z inside the gas constant, constant stagnation temperature; Darcy friction factor; sonic check at the end of every segment; no phase change in the line.',
  inputs: [
    ...OUTLET_INPUTS,
    input('T0', 'stagnation temperature, that of the gas ahead of the device', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    ...GAS_INPUTS.filter((one) => one.name !== 'T'),
    optional(
      'enlargement_model',
      'pressure at an enlargement: continuous (static, when not given) or by the momentum balance',
      undefined,
      { words: [...MODELS] },
    ),
  ],
  outputs: [
    ...segmentOutputs((s) => [
      output(`${s}_outlet_Mach`, 'Mach number there', 'dimensionless'),
      output(`${s}_inlet_Mach`, 'Mach number at its beginning', 'dimensionless'),
      output(`${s}_outlet_temperature`, 'static temperature at its end', 'temperature'),
    ]),
    output('exit_pressure', 'static pressure where the line ends', 'pressure-absolute'),
    output('exit_velocity', 'velocity where the line ends', 'velocity'),
    ...OUTLET_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const T = sheet.number('T0', 'K', { above: 0 }, 'T_0');
      const Z = sheet.number('Z', '-', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      const k = sheet.number('k', '-', { min: 1 });
      const model = sheet.word('enlargement_model', MODELS, 'static');
      sheet.keep('R', GAS_CONSTANT, 'R');
      const end = endPressure(sheet);
      const { count, D, W, N } = readSegments(sheet);
      const segments = D.map((bore, i) => ({ D: bore, W: W[i] ?? 0, N: N[i] ?? 0 }));
      const worked = adiabaticLine(segments, { T, Z, M, k }, end * 1e3, model);
      for (let i = count - 1; i >= 0; i -= 1) {
        const found = worked[i];
        if (!found) continue;
        fluxStep(sheet, i, count, (W[i] ?? 0) / boreArea(D[i] ?? 1));
        fannoSegmentSteps(sheet, i, count, { found, joint: jointOf(D, i, model) });
      }
      const last = worked.at(-1);
      if (last) {
        const velocity = last.machOut * Math.sqrt((k * Z * GAS_CONSTANT * last.temperatureOut) / M);
        pressureOutput(sheet, 'exit_pressure', last.outlet / 1e3, 'absolute');
        sheet.output('exit_velocity', velocity, 'm/s');
      }
      backPressureSteps(sheet, {
        inlet: (worked[0]?.inlet ?? Number.NaN) / 1e3,
        end,
        mach: Math.max(...worked.map((one) => one.machOut)),
        chokes: worked.some((one) => one.choked),
      });
    });
  },
};
