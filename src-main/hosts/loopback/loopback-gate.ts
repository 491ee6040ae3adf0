import { randomBytes, timingSafeEqual } from 'node:crypto';
import type { IncomingMessage } from 'node:http';

export interface LoopbackGate {
  /** Path of the first address; leads in once. */
  firstPath: string;
  /** The cookie for whoever brings the token first; null for everybody else. */
  enter(token: string | null): string | null;
  /** Whether a request is addressed to us and does not come from a page of somebody else. */
  isAddressedToUs(request: IncomingMessage): boolean;
  hasSession(request: IncomingMessage): boolean;
  /** Whether a request was sent by one of our own pages; browsers say so on every POST. */
  isFromOurPage(request: IncomingMessage): boolean;
}

/**
 * Who may come in. Everything on this machine can reach a port of 127.0.0.1, and so can any web page through the
 * browser: a one-time token keeps other users out, the cookie keeps the browser in, the Host header gives away names
 * that were made to point here, and Origin gives away pages of somebody else.
 */
export function createLoopbackGate(origin: string): LoopbackGate {
  const { host, port } = new URL(origin);
  // Cookies are shared by all ports of a host: two instances must not overwrite each other's.
  const cookieName = `footing-${port}`;
  const session = secret();
  const firstToken = secret();
  let token: string | null = firstToken;

  return {
    firstPath: `/enter?token=${firstToken}`,
    enter(candidate) {
      if (token === null || candidate === null || !isSame(candidate, token)) return null;
      token = null;
      return `${cookieName}=${session}; Path=/; HttpOnly; SameSite=Strict`;
    },
    isAddressedToUs({ headers }) {
      const site = headers['sec-fetch-site'];
      return headers.host === host && (site === undefined || site === 'same-origin' || site === 'none');
    },
    hasSession: ({ headers }) =>
      cookies(headers.cookie ?? '').some(([name, value]) => name === cookieName && isSame(value, session)),
    isFromOurPage: ({ headers }) => headers.origin === origin,
  };
}

function secret(): string {
  return randomBytes(32).toString('base64url');
}

function isSame(candidate: string, secretText: string): boolean {
  const one = Buffer.from(candidate);
  const other = Buffer.from(secretText);
  return one.length === other.length && timingSafeEqual(one, other);
}

function cookies(header: string): [name: string, value: string][] {
  return header.split(';').map((pair) => {
    const [name = '', ...value] = pair.trim().split('=');
    return [name, value.join('=')];
  });
}
