import { createPrivateKey, createPublicKey, sign } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { onTestFinished } from 'vitest';
import type { Claim } from '../../src-main/contract/claim.ts';
import type { SeriesValues } from '../../src-main/contract/series.ts';
import { canonicalJson } from '../../src-main/project/canonical-json.ts';
import type { Change } from '../../src-main/project/change-set.ts';
import { createProject } from '../../src-main/project/create-project.ts';
import { digest } from '../../src-main/project/digest.ts';
import type { Signer } from '../../src-main/project/identity.ts';
import type { Doing, Project } from '../../src-main/project/project.ts';
import type { NewRecord } from '../../src-main/project/records.ts';
import { signFinding } from '../../src-main/project/sign-finding.ts';
import type { Holder } from '../../src-main/project/writer-lock.ts';

/** Everything here is invented. */
export const doing: Doing = {
  reviewer: { name: 'R. Example', role: 'reviewer' },
  at: '2026-01-02T03:04:05.678Z',
  engineVersion: '0.0.1',
};
export const holder: Holder = { reviewer: 'R. Example', host: 'test', engineVersion: '0.0.1' };

/** A folder that is gone when the test is over. */
export function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'footing-test-'));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

export function emptyProject(path = join(temporaryFolder(), 'review.footing')): Project {
  const project = createProject(path, { ...doing, title: 'Invented review', isInvented: true, holder });
  onTestFinished(() => project.close());
  return project;
}

/** A signer whose key is made from one repeated byte, so that every run signs alike. */
export function sampleSigner(seed: number): Signer {
  // PKCS #8 wrapping of a raw Ed25519 key: RFC 8410, section 7.
  const der = Buffer.concat([Buffer.from('302e020100300506032b657004220420', 'hex'), Buffer.alloc(32, seed)]);
  const privateKey = createPrivateKey({ key: der, format: 'der', type: 'pkcs8' });
  const publicKey = createPublicKey(privateKey).export({ format: 'der', type: 'spki' }).subarray(-32).toString('hex');
  return { publicKey, sign: (bytes) => sign(null, bytes, privateKey).toString('hex') };
}

export const sampleFile = Buffer.from('year,temp\n1990,0.25\n1991,0.3\n1992,0.28\n');
export const sampleValues: SeriesValues = {
  years: [1990, 1991, 1992],
  months: null,
  values: [0.25, 0.3, 0.28],
  lower: null,
  upper: null,
  boundsLevelPercent: null,
};
export const sampleAnswer = { value: 1.88, unit: 'K per doubling' };

export const sampleClaim: NewRecord<'claim'> = {
  title: 'At most 1.9 °C per doubling',
  statement: {
    words: 'A doubling of CO2 gives at most 1.9 °C.',
    sourceId: null,
    locator: 'slide 14',
    quantity: 'apparent-sensitivity',
    value: '1.9',
    unit: 'K per doubling',
    bound: 'at most',
    definition: '',
    presentedAs: null,
    statedRSquared: null,
  },
  answers: {},
  derivation: ['2.71 * ln(2) = 1.9'],
  procedure: null,
  evidence: {
    totalForcingSeriesId: null,
    co2ForcingSeriesId: null,
    energyBudget: null,
    comparedWith: null,
    quotedRange: null,
    doublingWm2: null,
  },
  tolerance: { notableShare: 0.05, decisiveShare: 0.2 },
  seed: 1,
};

export function importSample(project: Project, fileName = 'invented.csv', bytes: Uint8Array = sampleFile): number {
  return project.command({ ...doing, action: 'import dataset', subject: fileName }, (change) => {
    const dataset = change.add('dataset', {
      fileName,
      sizeBytes: bytes.length,
      contentDigest: change.addContent(bytes),
      importedAt: doing.at,
      readerId: 'delimited',
      readerVersion: '1',
      options: {},
      choices: [{ key: 'temp' }],
      nRows: 3,
      leftOut: [],
      notes: [],
      licence: 'invented',
    });
    return change.add('series', {
      datasetId: dataset.id,
      name: `temperature of ${fileName}`,
      label: 'Temperature',
      quantity: 'temperature-anomaly',
      agent: null,
      unit: 'K',
      step: 'year',
      baseline: null,
      partialYears: [],
      valuesDigest: change.addContent(Buffer.from(canonicalJson(sampleValues))),
      startYear: 1990,
      endYear: 1992,
      nPresent: 3,
      nMissing: 0,
      nAbsent: 0,
    }).id;
  });
}

export function addClaim(project: Project, changes: Partial<NewRecord<'claim'>> = {}): Claim {
  const subject = `claim ${project.list('claim').length + 1}`;
  return project.command({ ...doing, action: 'add claim', subject }, (change) =>
    change.add('claim', { ...sampleClaim, ...changes }),
  );
}

export function addResult(change: Change, claimId: number) {
  const request = { method: 'recomputation', claimId };
  return change.add('result', {
    claimId,
    method: 'recomputation',
    request,
    requestDigest: digest(canonicalJson(request)),
    answerDigest: change.addContent(Buffer.from(canonicalJson(sampleAnswer))),
    seed: null,
    engineVersion: doing.engineVersion,
    computedAt: doing.at,
  });
}

/** A project with one record of each kind: a source, data, a claim on it, a result, a mark, a note, a signed finding. */
export function signedProject(path?: string): Project {
  const project = emptyProject(path);
  project.command({ ...doing, action: 'add source', subject: 'source 1' }, (change) =>
    change.add('source', {
      title: 'An invented talk',
      kind: 'talk',
      details: '',
      file: { name: 'talk.txt', sizeBytes: 5, digest: change.addContent(Buffer.from('words')) },
    }),
  );
  const seriesId = importSample(project);
  addClaim(project, {
    statement: { ...sampleClaim.statement, sourceId: 1 },
    procedure: {
      kind: 'trend',
      seriesId,
      minMonths: 12,
      window: null,
      covariance: { kind: 'classical' },
      per: 'decade',
    },
  });
  project.command({ ...doing, action: 'recompute', subject: 'claim 1' }, (change) => addResult(change, 1));
  project.command({ ...doing, action: 'mark assumption', subject: 'claim 1 · window' }, (change) =>
    change.add('mark', { claimId: 1, assumptionId: 'window', mark: 'not met', note: 'cherry-picked end year' }),
  );
  project.command({ ...doing, action: 'add note', subject: 'claim 1' }, (change) =>
    change.add('note', { claimId: 1, text: 'look at 1992 again', author: 'R. Example', writtenAt: doing.at }),
  );
  addFinding(project, 1);
  signFinding(project, { ...doing, findingId: 1, meaning: 'sign-off', remark: '', signer: sampleSigner(1) });
  return project;
}

export function addFinding(project: Project, claimId: number): number {
  return project.command({ ...doing, action: 'write finding', subject: `claim ${claimId} · revision 1` }, (change) =>
    change.add('finding', {
      claimId,
      revision: 1,
      conclusion: 'not supported',
      text: 'The number moves by a third.',
      conditions: '',
      publishedValueIds: [],
      resultIds: project
        .list('result')
        .filter((result) => result.claimId === claimId)
        .map((result) => result.id),
      reason: '',
      isSigned: false,
    }),
  ).id;
}
