/* What may I do: sorted acts, links to their forms, where the machine says they lead, and the page without script. */
import { renderToString } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { type ActAnswer } from '@domain/case';
import { linkOf, type MachineProps, sortActs } from '@islands/acts/groups';
import { leadsTo, snapshotOf, stagesAfter } from '@islands/acts/next-stage';
import { WhatMayIDo } from '@islands/WhatMayIDo';

const machine = (more: Partial<MachineProps> = {}): MachineProps => ({
  stage: 'scenarios',
  context: {
    class: 'permanent',
    graded: false,
    acted: false,
    extensions: 0,
    documents: [{ id: 'doc_1', state: 'open' }],
    removed: [],
  },
  actor: { id: 'p_o', roles: ['originator'], seats: ['originator'] },
  open: [],
  ...more,
});
const leads = (act: string, of: MachineProps) => leadsTo(act, of, snapshotOf(of));
const open = [
  { code: 'SHEET', sentence: 'The sheet of Fire is incomplete.', where: 'cases/KW-2026-003/sheets' },
];

const ACTS: ActAnswer[] = [
  { act: 'edit-document', words: 'edit the relief basis', ok: true },
  {
    act: 'PASS-scenarios',
    words: 'send it to the calculation check',
    ok: false,
    code: 'GATE_SHUT',
    sentence: 'One point is still open at this gate.',
  },
  {
    act: 'SIGN',
    words: 'sign the approval',
    ok: false,
    code: 'NOT_INDEPENDENT',
    sentence: 'You are the originator.',
  },
  {
    act: 'unseen',
    words: 'enter the unseen check',
    ok: false,
    code: 'NOT_PERMITTED',
    sentence: 'Only the checker.',
  },
];

describe('where an act leads', () => {
  it('the originator sends the analysis to the check', () => {
    expect(leads('PASS-scenarios', machine())).toBe('The case then goes to calculation check.');
  });

  it('nowhere while a point of the gate is open', () => {
    expect(leads('PASS-scenarios', machine({ open }))).toBeUndefined();
  });

  it('nowhere for somebody without the seat', () => {
    const checker = { id: 'p_c', roles: ['checker'], seats: ['checker'] };
    expect(leads('PASS-scenarios', machine({ actor: checker }))).toBeUndefined();
  });

  it('the last signature goes to the field or, where nothing in the plant changes, into force', () => {
    const actor = { id: 'p_a', roles: ['approver'], seats: ['approver'] };
    expect(leads('SIGN', machine({ stage: 'approval', actor }))).toBe(
      'The case then goes to field verification or into force, once every approver has signed.',
    );
  });

  it('is not asked of acts that are not the machine’s', () => {
    const of = machine();
    expect(stagesAfter('edit-document', of, snapshotOf(of))).toBeUndefined();
  });
});

describe('the list', () => {
  it('sorts by what keeps an act from happening; acts of other people are not shown', () => {
    const { now, later, never, notNow } = sortActs(ACTS);
    expect([now, later, never, notNow].map((list) => list.map(({ act }) => act))).toEqual([
      ['edit-document'],
      ['PASS-scenarios'],
      ['SIGN'],
      [],
    ]);
  });

  it('links to the part that holds the form, or where the page says', () => {
    expect(linkOf('edit-document', '/s/x/cases/1')).toBe('/s/x/cases/1/changes');
    expect(linkOf('HOLD', '/s/x/cases/1')).toBe('/s/x/cases/1/signatures');
    expect(linkOf('HOLD', '/s/x/cases/1', { HOLD: '#hold' })).toBe('#hold');
  });

  it('is whole without script: acts, reasons and open points with links', () => {
    const html = renderToString(
      <WhatMayIDo acts={ACTS} machine={machine({ open })} base="/s/ketterwold/cases/KW-2026-003" />,
    );
    expect(html).toContain('href="/s/ketterwold/cases/KW-2026-003/changes"');
    expect(html).toContain('One point is still open at this gate.');
    expect(html).toContain('href="/s/ketterwold/cases/KW-2026-003/sheets"');
    expect(html).toContain('You are the originator.');
    expect(html).not.toContain('Only the checker.');
  });
});
