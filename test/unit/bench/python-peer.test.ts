import { describe, expect, it } from 'vitest';
import { PeerMissing, readAnswer, timedAnswer } from '../../bench/python-peer.ts';

describe('readAnswer', () => {
  it('reads a median and the values', () => {
    const line = '{"medianS": 0.25, "values": [6146.78, 1806]}\n';
    expect(readAnswer(line, timedAnswer)).toEqual({ medianS: 0.25, values: [6146.78, 1806] });
  });

  it('tells a library that is not there from a failure', () => {
    const line = '{"skipped": "No module named \'statsmodels\'"}';
    expect(() => readAnswer(line, timedAnswer)).toThrow(PeerMissing);
    expect(() => readAnswer(line, timedAnswer)).toThrow("No module named 'statsmodels'");
  });

  it.each([
    ['no line', ''],
    ['no JSON', 'Traceback (most recent call last):'],
    ['a NaN among the values, as Python writes it', '{"medianS": 1, "values": [NaN]}'],
    ['no values', '{"medianS": 1, "values": []}'],
    ['no median', '{"values": [1]}'],
    ['a median of zero', '{"medianS": 0, "values": [1]}'],
    ['a value that is none', '{"medianS": 1, "values": [null]}'],
    ['more than was agreed', '{"medianS": 1, "values": [1], "unit": "h"}'],
  ])('%s is a failure', (_, line) => {
    expect(() => readAnswer(line, timedAnswer)).toThrow();
    expect(() => readAnswer(line, timedAnswer)).not.toThrow(PeerMissing);
  });
});
