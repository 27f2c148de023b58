/* Rich text comes out as safe HTML; equations of a sheet are set with the substitution under the equals sign. */
import { describe, expect, it } from 'vitest';
import { richHtml } from '@components/text/rich';
import { equationTex, texHtml } from '@components/sheet/tex';

const doc = (...content: unknown[]) => ({ type: 'doc' as const, content });
const paragraph = (...content: unknown[]) => ({ type: 'paragraph', content });
const figure = {
  type: 'figure',
  attrs: { doc: 'this', side: 'this', path: 'a/b', affirmed: { value: 46871, unit: 'kg/h' } },
};

describe('rich text', () => {
  it('escapes text and drops what it does not know', () => {
    const html = richHtml(
      doc(
        paragraph(
          {
            type: 'text',
            text: '<img src=x onerror=1>',
            marks: [{ type: 'bold' }, { type: 'link', attrs: { href: 'javascript:1' } }],
          },
          { type: 'script', content: [{ type: 'text', text: 'x' }] },
        ),
      ),
    );
    expect(html).toBe('<p><strong>&lt;img src=x onerror=1&gt;</strong>x</p>');
  });
  it('shows a live figure with its sheet, and says when it is stale', () => {
    const look = {
      figure: () => ({ text: '46 871 kg/h', href: '/s/x/sheets/2', sheet: 'sheet 2', now: '47 100 kg/h' }),
    };
    expect(richHtml(doc(paragraph(figure)), look)).toBe(
      '<p><a class="live stale" href="/s/x/sheets/2" title="Stale: sheet 2 now says 47 100 kg/h" data-sheet="sheet 2">46 871 kg/h<span class="vh">, Stale: sheet 2 now says 47 100 kg/h</span></a></p>',
    );
  });
  it('shows nothing of a hidden figure', () => {
    const html = richHtml(doc(paragraph(figure)), {
      figure: () => ({ text: '46 871', now: '47 100', href: '/x', hidden: true }),
    });
    expect(html).not.toMatch(/46|47|href/);
  });
  it('falls back to the affirmed figure, and links only to pages of ours', () => {
    expect(richHtml(doc(paragraph(figure)))).toMatch(/46\s871\skg\/h/);
    const place = { type: 'place', attrs: { doc: 'd', path: 'p', label: 'V-1' } };
    for (const href of ['javascript:alert(1)', 'https://elsewhere.example', '//elsewhere.example']) {
      expect(richHtml(doc(paragraph(place)), { place: () => ({ label: 'V-1', href }) })).toBe(
        '<p><span class="tag">V-1</span></p>',
      );
    }
  });
  it('keeps lists and survives malformed content', () => {
    expect(
      richHtml(
        doc({
          type: 'bulletList',
          content: [{ type: 'listItem', content: [paragraph({ type: 'text', text: 'a' })] }],
        }),
      ),
    ).toBe('<ul><li><p>a</p></li></ul>');
    expect(richHtml(doc(null, 3, 'x', [], { type: 'paragraph', content: 'no' }))).toBe('<p></p>');
    expect(richHtml(undefined)).toBe('');
  });
});

describe('equations', () => {
  it('puts the substitution under the equals sign', () => {
    expect(equationTex('W = \\dfrac{Q}{\\lambda}', 'W = \\dfrac{3320}{265}')).toBe(
      '\\begin{aligned}W&=\\dfrac{Q}{\\lambda}\\\\[3pt]&\\htmlClass{sub}{{}=\\dfrac{3320}{265}}\\end{aligned}',
    );
  });
  it('says a worded step once', () => {
    expect(equationTex('K_b = 1', 'K_b = 1')).not.toContain('htmlClass');
    expect(equationTex('\\text{critical}', '\\text{critical}')).toBe('\\text{critical}');
  });
  it('renders with MathML for those who listen, and never throws', () => {
    expect(texHtml('W = \\dfrac{Q}{\\lambda}', true)).toMatch(/<math[\s\S]*class="katex-html"/);
    expect(texHtml('\\notacommand{')).toContain('katex-error');
    expect(texHtml('\\href{javascript:alert(1)}{x}')).not.toContain('href=');
  });
});
