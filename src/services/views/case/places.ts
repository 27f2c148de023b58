/* Places of a case in words with links: sheets, scenarios, fields, parts of the brief, affected systems. */
import { describePath } from '@domain/basis';
import { placeOfPath } from '@domain/case';
import { maskEvaluation } from '@domain/hidden';
import { scenarioLabel, sheetLabel } from '@domain/projections';
import { type CaseDocumentFile } from '../../case-file';
import { addressOf } from './addresses';
import { type OpenedCase } from './open';
import { baseOf, plainOf, sheetHref } from './prose';

export type Place = { label: string; href: string };
export type PlaceChoice = { value: string; label: string; group: string };

const BRIEF: Record<string, string> = {
  title: 'Title',
  whatChanges: 'What changes',
  technicalBasis: 'Technical basis',
  effect: 'Effect on safety and health',
  timeNeeded: 'Time needed',
  papers: 'Procedures and drawings',
};

/** What a sheet of the case is called. */
export function sheetTitle(one: CaseDocumentFile, key: string): string {
  return one.after ? sheetLabel(one.after.body, key) : key;
}

/** Keys of the sheets that a reader may know of; while hidden only those that the scenarios tell anyone. */
export function knownSheets(of: OpenedCase, one: CaseDocumentFile): string[] {
  if (!one.after) return [];
  if (of.hidden) return maskEvaluation(one.after.evaluation).sheets.map((sheet) => sheet.key);
  return Object.keys(one.after.evaluation.sheets);
}

function inDocument(of: OpenedCase, one: CaseDocumentFile, path: string): Place {
  const several = of.file.documents.length > 1 ? `${one.document.tag}, ` : '';
  if (path.startsWith('sheets/')) {
    const [key = '', at] = path.slice(7).split('#');
    const step = /^step-(\d+)$/.exec(at ?? '')?.[1];
    const label = `${several}${sheetTitle(one, key)}${step === undefined ? '' : `, step ${step}`}`;
    return { label, href: `${sheetHref(of, one, key)}${step === undefined ? '' : `#step-${step}`}` };
  }
  const facts = of.facts.documents.find((each) => each.document === one.document.id);
  const where = facts ? placeOfPath(of.facts, facts, path) : '';
  return {
    label: several + plainOf(of, describePath(one.after?.body ?? {}, path).label),
    href: addressOf(of.file, where),
  };
}

/** A place that a finding or an outcome names, `doc_81:reliefPoints/rp_k3/set`, `brief/effect` or `affected/doc_7`. */
export function placeOf(of: OpenedCase, place: string): Place {
  const at = place.indexOf(':');
  const document = of.file.documents.find((one) => one.document.id === place.slice(0, Math.max(at, 0)));
  if (document) return inDocument(of, document, place.slice(at + 1));
  const [list = '', id = ''] = place.split('/');
  if (list === 'affected') {
    const tag = of.file.affectedDocuments.find((one) => one.id === id)?.tag ?? 'a system';
    return { label: `Affected system ${tag}`, href: `${baseOf(of)}#affected` };
  }
  if (list === 'unseen') return { label: 'Unseen check', href: `${baseOf(of)}/unseen` };
  const label = list === 'brief' && id !== '' ? `Brief, ${BRIEF[id] ?? id}` : 'Brief';
  return { label, href: baseOf(of) };
}

function choicesIn(of: OpenedCase, one: CaseDocumentFile): PlaceChoice[] {
  const { after, document } = one;
  if (!after) return [];
  const choice = (path: string, label: string, group: string): PlaceChoice => ({
    value: `${document.id}:${path}`,
    label: plainOf(of, label),
    group: `${document.tag}: ${group}`,
  });
  const named = (list: 'reliefPoints' | 'lines' | 'equipment' | 'sources' | 'fluids' | 'fieldConditions') =>
    after.body[list].map((each) => `${list}/${each.id}`);
  const fields = [
    ...named('reliefPoints'),
    ...named('equipment'),
    ...named('sources'),
    ...named('fluids'),
    ...named('lines'),
    ...named('fieldConditions'),
  ];
  return [
    ...after.body.scenarios.map((each) =>
      choice(`scenarios/${each.id}`, scenarioLabel(after.body, each), 'scenarios'),
    ),
    ...knownSheets(of, one).map((key) => choice(`sheets/${key}`, sheetTitle(one, key), 'sheets')),
    ...fields.map((path) => choice(path, describePath(after.body, path).label, 'fields')),
  ];
}

/** The places at which a finding can be raised. */
export function placeChoices(of: OpenedCase): PlaceChoice[] {
  const brief = Object.entries(BRIEF).map(([field, label]) => ({
    value: `brief/${field}`,
    label,
    group: 'Brief',
  }));
  const affected = of.file.affectedDocuments.map((one) => ({
    value: `affected/${one.id}`,
    label: one.tag,
    group: 'Affected systems',
  }));
  return [...of.file.documents.flatMap((one) => choicesIn(of, one)), ...brief, ...affected];
}
