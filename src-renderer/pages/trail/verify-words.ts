import type { VerifyProblem } from '../../../src-main/contract/trail.ts';

/** What each kind of damage means, for someone who has not met it before. */
export const verifyWords: Readonly<Record<VerifyProblem['code'], string>> = {
  schema: 'The tables of the file are not those of a project.',
  'file-damaged': 'The file itself is damaged.',
  'entry-altered': 'An entry of the trail was altered after it was written.',
  'entry-missing': 'An entry of the trail is missing.',
  'entry-order': 'Entries of the trail are out of order.',
  'head-mismatch': 'The last entry is not the one that the file names as its last.',
  'record-altered': 'A record differs from what the trail says it should be.',
  'record-missing': 'A record that the trail speaks of is not there.',
  'record-without-entry': 'A record is there of which the trail knows nothing.',
  'content-altered': 'Bytes that were kept are no longer those that were received.',
  'content-missing': 'Bytes that the trail speaks of are not there.',
  'content-without-entry': 'Bytes are there of which the trail knows nothing.',
  'signature-invalid': 'A signature does not fit what it was put to.',
};
