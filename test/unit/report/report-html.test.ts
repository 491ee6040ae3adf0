import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cautions } from '../../../src-main/contract/cautions.ts';
import { report as reportSchema, type Report, type ReportClaim } from '../../../src-main/contract/project.ts';
import { reportHtml } from '../../../src-main/report/report-html.ts';
import { inventedClaim, inventedReport, untouchedClaim } from './invented-report.ts';

/** What a reader reads: texts with their whitespace drawn together, without styles and markup. */
function words(page: string): string {
  const texts = page.replace(/<style>[\s\S]*?<\/style>/, '').replace(/<[^>]*>/g, ' ');
  const named: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', '#39': "'" };
  return texts.replace(/&([a-z#0-9]+);/g, (_, name: string) => named[name] ?? '?').replace(/[^\S\u202f]+/g, ' ');
}

const withClaim = (claim: ReportClaim, change: Partial<Report> = {}): Report => ({
  ...inventedReport,
  claims: [claim],
  ...change,
});
/** The page with its fonts taken out: they are long, and a failure prints the page. */
async function render(report: Report): Promise<string> {
  return (await reportHtml(report)).replace(/base64,[\w+/=]+/g, 'base64,');
}
const pageOf = (claim: ReportClaim, change?: Partial<Report>) => render(withClaim(claim, change));

describe('the invented report', () => {
  it('is a report in the sense of the contract', () => {
    expect(reportSchema.safeParse(inventedReport).error).toBeUndefined();
  });
});

describe('reportHtml', () => {
  it('needs nothing but itself: no script, no address to fetch from, a policy that forbids both', async () => {
    const page = await render(inventedReport);
    expect(page).not.toMatch(/<script|<link|<img|<iframe|<object|javascript:|@import/i);
    const addresses = [...page.matchAll(/(?:src|href|url)\s*[=(]\s*["']?([^"')\s>]+)/gi)].map(
      ([, address]) => address ?? '',
    );
    expect(addresses.length).toBeGreaterThan(3);
    expect(addresses.every((address) => address.startsWith('data:font/woff2') || address.startsWith('#claim-'))).toBe(
      true,
    );
    expect(page).toContain('content="default-src &#39;none&#39;;');
    expect(page).not.toMatch(/https?:\/\/(?!www\.w3\.org\/2000\/svg)/);
  });

  it('says its language, its title, and carries a landmark and one heading per page', async () => {
    const page = await render(inventedReport);
    expect(page).toContain('<html lang="en">');
    expect(page).toContain('<title>Tarn Ness harbour review: findings on stated numbers</title>');
    expect(page.match(/<main>/g)).toHaveLength(1);
    expect(page.match(/<h1/g)).toHaveLength(4);
    expect(page.match(/<svg[^>]*role="img"[^>]*aria-label="[^"]+"/g)).toHaveLength(4);
    expect(page.match(/<th(?![^>]*scope=)[ >]/g)).toBeNull();
  });

  it('gives the whole of a claim', async () => {
    const text = words(await pageOf(inventedClaim));
    for (const said of [
      'can warm the planet by 1.9 °C at the most.',
      'The roof over Tarn Ness (talk), 12:27 and slide 14',
      'Not supported : as an upper limit of the equilibrium sensitivity',
      'Tove Quillfeather, reviewer: sign-off, 3 March 2031',
      'Osric Pell-Anand, second reviewer: counter-signature, 5 March 2031',
      '7a1c 03bd 55e0 9f21 c8d4 1e6b 20aa 47f9 3b0e d612',
      'A limit of 1.9 K does not follow from them.',
      'The assumption that decides it',
      '2.71 1.9 – 4.4 decisive not met',
      'Energy budget, N = 0.79 ± 0.16 W/m²',
      'total forcing is in the project. It would need a table of effective forcing by year',
      '2.7 * ln(2) = 1.9',
      'R², centred 0.872',
      'R², uncentred 0.958',
      'Durbin–Watson 1.04',
      'Effective sample size 21.6',
      'Newey–West, lag 3, Bartlett, no small-sample factor 2.704 0.098 2.51 – 2.90',
      'C 0 and T 0 being the values of the first year',
      '1959: only 11 of 12 months in tarn-ness-air',
      'One noisy first year carries the whole slope.',
      'intercept t −4.20, p < 0.001',
      'Not tested no series of total forcing is in the project.',
      'The sea is left out.',
      'Proposed untested: It cannot be tested yet.',
      'seed 20261, 20000 draws',
      '1.9 – unbounded',
      'Windows overlap: this is a spread, not a confidence interval.',
      'likely (66 %)',
      'from memory; look it up before it decides anything',
      'No published range of the number’s own quantity (apparent sensitivity) is quoted.',
      '1994-03,?? the value is not a number',
      'CO 2 doubling 3.93 ± 0.47\u202fW/m², 5–95 %; no source given',
      'No row of this file was left out.',
      'Ask for the heat-content series',
      'Revision 1, cannot be determined.',
      'The intercept was tested with a longer lag.',
      'Recomputed on a second machine.',
    ]) {
      expect(text).toContain(said);
    }
  });

  it('gives what the number is compared with, and the range that the source quotes for it', async () => {
    expect(words(await pageOf(inventedClaim))).toContain('Range quoted the source quotes none');
    const { claim } = inventedClaim;
    const quotedRange = { low: '2.5', high: '4.0', levelPercent: 90 };
    const evidence = { ...claim.evidence, comparedWith: 'ar6-ecs', quotedRange };
    const text = words(await pageOf({ ...inventedClaim, claim: { ...claim, evidence } }));
    expect(text).toContain('Compared with AR6 assessed ECS');
    expect(text).toContain('Range quoted 2.5 – 4.0, said to be 90\u202f%');
  });

  it('gives every digest, key and signature in full', async () => {
    const text = (await pageOf(inventedClaim)).replace(/<\/?(span|wbr)[^>]*>/g, '');
    for (const digit of '123456789abcde') expect(text).toContain(digit.repeat(64));
    expect(text).toContain('f'.repeat(128));
    expect(text).toContain(inventedReport.head.hash);
  });

  it('says what the trail can and cannot prove, and every caution, on the page of each finding', async () => {
    const text = words(await render(inventedReport));
    expect(text).toContain(
      'A rewrite of the whole file cannot be prevented on someone’s own machine, only made evident: this hash witnesses the trail up to here.',
    );
    for (const caution of cautions) expect(text.split(caution)).toHaveLength(3);
  });

  it('says of every empty part why it is empty', async () => {
    const text = words(await pageOf(untouchedClaim));
    for (const reason of [
      'No finding has been written on this claim.',
      'There is no figure: nothing has been recomputed.',
      'The source shows no arithmetic for this number',
      'No procedure has been set.',
      'The number has not been recomputed',
      'The assumptions have not been tested',
      'No ladder has been computed',
      'has not been run over other windows',
      'No published range of the number’s own quantity',
      'No data were used',
      'Nothing has been computed for this claim.',
      'There are no notes in the margin.',
      'Nobody has signed this finding. It is a draft.',
    ]) {
      expect(text).toContain(reason);
    }
    expect(words(await render({ ...inventedReport, claims: [], sources: [] }))).toContain('The project has no claims');
  });

  it('marks a draft as one, on paper too, until a valid sign-off covers the finding as it stands', async () => {
    const draft = 'Draft. This finding is not signed; it may change.';
    const [signOff, counter] = inventedClaim.signatures;
    if (!signOff || !counter) throw new Error('the sample has two signatures');
    const invalid = { ...signOff, check: { ...signOff.check, isValid: false, reason: 'the finding was altered' } };
    const older = { ...signOff, signature: { ...signOff.signature, revision: 1 } };
    const signed = await pageOf(inventedClaim);
    expect(words(signed)).not.toContain(draft);
    expect(signed).not.toContain('class="claim of-draft"');
    for (const signatures of [[], [counter], [invalid], [older]]) {
      const page = await pageOf({ ...inventedClaim, signatures });
      expect(words(page)).toContain(draft);
      expect(page).toContain('class="claim of-draft"');
      expect(page).toContain('@top-left { content: "Draft, not signed"');
    }
    expect(words(await pageOf({ ...inventedClaim, signatures: [invalid] }))).toContain(
      'not valid: the finding was altered',
    );
  });

  it('labels invented data on every page, and only those', async () => {
    const invented = await pageOf(inventedClaim);
    expect(words(invented)).toContain('Invented data: nothing in this report is about the real world.');
    expect(invented).toContain('@top-right { content: "Invented data"');
    const real = await pageOf(inventedClaim, { isInvented: false });
    expect(words(real)).not.toContain('nothing in this report is about the real world');
    expect(real).not.toContain('@top-right');
  });

  it('runs the trail head along the foot of each page', async () => {
    expect(await render(inventedReport)).toMatch(/@bottom-right \{ content: "Trail 218 \\b7  9f2c77\\2026 c041"/);
  });

  it('draws a figure that it does not know with the recomputation rather than leaving it out', async () => {
    const [figure] = inventedClaim.figures;
    if (!figure) throw new Error('the sample has figures');
    const page = await pageOf({ ...inventedClaim, figures: [{ ...figure, name: 'other', title: 'Another figure' }] });
    expect(page).toContain('aria-label="Another figure.');
  });

  it('writes the same report the same way', async () => {
    expect(await render(inventedReport)).toBe(await render(structuredClone(inventedReport)));
  });

  it('lets no text of a project become markup or style', async () => {
    await fc.assert(
      fc.asyncProperty(fc.string({ unit: 'binary', minLength: 1 }), async (content) => {
        const page = await render(withEveryText(inventedReport, `${hostile}${content}`));
        const body = page.slice(page.indexOf('<body>'));
        expect(body).not.toMatch(/<(?:script|img|style)/i);
        expect(unknownTags(body)).toEqual([]);
        expect(page.match(/<\/style>/g)).toHaveLength(1);
        const style = /<style>([\s\S]*)<\/style>/.exec(page)?.[1] ?? '';
        expect(style).not.toContain('hostile-rule');
      }),
      { numRuns: 25 },
    );
  });
});

const hostile = `</style><script>x</script>"'><img src=x onerror=y>"}hostile-rule{`;

/** Every string that a person can write, replaced; what has a fixed form (kinds, digests, times) stays. */
function withEveryText<Value>(value: Value, content: string): Value {
  const fixed = /^(?:[0-9a-f]{64}|[0-9a-f]{128}|\d{4}-\d\d-\d\dT.*Z|[+\-−]?\d+(?:\.\d+)?)$/;
  const keys = new Set([
    'kind',
    'quantity',
    'unit',
    'bound',
    'presentedAs',
    'mark',
    'role',
    'id',
    'assumptionId',
    'meaning',
    'method',
    'provenance',
    'weight',
    'conclusion',
    'step',
    'conversion',
    'agent',
    'delimiter',
    'decimalMark',
  ]);
  const replaced = (each: unknown, key: string): unknown => {
    if (typeof each === 'string') return keys.has(key) || fixed.test(each) ? each : content;
    if (Array.isArray(each)) return each.map((one) => replaced(one, key));
    if (each !== null && typeof each === 'object') {
      return Object.fromEntries(Object.entries(each).map(([name, one]) => [name, replaced(one, name)]));
    }
    return each;
  };
  return replaced(value, '') as Value;
}

function unknownTags(body: string): string[] {
  const known =
    /^<\/?(?:a|article|b|body|br|caption|circle|code|dd|div|dl|dt|em|figcaption|figure|h[1-3]|header|html|li|line|main|p|path|rect|section|span|strong|sub|sup|svg|table|tbody|td|text|th|thead|tr|tspan|ul|wbr)(?:\s+[\w:-]+="[^"<>]*")*\s*\/?>$/;
  return (body.match(/<[^>]*>/g) ?? []).filter((tag) => !known.test(tag));
}
