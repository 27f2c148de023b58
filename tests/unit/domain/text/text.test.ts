/* Rich text: plain text, words, cleaning, live figures. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  cleanRich,
  DEEPEST_NODE,
  figureMoved,
  figuresIn,
  isEmptyRich,
  LONGEST_TEXT,
  plainText,
  richFromText,
  richSchema,
  wordsOf,
  type FigureNode,
} from '@domain/text';

function figure(value: number, unit: string): FigureNode {
  return {
    type: 'figure',
    attrs: { doc: 'this', side: 'this', path: 'reliefPoints/rp_a/set', affirmed: { value, unit } },
  };
}

function textWith(...content: unknown[]) {
  return { type: 'doc', content: [{ type: 'paragraph', content }] } as const;
}

describe('plainText', () => {
  it('reads blocks as lines, figures as their affirmed value, people and places by name', () => {
    const rich = cleanRich({
      type: 'doc',
      content: [
        { type: 'heading', attrs: { level: 2 }, content: [{ type: 'text', text: 'Why' }] },
        {
          type: 'paragraph',
          content: [
            { type: 'text', text: 'Set at ' },
            figure(3.5, 'bar_g'),
            { type: 'text', text: ', says ' },
            { type: 'person', attrs: { id: 'pe_1', name: 'A. Berger' } },
          ],
        },
        {
          type: 'bulletList',
          content: [
            { type: 'listItem', content: [{ type: 'paragraph', content: [{ type: 'text', text: 'one' }] }] },
          ],
        },
      ],
    });
    expect(plainText(rich)).toMatch(/^Why\nSet at 3\.50* barg, says A\. Berger\none$/);
    expect(plainText(rich, () => '[figure]')).toContain('Set at [figure],');
    expect(wordsOf(rich).slice(0, 3)).toEqual(['Why', 'Set', 'at']);
  });

  it('gives back the lines that a text was made from', () => {
    const line = fc
      .string()
      .map((text) => text.replace(/\s+/g, ' ').trim())
      .filter((text) => text !== '');
    fc.assert(
      fc.property(fc.array(line, { minLength: 1 }), (lines) => {
        const rich = richFromText(lines.join('\n\n'));
        expect(richSchema.safeParse(rich).success).toBe(true);
        expect(plainText(rich)).toBe(lines.join('\n'));
      }),
    );
  });

  it('knows a text that says nothing', () => {
    expect(isEmptyRich(richFromText(' \n '))).toBe(true);
    expect(isEmptyRich(richFromText('No outlet valve.'))).toBe(false);
  });
});

describe('richSchema', () => {
  const fault = (rich: unknown) => richSchema.safeParse(rich).error?.issues[0]?.message;

  it('refuses unknown nodes, marks and attributes', () => {
    expect(fault({ type: 'doc', content: [{ type: 'iframe' }] })).toBe('a text may not hold a "iframe"');
    expect(fault(textWith({ type: 'text', text: 'x', marks: [{ type: 'link' }] }))).toBe(
      'a text may not be marked as "link"',
    );
    expect(fault({ type: 'doc', content: [{ type: 'paragraph', attrs: { style: 'x' } }] })).toBe(
      'a "paragraph" may not have "style"',
    );
    expect(fault(textWith({ type: 'figure', attrs: { doc: 'this' } }))).toBe(
      'a "figure" lacks what it points to',
    );
  });

  it('limits length and depth', () => {
    expect(fault(richFromText('x'.repeat(LONGEST_TEXT + 1)))).toContain(String(LONGEST_TEXT));
    let deep: unknown = { type: 'paragraph' };
    for (let depth = 0; depth < DEEPEST_NODE; depth += 1) deep = { type: 'blockquote', content: [deep] };
    expect(fault({ type: 'doc', content: [deep] })).toContain('deep at most');
  });
});

describe('cleanRich', () => {
  it('keeps the words of what it takes away', () => {
    const rich = cleanRich({
      type: 'doc',
      content: [
        { type: 'table', content: [{ type: 'text', text: 'in a cell' }] },
        {
          type: 'paragraph',
          attrs: { style: 'color:red' },
          content: [{ type: 'text', text: 'kept', marks: [{ type: 'link' }, { type: 'bold' }] }],
        },
        { type: 'paragraph', content: [{ type: 'figure', attrs: { path: 'x' } }, null] },
      ],
    });
    expect(rich.content).toEqual([
      { type: 'paragraph', content: [{ type: 'text', text: 'in a cell' }] },
      { type: 'paragraph', content: [{ type: 'text', text: 'kept', marks: [{ type: 'bold' }] }] },
      { type: 'paragraph' },
    ]);
  });

  it('always gives what the schema takes, and cleans only once', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const clean = cleanRich({ type: 'doc', content: [value, { type: 'paragraph', content: [value] }] });
        expect(richSchema.safeParse(clean).success).toBe(true);
        expect(cleanRich(clean)).toEqual(clean);
      }),
    );
  });
});

describe('live figures', () => {
  it('are found in reading order', () => {
    const rich = textWith(figure(1, 'bar_g'), { type: 'text', text: ' and ' }, figure(2, 'bar_g'));
    expect(figuresIn({ ...rich, content: [...rich.content] }).map((one) => one.attrs.affirmed.value)).toEqual(
      [1, 2],
    );
  });

  it('have moved beyond 0.1 %, units converted', () => {
    expect(figureMoved(figure(10, 'bar_g'), { value: 10.009, unit: 'bar_g' })).toBe(false);
    expect(figureMoved(figure(10, 'bar_g'), { value: 10.011, unit: 'bar_g' })).toBe(true);
    expect(figureMoved(figure(12, 'bar_g'), { value: 174.05, unit: 'psig' })).toBe(false);
    expect(figureMoved(figure(12, 'bar_g'), { value: 176, unit: 'psig' })).toBe(true);
  });

  it('have moved when they became another quantity, a word, or are gone', () => {
    expect(figureMoved(figure(12, 'bar_g'), { value: 12, unit: 'bar_abs' })).toBe(true);
    expect(figureMoved(figure(12, 'bar_g'), 'full vacuum')).toBe(true);
    expect(figureMoved(figure(12, 'bar_g'), undefined)).toBe(true);
  });

  it('compares temperatures by kelvin', () => {
    expect(figureMoved(figure(0, 'degC'), { value: 32, unit: 'degF' })).toBe(false);
    expect(figureMoved(figure(0, 'degC'), { value: 0.1, unit: 'degC' })).toBe(true);
  });
});
