/* The pure parts of the editor of rich texts: with which text it opens, what it posts, what pasting keeps, which figures are stale. */
import { describe, expect, it } from 'vitest';
import { plainText, richFromText } from '@domain/text';
import { affirm, figureText, movedTo, offeredIn } from '@islands/rich/figures';
import { cleanPasted, countOf, postedText, richOf, startOf } from '@islands/rich/start';

const stored = JSON.stringify(richFromText('As stored.'));
const words = (text: { text: Parameters<typeof plainText>[0] }) => plainText(text.text);

describe('the text an editor opens with', () => {
  it('is the stored text while nobody typed', () => {
    const start = startOf({ draft: null, typed: 'As stored.', shown: 'As stored.', stored });
    expect([start.from, words(start)]).toEqual(['stored', 'As stored.']);
  });

  it('is what was typed into the plain area when it differs', () => {
    const start = startOf({ draft: null, typed: 'Typed\n\nmore', shown: 'As stored.', stored });
    expect([start.from, words(start)]).toEqual(['typed', 'Typed\nmore']);
  });

  it('is the draft before anything else', () => {
    const draft = JSON.stringify(richFromText('Half a sen'));
    const start = startOf({ draft, typed: 'x', shown: 'y', stored });
    expect([start.from, words(start)]).toEqual(['draft', 'Half a sen']);
  });

  it('takes broken JSON for plain text, so that no word is lost', () => {
    expect(plainText(richOf('{"type":"doc" oops'))).toBe('{"type":"doc" oops');
  });
});

describe('what the field posts', () => {
  it('begins as the server expects and holds known nodes only', () => {
    const link = { type: 'text', text: 'here', marks: [{ type: 'link', attrs: { href: 'javascript:1' } }] };
    const posted = postedText({ type: 'doc', content: [{ type: 'paragraph', content: [link] }] });
    expect(posted.startsWith('{"type":"doc"')).toBe(true);
    expect(posted).not.toContain('javascript');
    expect(posted).toContain('here');
  });

  it('is nothing for an empty text, so that "missing" stays missing', () => {
    expect(postedText({ type: 'doc', content: [{ type: 'paragraph' }] })).toBe('');
  });

  it('counts words and characters', () => {
    expect(countOf(richFromText('Two words'))).toEqual({ characters: 9, words: 2 });
  });
});

it('pasting from a word processor loses its styles, comments and office tags, and keeps the words', () => {
  const html =
    '<meta charset="utf-8"><!--[if gte mso 9]><xml><o:p>x</o:p></xml><![endif]--><style>p{mso-x:1}</style>' +
    '<p class=MsoNormal style="mso-margin:0"><b>Load</b> rises<o:p></o:p></p>';
  expect(cleanPasted(html)).toBe('<p><b>Load</b> rises</p>');
});

describe('live figures', () => {
  const offered = {
    path: 'points/rp_1#total',
    label: 'Total back pressure',
    value: { value: 1.2, unit: 'bar_g' },
  };

  it('are read from the page, and what is not a figure is left out', () => {
    expect(offeredIn(JSON.stringify([offered, { path: 'x' }, 3]))).toEqual([offered]);
    expect(offeredIn('not json')).toEqual([]);
    expect(offeredIn(undefined)).toEqual([]);
  });

  it('read as their affirmed value', () => {
    expect(figureText(affirm({ ...offered, decimals: 2 }))).toBe('1.20\u00a0barg'.replace('\u00a0', ' '));
  });

  it('are stale once the offered value moved by more than 0.1 %', () => {
    const attrs = affirm(offered);
    expect(movedTo(attrs, [offered])).toBeUndefined();
    const moved = { ...offered, value: { value: 1.22, unit: 'bar_g' } };
    expect(movedTo(attrs, [moved])).toBe(moved);
  });

  it('say nothing of a figure that the page does not offer', () => {
    expect(movedTo(affirm(offered), [])).toBeUndefined();
  });
});
