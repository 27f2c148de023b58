/* The pictures: true lengths, honest scales, labels that do not lie on each other. Source of the rules: the look's own section 5; no outside source. */
import { describe, expect, it } from 'vitest';
import { gapPicture } from '@components/field/gap';
import {
  miniRail,
  orificeBar,
  orificeRuler,
  pressureLadder,
  ratioBar,
  scaleMax,
  valve,
  verdictMark,
} from '@components/pictures';
import { escapeText } from '@components/pictures/draw';
import { ladderSentence } from '@components/pictures/ladder';
import { spread, type PlacedLabel } from '@components/pictures/ladder-labels';
import { ladderFrame, ladderScale, niceStep } from '@components/pictures/ladder-scale';
import { placeLetters } from '@components/pictures/letters';

const STATE = {
  set: 17.5,
  operating: 15.2,
  reseating: 16.28,
  relieving: 19.25,
  backPressure: 2.1,
  mawp: 19,
  allowed: 20.9,
};
const width = (svg: string, name: string) =>
  Number(new RegExp(`class="${name}"[^>]*width="([\\d.]+)"`).exec(svg)?.[1]);

describe('orifice bar', () => {
  const scale = { max: 2600, width: 262, installed: 2000 };
  it('draws lengths from zero in one scale', () => {
    expect(width(orificeBar(scale, { required: 1000 }), 'or-bar')).toBeCloseTo(100, 0);
    expect(width(orificeBar(scale, { required: 500 }), 'or-bar')).toBeCloseTo(50, 0);
  });
  it('ends the bar at the seat and blocks out what goes beyond', () => {
    const over = orificeBar(scale, { required: 2400 });
    expect(width(over, 'or-bar')).toBeCloseTo(200, 0);
    expect(over).toContain('or-over');
    expect(orificeBar(scale, { required: 1999 })).not.toContain('or-over');
  });
  it('says required, installed and use in words', () => {
    expect(orificeBar(scale, { required: 2400 })).toContain(
      'aria-label="required 2\u2009400.0 of 2\u2009000.0 mm², 120.0 %"',
    );
    expect(orificeBar(scale, {})).toContain('not sized');
  });
  it('ends the scale a tenth beyond the larger area', () => {
    expect(scaleMax([100, 200])).toBeCloseTo(220);
    expect(scaleMax([])).toBeGreaterThan(0);
  });
  it('keeps all seat lines of the register in one column', () => {
    const seat = (svg: string) => /class="or-seat" d="M([\d.]+)/.exec(svg)?.[1];
    expect(seat(ratioBar({ used: 12 }))).toBe(seat(ratioBar({ used: 119 })));
    expect(ratioBar({ used: 119 })).toContain('or-over');
    expect(ratioBar({})).toContain('or-none');
  });
});

describe('letters of the ruler', () => {
  it('draws crowding letters as a range', () => {
    const ruler = orificeRuler({ max: 2600, width: 208, installed: 2322.6, present: 1840.6 });
    expect(ruler).toMatch(/>D–[FG]</);
    expect(ruler).toContain('or-letter now');
    expect(ruler).toContain('or-letter was');
  });
  it.each([120, 208, 300, 340])('leaves no two labels on each other at %i px', (pixels) => {
    for (const max of [200, 900, 2600, 8000, 20000]) {
      const letters = [71, 126, 198, 325, 506, 830, 1186, 1841, 2323, 2800, 4116, 7129, 10323, 16774].filter(
        (a) => a <= max,
      );
      const at = letters.map((area, i) => ({
        letter: 'DEFGHJKLMNPQRT'[i] ?? '',
        x: (area / max) * pixels,
        kept: i === letters.length - 1,
      }));
      const placed = placeLetters(at).sort((a, b) => a.x - b.x);
      const half = (label: string) => (label.length === 1 ? 4 : 11);
      placed.forEach((label, i) => {
        const before = placed[i - 1];
        if (before) expect(label.x - before.x).toBeGreaterThanOrEqual(half(label.label) + half(before.label));
      });
      expect(placed.some((label) => label.kept)).toBe(true);
    }
  });
  it('names an installed area that is no letter by its figure', () => {
    expect(orificeRuler({ max: 6000, installed: 4560 })).toContain('>4\u2009560<');
  });
});

describe('pressure ladder', () => {
  it('takes steps of 1, 2 or 5', () => {
    expect([0.013, 0.7, 1.2, 3, 60].map(niceStep)).toEqual([0.02, 1, 2, 5, 100]);
  });
  it('breaks an empty scale once and keeps one bar per pixel on both sides', () => {
    const scale = ladderScale([STATE]);
    expect(scale).toMatchObject({ lo: 14, hi: 22, low: 3, step: 1 });
    const { y } = ladderFrame(scale, 34, 414);
    expect(y(20) - y(21)).toBeCloseTo(y(0) - y(1), 0);
  });
  it('does not break a scale that has no empty part', () => {
    expect(ladderScale([{ set: 0.6, operating: 0.1, mawp: 0.7 }])).toMatchObject({ lo: 0, low: 0 });
  });
  it('keeps every pressure on the scale', () => {
    for (const factor of [0.02, 1, 14.5, 100, 1000]) {
      const state = Object.fromEntries(
        Object.entries(STATE).map(([key, value]) => [key, value * factor]),
      ) as typeof STATE;
      const frame = ladderFrame(ladderScale([state]), 34, 414);
      for (const value of Object.values(state)) {
        expect(frame.y(value)).toBeGreaterThanOrEqual(34);
        expect(frame.y(value)).toBeLessThanOrEqual(414);
      }
    }
  });
  it('pushes labels apart and keeps their order', () => {
    const labels: PlacedLabel[] = [100, 101, 102, 103, 300].map((y) => ({
      key: 'set',
      name: '',
      value: y,
      y,
      at: 0,
    }));
    const placed = spread(labels, 30, 400);
    placed.forEach(
      (label, i) => i > 0 && expect(label.at - (placed[i - 1]?.at ?? 0)).toBeGreaterThanOrEqual(16.9),
    );
    expect(placed.map((label) => label.value)).toEqual([100, 101, 102, 103, 300]);
  });
  it('runs through what stays and steps what changes', () => {
    const svg = pressureLadder({
      of: 'PSV-1',
      unit: 'barg',
      present: STATE,
      proposed: { ...STATE, set: 18.2 },
      form: 'wide',
      id: 'x',
    });
    expect(svg.match(/class="rung mawp"/g)).toHaveLength(1);
    expect(svg).toMatch(/class="rise set"/);
    expect(svg).toContain('+0.70');
    const rerated = pressureLadder({
      of: 'PSV-1',
      unit: 'barg',
      present: STATE,
      proposed: { ...STATE, mawp: 20, allowed: 22 },
      form: 'wide',
      id: 'x',
    });
    expect(rerated.match(/class="rung mawp"/g)).toHaveLength(2);
  });
  it('says itself in a sentence', () => {
    expect(
      ladderSentence({
        of: 'PSV-1',
        unit: 'barg',
        present: STATE,
        proposed: { ...STATE, set: 18.2 },
        form: 'short',
        id: 'x',
      }),
    ).toBe(
      'Pressure ladder of PSV-1 in barg: allowed 20.90, relieving 19.25, MAWP 19.00, set 17.50 to 18.20, reseating 16.28, operating 15.20, back pressure 2.10',
    );
  });
  it('lets no markup of a tag through', () => {
    expect(
      pressureLadder({ of: '<b>"', unit: 'barg', present: STATE, form: 'short', id: 'x' }),
    ).not.toContain('<b>');
    expect(escapeText(`<a href='x' "&">`)).toBe('&lt;a href=&#39;x&#39; &quot;&amp;&quot;&gt;');
  });
});

describe('rail and marks', () => {
  it('draws one waiting gate, those before it passed, those after it shut', () => {
    const rail = miniRail(2);
    expect([
      rail.match(/v-passed/g)?.length,
      rail.match(/v-waiting/g)?.length,
      rail.match(/v-shut/g)?.length,
    ]).toEqual([2, 1, 2]);
    expect(miniRail(5)).not.toMatch(/v-waiting|v-shut|class="empty"/);
    expect(miniRail(2, { held: true })).toContain('v-held');
  });
  it('differs in shape, not only in colour', () => {
    const shapes = (['passed', 'waiting', 'held'] as const).map((state) =>
      valve(state).replace(/class="[^"]*"/g, ''),
    );
    expect(new Set(shapes).size).toBe(3);
    const marks = (['adequate', 'marginal', 'inadequate', 'not-sized'] as const).map(verdictMark);
    expect(new Set(marks).size).toBe(4);
  });
});

describe('gap of a field entry', () => {
  it('draws the tolerance to scale between seen and signed', () => {
    const svg = gapPicture({ seen: 17.7, signed: 18.4, tolerance: 0.35, toleranceWords: '± 0.35 barg' });
    const signed = Number(/class="ap" d="M([\d.]+)/.exec(svg)?.[1]);
    const seen = Number(/class="se" d="M([\d.]+)/.exec(svg)?.[1]);
    const from = Number(/class="tol" d="M([\d.]+)/.exec(svg)?.[1]);
    expect((signed - from) / (signed - seen)).toBeCloseTo(0.5, 2);
  });
});
