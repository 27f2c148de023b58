/* Calculation sheets of a system: the list, and one sheet that can be worked again by hand. */
import { type Basis, describePath, getAt, isFields, type Origin } from '@domain/basis';
import { type Sheet, type Verdict } from '@domain/evaluate';
import { maskEvaluation } from '@domain/hidden';
import { scenarioLabel, SHEET_KINDS, sheetLabel } from '@domain/projections';
import { methodById } from '@engine/catalog';
import { fail, ok, type Result } from '@domain/result';
import { type SheetWarning, type Step } from '@engine/sheet';
import { inline, originWords, shownValue } from '../shown';
import { type OpenedSystem, type Seen } from './open';
import { numbered, sheetHref } from './scenario-lines';

export type SheetLine = {
  key: string;
  href: string;
  name: string;
  method: string;
  result: string;
  verdict?: Verdict;
  note: string;
  hidden: boolean;
};
export type SheetGroup = { id: string; name: string; lines: SheetLine[] };

/** The output by which each kind of sheet is known. */
const LEAD: Record<string, readonly string[]> = {
  limit: ['relieving_pressure', 'MAAP'],
  load: ['relief_load'],
  size: ['A_required'],
  rated: ['W_rated', 'rated', 'W'],
  inlet: ['inlet_loss', 'loss'],
  outlet: ['total_back_pressure', 'P2'],
  force: ['reaction_force'],
  noise: ['L30'],
  cold: ['CDTP', 'reseat_pressure'],
};

const kindOfKey = (key: string) => key.slice(0, key.indexOf(':'));

function methodWords(method: string): string {
  const found = methodById(method);
  if (found) return found.title;
  return method.startsWith('external') ? 'external sheet' : method.startsWith('given') ? 'stated' : method;
}

function leadOf(sheet: Sheet): string {
  const outputs = Object.entries(sheet.outputs);
  const lead = (LEAD[kindOfKey(sheet.key)] ?? []).find((name) => sheet.outputs[name] !== undefined);
  const value = lead === undefined ? outputs[0]?.[1] : sheet.outputs[lead];
  return value === undefined ? '–' : inline(shownValue(value));
}

function verdictOf(seen: Seen, key: string): Verdict | undefined {
  const found = seen.evaluation?.figures[`sheets/${key}#verdict`];
  return typeof found === 'string' ? (found as Verdict) : undefined;
}

function lineOf(of: OpenedSystem, seen: Seen, sheet: Sheet): SheetLine {
  const verdict = verdictOf(seen, sheet.key);
  return {
    key: sheet.key,
    href: sheetHref(of, sheet.key),
    name: SHEET_KINDS[kindOfKey(sheet.key)] ?? sheet.key,
    method: methodWords(sheet.method),
    result: sheet.refused ? '–' : leadOf(sheet),
    note: sheet.refused?.text ?? sheet.warnings.map((one) => one.text).join(' '),
    hidden: false,
    ...(verdict ? { verdict } : {}),
  };
}

function hiddenLine(of: OpenedSystem, key: string): SheetLine {
  const name = SHEET_KINDS[kindOfKey(key)] ?? key;
  return { key, href: sheetHref(of, key), name, method: '', result: '', note: '', hidden: true };
}

function groupsOf(doc: Basis, lines: readonly SheetLine[]): SheetGroup[] {
  const of = (id: string) =>
    lines.filter((line) => line.key.slice(line.key.indexOf(':') + 1).split('/')[0] === id);
  const scenarios = numbered(doc).map(({ scenario }) => ({
    id: scenario.id,
    name: scenarioLabel(doc, scenario),
    lines: of(scenario.id),
  }));
  const points = doc.reliefPoints.map((point) => ({ id: point.id, name: point.tag, lines: of(point.id) }));
  return [...scenarios, ...points].filter((group) => group.lines.length > 0);
}

/** The calculation sheets of an opened system, by scenario and by relief point. */
export function sheetGroups(of: OpenedSystem, seen: Seen, keys: readonly string[]): SheetGroup[] {
  const { evaluation } = seen;
  const lines = evaluation
    ? Object.values(evaluation.sheets).map((sheet) => lineOf(of, seen, sheet))
    : keys.map((key) => hiddenLine(of, key));
  return groupsOf(seen.body, lines);
}

/** The keys that are told of a hidden document: those that anyone can read off its scenarios. */
export function hiddenKeys(doc: Basis): string[] {
  const keys = doc.scenarios
    .filter((scenario) => scenario.disposition === 'credible')
    .flatMap((scenario) =>
      scenario.answers.flatMap(({ id }) =>
        ['limit', 'load', 'size'].map((kind) => `${kind}:${scenario.id}/${id}`),
      ),
    );
  const sheets = Object.fromEntries(keys.map((key) => [key, {}]));
  return maskEvaluation({ sheets } as unknown as Parameters<typeof maskEvaluation>[0]).sheets.map(
    (one) => one.key,
  );
}

export type SheetInputView = {
  meaning: string;
  figure: string;
  unit?: string;
  origin?: string;
  href?: string;
  set?: boolean;
};
export type SheetView = {
  key: string;
  name: string;
  method: string;
  methodHref?: string;
  edition?: string;
  hidden: boolean;
  inputs: SheetInputView[];
  steps: Step[];
  outputs: { meaning: string; figure: string; unit?: string }[];
  warnings: SheetWarning[];
  refused?: { code: string; text: string; field: string };
  verdict?: { verdict: Verdict; words: string; used?: number };
  hash: string;
};

function originAt(doc: Basis, path: string): string | undefined {
  const found = getAt(doc, path);
  const own = isFields(found) ? (found['origin'] as Origin | undefined) : undefined;
  const [list, id] = path.split('/');
  const owner = getAt(doc, `${list ?? ''}/${id ?? ''}`);
  return originWords(own ?? (isFields(owner) ? (owner['origin'] as Origin | undefined) : undefined));
}

function fromWords(
  of: OpenedSystem,
  doc: Basis,
  path: string | undefined,
): { origin?: string; href?: string } {
  if (path === undefined) return {};
  if (path.startsWith('sheets/')) {
    const key = path.slice('sheets/'.length).split('#')[0] ?? '';
    return { origin: `from the sheet “${sheetLabel(doc, key)}”`, href: sheetHref(of, key) };
  }
  if (path.startsWith('site/')) return { origin: 'of the site' };
  const origin = originAt(doc, path);
  const label = describePath(doc, path).label;
  return { origin: origin === undefined ? label : `${label}; ${origin}` };
}

function inputsOf(of: OpenedSystem, doc: Basis, sheet: Sheet): SheetInputView[] {
  const method = methodById(sheet.method);
  return Object.entries(sheet.inputs).map(([name, value]) => {
    const shown = shownValue(value);
    return {
      meaning: method?.inputs.find((one) => one.name === name)?.meaning ?? name.replaceAll('_', ' '),
      figure: shown.text,
      ...(shown.unit === undefined ? {} : { unit: shown.unit }),
      ...fromWords(of, doc, sheet.from[name]),
      ...(name === 'set_pressure' ? { set: true } : {}),
    };
  });
}

function outputsOf(sheet: Sheet): SheetView['outputs'] {
  const method = methodById(sheet.method);
  return Object.entries(sheet.outputs).map(([name, value]) => {
    const shown = shownValue(value);
    const meaning = method?.outputs.find((one) => one.name === name)?.meaning ?? name.replaceAll('_', ' ');
    return { meaning, figure: shown.text, ...(shown.unit === undefined ? {} : { unit: shown.unit }) };
  });
}

function conclusionOf(seen: Seen, key: string): SheetView['verdict'] {
  const verdict = verdictOf(seen, key);
  if (!verdict) return undefined;
  const use = seen.evaluation?.figures[`sheets/${key}#use`];
  const words = verdict === 'not-sized' ? 'This sheet has no verdict' : 'Required against installed area';
  return { verdict, words, ...(typeof use === 'object' ? { used: use.value * 100 } : {}) };
}

/** One calculation sheet of an opened system. UNKNOWN where the revision has no such sheet. */
export function sheetView(of: OpenedSystem, seen: Seen, key: string): Result<SheetView> {
  const missing = fail(
    'UNKNOWN',
    `${of.document.tag} has no calculation sheet ${key.slice(0, 100)} in this revision.`,
  );
  const nothing = { inputs: [], steps: [], outputs: [], warnings: [], hash: '' };
  if (!seen.evaluation) {
    if (!hiddenKeys(seen.body).includes(key)) return missing;
    return ok({ key, name: sheetLabel(seen.body, key), method: '', hidden: true, ...nothing });
  }
  const sheet = seen.evaluation.sheets[key];
  if (!sheet) return missing;
  const method = methodById(sheet.method);
  const verdict = conclusionOf(seen, key);
  return ok({
    key,
    name: sheetLabel(seen.body, key),
    method: `${methodWords(sheet.method)} (${sheet.method})`,
    ...(method ? { methodHref: `/s/${of.actor.site.slug}/methods/${method.id}` } : {}),
    ...(sheet.edition === undefined ? {} : { edition: sheet.edition }),
    hidden: false,
    inputs: inputsOf(of, seen.body, sheet),
    steps: sheet.steps,
    outputs: outputsOf(sheet),
    warnings: sheet.warnings,
    hash: sheet.hash,
    ...(sheet.refused ? { refused: sheet.refused } : {}),
    ...(verdict ? { verdict } : {}),
  });
}
