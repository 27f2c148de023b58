/* The viscosity procedure on a sheet: Reynolds number at the selected letter, Kv, and the next letter where needed. */
import { type SheetBuilder } from '../../sheet';
import { SYSTEM_UNITS, type System } from '../common/system';
import {
  KV_FORMULAS,
  type KvFormula,
  LIQUID_FORMS,
  type LiquidFlow,
  liquidReynolds,
  type Viscosity,
  type ViscousResult,
  viscousArea,
} from './flow';

const CLAUSE = 'API 520-1, sizing for liquid relief, viscosity';

/** The viscosity as given in cP or in Saybolt seconds; undefined when none was given. */
export function readViscosity(sheet: SheetBuilder): Viscosity | undefined {
  if (sheet.has('mu')) return { mu: sheet.number('mu', 'cP', { above: 0 }, '\\mu') };
  if (sheet.has('viscosity')) return { sus: sheet.number('viscosity', 'SUS', { above: 0 }, 'U') };
  return undefined;
}

const KV_TEX: Record<KvFormula, (Re: string) => string> = {
  '10E': (Re) => `\\left(1 + \\frac{170}{${Re}}\\right)^{-0.5}`,
  '7E-9E': (Re) => `\\left(0.9935 + \\frac{2.878}{${Re}^{0.5}} + \\frac{342.75}{${Re}^{1.5}}\\right)^{-1}`,
};

/** The factor at the pass's Reynolds number and the area with it. */
function correctedSteps(sheet: SheetBuilder, pass: ViscousResult, formula: KvFormula, system: System): void {
  sheet.step(
    {
      key: 'Kv',
      tex: 'K_v',
      meaning: `viscosity factor, ${formula} formula`,
      value: pass.Kv,
      unit: '-',
      clause: `${CLAUSE}, Kv`,
    },
    (v) => KV_TEX[formula](v('Re')),
  );
  sheet.step(
    {
      key: 'A',
      meaning: 'required effective area with viscosity',
      value: pass.area,
      unit: SYSTEM_UNITS[system].A,
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('A_R')}}{${v('Kv')}}`,
  );
}

/** One pass: Reynolds number, factor, area. */
function passSteps(
  sheet: SheetBuilder,
  pass: ViscousResult,
  formula: KvFormula,
  saybolt: boolean,
  system: System,
): void {
  const form = LIQUID_FORMS[system];
  sheet.keep('A_sel', pass.selected, 'A_{sel}');
  const name = pass.letter === undefined ? 'area' : `letter ${pass.letter}`;
  const susTex = (v: (key: string) => string) =>
    `\\frac{${form.sus} \\cdot ${v('Q')}}{${v('viscosity')} \\sqrt{${v('A_sel')}}}`;
  const cPTex = (v: (key: string) => string) =>
    `\\frac{${v('Q')} \\cdot ${form.cP} \\cdot ${v('G')}}{${v('mu')} \\sqrt{${v('A_sel')}}}`;
  sheet.step(
    {
      key: 'Re',
      meaning: `Reynolds number at the selected ${name}`,
      value: pass.Re,
      unit: '-',
      clause: CLAUSE,
    },
    saybolt ? susTex : cPTex,
  );
  correctedSteps(sheet, pass, formula, system);
}

/** Works the procedure by one formula; with `shown` every pass becomes steps of the sheet. */
function viscosityPasses(
  sheet: SheetBuilder,
  bare: number,
  flow: LiquidFlow,
  viscosity: Viscosity,
  formula: KvFormula,
  system: System,
  shown: boolean,
): { Re: number; Kv: number; area: number } {
  const Re = (area: number) => liquidReynolds(flow.Q, flow.G, viscosity, area, system);
  const { passes, converged } = viscousArea(bare, Re, formula, system);
  if (!converged)
    sheet.warn('NOT_CONVERGED', 'The viscosity iteration above letter T did not settle in 100 passes.');
  for (const pass of shown ? passes : []) {
    passSteps(sheet, pass, formula, 'sus' in viscosity, system);
  }
  const last = passes.at(-1);
  if (!last) sheet.refuse('NO_RESULT', 'mu', 'The viscosity procedure found no area.');
  if (formula === '10E' && shown && last.Re < 80)
    sheet.warn(
      'RE_BELOW_RANGE',
      `Re = ${last.Re.toFixed(1)} is below 80, where the 10th edition formula for Kv ends.`,
      'Re above 80',
    );
  return last;
}

/** The formula asked for, else the one of the edition, else the 10th edition's. */
export function formulaFor(sheet: SheetBuilder, edition: string | undefined): KvFormula {
  const seventh = edition !== undefined && /[789]th/.test(edition) && !edition.includes('10th');
  return sheet.word('Kv_formula', KV_FORMULAS, seventh ? '7E-9E' : '10E');
}

/** The procedure by the formula used, shown, and by the other one, for comparison; gives the required area. */
export function viscosityOutputs(
  sheet: SheetBuilder,
  bare: number,
  flow: LiquidFlow,
  viscosity: Viscosity,
  formula: KvFormula,
  system: System,
): number {
  const u = SYSTEM_UNITS[system];
  const other: KvFormula = formula === '10E' ? '7E-9E' : '10E';
  const chosen = viscosityPasses(sheet, bare, flow, viscosity, formula, system, true);
  const compared = viscosityPasses(sheet, bare, flow, viscosity, other, system, false);
  const [tenth, seventh] = formula === '10E' ? [chosen, compared] : [compared, chosen];
  sheet.output('Re', chosen.Re);
  sheet.output('Kv', chosen.Kv);
  sheet.output('Kv_7th_to_9th_ed', seventh.Kv);
  sheet.output('A_required_7th_to_9th_ed', seventh.area, u.A);
  sheet.output('Kv_10th_ed', tenth.Kv);
  sheet.output('A_required_10th_ed', tenth.area, u.A);
  return chosen.area;
}
