/* Method k.emergency-venting: air that a storage tank in a fire must vent, by the formula and by the regulation's table. */
import { type Method } from '../../catalog/types';
import { convert, fromSI, toSI } from '../../quantity';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { gaugePressure } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { vaporisation } from '../f-loads/latent';
import { airOutputs, VENT_UNITS } from './breathing-steps';
import {
  boilingAir,
  heatBand,
  HEXANE,
  PROTECTION,
  type Protection,
  regulationAir,
  tankFireHeat,
  VENT_FORMS,
} from './emergency';
import { AREA_INPUTS, wettedArea } from './tank-area';

const CLAUSE = 'ISO 28300 / API 2000 7th edition, 4.3.3 emergency venting';
const TABLE_CLAUSE = '29 CFR 1910.106, Table H-10';
const BASES = ['formula', 'table'] as const;
const PROTECTIONS = Object.keys(PROTECTION) as Protection[];

/** Design pressure above which a large tank takes no constant heat, Pa gauge: 1 psig. */
const LOW_DESIGN = 6894.757293168;

/** The regulation credits drainage only above this wetted area, m² (200 ft²). */
const DRAINAGE_FROM = 18.58;

/** Whether the design pressure is above 1 psig; not known counts as above, which asks for more. */
function highPressure(sheet: SheetBuilder, area: number, system: System): boolean {
  if (sheet.has('design_pressure')) {
    const gauge = gaugePressure(sheet, 'design_pressure', 'p_d', system);
    return toSI({ value: gauge, unit: SYSTEM_UNITS[system].Pg }) > LOW_DESIGN * (1 + 1e-9);
  }
  const large = toSI({ value: area, unit: SYSTEM_UNITS[system].area }) >= 260;
  if (large)
    sheet.warn(
      'DESIGN_PRESSURE_ASSUMED',
      'No design pressure is given: it is taken as above 1 psig (6.9 kPa), which asks for more from a wetted area above 260 m² (2 800 ft²).',
    );
  return true;
}

/** The environment factor: as given, from the protection, or 1. */
function environment(sheet: SheetBuilder, area: number, system: System): number {
  if (sheet.has('F')) return sheet.number('F', '-', { min: 0, max: 1 }, 'F');
  const kind = sheet.word('protection', PROTECTIONS, 'none');
  if (kind === 'drainage' && toSI({ value: area, unit: SYSTEM_UNITS[system].area }) <= DRAINAGE_FROM) {
    sheet.warn(
      'DRAINAGE_NOT_CREDITED',
      'The regulation credits drainage only for tanks of more than 200 ft² (18.6 m²) wetted area: F = 1.',
    );
    return sheet.keep('F', 1, 'F');
  }
  return sheet.keep('F', PROTECTION[kind], 'F');
}

function heatStep(sheet: SheetBuilder, area: number, F: number, high: boolean, system: System): number {
  const { heat } = SYSTEM_UNITS[system];
  const { factor, exponent } = heatBand(area, high, system);
  const power = exponent === 1 ? '' : `^{${exponent}}`;
  const value = sheet.step(
    {
      key: 'Q',
      meaning: 'heat absorbed from the fire',
      value: tankFireHeat(area, F, high, system),
      unit: heat,
      clause: CLAUSE,
      memory: true,
    },
    (v) => `${texNumber(factor)} \\cdot ${v('F')}${exponent === 0 ? '' : ` \\cdot ${v('A')}${power}`}`,
  );
  const shown =
    system === 'SI' ? { value: convert({ value, unit: heat }, 'kW'), unit: 'kW' } : { value, unit: heat };
  sheet.output('F', F);
  sheet.output('heat_input', shown.value, shown.unit);
  return value;
}

/** The formula with the properties of the liquid; gives the vapour load beside the air. */
function formulaStep(sheet: SheetBuilder, heat: number, system: System): number {
  const u = SYSTEM_UNITS[system];
  const L = sheet.number('latent_heat', u.latent, { above: 0 }, 'L');
  const T = sheet.number('T', u.T, { above: 0 });
  const M = sheet.number('M', u.M, { above: 0 });
  const scale = system === 'SI' ? 1000 : 1;
  const vapour = vaporisation(toSI({ value: heat, unit: u.heat }), toSI({ value: L, unit: u.latent }));
  sheet.step(
    {
      key: 'Wv',
      tex: 'W_v',
      meaning: 'vapour boiled by the fire',
      value: fromSI(vapour, u.W).value,
      unit: u.W,
      clause: 'W = Q/λ',
    },
    (v) => `${system === 'SI' ? '3.6 \\cdot ' : ''}\\frac{${v('Q')}}{${v('latent_heat')}}`,
  );
  sheet.output('vapour_load', fromSI(vapour, u.W).value, u.W);
  const air = sheet.step(
    {
      key: 'Vf',
      tex: '\\dot V_f',
      meaning: 'air by the formula',
      value: boilingAir(heat, L * scale, T, M, system),
      unit: VENT_UNITS[system].air,
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `${VENT_FORMS[system]} \\cdot \\frac{${v('Q')}}{${system === 'SI' ? '1000 \\cdot ' : ''}${v('latent_heat')}} \\sqrt{\\frac{${v('T')}}{${v('M')}}}`,
  );
  sheet.output('formula_air_equivalent', air, VENT_UNITS[system].air);
  return air;
}

/** The regulation's table, corrected for the liquid where it is known, and by the factor of protection. */
function tableStep(sheet: SheetBuilder, area: number, F: number, high: boolean, system: System): number {
  const feet = sheet.step(
    {
      key: 'Af',
      tex: 'A_{ft^2}',
      meaning: 'wetted area for the table',
      value: convert({ value: area, unit: SYSTEM_UNITS[system].area }, 'ft2'),
      unit: 'ft2',
    },
    (v) => (system === 'SI' ? `\\frac{${v('A')}}{0.092\\,903\\,04}` : v('A')),
  );
  const outside = feet > 2800;
  const bare = sheet.step(
    {
      key: 'Vh',
      tex: '\\dot V_{hex}',
      meaning: outside ? 'free air above the table' : 'free air by the table',
      value: regulationAir(feet, high),
      unit: 'SCFH',
      clause: TABLE_CLAUSE,
    },
    (v) => (!outside ? `\\text{table}(${v('Af')})` : high ? `1107 \\cdot ${v('Af')}^{0.82}` : '742\\,000'),
  );
  const known = sheet.has('latent_heat') && sheet.has('M');
  const L = known ? sheet.number('latent_heat', 'Btu/lb', { above: 0 }, 'L_{US}') : 1;
  const M = known ? sheet.number('M', 'lb/lbmol', { above: 0 }) : 1;
  const value = bare * F * (known ? HEXANE / (L * Math.sqrt(M)) : 1);
  sheet.step(
    {
      key: 'Vr',
      tex: '\\dot V_r',
      meaning: known ? 'air by the table, corrected for the liquid' : 'air by the table, as for hexane',
      value,
      unit: 'SCFH',
      clause: TABLE_CLAUSE,
    },
    (v) =>
      `${v('F')} \\cdot ${v('Vh')}${known ? ` \\cdot \\frac{${HEXANE}}{${v('latent_heat')} \\sqrt{${v('M')}}}` : ''}`,
  );
  const { air } = VENT_UNITS[system];
  sheet.output('table_air_equivalent', convert({ value, unit: 'SCFH' }, air), air);
  return value;
}

/** k.emergency-venting: fire around a storage tank. */
export const EMERGENCY_VENTING: Method = {
  id: 'k.emergency-venting',
  version: 1,
  topic: 'k.emergency-venting',
  title: 'Storage tank in a fire: emergency venting',
  editions: ['ISO 28300:2008; API 2000, 6th and 7th edition', '29 CFR 1910.106'],
  source:
    'ISO 28300 / API Standard 2000 emergency venting, heat bands and constants from memory (US ones as printed in Ludwig, Applied Process Design, vol. 1, 3rd ed., p. 476); 29 CFR 1910.106 Table H-10',
  validity:
    'Stable liquids in tanks up to 103 kPa (15 psig) design pressure; a liquid that boils, no foaming, no reaction. The formula refers its air to 0 °C in SI and 60 °F in US units, so Nm³/h and SCFH of it differ by more than the units. Only one credit of protection may be taken.',
  inputs: [
    ...AREA_INPUTS,
    optional('design_pressure', 'design pressure of the tank', 'pressure-gauge', {
      rangeKey: 'tankDesignPressure',
    }),
    optional('F', 'environment factor, in place of the protection', 'dimensionless', {
      rangeKey: 'environmentFactor',
    }),
    optional('protection', 'protection credited by the regulation', undefined, { words: [...PROTECTIONS] }),
    optional('latent_heat', 'latent heat at relief', 'specific-energy', { rangeKey: 'latentHeat' }),
    optional('T', 'temperature of the vapour', 'temperature', { rangeKey: 'relievingTemperature' }),
    optional('M', 'molar mass of the vapour', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('basis', 'which of both gives the load (the formula where the liquid is known)', undefined, {
      words: [...BASES],
    }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('wetted_area', 'wetted area', 'area'),
    output('F', 'environment factor', 'dimensionless'),
    output('heat_input', 'heat absorbed, with the environment factor', 'power'),
    output('vapour_load', 'vapour boiled', 'mass-flow'),
    output('formula_air_equivalent', 'air by the formula', 'normal-volume-flow'),
    output('table_air_equivalent', 'air by the regulation’s table', 'normal-volume-flow'),
    output('air_equivalent', 'required venting in air', 'normal-volume-flow'),
    output('relief_load', 'the same air as a mass flow', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A_wetted', 'D']);
      const area = wettedArea(sheet, system);
      const high = highPressure(sheet, area, system);
      const F = environment(sheet, area, system);
      const heat = heatStep(sheet, area, F, high, system);
      const known = ['latent_heat', 'T', 'M'].every((name) => sheet.has(name));
      const asked = edition?.includes('1910.106') === true || !known ? 'table' : 'formula';
      const basis = sheet.word('basis', BASES, asked);
      if (basis === 'formula' || known) formulaStep(sheet, heat, system);
      const table = tableStep(sheet, area, F, high, system);
      const { air } = VENT_UNITS[system];
      const formula = sheet.outputs['formula_air_equivalent'];
      if (basis === 'formula' && typeof formula === 'object')
        return airOutputs(sheet, formula.value, air, system);
      airOutputs(sheet, table, 'SCFH', system);
    });
  },
};
