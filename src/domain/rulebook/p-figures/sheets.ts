/* Rules on calculations and on figures that were taken from elsewhere: unsound, from memory, stale. */
import { type FigureRef, getAt, isFigure, quantityOf, type Scenario } from '@domain/basis';
import { externalInputsHash, type Sheet } from '@domain/evaluate';
import { methodById } from '@engine/catalog';
import { type Q, toSI } from '@engine/quantity';
import { gaugePa, gt, onScenario } from '../reading';
import { type Hit, rule, type RuleContext } from '../types';
import { everyFigure, labelOf, ownerOf } from './every-figure';

const GRAVITY = 9.80665;

function onSheet(sheet: Sheet, values: Hit['values'], extra: Partial<Hit> = {}): Hit {
  return {
    subject: `sheets/${sheet.key}`,
    tag: sheet.key,
    values: { sheet: `Sheet ${sheet.key}`, ...values },
    ...extra,
  };
}

export const calculationUnsound = rule(
  {
    code: 'calculation-unsound',
    subject: 'any',
    statement: '{sheet} did not converge or left the range of {method} ({range}).',
    condition:
      'A correlation is used outside its range (the nearest limit is shown), or an iteration failed or stopped short.',
    severity: 'justify',
    gate: 'check',
    source: '[P]',
  },
  (ctx) =>
    Object.values(ctx.evaluation.sheets).flatMap((sheet): Hit[] => {
      if (sheet.refused?.code === 'NOT_CONVERGED') {
        return [
          onSheet(
            sheet,
            { method: sheet.method, range: 'no result' },
            { severity: 'stop', more: sheet.refused.text },
          ),
        ];
      }
      const left = sheet.warnings.find((warning) => warning.range !== undefined);
      return left
        ? [onSheet(sheet, { method: sheet.method, range: left.range ?? '' }, { more: left.text })]
        : [];
    }),
);

export const methodFromMemory = rule(
  {
    code: 'method-from-memory',
    subject: 'any',
    statement: '{constant} in {sheet} was set down from memory and not checked against {standard}.',
    condition:
      'A step of the sheet rests on a clause set down from memory, and this site has not confirmed it.',
    severity: 'note',
    gate: 'approval',
    source: 'reference “from memory” [P]',
  },
  (ctx) => {
    const confirmed = new Set(ctx.rules.confirmed.map((item) => item.constant));
    const byMethod = new Map<string, Sheet['steps']>();
    for (const sheet of Object.values(ctx.evaluation.sheets)) {
      const steps = sheet.steps.filter(
        (step) =>
          step.memory === true &&
          !confirmed.has(sheet.method) &&
          !confirmed.has(`${sheet.method}/${step.symbol}`),
      );
      if (steps.length > 0 && !byMethod.has(sheet.method)) byMethod.set(sheet.method, steps);
    }
    return [...byMethod].map(([method, steps]): Hit => {
      const constant = [...new Set(steps.map((step) => step.meaning))].slice(0, 3).join(', ');
      const standard = steps.find((step) => step.clause !== undefined)?.clause ?? 'the standard';
      const values = {
        constant: constant.charAt(0).toUpperCase() + constant.slice(1),
        sheet: methodById(method)?.title ?? method,
        standard,
      };
      return { subject: `methods/${method}`, tag: values.sheet, values };
    });
  },
);

/** What stands now where a figure was taken: in this document, or as the service hands it over under `doc:path`. */
function presentOf(ctx: RuleContext, ref: FigureRef): Q | undefined {
  if (ref.doc !== ctx.doc.id && ref.doc !== 'this') return ctx.imports.loads[`${ref.doc}:${ref.path}`];
  const result = ctx.evaluation.figures[ref.path];
  if (typeof result === 'object') return result;
  const found = getAt(ctx.doc, ref.path);
  return isFigure(found) ? quantityOf(found) : undefined;
}

/** Beyond 0.1 %: what stands now against what was taken. */
function movedFrom(ctx: RuleContext, ref: FigureRef): Q | undefined {
  const present = presentOf(ctx, ref);
  if (!present) return undefined;
  const [now, then] = [gaugePa(ctx, present), gaugePa(ctx, ref.taken)];
  return Math.abs(now - then) > Math.abs(then) * 0.001 ? present : undefined;
}

export const copiedFigureStale = rule(
  {
    code: 'copied-figure-stale',
    subject: 'any',
    statement: '{figure} was taken from {document} and has moved there from {old} to {new}.',
    condition:
      'The figure was taken from another document, and differs there from the value taken by more than 0.1 %.',
    severity: 'stop',
    gate: 'scenarios',
    source: '[P]',
    inheritable: false,
  },
  (ctx) =>
    everyFigure(ctx.doc).flatMap((entered): Hit[] => {
      const ref = entered.figure.origin?.kind === 'figure' ? entered.figure.origin.figure : undefined;
      const now = ref && (ref.via ?? 'same') === 'same' ? movedFrom(ctx, ref) : undefined;
      if (!ref || !now) return [];
      const owner = ownerOf(ctx.doc, entered.path);
      const document = entered.figure.origin?.ref ?? ref.doc;
      const values = { figure: labelOf(ctx.doc, entered.path), document, old: ref.taken, new: now };
      return [{ subject: entered.path, tag: owner, values, field: entered.path }];
    }),
);

/** The bound of a below-limit disposition with what is added to it, Pa gauge, and its limit. */
function boundPa(ctx: RuleContext, scenario: Scenario): { pa: number; limit: number; q: Q } | undefined {
  const { bound } = scenario;
  if (!bound) return undefined;
  const entered =
    'use' in bound.figure
      ? presentOf(ctx, { doc: 'this', path: bound.figure.use, taken: { value: 0, unit: '-' } })
      : undefined;
  const q = entered ?? ('value' in bound.figure ? quantityOf(bound.figure) : undefined);
  const side = ctx.lookup.equipment
    .get(bound.limit.equipment)
    ?.sides.find((one) => one.id === bound.limit.side);
  const external = typeof side?.external === 'object' ? quantityOf(side.external) : undefined;
  const limit = bound.limit.of === 'mawp' ? quantityOf(side?.ratings[0]?.mawp) : external;
  if (!q || !limit) return undefined;
  const head = quantityOf(bound.head);
  return { pa: gaugePa(ctx, q) + (head ? toSI(head) * 1000 * GRAVITY : 0), limit: toSI(limit), q };
}

export const belowLimitBoundStale = rule(
  {
    code: 'below-limit-bound-stale',
    subject: 'scenario',
    statement: '{scenario} stays below the limit only while {figure} is {old}; it is now {new}.',
    condition: 'The live figure on which the disposition rests has moved, or has passed the limit.',
    severity: 'stop',
    gate: 'scenarios',
    source: '[P]',
    inheritable: false,
  },
  (ctx) =>
    ctx.doc.scenarios
      .filter((scenario) => scenario.disposition === 'below-limit')
      .flatMap((scenario): Hit[] => {
        const live = scenario.bound?.live;
        const now = live && movedFrom(ctx, live);
        if (live && now)
          return [
            onScenario(
              scenario,
              { figure: live.path, old: live.taken, new: now },
              { field: `scenarios/${scenario.id}/bound` },
            ),
          ];
        const bound = boundPa(ctx, scenario);
        if (!bound || !gt(bound.pa, bound.limit)) return [];
        const values = { figure: 'the bound', old: 'below the limit', new: bound.q };
        return [
          onScenario(scenario, values, {
            field: `scenarios/${scenario.id}/bound`,
            more: 'It passes the limit.',
          }),
        ];
      }),
);

export const externalSheetStale = rule(
  {
    code: 'external-sheet-stale',
    subject: 'scenario',
    statement: 'The external sheet {sheet} was made for other inputs than stand here now.',
    condition: 'Its inputs here are no longer those that it was made of.',
    severity: 'stop',
    gate: 'scenarios',
    source: '[P]',
  },
  (ctx) =>
    ctx.doc.externalSheets
      .filter((sheet) => sheet.madeOf !== undefined && sheet.madeOf !== externalInputsHash(ctx.doc, sheet))
      .map((sheet): Hit => ({
        subject: `externalSheets/${sheet.id}`,
        tag: sheet.title,
        values: { sheet: `“${sheet.title}”` },
      })),
);
