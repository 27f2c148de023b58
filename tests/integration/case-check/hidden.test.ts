/* What the checker may not see before the reveal: no result of the originator in any view of the parts that check and sign. */
import { beforeAll, describe, expect, test } from 'vitest';
import { maskProse } from '@domain/hidden';
import { formatNumber, type Q } from '@engine/quantity';
import { loadCaseFile } from '@services/case-file';
import { revealUnseen } from '@services/check/unseen';
import { agreeSheet } from '@services/check/agree';
import { findingsView } from '@services/views/case/findings';
import { noticesView } from '@services/views/case/notices';
import { outcomesView } from '@services/views/case/outcomes';
import { sheetPage } from '@services/views/case/sheet';
import { sheetsView } from '@services/views/case/sheets';
import { signaturesView } from '@services/views/case/signatures';
import { summaryView } from '@services/views/case/summary';
import { trailView } from '@services/views/case/trail';
import { unseenView } from '@services/views/case/unseen';
import { HIDDEN_CASE, opened, type Place, seededPlace, written } from './support';

let place: Place;
/** Results of both truths as a page would print them: four digits or more, so that a day or a count is none. */
let figures: string[];

function printed(value: unknown): string[] {
  if (typeof value !== 'object' || value === null || !('value' in value)) return [];
  const q = value as Q;
  const raw = String(Number(q.value.toPrecision(6)));
  return [formatNumber(q.value), raw].filter(
    (text) => text.replace(/[^\d]/g, '').replace(/^0+/, '').length >= 4,
  );
}

beforeAll(async () => {
  place = await seededPlace();
  const file = await loadCaseFile(place.db, place.site, HIDDEN_CASE);
  const truths = (file?.documents ?? []).flatMap((one) => [one.before, one.after]);
  const outputs = truths.flatMap((truth) =>
    Object.entries(truth?.evaluation.sheets ?? {}).flatMap(([, sheet]) => Object.values(sheet.outputs)),
  );
  figures = [...new Set(outputs.flatMap(printed))];
}, 120_000);

async function viewsFor(name: string): Promise<Record<string, unknown>> {
  const { of, frame } = await opened(place, await place.as(name), HIDDEN_CASE);
  const size = Object.keys(of.file.documents[0]?.after?.evaluation.sheets ?? {}).find((key) =>
    key.startsWith('size:'),
  );
  return {
    frame,
    sheets: await sheetsView(of),
    sheet: await sheetPage(of, size ?? '', null),
    outcomes: await outcomesView(of),
    unseen: await unseenView(of),
    findings: findingsView(of),
    summary: await summaryView(of, frame.acts),
    signatures: signaturesView(of, frame),
    trail: await trailView(of),
    notices: await noticesView(of),
  };
}

const leaksIn = (view: unknown) => figures.filter((figure) => JSON.stringify(view).includes(figure));

describe('the checker before the reveal', () => {
  test('there are figures to look for, and another reader is shown them', async () => {
    expect(figures.length).toBeGreaterThan(20);
    const views = await viewsFor('Grace Okonta');
    expect(leaksIn(views['sheets']).length).toBeGreaterThan(3);
    expect(leaksIn(views['sheet']).length).toBeGreaterThan(0);
    expect(leaksIn(views['summary']).length).toBeGreaterThan(0);
  });

  test.each([
    'frame',
    'sheets',
    'sheet',
    'outcomes',
    'unseen',
    'findings',
    'summary',
    'signatures',
    'trail',
    'notices',
  ])('%s carries no result', async (part) => {
    const views = await viewsFor('Ilse Fennimore');
    expect(leaksIn(views[part])).toEqual([]);
  });

  test('no verdict, no governing mark and no use stands on a sheet', async () => {
    const { of } = await opened(place, await place.as('Ilse Fennimore'), HIDDEN_CASE);
    const view = await sheetsView(of);
    const rows = view.systems.flatMap((one) => [...one.changed, ...one.others]);
    expect(rows.length).toBeGreaterThan(3);
    expect(
      rows.every((row) => row.verdict === undefined && row.used === undefined && row.result === undefined),
    ).toBe(true);
    expect(rows.every((row) => /^(limit|load|size):/.test(row.key))).toBe(true);
  });

  test('the trail is refused as hidden', async () => {
    const { of } = await opened(place, await place.as('Ilse Fennimore'), HIDDEN_CASE);
    expect(await trailView(of)).toMatchObject({ ok: false, problem: { code: 'HIDDEN' } });
  });

  test('the refusal of an early reveal lists what is missing, without a result', async () => {
    const actor = await place.as('Ilse Fennimore');
    const { frame } = await opened(place, actor, HIDDEN_CASE);
    const document = frame.documents[0]?.id ?? '';
    const result = await revealUnseen(
      place.ctx,
      actor,
      HIDDEN_CASE,
      await written(place, HIDDEN_CASE, { document }),
    );
    expect(result).toMatchObject({ ok: false, problem: { code: 'GATE_SHUT' } });
    expect(leaksIn(result)).toEqual([]);
  });

  test('a sheet can not be agreed while it is hidden, and the refusal does not give its hash', async () => {
    const actor = await place.as('Ilse Fennimore');
    const { of } = await opened(place, actor, HIDDEN_CASE);
    const one = of.file.documents[0];
    const sheet = Object.values(one?.after?.evaluation.sheets ?? {})[0];
    const at = { number: HIDDEN_CASE, document: one?.document.tag ?? '', sheet: sheet?.key ?? '' };
    const result = await agreeSheet(
      place.ctx,
      actor,
      at,
      await written(place, HIDDEN_CASE, { hash: '0'.repeat(64) }),
    );
    expect(result).toMatchObject({ ok: false, problem: { code: 'HIDDEN' } });
    expect(JSON.stringify(result)).not.toContain(sheet?.hash);
  });
});

test('prose loses sizes of valves, letters beside the word orifice, and flow coefficients', () => {
  const masked = maskProse('PSV-306 goes from a 2J3 to a 3K4, a K orifice, for Cv 16 instead of Kv of 11.5.');
  expect(masked).toBe(
    'PSV-306 goes from a [hidden] to a [hidden], a [hidden] orifice, for Cv [hidden] instead of Kv of [hidden].',
  );
});
