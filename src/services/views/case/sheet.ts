/* One calculation sheet of a case, whole: inputs with where they come from, steps, result, its check and the findings at it. */
import { describePath, getAt, type Origin } from '@domain/basis';
import { changedSheets, type DocumentFacts, type FindingWeight } from '@domain/case';
import { type Sheet, type Verdict } from '@domain/evaluate';
import { fail, ok, type Result } from '@domain/result';
import { methodById } from '@engine/catalog';
import { type Refusal, type SheetWarning, type Step } from '@engine/sheet';
import { type CaseDocumentFile } from '../../case-file';
import { checkerFacts } from '../../check/unseen';
import { originWords, shownValue } from '../shown';
import { type May, mayHere, nameOf } from './acts';
import { noteLook, type OpenedCase } from './open';
import { knownSheets, placeOf, sheetTitle } from './places';
import { baseOf, sheetHref } from './prose';
import { checkOf, type CheckWord, methodTitle } from './sheets';
import { instantWords, shortHash } from './when';

export type SheetInput = {
  symbol?: string;
  meaning: string;
  figure: string;
  unit?: string;
  origin?: string;
  href?: string;
  set?: boolean;
};
export type SheetPage = {
  key: string;
  title: string;
  document: string;
  tag: string;
  /** Path of the sheet as a finding names it. */
  place: string;
  before?: string;
  next?: string;
  /** Absent while the reader's view is hidden. */
  shown?: {
    method: string;
    edition?: string;
    source?: string;
    validity?: string;
    hash: string;
    shortHash: string;
    changed: boolean;
    check?: { state: CheckWord; word?: string };
    agreed: { by: string; at: string; now: boolean } | null;
    inputs: SheetInput[];
    steps: Step[];
    warnings: SheetWarning[];
    refused?: Refusal & { href: string };
    verdict?: { verdict: Verdict; words: string; used?: number };
    findings: {
      number: number;
      weight: FindingWeight;
      closed: boolean;
      step: number;
      href: string;
      label: string;
    }[];
  };
  agree: May;
  raise: May;
};

function originAt(one: CaseDocumentFile, path: string): string | undefined {
  const value = one.after && getAt(one.after.body, path);
  if (typeof value !== 'object' || value === null || !('origin' in value)) return undefined;
  return originWords(value.origin as Origin);
}

/** TeX of an input whose name is a symbol of the trade (`P1`, `Kd`, `T`), nothing for names that are words. */
function symbolOf(name: string): string | undefined {
  const found = /^([A-Za-z])_?([A-Za-z0-9]{0,2})$/.exec(name);
  if (!found?.[1]) return undefined;
  return found[2] ? `${found[1]}_{\\mathrm{${found[2]}}}` : found[1];
}

/** What an input was taken from: another sheet by its title, a field of the basis by its words. */
function labelAt(one: CaseDocumentFile, path: string): string {
  if (path.startsWith('sheets/')) return sheetTitle(one, path.slice(7).split('#')[0] ?? '');
  return describePath(one.after?.body ?? {}, path).label;
}

function inputsOf(of: OpenedCase, one: CaseDocumentFile, sheet: Sheet): SheetInput[] {
  const declared = methodById(sheet.method.split('@')[0] ?? '')?.inputs ?? [];
  return Object.entries(sheet.inputs).map(([name, value]) => {
    const path = sheet.from[name];
    const symbol = symbolOf(name);
    const origin = path === undefined ? undefined : originAt(one, path);
    const place = path === undefined ? undefined : placeOf(of, `${one.document.id}:${path}`);
    const meaning = declared.find((input) => input.name === name)?.meaning ?? name.replaceAll('_', ' ');
    const label = path === undefined ? undefined : labelAt(one, path);
    const { text, unit } = shownValue(value);
    return {
      ...(symbol === undefined ? {} : { symbol }),
      meaning,
      figure: text,
      ...(unit === undefined ? {} : { unit }),
      ...(label === undefined && origin === undefined
        ? {}
        : { origin: [label, origin].filter(Boolean).join(' · ') }),
      ...(place ? { href: place.href } : {}),
      ...(path?.endsWith('/set') ? { set: true } : {}),
    };
  });
}

function verdictOf(
  one: CaseDocumentFile,
  sheet: Sheet,
): { verdict?: { verdict: Verdict; words: string; used?: number } } {
  const figures = one.after?.evaluation.figures ?? {};
  const verdict = figures[`sheets/${sheet.key}#verdict`];
  const use = figures[`sheets/${sheet.key}#use`];
  if (typeof verdict !== 'string') return {};
  return {
    verdict: {
      verdict: verdict as Verdict,
      words: 'Required area against the installed area of the group',
      ...(typeof use === 'object' ? { used: use.value * 100 } : {}),
    },
  };
}

/** Findings at this sheet; one that names an output hangs at the step that gives it, else at the first. */
function findingsAt(of: OpenedCase, place: string, sheet: Sheet) {
  const here = of.file.findings.filter((one) => one.place === place || one.place.startsWith(`${place}#`));
  return here.map((one) => {
    const at = one.place.slice(place.length + 1);
    const step = /^step-(\d+)$/.exec(at);
    const named = sheet.steps.findIndex((each) => each.symbol === at);
    return {
      number: one.number,
      weight: one.weight,
      closed: one.state === 'closed',
      step: step ? Number(step[1]) : named >= 0 ? named + 1 : 1,
      href: `${baseOf(of)}/findings#finding-${String(one.number)}`,
      label: `Finding ${String(one.number)}, ${one.weight.replace('-', ' ')}, ${one.state}`,
    };
  });
}

function agreedOf(of: OpenedCase, one: CaseDocumentFile, sheet: Sheet) {
  const given = of.file.agreements
    .filter((row) => row.documentId === one.document.id && row.sheetKey === sheet.key)
    .at(-1);
  if (!given) return null;
  return {
    by: nameOf(of, given.personId),
    at: instantWords(given.at, of.file.site.timeZone),
    now: given.sheetHash === sheet.hash,
  };
}

function shownSheet(of: OpenedCase, one: CaseDocumentFile, facts: DocumentFacts, sheet: Sheet) {
  const method = methodById(sheet.method.split('@')[0] ?? '');
  const changed = changedSheets(facts, of.file.row.class === 'revalidation').some(
    (each) => each.key === sheet.key,
  );
  const check = checkOf(of, facts, sheet, changed);
  const place = `${one.document.id}:sheets/${sheet.key}`;
  return {
    method: methodTitle(sheet.method),
    ...(sheet.edition === undefined ? {} : { edition: sheet.edition }),
    ...(method ? { source: method.source, validity: method.validity } : {}),
    hash: sheet.hash,
    shortHash: shortHash(sheet.hash),
    changed,
    ...(check ? { check } : {}),
    agreed: agreedOf(of, one, sheet),
    inputs: inputsOf(of, one, sheet),
    steps: sheet.steps,
    warnings: sheet.warnings,
    ...(sheet.refused
      ? { refused: { ...sheet.refused, href: placeOf(of, `${one.document.id}:${sheet.refused.field}`).href } }
      : {}),
    ...verdictOf(one, sheet),
    findings: findingsAt(of, place, sheet),
  };
}

function neighbours(of: OpenedCase, one: CaseDocumentFile, key: string): { before?: string; next?: string } {
  const keys = knownSheets(of, one);
  const at = keys.indexOf(key);
  const [before, next] = [keys[at - 1], keys[at + 1]];
  return {
    ...(before === undefined ? {} : { before: sheetHref(of, one, before) }),
    ...(next === undefined ? {} : { next: sheetHref(of, one, next) }),
  };
}

/** One sheet. `system` names the document when the case holds several. UNKNOWN when there is no such sheet. */
export async function sheetPage(
  of: OpenedCase,
  key: string,
  system: string | null,
): Promise<Result<SheetPage>> {
  const among = of.file.documents.filter((one) => system === null || one.document.tag === system);
  const one = among.find((each) => knownSheets(of, each).includes(key));
  const facts = of.facts.documents.find((each) => each.document === one?.document.id);
  const sheet = one?.after?.evaluation.sheets[key];
  if (!one || !facts || !sheet) return fail('UNKNOWN', `This case has no sheet ${key.slice(0, 80)}.`);
  await noteLook(of, 'sheets');
  return ok({
    key,
    title: sheetTitle(one, key),
    document: one.document.id,
    tag: one.document.tag,
    place: `${one.document.id}:sheets/${key}`,
    ...neighbours(of, one, key),
    ...(of.hidden ? {} : { shown: shownSheet(of, one, facts, sheet) }),
    agree: mayHere(of, 'agree', checkerFacts(of.file)),
    raise: mayHere(of, 'raise-finding'),
  });
}
