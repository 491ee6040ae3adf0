import { beforeAll, describe, expect, it } from 'vitest';
import { errorAnswer } from '../../../src-main/contract/requests.ts';
import { errorSentence } from '../../../src-main/errors.ts';
import { footingHere, jsonOf, shellWords } from '../../helpers/command-line.ts';
import { prepareReview, project, workingFolder } from '../../helpers/review-folder.ts';

/** Every command once badly: words, exit status, and what the sentence must say. */
const bad: [string, 2 | 3, RegExp][] = [
  ['bogus', 2, /^footing: expected one of new, .* but found bogus\./],
  ['help bogus', 2, /but found bogus/],
  ['new', 2, /^footing new: expected FILE, but found nothing\. footing help new/],
  ['new review.footing', 2, /a file that is there already/],
  ['new talk.txt/x.footing', 2, /talk\.txt: expected a folder .* but found a file in its place/],
  ['new x.footing --title', 2, /--title/],
  ['new x.footing --title A --title B', 2, /--title: expected to be given once, but found A and B/],
  ['new x.footing --role r', 2, /--role: expected a --reviewer/],
  ['new x.footing --reviewer ""', 2, /reviewer\.set\.name: expected text/],
  ['import review.footing', 2, /expected FILE DATA…/],
  [
    'import none.footing readings.csv',
    3,
    /none\.footing: expected a project file that can be read, but found no such file/,
  ],
  ['import review.footing nowhere.csv', 2, /nowhere\.csv: expected a file that can be read, but found nothing there/],
  ['import review.footing reviewer', 2, /reviewer: .* a folder in its place/],
  ['import review.footing readings.csv talk.txt', 2, /talk\.txt, line 1: /],
  [
    'import review.footing readings.csv --series nope',
    2,
    /--series: expected series of readings\.csv: .* but found nope/,
  ],
  ['import review.footing readings.csv --quantity love', 2, /--quantity: expected one of temperature-anomaly, /],
  ['import review.footing readings.csv --baseline 1980-1951', 2, /--baseline: expected two years/],
  ['import review.footing GLB.Ts+dSST.csv co2_mm_mlo.txt --unit K', 2, /--unit: expected series of one quantity/],
  ['import review.footing GLB.Ts+dSST.csv co2_mm_mlo.txt --as both', 2, /--as: expected one file and one series/],
  ['series nowhere.footing', 3, /nowhere\.footing/],
  ['source review.footing talk.txt --kind sermon', 2, /--kind: expected one of talk, .* but found sermon/],
  ['source review.footing talk.txt readings.csv --title Both', 2, /--title: expected one source/],
  ['claim review.footing talk.txt', 2, /talk\.txt: expected JSON/],
  ['claim review.footing request.json', 2, /request\.json\.title: expected text, but found nothing/],
  ['recompute review.footing --claim 99', 2, /--claim: expected the number of a claim \(1\), but found 99/],
  ['assumptions review.footing --claim one', 2, /--claim: .* but found one/],
  ['sweep review.footing --min-years 2', 2, /--min-years: expected a whole number from 3 to 1000, but found 2/],
  ['sweep review.footing --min-years 500', 2, /expected at most the 39 years/],
  ['estimators review.footing --claim 2', 2, /but found 2/],
  ['mark review.footing gravity met', 2, /ASSUMPTION: expected one of zero-intercept/],
  ['mark review.footing window maybe', 2, /MARK: expected one of met, not met, untested, but found maybe/],
  ['note review.footing ""', 2, /note\.add\.text: expected text/],
  ['finding review.footing --conclusion perhaps', 2, /--conclusion: expected one of supported/],
  ['finding review.footing --published nope', 2, /the id of a published value .* but found nope\. Known: /],
  ['sign review.footing --meaning applause', 2, /--meaning: expected one of sign-off/],
  ['sign review.footing', 2, /expected your mark on every decisive assumption/],
  ['revise review.footing', 2, /--reason: expected what changes and why/],
  ['revise review.footing --reason because', 2, /a signed finding to revise, but found an unsigned one/],
  ['report review.footing', 2, /--out: expected a folder to write into/],
  ['report review.footing --out r --format pdf', 2, /--format: expected html or json, but found pdf\. Print the HTML/],
  ['report review.footing --out talk.txt', 2, /talk\.txt: .* a file in its place/],
  ['verify nowhere.footing', 3, /nowhere\.footing/],
  ['recheck readings.csv', 3, /expected a Footing project, but found a file of another kind/],
  ['trail review.footing --limit 0', 2, /--limit: expected a whole number from 1 to 500, but found 0/],
  ['undo fresh.footing', 2, /undo: expected a change to take back, but found nothing\. The trail goes back no further/],
  ['redo review.footing', 2, /redo: expected an undone change/],
  ['published --quantity love', 2, /--quantity: expected one of .*equilibrium-climate-sensitivity, .* but found love/],
  ['demo talk.txt', 2, /talk\.txt: expected a folder/],
  ['compute nowhere.json', 2, /nowhere\.json: expected a file that can be read/],
  ['compute talk.txt', 2, /talk\.txt: expected JSON, but found Unexpected token/],
  ['schema no-such-form', 2, /NAME: expected a name that footing schema lists/],
  ['series review.footing --loud', 2, /Unknown option '--loud'/],
];

describe('a command that is given badly', () => {
  const folder = workingFolder();
  let before: unknown;
  beforeAll(async () => {
    await prepareReview(folder);
    await jsonOf(footingHere, folder, ['new', 'fresh.footing', '--title', 'Fresh']);
    before = await jsonOf(footingHere, folder, ['verify', project]);
  });

  it.each(bad)('%s: is told in one sentence what happened, where and what to do', async (line, status, pattern) => {
    const ran = await footingHere(folder, [...shellWords(line), '--json']);
    expect(ran).toMatchObject({ status });
    const { ok, error } = JSON.parse(ran.out) as { ok: unknown; error: unknown };
    expect(ok).toBe(false);
    const sentence = ran.errors.trimEnd();
    expect(sentence).toBe(errorSentence(errorAnswer.parse(error)));
    expect(sentence).toMatch(pattern);
    expect(sentence).not.toMatch(/undefined|\[object|Error:|at .*\.js:\d/);
    expect(await jsonOf(footingHere, folder, ['verify', project])).toEqual(before);
  });

  it('is each of the commands in this table', async () => {
    const names = ((await jsonOf(footingHere, folder, ['help'])) as { name: string }[]).map(({ name }) => name);
    const tried = new Set(bad.map(([line]) => line.split(' ')[0]));
    expect(names.filter((name) => !tried.has(name))).toEqual([]);
  });
});
