import { describe, expect, it } from 'vitest';
import { quotedRange } from '../../../src-main/assumptions/quoted-range.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import type { QuotedRange } from '../../../src-main/contract/claim.ts';
import { computationOf } from '../../helpers/claim-computation.ts';

// The published ends are written out here from the publications, not taken from the table under test:
// AR6 WG1 §7.5.5: likely 2.5–4, very likely 2–5, virtually certain above 1.5 (ECS); likely 1.4–2.2, very likely 1.2–2.4
// (TCR). AR5 WG1 box 12.2: likely 1.5–4.5, very unlikely above 6 (from memory).
const thin = '\u202f';
const plain = (text: string) => text.replaceAll(thin, ' ');

function claim(quoted: QuotedRange | null, comparedWith: string | null = 'ar6-ecs') {
  const part = (value: string) => ({ value, unit: '' });
  const computation = computationOf(
    { kind: 'ratio', numerator: part('4.05'), denominator: part('1.61') },
    {},
    { value: '2.5' },
  );
  return { ...computation, evidence: { ...computation.evidence, comparedWith, quotedRange: quoted } };
}
const quoted = (low: string | null, high: string | null, levelPercent: number | null = null): QuotedRange => ({
  low,
  high,
  levelPercent,
});
function outcomeOf(range: QuotedRange | null, comparedWith = 'ar6-ecs') {
  const { proposal, test, sentence, ...rest } = quotedRange.test(testContext(claim(range, comparedWith)));
  return { ...rest, mark: proposal.mark, test: plain(test), sentence: plain(sentence) };
}

describe('quoted-range', () => {
  it.each([
    ['likely', 'ar6-ecs', quoted('2.5', '4', 66), /likely \(66 %\) 2\.5 – 4\.0 K per doubling, in IPCC AR6/],
    ['likely as two in three', 'ar6-ecs', quoted('2.5', '4.0', 67), /what stands there: likely \(66 %\)/],
    ['very likely', 'ar6-ecs', quoted('2', '5', 90), /what stands there: very likely \(5–95 %\) 2\.0 – 5\.0/],
    ['decimal commas', 'ar6-tcr', quoted('1,4', '2,2', 66), /likely \(66 %\) 1\.4 – 2\.2/],
    ['an edition that the source names itself', 'ar5-ecs', quoted('1.5', '4.5', 66), /in IPCC AR5/],
    ['ends rounded by the source', 'ar6-tcr', quoted('1', '2', 66), /likely \(66 %\) 1\.4 – 2\.2/],
    ['a range without a level', 'tar-ecs', quoted('1.5', '4.5'), /range of the models 1\.5 – 4\.5/],
    ['a one-sided statement', 'ar6-ecs', quoted('1.5', null, 99), /virtually certain above 1\.5/],
    ['an upper bound from what is unlikely', 'ar5-ecs', quoted(null, '6', 90), /very unlikely above 6/],
  ])('is met by %s', (_, id, range, says) => {
    const { mark, sentence, weight, effect, alternative } = outcomeOf(range, id);
    expect(mark).toBe('met');
    expect(sentence).toMatch(says);
    expect([weight, effect, alternative]).toEqual([null, null, null]);
  });

  it('is met without a level, and adds the one that the source leaves out', () => {
    const { mark, sentence } = outcomeOf(quoted('2.5', '4'));
    expect(mark).toBe('met');
    expect(sentence).toMatch(/does not say its level, 66 %\.$/);
  });

  it.each([90, 95])('finds the likely range read as one of %i %, and says both', (level) => {
    const { mark, test, sentence } = outcomeOf(quoted('2.5', '4.0', level));
    expect(mark).toBe('not met');
    expect(test).toBe(`2.5 – 4.0, said to be ${level} %: ends of likely (66 %), another level than said`);
    expect(sentence).toContain('The ends are those of likely (66 %) 2.5 – 4.0 K per doubling, in IPCC AR6');
    expect(sentence).toContain(`The source calls it a range of ${level} %; it is one of 66 %.`);
    const veryLikely = 'At the level that is said it gives very likely (5–95 %) 2.0 – 5.0 K per doubling.';
    expect(sentence.includes(veryLikely)).toBe(level === 90);
  });

  it('finds a range of 5–95 % said to be 95 %', () => {
    const { mark, sentence } = outcomeOf(quoted('2', '5', 95));
    expect(mark).toBe('not met');
    expect(sentence).toContain('a range of 95 %; it is one of 90 %.');
  });

  it('does not lend a level to a publication that gives none', () => {
    const { mark, sentence } = outcomeOf(quoted('1.5', '4.5', 66), 'tar-ecs');
    expect(mark).toBe('not met');
    expect(sentence).toContain('the publication gives it no level');
  });

  it('names the older edition whose range it is, and what the named one says', () => {
    const { mark, test, sentence, caveats } = outcomeOf(quoted('1.5', '4.5', 66));
    expect(mark).toBe('not met');
    expect(test).toContain('not AR6 assessed ECS but AR5 assessed ECS, likely (66 %)');
    expect(sentence).toContain(
      'That is an older range: AR5 assessed ECS, likely (66 %) 1.5 – 4.5 K per doubling, in IPCC',
    );
    expect(sentence).toContain('The same ends stand in: TAR range of ECS; FAR range of ECS; Charney report, ECS.');
    expect(sentence).toContain(
      'IPCC AR6 WG1 (2021) gives likely (66 %) 2.5 – 4.0 K per doubling; very likely (5–95 %)',
    );
    expect(caveats).toEqual([
      { code: 'published-from-memory', detail: expect.stringMatching(/^AR5 assessed ECS .* from memory/) as string },
    ]);
  });

  it('does not call a newer range older', () => {
    const { sentence } = outcomeOf(quoted('2.5', '4', 66), 'ar5-ecs');
    expect(sentence).toContain('That is another published range: AR6 assessed ECS, likely (66 %)');
  });

  it('says how far wrong ends are off, beside the range of the level that is said', () => {
    const { mark, sentence, table } = outcomeOf(quoted('1.0', '4.0', 66));
    expect(mark).toBe('not met');
    expect(sentence).toMatch(
      /Beside likely .*2\.5 – 4\.0 K per doubling, the lower end is 1\.5 too low and the upper end agrees\./,
    );
    expect(table?.rows[0]?.slice(-3)).toEqual(['−1.5', 'agrees', 'no']);
    // 4.3 is nearer to 4, the likely end; at the level that is said it is 5.
    expect(outcomeOf(quoted('2.0', '4.3', 90)).sentence).toMatch(
      /Beside very likely .* the lower end agrees and the upper end is 0\.7 too low\./,
    );
  });

  it('holds the ends to the digits that are printed', () => {
    expect(outcomeOf(quoted('2.50', '4.00', 66)).mark).toBe('met');
    expect(outcomeOf(quoted('2.6', '4.0', 66)).mark).toBe('not met');
    // 2.5 rounds away from zero, to 3.
    expect(outcomeOf(quoted('3', '4', 66)).mark).toBe('met');
    expect(outcomeOf(quoted('2', '4', 66)).mark).toBe('not met');
  });

  it.each([
    { range: quoted(null, '4', 66), mark: 'met', says: 'the upper end of likely (66 %)' },
    { range: quoted(null, '5', 95), mark: 'met', says: 'the upper end of very likely (5–95 %)' },
    { range: quoted('2', null), mark: 'met', says: 'the lower end of very likely (5–95 %)' },
    { range: quoted(null, '4', 95), mark: 'not met', says: 'a range of 95 %; it is one of 66 %' },
    { range: quoted(null, '1.9', 90), mark: 'not met', says: 'the upper end is 3.1 too low.' },
  ])('takes a single end, $range.low to $range.high, as an end of a range', ({ range, mark, says }) => {
    const outcome = outcomeOf(range);
    expect(outcome.mark).toBe(mark);
    expect(outcome.sentence).toContain(says);
  });

  it('keeps what stands for one agent apart from another', () => {
    // The published range of methane, 0.43 – 0.65, quoted for CO2.
    const { mark, test, sentence } = outcomeOf(quoted('0.43', '0.65', 90), 'ar6-erf-co2');
    expect(sentence).toContain('No range of effective radiative forcing (CO₂, 1750–2019) in the table');
    expect([mark, test.split(': ')[1]]).toEqual(['not met', 'no published range has these ends']);
    expect(outcomeOf(quoted('0.43', '0.65', 90), 'ar6-erf-ch4').mark).toBe('met');
  });

  it('applies only where a published value is named, and asks for the range where none is quoted', () => {
    expect(quotedRange.applies(claim(null, null))).toBe(false);
    expect(quotedRange.applies(claim(null))).toBe(true);
    const outcome = outcomeOf(null);
    expect(outcome).toMatchObject({ isTestable: false, mark: 'untested' });
    expect(outcome.missing?.reason).toContain('AR6 assessed ECS');
    expect(outcome.missing?.wouldNeed).toMatch(/write the range that the source quotes/);
  });

  it('cannot be tested against a value without a range', () => {
    const { isTestable, missing } = outcomeOf(quoted('3.5', '4.1'), 'ar5-doubling-adjusted');
    expect(isTestable).toBe(false);
    expect(missing?.reason).toMatch(/holds no range of/);
  });

  it.each([
    [quoted(null, null), /at least one end/],
    [quoted('4', '2.5'), /4 – 2\.5/],
  ])('refuses %o', (range, says) => {
    expect(() => quotedRange.test(testContext(claim(range)))).toThrow(says);
    expect(() => quotedRange.test(testContext(claim(quoted('2', '5'), 'no-such-range')))).toThrow(/“no-such-range”/);
  });
});
