import type { IncomingMessage } from 'node:http';

/**
 * The body of a request as text. What goes past the limit is thrown away as it comes, not kept, so that the sender
 * can still read the answer.
 */
export async function readBody(
  request: IncomingMessage,
  limitBytes: number,
): Promise<string | 'too large' | 'not UTF-8'> {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    length += chunk.length;
    if (length <= limitBytes) chunks.push(chunk);
    else chunks.length = 0;
  }
  if (length > limitBytes) return 'too large';
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks));
  } catch {
    return 'not UTF-8';
  }
}
