/* The steps of a sheet of water properties: from the basic equation of the region to the figures, line by line. */
import { type SheetBuilder } from '../../sheet';
import { gibbs1, gibbs2, gibbs5, REDUCING } from '../../water/basic';
import { CRITICAL } from '../../water/constants';
import { type Gibbs } from '../../water/gibbs';
import { helmholtz3 } from '../../water/region3';

const RELEASE = 'IAPWS R7-97(2012)';

/** Specific gas constant in the unit of the sheet, kJ/(kg·K). */
const R = 0.461526;

/** A region whose equation is a Gibbs free energy. */
export type GibbsRegion = 1 | 2 | 5;

/** The sum of each region as the release writes it, in π and τ; its coefficients stand in the tables named. */
const SUMS: Record<GibbsRegion, { tex: (pi: string, tau: string) => string; clause: string }> = {
  1: {
    tex: (pi, tau) => `\\sum_{i=1}^{34} n_i\\,(7.1-${pi})^{I_i}\\,(${tau}-1.222)^{J_i}`,
    clause: `${RELEASE}, Eq. (7), Tables 2 and 4`,
  },
  2: {
    tex: (pi, tau) =>
      `\\ln ${pi} + \\sum_{i=1}^{9} n_i^{\\circ}\\,${tau}^{J_i^{\\circ}} + \\sum_{i=1}^{43} n_i\\,${pi}^{I_i}\\,(${tau}-0.5)^{J_i}`,
    clause: `${RELEASE}, Eqs. (15) to (17), Tables 10, 11, 13 and 14`,
  },
  5: {
    tex: (pi, tau) =>
      `\\ln ${pi} + \\sum_{i=1}^{6} n_i^{\\circ}\\,${tau}^{J_i^{\\circ}} + \\sum_{i=1}^{6} n_i\\,${pi}^{I_i}\\,${tau}^{J_i}`,
    clause: `${RELEASE}, Eqs. (32) to (34), Tables 37, 38, 40 and 41`,
  },
};

/** Where the release writes the relations; for regions 2 and 5 with the two parts of γ apart. */
const RELATIONS: Record<GibbsRegion, string> = {
  1: 'Table 3',
  2: 'Table 12, in the form of Table 3',
  5: 'Table 39, in the form of Table 3',
};

const EQUATION: Record<GibbsRegion, (P: number, T: number) => Gibbs> = { 1: gibbs1, 2: gibbs2, 5: gibbs5 };

/** One derivative of the sum: its symbol and what it is derived by. */
const derivative = (
  sheet: SheetBuilder,
  key: string,
  value: number,
  names: { tex: string; of: string; clause: string },
) =>
  sheet.step(
    { key, tex: names.tex, meaning: 'derivative of the sum', value, unit: '-', clause: names.clause },
    () => names.of,
  );

/** π, τ, γ and the derivatives of γ, in this order. */
function gibbsTerms(sheet: SheetBuilder, region: GibbsRegion, P: number, T: number): void {
  const g = EQUATION[region](P, T);
  const { tex, clause } = SUMS[region];
  const reducing = REDUCING[region];
  sheet.step(
    { key: 'pi', tex: '\\pi', meaning: 'reduced pressure', value: g.pi, unit: '-', clause },
    (v) => `\\frac{${v('P')}}{${reducing.P / 1e3}}`,
  );
  sheet.step(
    { key: 'tau', tex: '\\tau', meaning: 'inverse reduced temperature', value: g.tau, unit: '-', clause },
    (v) => `\\frac{${reducing.T}}{${v('T')}}`,
  );
  sheet.step(
    { key: 'g', tex: '\\gamma', meaning: 'reduced Gibbs free energy', value: g.g, unit: '-', clause },
    (v) => tex(v('pi'), v('tau')),
  );
  const by = (key: string, value: number, index: string, of: string) =>
    derivative(sheet, key, value, { tex: `\\gamma_{${index}}`, of, clause });
  by('gp', g.gp, '\\pi', '\\partial\\gamma/\\partial\\pi');
  by('gpp', g.gpp, '\\pi\\pi', '\\partial^2\\gamma/\\partial\\pi^2');
  by('gt', g.gt, '\\tau', '\\partial\\gamma/\\partial\\tau');
  by('gtt', g.gtt, '\\tau\\tau', '\\partial^2\\gamma/\\partial\\tau^2');
  by('gpt', g.gpt, '\\pi\\tau', '\\partial^2\\gamma/\\partial\\pi\\,\\partial\\tau');
}

/** A figure of one phase, in SI units of the formulation. */
export type Figures = { rho: number; h: number; s: number; cp: number; cv: number; w: number };

type Line = { key: keyof Figures | 'v'; tex: string; meaning: string; value: number; unit: string };

/** The figures in the units of the sheet, with their symbols. */
function lines(state: Figures): Record<Line['key'], Line> {
  const line = (key: Line['key'], tex: string, meaning: string, value: number, unit: string): Line => ({
    key,
    tex,
    meaning,
    value,
    unit,
  });
  return {
    v: line('v', 'v', 'specific volume', 1 / state.rho, 'm3/kg'),
    rho: line('rho', '\\rho', 'density', state.rho, 'kg/m3'),
    h: line('h', 'h', 'enthalpy', state.h / 1e3, 'kJ/kg'),
    s: line('s', 's', 'entropy', state.s / 1e3, 'kJ/(kg.K)'),
    cp: line('cp', 'c_p', 'heat capacity at constant pressure', state.cp / 1e3, 'kJ/(kg.K)'),
    cv: line('cv', 'c_v', 'heat capacity at constant volume', state.cv / 1e3, 'kJ/(kg.K)'),
    w: line('w', 'w', 'speed of sound', state.w, 'm/s'),
  };
}

/** Regions 1, 2 and 5: the figures from γ at P and T. `state` is what the equation gives, in SI. */
export function gibbsSteps(
  sheet: SheetBuilder,
  region: GibbsRegion,
  P: number,
  T: number,
  state: Figures,
): void {
  gibbsTerms(sheet, region, P, T);
  const clause = `${RELEASE}, ${RELATIONS[region]}`;
  const line = lines(state);
  const mixed = (v: (key: string) => string) => `(${v('gp')} - ${v('tau')} \\cdot {(${v('gpt')})})^2`;
  sheet.step(
    { ...line.v, clause },
    (v) => `${v('pi')} \\cdot ${v('gp')} \\cdot \\frac{${R} \\cdot ${v('T')}}{${v('P')}}`,
  );
  sheet.step(line.rho, (v) => `\\frac{1}{${v('v')}}`);
  sheet.step({ ...line.h, clause }, (v) => `${R} \\cdot ${v('T')} \\cdot ${v('tau')} \\cdot ${v('gt')}`);
  sheet.step({ ...line.s, clause }, (v) => `${R} \\cdot (${v('tau')} \\cdot ${v('gt')} - (${v('g')}))`);
  sheet.step({ ...line.cp, clause }, (v) => `-${R} \\cdot ${v('tau')}^2 \\cdot (${v('gtt')})`);
  sheet.step(
    { ...line.cv, clause },
    (v) =>
      `${R} \\cdot \\left(-${v('tau')}^2 \\cdot (${v('gtt')}) + \\frac{${mixed(v)}}{${v('gpp')}}\\right)`,
  );
  sheet.step(
    { ...line.w, clause },
    (v) =>
      `\\sqrt{\\frac{1000 \\cdot ${R} \\cdot ${v('T')} \\cdot ${v('gp')}^2}{\\frac{${mixed(v)}}{${v('tau')}^2 \\cdot (${v('gtt')})} - (${v('gpp')})}}`,
  );
}

/** Region 3: the density by iteration, then the figures from φ at density and temperature. */
export function helmholtzSteps(sheet: SheetBuilder, T: number, state: Figures): void {
  const clause = `${RELEASE}, Eq. (28), Tables 30 and 32`;
  const f = helmholtz3(state.rho, T);
  const line = lines(state);
  sheet.step(
    {
      ...line.rho,
      meaning: 'density at which Eq. (28) gives the pressure, by iteration',
      clause: `${RELEASE}, Table 31`,
    },
    (v) => `\\rho\\left(p = \\rho\\,R\\,T\\,\\delta\\,\\varphi_\\delta = ${v('P')},\\ T = ${v('T')}\\right)`,
  );
  sheet.step(
    { key: 'delta', tex: '\\delta', meaning: 'reduced density', value: f.delta, unit: '-', clause },
    (v) => `\\frac{${v('rho')}}{${CRITICAL.rho}}`,
  );
  sheet.step(
    { key: 'tau', tex: '\\tau', meaning: 'inverse reduced temperature', value: f.tau, unit: '-', clause },
    (v) => `\\frac{${CRITICAL.T}}{${v('T')}}`,
  );
  sheet.step(
    { key: 'f', tex: '\\varphi', meaning: 'reduced Helmholtz free energy', value: f.f, unit: '-', clause },
    (v) => `n_1 \\ln ${v('delta')} + \\sum_{i=2}^{40} n_i\\,${v('delta')}^{I_i}\\,${v('tau')}^{J_i}`,
  );
  const by = (key: string, value: number, index: string, of: string) =>
    derivative(sheet, key, value, { tex: `\\varphi_{${index}}`, of, clause });
  by('fd', f.fd, '\\delta', '\\partial\\varphi/\\partial\\delta');
  by('fdd', f.fdd, '\\delta\\delta', '\\partial^2\\varphi/\\partial\\delta^2');
  by('ft', f.ft, '\\tau', '\\partial\\varphi/\\partial\\tau');
  by('ftt', f.ftt, '\\tau\\tau', '\\partial^2\\varphi/\\partial\\tau^2');
  by('fdt', f.fdt, '\\delta\\tau', '\\partial^2\\varphi/\\partial\\delta\\,\\partial\\tau');
  helmholtzFigures(sheet, line);
}

function helmholtzFigures(sheet: SheetBuilder, line: Record<Line['key'], Line>): void {
  const clause = `${RELEASE}, Table 31`;
  type V = (key: string) => string;
  const mixed = (v: V) =>
    `(${v('delta')} \\cdot ${v('fd')} - ${v('delta')} \\cdot ${v('tau')} \\cdot (${v('fdt')}))^2`;
  const stiff = (v: V) => `2 \\cdot ${v('delta')} \\cdot ${v('fd')} + ${v('delta')}^2 \\cdot (${v('fdd')})`;
  const thermal = (v: V) => `${v('tau')}^2 \\cdot (${v('ftt')})`;
  sheet.step(line.v, (v) => `\\frac{1}{${v('rho')}}`);
  sheet.step(
    { ...line.h, clause },
    (v) => `${R} \\cdot ${v('T')} \\cdot (${v('tau')} \\cdot ${v('ft')} + ${v('delta')} \\cdot ${v('fd')})`,
  );
  sheet.step({ ...line.s, clause }, (v) => `${R} \\cdot (${v('tau')} \\cdot ${v('ft')} - (${v('f')}))`);
  sheet.step(
    { ...line.cp, clause },
    (v) => `${R} \\cdot \\left(-${thermal(v)} + \\frac{${mixed(v)}}{${stiff(v)}}\\right)`,
  );
  sheet.step({ ...line.cv, clause }, (v) => `-${R} \\cdot ${thermal(v)}`);
  sheet.step(
    { ...line.w, clause },
    (v) =>
      `\\sqrt{1000 \\cdot ${R} \\cdot ${v('T')} \\cdot \\left(${stiff(v)} - \\frac{${mixed(v)}}{${thermal(v)}}\\right)}`,
  );
}
