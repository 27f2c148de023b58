/* The canonical form and its hash. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonical, hashOf, roundedForHash, sameContent } from '@domain/basis';

function shuffled(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(shuffled);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, field]) => [key, shuffled(field)]),
  );
}

describe('canonical', () => {
  it('sorts keys, drops absent ones and keeps lists in order', () => {
    expect(canonical({ b: [2, 1], a: undefined, c: 'x' })).toBe('{"b":[2,1],"c":"x"}');
  });

  it('writes numbers as the shortest decimal and −0 as 0', () => {
    expect(canonical([0.1, 1e21, -0, 12.5])).toBe('[0.1,1e+21,0,12.5]');
  });

  it('takes composed and decomposed letters as the same (Unicode NFC)', () => {
    expect(canonical('Ga\u0308rung')).toBe(canonical('G\u00e4rung'));
  });

  it('refuses what no document holds', () => {
    expect(() => canonical({ value: Number.NaN })).toThrow(RangeError);
  });

  it('does not depend on the order of keys', () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => canonical(value) === canonical(shuffled(value))));
  });

  it('tells different values apart', () => {
    fc.assert(
      fc.property(fc.jsonValue(), fc.jsonValue(), (one, other) => {
        const plain = (value: unknown) => JSON.parse(canonical(value)) as unknown;
        expect(sameContent(one, other)).toBe(canonical(plain(one)) === canonical(plain(other)));
      }),
    );
  });
});

describe('hashOf', () => {
  // SHA-256 of the bytes "document\n1\n{}", worked with sha256sum (FIPS 180-4).
  it('is SHA-256 over kind, schema and canonical form', () => {
    expect(hashOf('document', {})).toBe('9f00f679389f83f1876a3597f1a31e42a5abfb5ba53a5a65acf76f2e87e6de8b');
  });

  it('differs by kind and by content', () => {
    expect(hashOf('document', { a: 1 })).not.toBe(hashOf('sheet', { a: 1 }));
    expect(hashOf('document', { a: 1 })).not.toBe(hashOf('document', { a: 2 }));
  });

  it('lets worked floats in at nine significant digits', () => {
    expect(roundedForHash(0.1 + 0.2)).toBe(0.3);
    expect(roundedForHash(1_234_567_894)).toBe(1_234_567_890);
  });
});
