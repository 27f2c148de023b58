/* What single components promise: hidden fields of forms, errors tied to fields, hidden results that do not leak. */
import { describe, expect, it } from 'vitest';
import DifferenceTable from '@components/case/DifferenceTable.astro';
import GatePanel from '@components/case/GatePanel.astro';
import ScenarioTable from '@components/case/ScenarioTable.astro';
import SignForm from '@components/case/SignForm.astro';
import UnseenCompare from '@components/case/UnseenCompare.astro';
import FieldSeen from '@components/field/FieldSeen.astro';
import ActButton from '@components/forms/ActButton.astro';
import QuantityField from '@components/forms/QuantityField.astro';
import SortHead from '@components/page/SortHead.astro';
import PressureLadder from '@components/pictures/PressureLadder.astro';
import { render } from '../../support/render';

describe('forms', () => {
  it('post version, key and way back', async () => {
    const html = await render(SignForm, {
      action: '/a',
      title: 'Sign',
      meaning: 'I accept.',
      signs: 'KW-1',
      pageHash: 'h1',
      label: 'Sign and pass',
      version: 4,
      key: 'k9',
      back: '/s/x',
    });
    for (const [name, value] of [
      ['_version', '4'],
      ['_key', 'k9'],
      ['_back', '/s/x'],
      ['pageHash', 'h1'],
    ]) {
      expect(html).toContain(`name="${name}" value="${value}"`);
    }
    expect(html).toContain('“I accept.”');
    expect(html).toMatch(/type="password"[^>]*autocomplete="current-password"/);
  });
  it('tie hint, unit and error to the figure, which is text with a decimal keyboard', async () => {
    const html = await render(QuantityField, {
      label: 'Load',
      name: 'w',
      unit: 'kg/h',
      hint: 'per device',
      error: 'Too low.',
    });
    expect(html).toContain('type="text" inputmode="decimal"');
    expect(html).toContain('aria-describedby="w-hint w-error w-unit"');
    expect(html).toContain('aria-invalid="true"');
  });
  it('give the reason in place of an act that is not permitted', async () => {
    const html = await render(ActButton, { action: '/a', label: 'Pass', whyNot: 'Four points are open.' });
    expect(html).toMatch(/Pass:<\/b> Four points are open\./);
    expect(html).not.toMatch(/<button|<form|disabled/);
  });
});

describe('hidden results', () => {
  it('of a scenario do not reach the page', async () => {
    const line = {
      number: 1,
      name: 'Loss of cooling',
      disposition: 'credible',
      load: '45100',
      required: '2030',
      area: 2030,
      used: '87.4',
      verdict: 'marginal',
      hidden: true,
    };
    const html = await render(ScenarioTable, {
      lines: [line],
      caption: 'Scenarios',
      scale: { max: 2600, installed: 2322.6 },
      units: { load: 'kg/h', area: 'mm²', used: '%' },
      last: 'verdict',
    });
    expect(html).toContain('Hidden until your own figures are in');
    expect(html).not.toMatch(/45100|2030|87\.4|[Mm]arginal/);
  });
  it('of the sheet stay behind film until the own figures are in', async () => {
    const rows = [{ what: 'Load', yours: '8150', sheet: '9000', differs: '+3 %' }];
    expect(await render(UnseenCompare, { caption: 'c', rows, hidden: true })).not.toMatch(/9000|\+3/);
    expect(await render(UnseenCompare, { caption: 'c', rows })).toMatch(/9000[\s\S]*\+3 % +within/);
  });
  it('of a ladder and of a difference are not drawn', async () => {
    const state = { set: 17.531, mawp: 19 };
    expect(
      await render(PressureLadder, {
        of: 'P',
        unit: 'barg',
        present: state,
        form: 'short',
        id: 'a',
        hidden: true,
      }),
    ).not.toContain('17.53');
    const rows = [{ where: 'Area', old: '1840.6', now: '2322.6', hidden: true }];
    expect(await render(DifferenceTable, { rows, caption: 'c', oldHead: 'a', nowHead: 'b' })).not.toMatch(
      /1840|2322/,
    );
  });
});

describe('gate, field sheet, order', () => {
  it('lists open points with links and says when nothing is open', async () => {
    const html = await render(GatePanel, {
      from: 'Calculation check',
      to: 'Approval',
      points: [{ sentence: 'Finding 2 is open.', href: '/f2', link: 'Read it' }],
    });
    expect(html).toMatch(/Calculation check to approval/);
    expect(html).toMatch(/Finding 2 is open\. <a href="\/f2">Read it<\/a>/);
    expect(await render(GatePanel, { from: 'Draft', to: 'Scenario analysis', points: [] })).toContain(
      'Nothing is open.',
    );
  });
  it('puts what is seen before what was signed, and says that start-up is held', async () => {
    const html = await render(FieldSeen, {
      label: 'CDTP',
      seen: '17.7',
      unit: 'barg',
      agrees: false,
      signed: '18.4',
      sentence: 'Outside ± 3 %.',
    });
    expect(html.indexOf('17.7')).toBeLessThan(html.indexOf('18.4'));
    expect(html).toMatch(/Discrepancy\.<\/b> Outside ± 3 %\. <span class="nw">Start-up is held/);
  });
  it('sorts by a link that keeps the filters and turns round', async () => {
    const head = (query: string) =>
      render(SortHead, {
        label: 'Set',
        column: 'set',
        url: new URL(`http://x.test/r${query}`),
        figures: true,
      });
    expect(await head('?q=PSV&page=3')).toContain('href="?q=PSV&#38;sort=set"');
    expect(await head('?sort=set')).toMatch(/aria-sort="ascending"[\s\S]*sort=-set/);
  });
});
