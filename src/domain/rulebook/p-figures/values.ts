/* Rules on entered values: impossible, unusual, changed by what looks like a unit mix-up, changed without an origin. */
import { quantityOf, type Path } from '@domain/basis';
import { effectiveArea } from '@domain/evaluate';
import { checkRange } from '@domain/rules';
import { ORIFICE_LETTERS } from '@engine/methods/i-letters';
import { formatQuantity, type Q, sameValue, toSI } from '@engine/quantity';
import { gt, told } from '../reading';
import { type Hit, rule, type RuleContext } from '../types';
import { type Entered, everyFigure, labelOf, originOf, ownerOf } from './every-figure';

function onFigure(ctx: RuleContext, entered: Entered, values: Hit['values'], extra: Partial<Hit> = {}): Hit {
  const named = { quantity: labelOf(ctx.doc, entered.path), ...values };
  return {
    subject: entered.path,
    tag: ownerOf(ctx.doc, entered.path),
    values: named,
    field: entered.path,
    ...extra,
  };
}

function bare(entered: Entered): Q {
  return { value: entered.figure.value, unit: entered.figure.unit };
}

type Fence = 'impossible' | 'implausible';

/** Figures outside their range, with what the range says. */
function outside(ctx: RuleContext, fence: Fence): { entered: Entered; says: string }[] {
  const site = { barometer: ctx.rules.barometer, ranges: ctx.rules.ranges };
  return everyFigure(ctx.doc).flatMap((entered) => {
    if (entered.key === undefined) return [];
    const check = checkRange(entered.key, bare(entered), site);
    return check.verdict === fence ? [{ entered, says: check.sentence ?? '' }] : [];
  });
}

/** "Set pressure 2 barg is impossible: it lies between…" → "It lies between…". */
function tail(sentence: string): string {
  const after = sentence.split(': ')[1] ?? sentence;
  return after.charAt(0).toUpperCase() + after.slice(1);
}

type Clash = { path: Path; v: Q; more: string };

/** Figures that contradict each other on one piece of equipment or relief point. */
function clashes(ctx: RuleContext): Clash[] {
  return [...sideClashes(ctx), ...pointClashes(ctx)];
}

function sideClashes(ctx: RuleContext): Clash[] {
  return ctx.doc.equipment.flatMap((equipment) =>
    equipment.sides.flatMap((side): Clash[] => {
      const at = `equipment/${equipment.id}/sides/${side.id}`;
      const hottest = side.ratings
        .flatMap((pair) => quantityOf(pair.at) ?? [])
        .toSorted((a, b) => toSI(b) - toSI(a))[0];
      const mawp = side.ratings
        .flatMap((pair) => quantityOf(pair.mawp) ?? [])
        .toSorted((a, b) => toSI(a) - toSI(b))[0];
      const [mdmt, test] = [quantityOf(side.mdmt), quantityOf(side.test)];
      const found: Clash[] = [];
      if (mdmt && hottest && toSI(mdmt) >= toSI(hottest))
        found.push({ path: `${at}/mdmt`, v: mdmt, more: 'It lies below the design temperature.' });
      if (test && mawp && gt(toSI(mawp), toSI(test)))
        found.push({ path: `${at}/test`, v: test, more: 'It is at least the MAWP.' });
      return found;
    }),
  );
}

function pointClashes(ctx: RuleContext): Clash[] {
  return ctx.doc.reliefPoints.flatMap((point): Clash[] => {
    const at = `reliefPoints/${point.id}`;
    const [least, most] = [quantityOf(point.superimposed?.min), quantityOf(point.superimposed?.max)];
    const found: Clash[] = [];
    if (least && most && gt(toSI(least), toSI(most))) {
      found.push({ path: `${at}/superimposed/min`, v: least, more: 'The least is above the greatest.' });
    }
    const row = ORIFICE_LETTERS.find((letter) => letter.letter === point.orifice.letter);
    const area = quantityOf(point.orifice.effective);
    const m2 = effectiveArea(point);
    if (row && area && m2 !== undefined && Math.abs(m2 / (row.mm2 * 1e-6) - 1) > 0.005) {
      found.push({
        path: `${at}/orifice/effective`,
        v: area,
        more: `Letter ${row.letter} has ${String(row.mm2)} mm².`,
      });
    }
    return found;
  });
}

export const valueImpossible = rule(
  {
    code: 'value-impossible',
    subject: 'any',
    statement: '{quantity} = {v} cannot be.',
    condition:
      'The figure is outside the possible range, is no number, is negative where it cannot be, or is blank where it is needed.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'the ranges of inputs [P]',
    inheritable: false,
  },
  (ctx) => [
    ...outside(ctx, 'impossible').map(({ entered, says }) =>
      onFigure(ctx, entered, { v: bare(entered) }, { more: tail(says) }),
    ),
    ...clashes(ctx).map(({ path, v, more }) => {
      return onFigure(ctx, { path, figure: v }, { v }, { more });
    }),
  ],
);

/** A figure with an origin of its own, other than a judgement, counts as confirmed. */
export const valueImplausible = rule(
  {
    code: 'value-implausible',
    subject: 'any',
    statement: '{quantity} = {v} is unusual: confirm or correct.',
    condition:
      'The figure is outside the plausible range and inside the possible one. Confirm it, with its origin.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'the ranges of inputs [P]',
  },
  (ctx) =>
    outside(ctx, 'implausible')
      .filter(
        ({ entered }) => entered.figure.origin === undefined || entered.figure.origin.kind === 'judgement',
      )
      .map(({ entered, says }) => onFigure(ctx, entered, { v: bare(entered) }, { more: tail(says) })),
);

type Moved = { entered: Entered; old: Entered | undefined };

/** Figures that differ from the basis in force, or were not there. */
function movedFigures(ctx: RuleContext): Moved[] {
  if (!ctx.prior) return [];
  const before = new Map(everyFigure(ctx.prior.doc).map((entered) => [entered.path, entered]));
  return everyFigure(ctx.doc).flatMap((entered) => {
    const old = before.get(entered.path);
    const same = old?.figure.value === entered.figure.value && old.figure.unit === entered.figure.unit;
    return same ? [] : [{ entered, old }];
  });
}

const SLIPS: [number, string, string][] = [
  [6.894757, 'psi', 'kPa'],
  [14.50377, 'bar', 'psi'],
  [98.0665, 'kg/cm²', 'kPa'],
  [1.019716, 'bar', 'kg/cm²'],
  [1.8, 'K', '°F'],
  [25.4, 'mm', 'in'],
  [645.16, 'mm²', 'in²'],
  [2.204623, 'kg', 'lb'],
  [3.785412, 'US gal', 'L'],
  [4.402868, 'm³/h', 'US gpm'],
  [0.865, 'Kv', 'Cv'],
  [3.6, 'kg/s', 't/h'],
  [16.01846, 'lb/ft³', 'kg/m³'],
  [1000, 'thousands', 'ones'],
  [10, 'bar', '100 kPa'],
];
const SLIP_BAND = 0.007;

function slipOf(ratio: number): { a: string; b: string } | undefined {
  for (const [factor, a, b] of SLIPS) {
    if (Math.abs(ratio / factor - 1) <= SLIP_BAND || Math.abs(ratio * factor - 1) <= SLIP_BAND)
      return { a, b };
  }
  return undefined;
}

export const unitSlipSuspected = rule(
  {
    code: 'unit-slip-suspected',
    subject: 'any',
    statement: '{quantity} changed by a factor {f}, close to a unit mix-up ({a} ↔ {b}).',
    condition:
      'A figure differs from its old value, its document or plate, or from the unseen check by a factor within 0.7 % of a common conversion (psi to kPa or bar, inch to mm, pound to kg, gallon to litre, …), or by the barometer or the zero of a temperature scale, or by two digits in each other’s place.',
    severity: 'justify',
    gate: 'check',
    source: '[P]; published-examples TANK-06 (swapped digits)',
    inheritable: false,
  },
  (ctx) =>
    movedFigures(ctx).flatMap(({ entered, old }): Hit[] => {
      if (!old || entered.figure.value === 0 || old.figure.value === 0) return [];
      const [now, then] = [toSI(entered.figure), toSI(old.figure)];
      const slip = then === 0 ? undefined : slipOf(now / then);
      if (!slip) return [];
      return [
        onFigure(ctx, entered, { f: told(now / then, '-'), ...slip, old: bare(old), now: bare(entered) }),
      ];
    }),
);

function ownerOriginMoved(ctx: RuleContext, path: Path): boolean {
  const now = originOf(ctx.doc, path);
  const then = ctx.prior && originOf(ctx.prior.doc, path);
  return now !== undefined && (now.own || JSON.stringify(now.origin) !== JSON.stringify(then?.origin));
}

export const originMissing = rule(
  {
    code: 'origin-missing',
    subject: 'any',
    statement: '{quantity} was changed and does not say where it comes from.',
    condition:
      'A changed figure has no kind of origin (drawing, data sheet, simulation with file and method, plate, judgement) or no reference.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice [P]',
    inheritable: false,
  },
  (ctx) =>
    movedFigures(ctx)
      .filter(({ entered, old }) => !old || !sameValue(bare(entered), bare(old)))
      .filter(({ entered }) => !ownerOriginMoved(ctx, entered.path))
      .map(({ entered, old }) =>
        onFigure(ctx, entered, {
          now: formatQuantity(bare(entered)),
          old: old ? formatQuantity(bare(old)) : 'not there',
        }),
      ),
);
