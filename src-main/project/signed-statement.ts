import { z } from 'zod';
import { claim } from '../contract/claim.ts';
import { finding, mark, signature } from '../contract/finding.ts';
import { result } from '../contract/result.ts';
import { trailHead } from '../contract/trail.ts';

/**
 * What a signature is made over, as canonical JSON: the whole of it, so that it can be read without the project, and
 * nothing that a signature of another kind could be mistaken for.
 */
export const signedStatement = z.object({
  format: z.literal('footing-signed-finding/1'),
  finding,
  /** The results that the finding cites; each carries the digest of its answer. */
  results: z.array(result),
  claim,
  marks: z.array(mark),
  trailHead,
  signer: z.object({ name: z.string(), role: z.string(), publicKey: signature.shape.publicKey }),
  meaning: signature.shape.meaning,
  remark: signature.shape.remark,
  signedAt: signature.shape.signedAt,
});
export type SignedStatement = z.infer<typeof signedStatement>;
