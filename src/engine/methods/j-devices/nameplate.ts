/* Method j.nameplate-capacity: coefficient × area out of the capacity on a nameplate, and from there the capacity on the real fluid. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, optional, output } from '../common/describe';
import { absolutePressure, barometer } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { fluxStep, readState } from '../a-gas/rated';
import { DERATING, liquidFlux } from './certified';
import { type Plate, PLATE_CLAUSE, plateStep, readPlate } from './plate';

/** Coefficient × area in m², derated where the capacity was measured and not certified; with the coefficient or the area that follows. */
function productStep(sheet: SheetBuilder, plate: Plate, system: System): number {
  const measured = sheet.word('nameplate_is', ['certified', 'measured'], 'certified') === 'measured';
  const KA = sheet.step(
    {
      key: 'KA',
      tex: 'K\\!A',
      meaning: 'certified coefficient × actual area',
      value: (plate.mass / plate.flux) * (measured ? DERATING : 1),
      unit: 'm2',
      clause: PLATE_CLAUSE,
    },
    (v) => `${measured ? `${DERATING} \\cdot ` : ''}\\frac{${v('Wn')}}{${v('Gn')}}`,
  );
  const { A: unit } = SYSTEM_UNITS[system];
  sheet.output('K_times_A', fromSI(KA, unit).value, unit);
  if (sheet.has('A_actual')) coefficientStep(sheet, KA, plate);
  else if (sheet.has('K_certified')) {
    const K = sheet.number('K_certified', '-', { above: 0, max: 1 }, 'K');
    const A = sheet.step(
      { key: 'A', meaning: 'actual area that follows', value: KA / K, unit: 'm2' },
      (v) => `\\frac{${v('KA')}}{${v('K_certified')}}`,
    );
    sheet.output('A_actual', fromSI(A, unit).value, unit);
  }
  return KA;
}

function coefficientStep(sheet: SheetBuilder, KA: number, plate: Plate): void {
  const A = sheet.number('A_actual', 'm2', { above: 0 }, 'A');
  const K = sheet.step(
    { key: 'K', meaning: 'certified coefficient that follows', value: KA / A, unit: '-' },
    (v) => `\\frac{${v('KA')}}{${v('A_actual')}}`,
  );
  sheet.output('K_certified', K);
  const most = plate.fluid === 'water' ? 0.8 : 0.9;
  if (K > most)
    sheet.warn(
      'COEFFICIENT_HIGH',
      `A certified coefficient of ${K.toFixed(3)} is more than a nozzle derated by 0.9 reaches: nameplate, area or set pressure do not belong together.`,
      `up to ${most}`,
    );
}

/** What the device passes of the fluid at hand; gas after a nameplate in air or steam, liquid after one in water. */
function realSteps(sheet: SheetBuilder, KA: number, plate: Plate, system: System): void {
  const gas = sheet.has('M');
  const liquid = sheet.has('rho');
  if (!gas && !liquid) return;
  if (gas === (plate.fluid === 'water'))
    sheet.refuse(
      'COEFFICIENT_OF_OTHER_PHASE',
      gas ? 'M' : 'rho',
      `The nameplate is in ${plate.fluid}: its coefficient says nothing of ${gas ? 'a gas' : 'a liquid'}. Take the coefficient certified for that service.`,
    );
  const flux = gas ? fluxStep(sheet, readState(sheet, system)).flux : liquidStep(sheet, system);
  const Kv = liquid ? sheet.number('Kv', '-', { above: 0, max: 1, fallback: 1 }, 'K_v') : 1;
  const { W: unit } = SYSTEM_UNITS[system];
  const W = sheet.step(
    {
      key: 'W',
      meaning: 'rated capacity on the fluid',
      value: KA * Kv * flux,
      unit: 'kg/s',
      clause: PLATE_CLAUSE,
    },
    (v) => `${v('KA')} \\cdot ${liquid ? `${v('Kv')} \\cdot ` : ''}${v('G')}`,
  );
  sheet.output('W_rated', fromSI(W, unit).value, unit);
}

function liquidStep(sheet: SheetBuilder, system: System): number {
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const unit = SYSTEM_UNITS[system].P;
  const relieving = sheet.has('P1')
    ? absolutePressure(sheet, 'P1', 'P_1', system)
    : setPressure(sheet, system);
  const back = sheet.has('P2') ? absolutePressure(sheet, 'P2', 'P_2', system) : barometer(sheet, system);
  const [P1, P2] = [relieving, back].map((value) => convert({ value, unit }, 'Pa_abs')) as [number, number];
  if (P2 >= P1)
    sheet.refuse('NO_FLOW', 'P2', 'The relieving pressure is not above the back pressure: nothing can flow.');
  sheet.keep('P1', P1, 'P_1');
  sheet.keep('P2', P2, 'P_2');
  return sheet.step(
    {
      key: 'G',
      meaning: 'theoretical mass flux of the liquid, in SI base units',
      value: liquidFlux(P1, P2, rho),
      unit: 'kg/(m2.s)',
    },
    (v) => `\\sqrt{2 \\cdot ${v('rho')} \\cdot (${v('P1')} - ${v('P2')})}`,
  );
}

function setPressure(sheet: SheetBuilder, system: System): number {
  const { P, Pg } = SYSTEM_UNITS[system];
  const set = sheet.number('set_pressure', Pg, { above: 0 }, 'p_{set}');
  const over = sheet.number('overpressure', '-', { min: 0, max: 1 }, 'x');
  const atmosphere = barometer(sheet, system);
  return sheet.step(
    {
      key: 'P1',
      tex: 'P_1',
      meaning: 'relieving pressure, absolute',
      value: set * (1 + over) + atmosphere,
      unit: P,
    },
    (v) => `${v('set_pressure')} \\cdot (1 + ${v('overpressure')}) + ${v('atmospheric_pressure')}`,
  );
}

/** j.nameplate-capacity: from the nameplate to the capacity on the real fluid. */
export const NAMEPLATE: Method = {
  id: 'j.nameplate-capacity',
  version: 1,
  topic: 'j.nameplate-capacity',
  title: 'Capacity on the real fluid from a nameplate in air, steam or water',
  editions: ['ASME XIII:2021; ASME VIII-1, UG-131 and Appendix 11'],
  source:
    'ASME BPVC Section XIII capacity formulas: W = C K A P √(M/(ZT)), W = 51.5 K A P, W = 2407 K A √(w ΔP), in coherent units; from memory',
  validity:
    'Nameplate rated at 10 % or 3 psi overpressure unless said otherwise, against the standard atmosphere: air at 60 °F, dry saturated steam, water at 70 °F. One coefficient does not serve gas and liquid. The effective area of a letter plays no part here.',
  inputs: [
    optional('nameplate_air', 'capacity on the nameplate in air', 'normal-volume-flow', {
      rangeKey: 'reliefLoad',
    }),
    optional('nameplate_steam', 'capacity on the nameplate in steam', 'mass-flow', {
      rangeKey: 'reliefLoad',
    }),
    optional('nameplate_water', 'capacity on the nameplate in water', 'volume-flow', {
      rangeKey: 'pumpFlow',
    }),
    optional(
      'nameplate_is',
      'whether the capacity was certified, or measured and still to be derated by 0.9',
      undefined,
      { words: ['certified', 'measured'] },
    ),
    {
      ...optional('set_pressure', 'set pressure on the nameplate', 'pressure-gauge', {
        rangeKey: 'setPressure',
      }),
      required: true,
    },
    optional(
      'nameplate_overpressure',
      'overpressure of the nameplate rating (10 % when not given)',
      'dimensionless',
      { rangeKey: 'overpressure' },
    ),
    optional('A_actual', 'actual flow area, to find the coefficient', 'area', { rangeKey: 'orificeArea' }),
    optional('K_certified', 'certified coefficient, to find the area', 'dimensionless', {
      rangeKey: 'kdGas',
    }),
    ...GAS_INPUTS.map((one) => ({ ...one, required: false })),
    optional('rho', 'density of the liquid', 'density', { rangeKey: 'liquidDensity' }),
    optional('Kv', 'viscosity factor of the liquid (1 when not given)', 'dimensionless', { rangeKey: 'kv' }),
    optional('P1', 'relieving pressure on the fluid', 'pressure-absolute'),
    optional('overpressure', 'overpressure on the fluid, in place of P1', 'dimensionless', {
      rangeKey: 'overpressure',
    }),
    optional('P2', 'total back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('K_times_A', 'certified coefficient × actual area', 'area'),
    output('K_certified', 'certified coefficient', 'dimensionless'),
    output('A_actual', 'actual area', 'area'),
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('W_rated', 'rated capacity on the fluid', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['set_pressure', 'A_actual']);
      const plate = readPlate(sheet, plateStep(sheet));
      const KA = productStep(sheet, plate, system);
      realSteps(sheet, KA, plate, system);
    });
  },
};
