/* Headers: parsed, changed by ops, told apart, named. */
import { describe, expect, it } from 'vitest';
import { applyHeaderOps, describePath, parseHeader, rangeKeyAt, richFromText } from '@domain/basis';
import { difference } from '@domain/difference';
import type { Header } from '@domain/header';

function header(): Header {
  const segment = {
    id: 'sg_1',
    from: 'nd_a',
    to: 'nd_t',
    bore: { value: 12, unit: 'in' },
    length: { value: 140, unit: 'm' },
    fittings: [],
  };
  const load = { id: 'ld_1', system: 'doc_101', scenario: 'cooling-water-loss', group: 'gr_1', node: 'nd_a' };
  const parsed = parseHeader({
    schema: 1,
    id: 'doc_601',
    tag: 'HDR-601',
    name: 'Low-pressure flare header',
    unit: 'un_600',
    service: 'Flare',
    disposesTo: 'FL-601',
    limits: { mach: { value: 0.5, unit: '-' } },
    nodes: [
      { id: 'nd_a', name: 'A' },
      { id: 'nd_t', name: 'Tip', tip: true },
    ],
    segments: [segment],
    members: [{ id: 'mb_1', system: 'doc_101', node: 'nd_a' }],
    references: [],
    assumptions: [],
    causes: [
      {
        id: 'cs_1',
        key: 'cooling-water-loss',
        name: 'Cooling water',
        text: richFromText('All condensers.'),
        loads: [load],
      },
    ],
    justifications: [],
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problem));
  return parsed.value;
}

describe('a header', () => {
  it('is changed and told apart like a basis', () => {
    const path = 'segments/sg_1/bore';
    const next = applyHeaderOps(header(), [{ op: 'set', path, value: { value: 10, unit: 'in' } }]);
    const changes = next.ok ? difference(header(), next.value) : [];
    expect(changes).toMatchObject([{ path, kind: 'moved', label: 'segment, bore' }]);
  });

  it('refuses an impossible Mach number', () => {
    const value = { value: 1.4, unit: '-' };
    expect(applyHeaderOps(header(), [{ op: 'set', path: 'limits/mach', value }])).toMatchObject({
      ok: false,
      problem: { code: 'VALUE_IMPOSSIBLE' },
    });
  });

  it('knows its range keys and places', () => {
    expect(rangeKeyAt('segments/sg_1/length', header())).toBe('outletLength');
    expect(describePath(header(), 'causes/cs_1/loads/ld_1/share').label).toContain('Cooling water');
  });
});
