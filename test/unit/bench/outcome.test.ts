import { describe, expect, it } from 'vitest';
import { sameNumbers } from '../../bench/comparison.ts';
import { outcome } from '../../bench/outcome.ts';

const compare = sameNumbers({ rel: 1e-6, why: 'the same rows' });
const own = { medianMs: 2, values: [1] };

describe('outcome', () => {
  it('meets a target at its bound and misses it beyond', () => {
    const peer = { name: 'a peer', atMost: 0.25, compare };
    expect(outcome('a case', peer, own, { medianMs: 8, values: [1] })).toEqual({
      ratio: 0.25,
      isMet: true,
      agrees: true,
      line: 'a case | a peer | 2 ms | 8 ms | ratio 0.25 | at most 0.25: met | values agree: relative difference 0.0, at most 0.0000010 (the same rows)',
    });
    const missed = outcome('a case', peer, own, { medianMs: 7.99, values: [1] });
    expect(missed).toMatchObject({ isMet: false, agrees: true });
    expect(missed.line).toContain('MISSED');
  });

  it('says of a fast wrong answer that it differs', () => {
    const wrong = outcome('a case', { name: 'a peer', atMost: 1, compare }, own, { medianMs: 2000, values: [1.1] });
    expect(wrong).toMatchObject({ ratio: 0.001, isMet: true, agrees: false });
    expect(wrong.line).toContain('2000 ms | ratio 0.0010 | at most 1: met | values DIFFER');
  });

  it('has nothing to miss without a target, and nothing to differ without a comparison', () => {
    const shown = outcome('a case', { name: 'a peer' }, own, { medianMs: 1, values: [] });
    expect(shown).toMatchObject({ ratio: 2, isMet: true, agrees: true });
    expect(shown.line).toContain('no target | not compared');
  });

  it('does not take a time that is no number for a target met', () => {
    const peer = { name: 'a peer', atMost: 1 };
    expect(outcome('a case', peer, own, { medianMs: NaN, values: [] }).isMet).toBe(false);
  });
});
