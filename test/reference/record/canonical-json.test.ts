import { describe, expect, it } from 'vitest';
import { InputError } from '../../../src-main/errors.ts';
import { canonicalJson } from '../../../src-main/project/canonical-json.ts';
import { digest } from '../../../src-main/project/digest.ts';
import vectors from './rfc8785.json' with { type: 'json' };

function doubleFrom(hex: string): number {
  return Buffer.from(hex, 'hex').readDoubleBE();
}

describe('canonicalJson against RFC 8785', () => {
  it.each(vectors.numbers)('writes the number $ieee754 as $json', ({ ieee754, json }) => {
    expect(canonicalJson(doubleFrom(ieee754))).toBe(json);
    expect(canonicalJson({ in: [doubleFrom(ieee754)] })).toBe(`{"in":[${json}]}`);
  });

  it.each(vectors.refused)('refuses $what', ({ ieee754, what }) => {
    expect(() => canonicalJson([0, doubleFrom(ieee754)])).toThrow(InputError);
    expect(() => canonicalJson([0, doubleFrom(ieee754)])).toThrow(what);
  });

  it('writes the sample of section 3.2.2 byte for byte', () => {
    const text = canonicalJson(JSON.parse(vectors.sample.input));
    expect(text).toBe(vectors.sample.canonical);
    expect(digest(text)).toBe(vectors.sample.sha256);
  });

  it('sorts the names of section 3.2.3 by UTF-16 code units', () => {
    const text = canonicalJson(JSON.parse(vectors.sorting.input));
    expect(Object.values(JSON.parse(`{${text.slice(1, -1).replace('"1"', '"one"')}}`) as object)).toEqual(
      vectors.sorting.order,
    );
  });
});
