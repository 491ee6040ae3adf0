import { describe, expect, it } from 'vitest';
import { verifyProject } from '../../../src-main/project/verify-project.ts';
import { signedProject } from '../../helpers/sample-project.ts';

describe('verifyProject', () => {
  it('finds nothing in a project with one record of each kind, open or closed', () => {
    const project = signedProject();
    const expected = { isSound: true, problems: [], nEntries: 9, nRecords: 10, nContents: 5, head: project.head() };
    expect(verifyProject(project.path)).toMatchObject(expected);
    project.close();
    const report = verifyProject(project.path);
    expect(report).toMatchObject(expected);
    expect(report.signatures).toMatchObject([
      { signatureId: 1, isValid: true, reason: null, signer: 'R. Example, reviewer' },
    ]);
  });
});
