/* The method file on paper: every method with equations, inputs, validity, source and every check value; the same content gives the same bytes. */
import { createRequire } from 'node:module';
import { Document, Font, Page, renderToBuffer, StyleSheet, Text } from '@react-pdf/renderer';
import { createElement as el, type ReactElement } from 'react';
import { displayUnit, unitLabel } from '@engine/quantity';
import { type CheckedCase, checkRows, deviationWords, methodChecks } from '@services/views/method-checks';
import { type MethodFile, type MethodLine } from '@services/views/methods';
import { plainTex } from './plain-tex';

const font = (name: string) => createRequire(import.meta.url).resolve(`dejavu-fonts-ttf/ttf/${name}.ttf`);
const SANS = 'DejaVu Sans';
const MONO = 'DejaVu Sans Mono';

function registerFonts(): void {
  Font.register({
    family: SANS,
    fonts: [{ src: font('DejaVuSans') }, { src: font('DejaVuSans-Bold'), fontWeight: 700 }],
  });
  Font.register({ family: MONO, src: font('DejaVuSansMono') });
  // Names of inputs and units are never broken with a hyphen that is not theirs.
  Font.registerHyphenationCallback((word) => [word]);
}

const style = StyleSheet.create({
  page: {
    fontFamily: SANS,
    fontSize: 8,
    paddingTop: 48,
    paddingBottom: 56,
    paddingHorizontal: 42,
    lineHeight: 1.35,
  },
  head: { position: 'absolute', top: 22, left: 42, right: 42, fontSize: 7 },
  foot: { position: 'absolute', bottom: 20, left: 42, right: 42, fontSize: 6.5 },
  title: { fontSize: 18, fontWeight: 700, marginBottom: 8 },
  topic: { fontSize: 13, fontWeight: 700, marginBottom: 4 },
  method: { fontSize: 10, fontWeight: 700, marginTop: 12 },
  label: { fontWeight: 700, marginTop: 4 },
  mono: { fontFamily: MONO, fontSize: 6 },
  case: { marginTop: 3 },
  why: { fontWeight: 700 },
});

type Line = { text: string; of?: keyof typeof style };

const line = (text: string, of?: keyof typeof style): Line => (of === undefined ? { text } : { text, of });
const COLUMNS = [34, 12, 16, 16, 16, 16];

/** A row of a table in a face of even width: cells cut to their columns. */
function row(cells: readonly string[]): string {
  return cells
    .map((cell, i) =>
      (cell.length > (COLUMNS[i] ?? 12) - 1 ? `${cell.slice(0, (COLUMNS[i] ?? 12) - 2)}…` : cell).padEnd(
        COLUMNS[i] ?? 12,
      ),
    )
    .join('');
}

function checkedLines(one: CheckedCase): Line[] {
  const why =
    one.reason !== undefined
      ? [line(`Does not reproduce, and why: ${one.reason}`, 'why')]
      : one.agrees
        ? []
        : [line(`Does not agree: ${one.refused ?? 'a value lies outside its tolerance.'}`, 'why')];
  const rows = [['output', 'unit', 'expected', 'ours', 'deviation', 'tolerance'], ...checkRows(one)];
  return [
    line(`${one.what}. Source: ${one.source}`, 'case'),
    ...why,
    ...rows.map((cells) => line(row(cells), 'mono')),
  ];
}

const inputWords = ({ name, meaning, dimension, words, required }: MethodLine['inputs'][number]): string => {
  const unit = dimension === undefined ? '' : unitLabel(displayUnit(dimension, 'SI'));
  const kind = words ? `one of: ${words.join(', ')}` : unit || dimension?.replaceAll('-', ' ') || 'yes or no';
  return `${name}  ${meaning} [${kind}]${required ? '' : ', where it applies'}`;
};

function methodLines(method: MethodLine): Line[] {
  const { cases, equations } = methodChecks(method.topic);
  const equationWords = equations.map(({ tex, meaning, unit, clause, memory }) => {
    const from = [clause, memory ? 'from memory of the standard' : ''].filter(Boolean).join(', ');
    return line(`${plainTex(tex)}   ${meaning} [${unitLabel(unit) || '–'}]${from ? `; ${from}` : ''}`);
  });
  return [
    line(`${method.id}  ${method.title}, version ${method.version}`, 'method'),
    line(`Source: ${method.source}`),
    line(`Editions: ${method.editions.length > 0 ? method.editions.join(', ') : 'one'}`),
    line(`Holds for: ${method.validity}`),
    line('Equations', 'label'),
    ...(equationWords.length > 0 ? equationWords : [line('None shown: no check value works this sheet.')]),
    line('What goes in', 'label'),
    ...method.inputs.map((one) => line(inputWords(one))),
    line(`Check values: ${method.agreeing} of ${method.values} agree`, 'label'),
    ...cases.flatMap(checkedLines),
  ];
}

function summary(file: MethodFile): Line[] {
  return [
    line('Method file', 'title'),
    line(`Engine ${file.engine}, catalogue ${file.catalogue}. ${file.shown} of ${file.total} methods.`),
    line(
      `${file.agreeing} of ${file.values} check values agree; worst deviation of those that should ${deviationWords(file.worst)}.`,
    ),
    line('Check values are worked anew by this engine when this paper is made.'),
    ...file.groups.map((group) =>
      line(
        `${group.name}: ${group.methods.length} methods, ${group.values} check values, worst deviation ${deviationWords(group.worst)}`,
      ),
    ),
  ];
}

/** Paper carries no time: what it says is told by engine and catalogue, and the same content is the same file. */
const NO_TIME = new Date(0);

/** Methods that run on from page to page: this renderer loses its place in a run of many pages. */
const IN_ONE_RUN = 6;

function parts<T>(all: readonly T[]): T[][] {
  const count = Math.ceil(all.length / IN_ONE_RUN);
  return Array.from({ length: count }, (_, i) => all.slice(i * IN_ONE_RUN, (i + 1) * IN_ONE_RUN));
}

function paper(file: MethodFile, caution: string): Parameters<typeof renderToBuffer>[0] {
  const foot = ({ pageNumber, totalPages }: { pageNumber: number; totalPages: number }) =>
    `${caution}   Page ${pageNumber} of ${totalPages}`;
  const head = `Setwright method file · ${file.engine} · catalogue ${file.catalogue}`;
  // Lines stand directly on the sheet: nested boxes that run over several pages lose their place in this renderer.
  const sheet = (lines: readonly Line[], key: string): ReactElement =>
    el(
      Page,
      { key, size: 'A4', style: style.page },
      el(Text, { style: style.head, fixed: true }, head),
      ...lines.map(({ text, of }, i) =>
        el(Text, { key: i, wrap: false, ...(of ? { style: style[of] } : {}) }, text),
      ),
      el(Text, { style: style.foot, fixed: true, render: foot }),
    );
  const topics = file.groups.flatMap((group) =>
    parts(group.methods).map((methods, i) =>
      sheet(
        [...(i === 0 ? [line(group.name, 'topic')] : []), ...methods.flatMap(methodLines)],
        `${group.key}${i}`,
      ),
    ),
  );
  const about = { title: 'Method file', producer: 'Setwright', creator: 'Setwright' };
  return el(
    Document,
    { ...about, creationDate: NO_TIME, modificationDate: NO_TIME },
    sheet(summary(file), 'summary'),
    ...topics,
  ) as Parameters<typeof renderToBuffer>[0];
}

const made = new Map<string, Promise<Buffer>>();

/** The method file as PDF, made once for the same content while the server runs. `caution` stands at the foot of every page. */
export function methodFilePdf(file: MethodFile, caution: string): Promise<Buffer> {
  const key = JSON.stringify([
    file.catalogue,
    file.groups.flatMap((group) => group.methods.map((one) => one.id)),
    caution,
  ]);
  const known = made.get(key);
  if (known) return known;
  registerFonts();
  const bytes = renderToBuffer(paper(file, caution));
  bytes.catch(() => made.delete(key));
  made.set(key, bytes);
  return bytes;
}
