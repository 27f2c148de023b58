/* What the sheet of a nameplate reads off it: rated pressure, capacity in air, steam or water, flux of that fluid. */
import { type SheetBuilder } from '../../sheet';
import {
  airFlux,
  liquidFlux,
  NAPIER,
  PLATE_WATER,
  plateAirMass,
  platePressure,
  STANDARD_ATMOSPHERE,
  steamFlux,
} from './certified';

/** The clause of the capacity formulas. */
export const PLATE_CLAUSE = 'ASME XIII capacity formulas (VIII-1 UG-131 and Appendix 11)';

/** Floors of the overpressure at which nameplates are rated, Pa: 3 psi. */
const FLOOR = 3 * 6894.757293168;

/** What a nameplate comes to: its fluid, its capacity in kg/s and the flux of that fluid for K = 1, kg/(m²·s). */
export type Plate = { fluid: 'air' | 'steam' | 'water'; mass: number; flux: number };

/** What a nameplate tells and how it becomes a mass flow in kg/s. */
const KINDS = {
  nameplate_air: {
    fluid: 'air',
    unit: 'Nm3/h',
    mass: (q: number) => plateAirMass(q / 3600),
    tex: (s: string) => `\\frac{${s}}{3600} \\cdot \\frac{28.97}{22.414}`,
  },
  nameplate_steam: {
    fluid: 'steam',
    unit: 'kg/h',
    mass: (q: number) => q / 3600,
    tex: (s: string) => `\\frac{${s}}{3600}`,
  },
  nameplate_water: {
    fluid: 'water',
    unit: 'm3/h',
    mass: (q: number) => (q * PLATE_WATER) / 3600,
    tex: (s: string) => `\\frac{${s}}{3600} \\cdot ${PLATE_WATER}`,
  },
} as const;

/** The rated pressure of the nameplate in Pa absolute, as a step. */
export function plateStep(sheet: SheetBuilder): number {
  const set = sheet.number('set_pressure', 'Pa_g', { above: 0 }, 'p_{set}');
  const over = sheet.number('nameplate_overpressure', '-', { min: 0, max: 1, fallback: 0.1 }, 'x_n');
  return sheet.step(
    {
      key: 'Pn',
      tex: 'P_n',
      meaning: 'pressure at which the nameplate is rated, absolute, at the standard atmosphere',
      value: platePressure(set, over, FLOOR),
      unit: 'Pa_abs',
      clause: PLATE_CLAUSE,
    },
    (v) =>
      `${v('set_pressure')} + \\max(${v('nameplate_overpressure')} \\cdot ${v('set_pressure')},\\ 20\\,684) + 101\\,325`,
  );
}

/** The capacity on the nameplate: exactly one of air, steam and water; refuses none and several. */
export function readPlate(sheet: SheetBuilder, Pn: number): Plate {
  const given = (Object.keys(KINDS) as (keyof typeof KINDS)[]).filter((name) => sheet.has(name));
  const [name] = given;
  if (name === undefined || given.length > 1)
    return sheet.refuse(
      'NAMEPLATE',
      name ?? 'nameplate_air',
      'Give exactly one capacity of the nameplate: air, steam or water.',
    );
  const kind = KINDS[name];
  const q = sheet.number(name, kind.unit, { above: 0 }, 'q_n');
  const mass = sheet.step(
    {
      key: 'Wn',
      tex: 'W_n',
      meaning: `capacity of the nameplate in ${kind.fluid}, as a mass flow`,
      value: kind.mass(q),
      unit: 'kg/s',
    },
    (v) => kind.tex(v(name)),
  );
  return { fluid: kind.fluid, mass, flux: plateFlux(sheet, kind.fluid, Pn) };
}

/** Flux and equation of the fluid of the nameplate; undefined where Napier's equation ends. */
function plateForm(
  fluid: Plate['fluid'],
  Pn: number,
): { flux: number; tex: (p: string) => string } | undefined {
  if (fluid === 'water')
    return {
      flux: liquidFlux(Pn, STANDARD_ATMOSPHERE, PLATE_WATER),
      tex: (p) => `\\sqrt{2 \\cdot ${PLATE_WATER} \\cdot (${p} - 101\\,325)}`,
    };
  if (fluid === 'steam') {
    const steam = steamFlux(Pn);
    return (
      steam && {
        flux: steam.flux,
        tex: (p) => `${NAPIER.toPrecision(6)} \\cdot ${p} \\cdot ${steam.KN.toPrecision(6)}`,
      }
    );
  }
  const { flux, choked } = airFlux(Pn);
  const root = '\\frac{28.97}{8314.46 \\cdot 288.706}';
  const r = (p: string) => `\\left(\\frac{101\\,325}{${p}}\\right)`;
  return {
    flux,
    tex: (p) =>
      choked
        ? `${p} \\sqrt{${root} \\cdot 1.4 \\left(\\frac{2}{2.4}\\right)^6}`
        : `${p} \\sqrt{${root} \\cdot 7 \\left[${r(p)}^{2/1.4} - ${r(p)}^{2.4/1.4}\\right]}`,
  };
}

function plateFlux(sheet: SheetBuilder, fluid: Plate['fluid'], Pn: number): number {
  const form = plateForm(fluid, Pn);
  if (!form)
    return sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'set_pressure',
      'Napier’s equation for steam ends at 22 057 kPa (3 200 psi) absolute.',
    );
  const meaning = `theoretical mass flux of ${fluid} at the rating of the nameplate`;
  return sheet.step(
    {
      key: 'Gn',
      tex: 'G_n',
      meaning,
      value: form.flux,
      unit: 'kg/(m2.s)',
      clause: PLATE_CLAUSE,
      memory: true,
    },
    (v) => form.tex(v('Pn')),
  );
}
