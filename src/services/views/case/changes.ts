/* What changes in a case: the figures of the working revision beside those it started from, ready for forms. */
import {
  type Basis,
  capital,
  describePath,
  getAt,
  isFigure,
  isKnown,
  isWordInput,
  originSchema,
  type Path,
} from '@domain/basis';
import { can, scenarioName } from '@domain/case';
import { sameLeaf } from '@domain/difference';
import { maskDocument, readingsOf } from '@domain/hidden';
import { ok, type Result } from '@domain/result';
import { UNITS, unitLabel } from '@engine/quantity';
import { type CaseDocumentFile, onFile } from '../../case-file';
import { whoOf } from '../../context';
import { digitsOf, expectsAt } from '../../edit/form/figure';
import { wordsOfInput } from '../../edit/form/ops';
import { choicesAt, kindAt } from '../../edit/form/word';
import { inline } from '../shown';
import { changeHref } from './addresses';
import {
  type Offered,
  offeredOfAnswer,
  offeredOfEquipment,
  offeredOfExternal,
  offeredOfFluid,
  offeredOfPoint,
  offeredOfSource,
  shownPaths,
} from './change-paths';
import { differenceRows, type DifferenceRowView } from './difference-rows';
import { noteLook, type OpenedCase } from './open';
import { baseOf } from './prose';
import { shownAny } from './shown-values';
import { systemOf, type SystemTab, systemTabs } from './systems';

export type FieldView = {
  path: Path;
  label: string;
  kind: 'figure' | 'word' | 'choice' | 'flag' | 'number' | 'taken';
  before: string;
  now: string;
  value: string;
  unit: string;
  units: { value: string; label: string }[];
  choices: string[];
  originKind: string;
  originRef: string;
  changed: boolean;
  set: boolean;
};
export type ElementView = { id: string; tag: string; name: string; changed: number; fields: FieldView[] };
export type SectionView = {
  key: string;
  title: string;
  elements: ElementView[];
  changed: number;
  /** Its figures are in forms; the others are read, so that a page stays small. */
  open: boolean;
};
export type ChangesView = {
  tabs: SystemTab[];
  system: string;
  version: number | null;
  baseHead: string;
  editable: boolean;
  whyNot?: string;
  changed: DifferenceRowView[];
  sections: SectionView[];
};

export const ORIGIN_KINDS: readonly string[] = originSchema.shape.kind.options;

type Of = { document: Basis; base: Basis | undefined };

function unitsFor(document: Basis, path: Path, present: string | undefined): FieldView['units'] {
  const expects = expectsAt(document, path);
  if (!expects) return present === undefined ? [] : [{ value: present, label: unitLabel(present) }];
  const keys = Object.entries(UNITS)
    .filter(([, unit]) => expects.dimension.includes(unit.dimension))
    .map(([key]) => key);
  const all = present !== undefined && !keys.includes(present) ? [present, ...keys] : keys;
  return all.map((value) => ({ value, label: unitLabel(value) || '–' }));
}

function fieldKind(of: Of, path: Path): FieldView['kind'] | undefined {
  const found = getAt(of.document, path);
  if (wordsOfInput(of.document, path)) return 'choice';
  if (isWordInput(found)) return 'taken';
  const kind = kindAt(of.document, path);
  if (kind === 'figure') return typeof found === 'string' ? 'taken' : 'figure';
  if (kind === 'word') return choicesAt(path).length > 0 ? 'choice' : 'word';
  return kind === 'flag' || kind === 'number' ? kind : undefined;
}

function fieldOf(of: Of, path: Path, prefix: string): FieldView[] {
  const kind = fieldKind(of, path);
  if (!kind) return [];
  const found = getAt(of.document, path);
  const before = of.base && getAt(of.base, path);
  const figure = isFigure(found) ? found : undefined;
  const known = figure && isKnown(figure) ? figure : undefined;
  const word = isWordInput(found) && 'word' in found ? found.word : undefined;
  const label = capital(describePath(of.document, path).label).replaceAll('_', ' ');
  const unit = known?.unit ?? (isFigure(before) && isKnown(before) ? before.unit : undefined);
  const plain = typeof found === 'boolean' ? (found ? 'yes' : 'no') : String(found ?? '');
  return [
    {
      path,
      label: label.startsWith(`${prefix}, `) ? capital(label.slice(prefix.length + 2)) : label,
      kind,
      before: inline(shownAny(of.base, before)),
      now: inline(shownAny(of.document, found)),
      value: word ?? (figure ? digitsOf(figure) : plain),
      unit: unit ?? expectsAt(of.document, path)?.unit ?? '',
      units: kind === 'figure' ? unitsFor(of.document, path, unit) : [],
      choices: wordsOfInput(of.document, path) ?? choicesAt(path),
      originKind: known?.origin?.kind ?? '',
      originRef: known?.origin?.ref ?? '',
      changed: !sameLeaf(before, found),
      set: path.endsWith('/set'),
    },
  ];
}

type Named = { id: Path; tag: string; name: string; offered: Offered };

function elementOf(of: Of, one: Named): ElementView {
  const prefix = capital(describePath(of.document, one.id).label);
  const fields = shownPaths(one.offered, of.document, of.base).flatMap((path) => fieldOf(of, path, prefix));
  const { id, tag, name } = one;
  return { id, tag, name, fields, changed: fields.filter((field) => field.changed).length };
}

function answersOf(doc: Basis): Named[] {
  return doc.scenarios.flatMap((scenario) =>
    scenario.answers.map((answer) => ({
      id: `scenarios/${scenario.id}/answers/${answer.id}`,
      tag: scenarioName(scenario),
      name: answer.name ?? '',
      offered: offeredOfAnswer(scenario.id, answer),
    })),
  );
}

function sectionsOf(of: Of, part: string | null): SectionView[] {
  const { document: doc } = of;
  const named: [string, string, Named[]][] = [
    [
      'equipment',
      'Equipment',
      doc.equipment.map((one) => ({
        id: `equipment/${one.id}`,
        tag: one.tag,
        name: one.name ?? '',
        offered: offeredOfEquipment(one),
      })),
    ],
    [
      'sources',
      'Sources',
      doc.sources.map((one) => ({
        id: `sources/${one.id}`,
        tag: one.tag,
        name: one.name ?? '',
        offered: offeredOfSource(one),
      })),
    ],
    [
      'fluids',
      'Fluids',
      doc.fluids.map((one) => ({
        id: `fluids/${one.id}`,
        tag: one.name,
        name: '',
        offered: offeredOfFluid(one),
      })),
    ],
    [
      'reliefPoints',
      'Relief points',
      doc.reliefPoints.map((one) => ({
        id: `reliefPoints/${one.id}`,
        tag: one.tag,
        name: one.name ?? '',
        offered: offeredOfPoint(one),
      })),
    ],
    ['loads', 'Inputs of loads and sizes', answersOf(doc)],
    [
      'externalSheets',
      'External sheets',
      doc.externalSheets.map((one) => ({
        id: `externalSheets/${one.id}`,
        tag: one.title,
        name: one.author,
        offered: offeredOfExternal(one),
      })),
    ],
  ];
  const sections = named
    .map(([key, title, list]) => {
      const elements = list.map((one) => elementOf(of, one)).filter((one) => one.fields.length > 0);
      return { key, title, elements, changed: elements.reduce((sum, one) => sum + one.changed, 0) };
    })
    .filter((section) => section.elements.length > 0);
  const open =
    sections.find((one) => one.key === part) ?? sections.find((one) => one.changed > 0) ?? sections[0];
  return sections.map((section) => ({ ...section, open: section === open }));
}

function documentsOf(of: OpenedCase, one: CaseDocumentFile): Of | undefined {
  const [document, base] = [one.after?.body ?? one.before?.body, one.before?.body];
  if (!document) return undefined;
  if (!of.hidden) return { document, base };
  return {
    document: maskDocument(document, readingsOf(document)),
    base: base && maskDocument(base, readingsOf(base)),
  };
}

/** What changes in one system of a case, with one section of its document ready to be changed. UNKNOWN for a system that the case does not hold. */
export async function changesView(
  of: OpenedCase,
  tag: string | null,
  part: string | null = null,
): Promise<Result<ChangesView>> {
  const found = systemOf(of, tag);
  if (!found.ok) return found;
  const one = found.value;
  await noteLook(of, `changes ${one.document.tag}`);
  const may = can(whoOf(of.actor), 'edit-document', onFile(of.file));
  const both = documentsOf(of, one);
  const why = may.ok
    ? `${one.document.tag} gets its working revision when the draft is passed; until then its basis in force stands here.`
    : may.sentence;
  const editable = may.ok && one.working?.state === 'working' && !of.hidden;
  const number = one.base?.number;
  return ok({
    tabs: systemTabs(of, 'changes', one.document.tag),
    system: one.document.tag,
    version: one.working?.version ?? null,
    baseHead: number == null ? 'Base' : `Rev ${String(number)}`,
    editable,
    ...(editable ? {} : { whyNot: why }),
    changed:
      one.before && one.after
        ? differenceRows(
            one.before.body,
            one.after.body,
            (change) => changeHref(baseOf(of), one.document.tag, change.path),
            of.hidden,
          )
        : [],
    sections: both ? sectionsOf(both, part) : [],
  });
}
