import fc from 'fast-check';
import { canonicalJson, sha256 } from './canonical-json.js';

const shuffled = (value: unknown): unknown => {
  if (Array.isArray(value)) return value.map(shuffled);
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(Object.entries(value).reverse().map(([key, v]) => [key, shuffled(v)]));
};

describe('canonical JSON', () => {
  it('reads back as what was written, whatever the order of keys', () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => {
      const text = canonicalJson(value);
      expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)));
      expect(canonicalJson(shuffled(value))).toBe(text);
    }));
  });

  it('leaves out what is undefined and refuses what JSON cannot hold', () => {
    expect(canonicalJson({ b: 1, a: [null, 'ü'], c: undefined })).toBe('{"a":[null,"ü"],"b":1}');
    for (const value of [Number.NaN, Infinity, -Infinity]) expect(() => canonicalJson({ value })).toThrow(TypeError);
  });

  it('digests as FIPS 180-4 does', () => {
    // the standard's own example for "abc"
    expect(sha256('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });
});
