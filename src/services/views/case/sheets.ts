/* The sheets of a case, changed ones first, each with the state of its check. */
import { agreementOf, changedSheets, type DocumentFacts, unseenDifferences, unseenState } from '@domain/case';
import { type Sheet, type Verdict } from '@domain/evaluate';
import { methodById } from '@engine/catalog';
import { convert, dimensionOf, displayUnit, formatNumber, unitLabel } from '@engine/quantity';
import { keptWith } from '@data/memo';
import { type CaseDocumentFile } from '../../case-file';
import { noteLook, type OpenedCase } from './open';
import { knownSheets, sheetTitle } from './places';
import { sheetHref } from './prose';

export type CheckWord = 'not-begun' | 'unseen' | 'agreed' | 'edited' | 'differs';
export type SheetRow = {
  key: string;
  title: string;
  href: string;
  /** Title of the method, or that it is an external sheet. */
  method: string;
  changed: boolean;
  check?: { state: CheckWord; word?: string };
  /** What it comes to: figure and unit; absent where it has none or is hidden. */
  result?: string;
  unit?: string;
  verdict?: Verdict;
  used?: string;
  refused?: true;
  warnings: number;
  findings: number;
};
export type SheetsOfSystem = {
  document: string;
  tag: string;
  name: string;
  changed: SheetRow[];
  others: SheetRow[];
  /** Changed sheets that are not agreed as they stand. */
  left: number;
};
export type SheetsView = { hidden: boolean; systems: SheetsOfSystem[] };

/** The output that a row shows, by the kind of sheet. */
const RESULTS: Record<string, readonly string[]> = {
  limit: ['relieving_pressure', 'P1', 'MAAP'],
  load: ['relief_load', 'relief_flow', 'volumetric_load'],
  size: ['A_required'],
  rated: ['W_rated', 'rated', 'rated_capacity', 'W', 'Q'],
  inlet: ['inlet_loss', 'loss', 'pressure_loss'],
  outlet: ['total_back_pressure', 'built_up_back_pressure'],
  cold: ['CDTP', 'cdtp'],
  force: ['F', 'reaction_force'],
  noise: ['L30'],
};

/** The title of a sheet's method. */
export function methodTitle(method: string): string {
  if (method.startsWith('external:')) return 'external sheet';
  return methodById(method.split('@')[0] ?? method)?.title ?? method;
}

/** The result of a sheet in the units of its system. */
function resultOf(sheet: Sheet, system: 'SI' | 'US'): { result?: string; unit?: string } {
  const names = RESULTS[sheet.key.split(':')[0] ?? ''] ?? [];
  const found = names.map((name) => sheet.outputs[name]).find((value) => value !== undefined);
  if (found === undefined || typeof found === 'boolean') return {};
  if (typeof found !== 'object') return { result: found };
  const dimension = dimensionOf(found.unit);
  const unit = dimension === undefined ? found.unit : displayUnit(dimension, system);
  return { result: formatNumber(convert(found, unit)), unit: unit === '-' ? '' : unitLabel(unit) };
}

/** How the check of a sheet stands for anyone but a reader from whom it is hidden. */
export function checkOf(
  of: OpenedCase,
  facts: DocumentFacts,
  sheet: Pick<Sheet, 'key'>,
  changed: boolean,
): { state: CheckWord; word?: string } | undefined {
  const agreed = agreementOf(facts, sheet.key, of.facts);
  if (agreed === 'agreed') return { state: 'agreed' };
  if (agreed === 'stale') return { state: 'edited' };
  if (!changed) return undefined;
  const own = unseenState(facts, of.facts);
  const asked = own.items.some((item) => item.scope.startsWith(`sheets/${sheet.key}#`));
  if (asked && !own.revealed) return { state: 'unseen' };
  const apart = own.revealed
    ? unseenDifferences(facts, of.facts, { barometer: of.file.site.barometer }).find(
        (one) =>
          one.item.scope.startsWith(`sheets/${sheet.key}#`) && !one.compared.within && !one.entry.reconciled,
      )
    : undefined;
  if (!apart) return { state: 'not-begun' };
  const { deviation } = apart.compared;
  return {
    state: 'differs',
    ...(deviation === undefined ? {} : { word: `Differs ${formatNumber(Math.abs(deviation) * 100, 1)} %` }),
  };
}

function findingsAt(of: OpenedCase, document: string, key: string): number {
  const place = `${document}:sheets/${key}`;
  return of.file.findings.filter(
    (one) => one.state !== 'closed' && (one.place === place || one.place.startsWith(`${place}#`)),
  ).length;
}

function rowOf(
  of: OpenedCase,
  one: CaseDocumentFile,
  facts: DocumentFacts,
  sheet: Sheet,
  changed: boolean,
): SheetRow {
  const figures = one.after?.evaluation.figures ?? {};
  const use = figures[`sheets/${sheet.key}#use`];
  const verdict = figures[`sheets/${sheet.key}#verdict`];
  const check = checkOf(of, facts, sheet, changed);
  return {
    key: sheet.key,
    title: sheetTitle(one, sheet.key),
    href: sheetHref(of, one, sheet.key),
    method: methodTitle(sheet.method),
    changed,
    ...(check ? { check } : {}),
    ...resultOf(sheet, one.after?.body.units ?? 'SI'),
    ...(typeof verdict === 'string' ? { verdict: verdict as Verdict } : {}),
    ...(typeof use === 'object' ? { used: formatNumber(use.value * 100, 1) } : {}),
    ...(sheet.refused ? { refused: true } : {}),
    warnings: sheet.warnings.length,
    findings: findingsAt(of, one.document.id, sheet.key),
  };
}

/** While hidden: which sheets there are, and which of them the checker still works unseen. */
function hiddenRow(of: OpenedCase, one: CaseDocumentFile, facts: DocumentFacts, key: string): SheetRow {
  const asked = unseenState(facts, of.facts).items.some((item) => item.scope.startsWith(`sheets/${key}#`));
  return {
    key,
    title: sheetTitle(one, key),
    href: sheetHref(of, one, key),
    method: '',
    changed: false,
    check: { state: asked ? 'unseen' : 'not-begun' },
    warnings: 0,
    findings: findingsAt(of, one.document.id, key),
  };
}

function systemOf(of: OpenedCase, one: CaseDocumentFile): SheetsOfSystem {
  const { document } = one;
  const head = { document: document.id, tag: document.tag, name: document.name };
  const facts = of.facts.documents.find((each) => each.document === document.id);
  const after = one.after;
  if (!facts || !after) return { ...head, changed: [], others: [], left: 0 };
  if (of.hidden) {
    const others = knownSheets(of, one).map((key) => hiddenRow(of, one, facts, key));
    return { ...head, changed: [], others, left: 0 };
  }
  const moved = new Set(changedSheets(facts, of.file.row.class === 'revalidation').map((sheet) => sheet.key));
  const rows = Object.values(after.evaluation.sheets).map((sheet) =>
    rowOf(of, one, facts, sheet, moved.has(sheet.key)),
  );
  const changed = rows.filter((row) => row.changed);
  return {
    ...head,
    changed,
    others: rows.filter((row) => !row.changed),
    left: changed.filter((row) => row.check?.state !== 'agreed').length,
  };
}

/** The sheets of every system of the case. */
export async function sheetsView(of: OpenedCase): Promise<SheetsView> {
  await noteLook(of, 'sheets');
  return keptWith(of, 'sheets', () =>
    Promise.resolve({ hidden: of.hidden, systems: of.file.documents.map((one) => systemOf(of, one)) }),
  );
}
