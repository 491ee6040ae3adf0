import type { IncomingMessage } from 'node:http';

export type Body = { isWhole: true; text: string } | { isWhole: false; problem: 'too large' | 'not UTF-8' };

/**
 * The body of a request as text. What goes past the limit is thrown away as it comes, not kept, so that the sender
 * can still read the answer.
 */
export async function readBody(request: IncomingMessage, limitBytes: number): Promise<Body> {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    length += chunk.length;
    if (length <= limitBytes) chunks.push(chunk);
    else chunks.length = 0;
  }
  if (length > limitBytes) return { isWhole: false, problem: 'too large' };
  try {
    return { isWhole: true, text: new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks)) };
  } catch {
    return { isWhole: false, problem: 'not UTF-8' };
  }
}
