import { describe, expect, it } from 'vitest';
import { withinTime } from '../../../src-main/readers/within-time.ts';

/** (module (func (export "f") (loop (br 0)))), by the binary format of WebAssembly 1.0. */
const endless = [
  ...[0, 0x61, 0x73, 0x6d, 1, 0, 0, 0],
  ...[1, 4, 1, 0x60, 0, 0],
  ...[3, 2, 1, 0],
  ...[7, 5, 1, 1, 0x66, 0, 0],
  ...[10, 9, 1, 7, 0, 3, 0x40, 0x0c, 0, 0x0b, 0x0b],
];

describe('withinTime', () => {
  it('hands on what the work returns and throws', () => {
    expect(withinTime(1000, () => [1, 2])).toEqual([1, 2]);
    expect(() =>
      withinTime(1000, () => {
        throw new RangeError('too far');
      }),
    ).toThrow(RangeError);
  });

  it('stops WebAssembly that never ends', async () => {
    const { instance } = await WebAssembly.instantiate(Uint8Array.from(endless));
    const run = instance.exports['f'] as () => void;
    const started = performance.now();
    expect(() => withinTime(100, run)).toThrow(expect.objectContaining({ code: 'ERR_SCRIPT_EXECUTION_TIMEOUT' }));
    expect(performance.now() - started).toBeGreaterThan(90);
    expect(withinTime(1000, () => 'and goes on')).toBe('and goes on');
  });
});
