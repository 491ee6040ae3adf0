import { describe, expect, it } from 'vitest';
import { InputError } from '../../../src-main/errors.ts';
import { canonicalJson } from '../../../src-main/project/canonical-json.ts';

function refusal(value: unknown): { where: string; received: string } {
  try {
    canonicalJson(value);
  } catch (error) {
    if (error instanceof InputError && error.fields.code === 'not-json') return error.fields;
    throw error;
  }
  throw new Error('accepted');
}

describe('canonicalJson', () => {
  it('gives one text to equal values, whatever the order of their members', () => {
    expect(canonicalJson({ b: [1, { d: null, c: 'x' }], a: -0 })).toBe('{"a":0,"b":[1,{"c":"x","d":null}]}');
    expect(canonicalJson({ a: 0, b: [1, { c: 'x', d: null }] })).toBe('{"a":0,"b":[1,{"c":"x","d":null}]}');
  });

  it('leaves out members that are undefined, as absent', () => {
    expect(canonicalJson({ a: undefined, b: 1 })).toBe('{"b":1}');
  });

  it('accepts the same object twice, but not inside itself', () => {
    const shared = { x: 1 };
    expect(canonicalJson([shared, shared])).toBe('[{"x":1},{"x":1}]');
    const loop: unknown[] = [];
    loop.push({ loop });
    expect(refusal(loop)).toMatchObject({ where: '$[0].loop', received: 'an object that contains itself' });
  });

  it('does not join or compose characters', () => {
    expect(canonicalJson(['\u00e9', 'e\u0301'])).toBe('["\u00e9","e\u0301"]');
  });

  it.each([
    ['NaN', { a: [1, NaN] }, '$.a[1]'],
    ['Infinity', { a: Infinity }, '$.a'],
    ['half a surrogate pair', { a: 'x\ud800' }, '$.a'],
    ['half a surrogate pair in a name', { a: { '\udc00': 1 } }, "$.a (a member's name)"],
    ['undefined in a list', [1, undefined], '$[1]'],
    ['a hole in a list', new Array(1), '$[0]'],
    ['undefined', undefined, '$'],
    ['a function', { a: () => 1 }, '$.a'],
    ['a big integer', { a: 1n }, '$.a'],
    ['a date', { a: new Date(0) }, '$.a'],
    ['a typed array', { a: new Float64Array(2) }, '$.a'],
    ['a map', { a: new Map() }, '$.a'],
    ['an object that says otherwise what it is', { a: { toJSON: () => 1 } }, '$.a'],
  ])('refuses %s and says where', (_, value, where) => {
    expect(refusal(value).where).toBe(where);
  });
});
