/* The hidden view (model, section 5): no view tells a result of a document to a checker who has not worked it unseen. */
import { beforeAll, describe, expect, it } from 'vitest';
import {
  pointRows,
  pointsCsv,
  pointsView,
  systemRows,
  systemsCsv,
  systemsView,
} from '@services/views/register';
import {
  systemBasis,
  systemDifference,
  systemDocument,
  systemEvaluation,
  systemLines,
  systemOutcomes,
  systemOverview,
  systemPoints,
  systemRevisions,
  systemScenarios,
  systemSheet,
  systemSheets,
  type SystemFrame,
} from '@services/views/system';
import { type Result } from '@domain/result';
import { dueView } from '@services/views/due';
import { myWorkView } from '@services/views/my-work';
import { searchView } from '@services/views/search';
import { type Actor } from '@services/context';
import { asked, demoSite, type Demo } from './demo';

/* SYS-302 is inadequate: 1.561 in² required of 1.287 in² installed, 121.3 % used, load by gas blow-by. Ilse checks its case. */
const HIDDEN = 'SYS-302';
const LEAKS = /1\.561|1\.287|121\.3|inadequate|blow-by through a level valve needs|-17\.6|−17\.6/i;
const KEY = 'size:gas-blow-by/';

let demo: Demo;
let checker: Actor;
let reader: Actor;

beforeAll(async () => {
  demo = await demoSite();
  checker = await demo.actor('ilse.fennimore');
  reader = await demo.actor('aoife.renshaw');
}, 120_000);

function value<T>(result: { ok: true; value: T } | { ok: false; problem: { detail: string } }): T {
  if (!result.ok) throw new Error(result.problem.detail);
  return result.value;
}

describe('registers before the unseen check', () => {
  it('show every result of a hidden system to others and none to its checker', async () => {
    const seen = value(await systemsView(demo.ctx, reader, asked())).rows.find((row) => row.tag === HIDDEN);
    expect(seen).toMatchObject({ hidden: false, verdict: 'inadequate' });
    expect(seen?.used).toBeCloseTo(121.3, 1);
    const kept = value(await systemsView(demo.ctx, checker, asked())).rows.find((row) => row.tag === HIDDEN);
    expect(kept?.hidden).toBe(true);
    for (const name of [
      'governing',
      'letter',
      'required',
      'installed',
      'used',
      'margin',
      'verdict',
      'waiting',
    ])
      expect(kept, name).not.toHaveProperty(name);
  });

  it.each(['-use', 'use', '-requiredSi', 'verdict', '-margin', 'governingName'])(
    'put a hidden system last when sorted by %s',
    async (sort) => {
      const { rows } = value(await systemsView(demo.ctx, checker, asked(`sort=${sort}`)));
      const first = rows.findIndex((row) => row.hidden);
      expect(first).toBeGreaterThan(0);
      expect(rows.slice(first).every((row) => row.hidden)).toBe(true);
    },
  );

  it('match a hidden system by no verdict and by no governing scenario', async () => {
    const others = value(await systemsView(demo.ctx, reader, asked('verdict=inadequate'))).rows;
    expect(others.map((row) => row.tag)).toContain(HIDDEN);
    const governing = others.find((row) => row.tag === HIDDEN)?.governing ?? '';
    for (const query of ['verdict=inadequate', `kind=${encodeURIComponent(governing)}`]) {
      const own = value(await systemsView(demo.ctx, checker, asked(query)));
      expect(
        own.rows.map((row) => row.tag),
        query,
      ).not.toContain(HIDDEN);
      expect(own.matching, query).toBe(own.rows.length);
    }
    const { kindChoices } = value(await systemsView(demo.ctx, checker, asked())).around;
    expect(kindChoices.map((one) => one.value)).not.toContain(governing);
  });

  it('withhold the relief points, their set pressure among them', async () => {
    const rows = value(await pointsView(demo.ctx, checker, asked('sort=-use'))).rows;
    const own = rows.filter((row) => row.system.tag === HIDDEN);
    expect(own.length).toBeGreaterThan(0);
    for (const row of own) {
      expect(row.hidden).toBe(true);
      expect(row).not.toHaveProperty('set');
      expect(row).not.toHaveProperty('used');
    }
  });

  it('withhold them from programs and spreadsheets too', async () => {
    const systems = value(await systemRows(demo.ctx, checker, asked())).rows.find(
      (row) => row.tag === HIDDEN,
    );
    expect(systems).toMatchObject({
      hidden: true,
      required: null,
      use: null,
      verdict: null,
      governing: null,
    });
    const points = value(await pointRows(demo.ctx, checker, asked())).rows.filter(
      (row) => row.system === HIDDEN,
    );
    expect(points.every((row) => row.hidden && row.set === null && row.use === null)).toBe(true);
    const own = (text: string) =>
      text
        .split('\r\n')
        .filter((line) => line.includes(HIDDEN))
        .join('\n');
    expect(own(await systemsCsv(demo.ctx, reader, asked()))).toMatch(/121\.3.*inadequate/);
    expect(own(await systemsCsv(demo.ctx, checker, asked()))).toMatch(/,{10}hidden$/);
    expect(own(await pointsCsv(demo.ctx, checker, asked()))).toMatch(/,{11}hidden$/);
  });
});

describe('pages of a system before the unseen check', () => {
  const parts = {
    systemBasis,
    systemLines,
    systemOutcomes,
    systemOverview,
    systemPoints,
    systemScenarios,
    systemSheets,
  };

  it.each(Object.entries(parts))('%s tells no result', async (_name, view) => {
    const found: Result<{ frame: SystemFrame; view?: unknown }> = await view(
      demo.ctx,
      checker,
      HIDDEN,
      asked(),
    );
    const page = value(found);
    expect(page.frame.hidden).toBe(true);
    expect(page.view).toBeDefined();
    expect(JSON.stringify(page)).not.toMatch(LEAKS);
    // The trim of LV-304 is a reading of the unseen check: the field condition may not give it away.
    expect(JSON.stringify(page)).not.toMatch(/Cv 16|16 Cv/);
  });

  it('shows the same pages with results to another reader', async () => {
    const page = value(await systemOverview(demo.ctx, reader, HIDDEN, asked()));
    expect(JSON.stringify(page)).toMatch(/121\.3/);
    expect(page.view?.groups.some((group) => group.scale !== undefined)).toBe(true);
  });

  it('draws no ladder, no bar and no governing mark', async () => {
    const { view } = value(await systemOverview(demo.ctx, checker, HIDDEN, asked()));
    expect(
      view?.points.points.every((point) => point.ladder === undefined && point.results.length === 0),
    ).toBe(true);
    expect(view?.groups.every((group) => group.scale === undefined && group.verdict === undefined)).toBe(
      true,
    );
    expect(view?.groups.flatMap((group) => group.lines).some((line) => line.governs || line.load)).toBe(
      false,
    );
  });

  it('lists and opens sheets without a figure', async () => {
    const { view } = value(await systemSheets(demo.ctx, checker, HIDDEN, asked()));
    const lines = view?.groups.flatMap((group) => group.lines) ?? [];
    expect(lines.length).toBeGreaterThan(0);
    expect(lines.every((line) => line.hidden && line.result === '')).toBe(true);
    const key = lines.find((line) => line.key.startsWith(KEY))?.key ?? lines[0]?.key ?? '';
    const sheet = value(await systemSheet(demo.ctx, checker, HIDDEN, key, asked())).view;
    expect(sheet).toMatchObject({ hidden: true, steps: [], inputs: [], outputs: [], hash: '' });
  });

  it('answers programs with a masked document and no evaluation', async () => {
    const document = value(await systemDocument(demo.ctx, checker, HIDDEN));
    expect(document.hidden).toBe(true);
    expect(JSON.stringify(document.document)).not.toMatch(LEAKS);
    const evaluation = value(await systemEvaluation(demo.ctx, checker, HIDDEN));
    expect(evaluation.evaluation).toMatchObject({ hidden: true });
    expect(Object.keys(evaluation.evaluation)).toEqual(['hidden', 'sheets']);
    expect(evaluation.outcomes).toEqual([]);
    expect(JSON.stringify(evaluation)).not.toMatch(LEAKS);
  });

  it('tells neither values of a difference nor figures of a note', async () => {
    const revisions = value(await systemRevisions(demo.ctx, checker, HIDDEN));
    expect(JSON.stringify(revisions)).not.toMatch(/inadequate/i);
    const found = await systemDifference(demo.ctx, checker, HIDDEN, asked('from=3&to=3'));
    expect(value(found).view).toMatchObject({ hidden: true, moved: [] });
  });
});

describe('lists of a person before the unseen check', () => {
  it('my work, due items and search tell no result', async () => {
    const due = async (who: Actor) =>
      value(await dueView(demo.ctx, who, asked('kind=deficiency'))).lines.find((line) =>
        line.of.some((one) => one.text === HIDDEN),
      );
    expect((await due(reader))?.text).toMatch(/PSV-306/);
    expect((await due(checker))?.text).toBe('Its text is hidden until your own figures are in');
    expect(JSON.stringify(value(await myWorkView(demo.ctx, checker)))).not.toMatch(LEAKS);
    for (const words of ['SYS-302', 'blow-by', 'inadequate', '1.561']) {
      const found = value(await searchView(demo.ctx, checker, words));
      expect(JSON.stringify(found.lines), words).not.toMatch(LEAKS);
      expect(
        found.lines.some((line) => line.href.endsWith(`${HIDDEN}/scenarios`)),
        words,
      ).toBe(false);
    }
    const others = value(await searchView(demo.ctx, reader, 'SYS-302'));
    expect(others.lines.some((line) => line.href.endsWith(`systems/${HIDDEN}/scenarios`))).toBe(true);
  });

  it('follows someone who stands in for the checker', async () => {
    const deputy = { ...reader, standsFor: [checker.person.id] };
    const rows = value(await systemsView(demo.ctx, deputy, asked())).rows;
    expect(rows.find((row) => row.tag === HIDDEN)?.hidden).toBe(true);
  });
});
