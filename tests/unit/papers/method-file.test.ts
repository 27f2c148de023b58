/* The method file on paper: real PDF, its own fonts, every page numbered and cautioned, the same bytes for the same content. */
import { inflateSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { methodFilePdf } from '@/papers/method-file';
import { plainTex } from '@/papers/plain-tex';
import { methodFile } from '@services/views/methods';

/** The content streams of a PDF, inflated. */
function streams(pdf: Buffer): string[] {
  const text = pdf.toString('latin1');
  return [...text.matchAll(/stream\r?\n/g)].flatMap(({ index, 0: word }) => {
    const from = index + word.length;
    try {
      return [inflateSync(pdf.subarray(from, text.indexOf('endstream', from))).toString('latin1')];
    } catch {
      return [];
    }
  });
}

describe('the method file as PDF', () => {
  it('embeds its fonts, holds pages, and is made of the same bytes again', async () => {
    const file = methodFile({ topic: 'i' });
    const one = await methodFilePdf(file, 'An aid to qualified engineers.');
    expect(one.subarray(0, 5).toString()).toBe('%PDF-');
    expect(one.toString('latin1')).toMatch(/\/FontFile2/);
    expect((one.toString('latin1').match(/\/Type \/Page\b/g) ?? []).length).toBeGreaterThan(1);
    expect(streams(one).length).toBeGreaterThan(2);
    // Another object of equal content but for the caution's last sign is not at hand, so it is made anew.
    const again = await methodFilePdf(file, 'An aid to qualified engineers!');
    const third = await methodFilePdf(structuredClone(file), 'An aid to qualified engineers.');
    expect(third.equals(one)).toBe(true);
    expect(again.equals(one)).toBe(false);
  }, 120_000);
});

describe('an equation as a line of text', () => {
  it.each([
    ['A = \\frac{W}{C \\cdot K_d} \\sqrt{\\frac{T \\cdot Z}{M}}', 'A = W/(C · K_d) √((T · Z)/M)'],
    ['P_1 \\left(\\frac{2}{k+1}\\right)^{k/(k-1)}', 'P_1 (2/(k+1))^(k/(k-1))'],
    ['Q_{in} - \\dot{m} \\lambda', 'Q_in - m λ'],
    ['\\text{regime}: P_2 \\le P_{cf}', 'regime: P_2 ≤ P_cf'],
    ['\\unknown{x} }', 'unknownx'],
  ])('%s', (tex, text) => {
    expect(plainTex(tex)).toBe(text);
  });
});
