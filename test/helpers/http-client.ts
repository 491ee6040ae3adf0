import { request, type IncomingMessage, type OutgoingHttpHeaders } from 'node:http';

export interface HttpAnswer {
  status: number;
  headers: IncomingMessage['headers'];
  body: string;
}

/** One plain HTTP request in which everything can be said, also what a browser would not say. */
export function send(
  address: string,
  {
    method = 'GET',
    headers = {},
    body,
    path,
  }: { method?: string; headers?: OutgoingHttpHeaders; body?: string | Buffer; path?: string } = {},
): Promise<HttpAnswer> {
  const { hostname, port, pathname, search } = new URL(address);
  return new Promise((resolve, reject) => {
    // `path` is sent as it stands: a URL would tidy it up first.
    const sent = request(
      { hostname, port, path: path ?? pathname + search, method, headers, agent: false },
      (response) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('error', reject);
        response.on('end', () =>
          resolve({
            status: response.statusCode ?? 0,
            headers: response.headers,
            body: Buffer.concat(chunks).toString(),
          }),
        );
      },
    );
    sent.on('error', reject);
    sent.end(body);
  });
}

/** Goes in by the first address and gives back the cookie. */
export async function enter(firstAddress: string): Promise<string> {
  const { status, headers } = await send(firstAddress);
  const [cookie] = headers['set-cookie'] ?? [];
  if (status !== 303 || !cookie) throw new Error(`expected to be let in with a cookie, but found status ${status}`);
  return cookie.split(';', 1).join('');
}
