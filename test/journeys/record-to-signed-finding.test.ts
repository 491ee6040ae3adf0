import { describe, it } from 'vitest';
import { openBrowserStage } from '../helpers/browser.ts';
import { recordToSignedFinding } from './flows/record-to-signed-finding.ts';

describe('From two published files to a signed finding', () => {
  it('is walked by hand, in a browser', () => recordToSignedFinding(openBrowserStage));
});
