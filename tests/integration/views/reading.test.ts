/* What the registers and pages of systems show to a reader from whom nothing is hidden. */
import { beforeAll, describe, expect, it } from 'vitest';
import { csvCell, pointsView, systemsCsv, systemsView } from '@services/views/register';
import {
  systemBasis,
  systemDifference,
  systemOverview,
  systemRevisions,
  systemScenarios,
  systemSheet,
  systemSheets,
} from '@services/views/system';
import { dueView } from '@services/views/due';
import { methodFile, methodView } from '@services/views/methods';
import { headingOf, myWorkView } from '@services/views/my-work';
import { rulebookView } from '@services/views/rulebook';
import { searchView } from '@services/views/search';
import { type Actor } from '@services/context';
import { siteActor } from '@/http';
import { asked, demoSite, type Demo } from './demo';

let demo: Demo;
let reader: Actor;

beforeAll(async () => {
  demo = await demoSite();
  reader = await demo.actor('aoife.renshaw');
}, 120_000);

function value<T>(result: { ok: true; value: T } | { ok: false; problem: { detail: string } }): T {
  if (!result.ok) throw new Error(result.problem.detail);
  return result.value;
}

describe('registers', () => {
  it('show both truths of a system whose approved revision waits', async () => {
    const row = value(await systemsView(demo.ctx, reader, asked())).rows.find((one) => one.tag === 'SYS-201');
    expect(row).toMatchObject({
      letter: 'L',
      verdict: 'adequate',
      waiting: { letter: 'M', verdict: 'adequate' },
    });
    expect(row?.used).toBeCloseTo(70, 0);
    expect(row?.waiting?.used).toBeCloseTo(76.2, 1);
    expect(row?.waiting?.case?.number).toBe('KW-2025-036');
    const points = value(await pointsView(demo.ctx, reader, asked('q=PSV-201A'))).rows;
    expect(points).toHaveLength(1);
    expect(points[0]).toMatchObject({ letter: 'L', waiting: { letter: 'M' }, dischargesTo: 'HDR-601' });
  });

  it('count n of m, filter and clear', async () => {
    const all = value(await systemsView(demo.ctx, reader, asked()));
    const some = value(await systemsView(demo.ctx, reader, asked('verdict=marginal')));
    expect(all.matching).toBe(all.around.total);
    expect(some.matching).toBeLessThan(all.matching);
    expect(some.rows.every((row) => row.verdict === 'marginal')).toBe(true);
    expect(some.around.total).toBe(all.around.total);
    expect(some.clear).toBe('/s/ketterwold/register/systems');
  });

  it('put the unit into the head where it is one, and into rows where not', async () => {
    const own = value(await systemsView(demo.ctx, reader, asked()));
    expect(own.heads.required).toBeUndefined();
    expect(new Set(own.rows.map((row) => row.required?.unit))).toEqual(new Set(['mm²', 'in²']));
    const metric = value(await systemsView(demo.ctx, reader, asked('figures=SI')));
    expect(metric.heads.required).toBe('mm²');
    expect(metric.rows.every((row) => row.required?.unit === '')).toBe(true);
    const unit = value(await systemsView(demo.ctx, reader, asked('unit=unit_u300')));
    expect(unit.heads.required).toBe('in²');
  });

  it('take an unreadable query as not asked', async () => {
    const wild = asked('sort=;drop&after=%00&n=-4&verdict=fine&figures=x');
    const found = value(await systemsView(demo.ctx, reader, wild));
    expect(found.rows[0]?.tag).toBe('SYS-101');
    expect(found.ask).toMatchObject({ sort: 'tag', verdict: '', figures: 'entered', first: 1 });
  });

  it('write CSV that no spreadsheet takes for a formula, with the caution', async () => {
    expect(csvCell('=HYPERLINK("x")')).toBe(`"'=HYPERLINK(""x"")"`);
    expect(csvCell('-DN 20')).toBe("'-DN 20");
    expect(csvCell(-17.6)).toBe('-17.6');
    expect(csvCell('a, b')).toBe('"a, b"');
    const text = await systemsCsv(demo.ctx, reader, asked());
    expect(text.split('\r\n').filter((line) => line.startsWith('SYS-'))).toHaveLength(18);
    expect(text).toContain('An aid to qualified engineers.');
  });
});

describe('a system', () => {
  it('is unknown by another tag, another revision and another sheet', async () => {
    for (const found of [
      await systemOverview(demo.ctx, reader, 'SYS-999', asked()),
      await systemOverview(demo.ctx, reader, 'SYS-101', asked('revision=99')),
      await systemSheet(demo.ctx, reader, 'SYS-101', 'size:none/such', asked()),
      await systemDifference(demo.ctx, reader, 'SYS-101', asked('from=5&to=99')),
    ])
      expect(found).toMatchObject({ ok: false, problem: { code: 'UNKNOWN' } });
  });

  it('says what governs, what will hold, and who may raise a case', async () => {
    const page = value(await systemOverview(demo.ctx, reader, 'SYS-201', asked()));
    expect(page.frame.pending.some((one) => /approved, not installed.*76\.2/.test(one.text))).toBe(true);
    expect(page.frame.raise).toHaveProperty('whyNot');
    const originator = await demo.actor('hedda.brannick');
    const own = value(await systemOverview(demo.ctx, originator, 'SYS-201', asked()));
    expect(own.frame.raise).toEqual({ href: '/s/ketterwold/cases/new?system=SYS-201' });
  });

  it('shows an older revision as such, and none where no body was held', async () => {
    const old = value(await systemOverview(demo.ctx, reader, 'SYS-101', asked('revision=4')));
    expect(old.frame.older?.text).toContain('revision 4');
    expect(old.view).toBeDefined();
    const unheld = value(await systemOverview(demo.ctx, reader, 'SYS-101', asked('revision=3')));
    expect(unheld.view).toBeUndefined();
  });

  it('reads as a document: every figure has its unit, and its origin where it has one', async () => {
    const { view } = value(await systemBasis(demo.ctx, reader, 'SYS-101', asked()));
    expect(view?.ratings[0]).toMatchObject({ tag: 'C-101', mawp: { text: '3.5', unit: 'barg' } });
    const ua = view?.sources.flatMap((one) => one.facts).find((fact) => fact.label.endsWith('UA'));
    expect(ua?.shown.unit).toBe('kW/K');
    expect(ua?.shown.origin).toBeTruthy();
  });

  it('has all standard scenarios with their statuses', async () => {
    const { view } = value(await systemScenarios(demo.ctx, reader, 'SYS-101', asked()));
    expect(view?.matrix.count.all).toBeGreaterThanOrEqual(35);
    expect(view?.groups[0]?.lines.filter((line) => line.governs)).toHaveLength(1);
  });

  it('opens each of its sheets', async () => {
    const { view } = value(await systemSheets(demo.ctx, reader, 'SYS-101', asked()));
    const keys = view?.groups.flatMap((group) => group.lines.map((line) => line.key)) ?? [];
    expect(keys.length).toBeGreaterThan(20);
    for (const key of keys)
      expect(value(await systemSheet(demo.ctx, reader, 'SYS-101', key, asked())).view).toBeDefined();
  });

  it('tells what changed from one revision to the next, results too', async () => {
    const { view } = value(await systemDifference(demo.ctx, reader, 'SYS-101', asked('from=4&to=5')));
    expect(view?.rows.some((row) => row.now === 'L' && row.old === 'K')).toBe(true);
    expect(view?.moved.length).toBeGreaterThan(0);
    const list = value(await systemRevisions(demo.ctx, reader, 'SYS-101')).view?.revisions ?? [];
    expect(list[0]).toMatchObject({ name: '5', state: 'in force', case: { number: 'KW-2025-038' } });
    expect(list.find((one) => one.name === '3')?.href).toBeUndefined();
  });
});

describe('lists', () => {
  it('say in words how many things wait', () => {
    expect([0, 1, 3, 12].map(headingOf)).toEqual([
      'Nothing waits for you',
      'One thing waits for you',
      'Three things wait for you',
      '12 things wait for you',
    ]);
  });

  it('bring each case to the one whose turn it is', async () => {
    const approver = value(await myWorkView(demo.ctx, await demo.actor('grace.okonta')));
    expect(approver.waiting.map((one) => one.tag)).toContain('KW-2026-003');
    const checker = value(await myWorkView(demo.ctx, await demo.actor('ilse.fennimore')));
    expect(checker.waiting.map((one) => one.tag)).toContain('KW-2026-008');
    expect(checker.others.map((one) => one.number)).toContain('KW-2026-003');
    expect(value(await myWorkView(demo.ctx, reader)).heading).toBe('Nothing waits for you');
  });

  it('filter due items by owner and state', async () => {
    const owner = await demo.actor('owen.tarrant');
    const mine = value(await dueView(demo.ctx, owner, asked('who=me')));
    expect(mine.lines.length).toBeGreaterThan(0);
    expect(mine.lines.every((line) => line.mine && line.owner === 'Owen Tarrant')).toBe(true);
    const closed = value(await dueView(demo.ctx, owner, asked('state=closed')));
    expect(closed.lines.every((line) => ['accepted', 'waived'].includes(line.state))).toBe(true);
  });

  it('find a relief point by the beginning of its tag', async () => {
    const found = value(await searchView(demo.ctx, reader, 'PSV-20'));
    expect(found.lines.some((line) => line.title.startsWith('PSV-201A'))).toBe(true);
  });

  it('show every method and every rule with its source', async () => {
    const methods = methodFile().groups.flatMap((group) => group.methods);
    expect(methods.length).toBeGreaterThan(15);
    expect(methods.every((one) => one.source !== '' && !('work' in one))).toBe(true);
    expect(methodView('a.gas').ok).toBe(true);
    expect(methodView('z.none')).toMatchObject({ ok: false, problem: { code: 'UNKNOWN' } });
    const { rules } = value(await rulebookView(demo.ctx, reader));
    expect(rules.length).toBeGreaterThanOrEqual(30);
    expect(rules.every((one) => one.source !== '' && one.condition !== '')).toBe(true);
  });
});

describe('a site of which one is no member', () => {
  it('does not exist', () => {
    const who = { person: { id: 'p' }, sites: [], standsInFor: [] };
    const context = { locals: { who } as unknown as App.Locals, params: { site: 'ketterwold' } };
    expect(siteActor(context)).toMatchObject({ ok: false, problem: { code: 'UNKNOWN' } });
  });
});
