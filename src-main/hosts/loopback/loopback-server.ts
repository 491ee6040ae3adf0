import { once } from 'node:events';
import { readFile } from 'node:fs/promises';
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { requestNames, type RequestName } from '../../contract/request-names.ts';
import type { Core } from '../../handlers/handle.ts';
import { carryRequest, notJson, refused, tooLarge } from '../carry-request.ts';
import { createLoopbackGate, type LoopbackGate } from './loopback-gate.ts';
import { pageHeaders } from '../page-headers.ts';
import { payloadLimitBytes } from '../payload-limit.ts';
import { createProgressStream, type ProgressStream } from './progress-stream.ts';
import { readBody } from './read-body.ts';
import { rendererFiles, type RendererFile } from '../renderer-files.ts';

export interface LoopbackServer {
  origin: string;
  /** Leads a browser in, once. */
  firstAddress: string;
  /** Takes nothing new, finishes what is under way, and ends. */
  close(): Promise<void>;
}

export interface LoopbackServerOptions {
  core: Core;
  rendererDirectory: string;
  /** How long requests under way may still take when the server is closed. */
  graceMs?: number;
}

interface Session {
  core: Core;
  gate: LoopbackGate;
  files: ReadonlyMap<string, RendererFile>;
  progress: ProgressStream;
}

/** Serves the screens and carries their requests, to this machine only. */
export async function startLoopbackServer({
  core,
  rendererDirectory,
  graceMs = 5000,
}: LoopbackServerOptions): Promise<LoopbackServer> {
  const underWay = new Set<Promise<void>>();
  let isClosing = false;
  const server = createServer({ headersTimeout: 10_000, requestTimeout: 120_000 });
  const origin = `http://127.0.0.1:${await listen(server)}`;
  const gate = createLoopbackGate(origin);
  const session = { core, gate, files: rendererFiles(rendererDirectory), progress: createProgressStream(core) };

  server.on('request', (request, response) => {
    for (const [name, value] of Object.entries(pageHeaders)) response.setHeader(name, value);
    if (isClosing) return sendPage(response, 503, 'Footing is closing.');
    const answered = answerWhole(request, response, session);
    underWay.add(answered);
    void answered.finally(() => underWay.delete(answered));
  });

  return {
    origin,
    firstAddress: origin + gate.firstPath,
    async close() {
      isClosing = true;
      const closed = new Promise((resolve) => server.close(resolve));
      session.progress.close();
      const finished = Promise.all(underWay);
      await Promise.race([finished, new Promise((resolve) => setTimeout(resolve, graceMs).unref())]);
      server.closeAllConnections();
      await closed;
    },
  };
}

function listen(server: Server): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      if (address !== null && typeof address === 'object') resolve(address.port);
    });
  });
}

/** Settles when the last byte is on its way, or when nobody is there to take it. */
async function answerWhole(request: IncomingMessage, response: ServerResponse, session: Session): Promise<void> {
  try {
    await answer(request, response, session);
  } catch (error) {
    console.error('Footing could not answer a request:', error);
    if (response.headersSent) response.destroy();
    else sendPage(response, 500, 'Footing could not answer this. The terminal it runs in says why.');
  }
  if (response.writableEnded && !response.writableFinished && !response.destroyed) await once(response, 'close');
}

async function answer(request: IncomingMessage, response: ServerResponse, session: Session): Promise<void> {
  const { gate, files, progress } = session;
  const [path = '', query = ''] = (request.url ?? '').split('?', 2);
  const method = request.method ?? '';

  if (!gate.isAddressedToUs(request)) {
    return sendPage(response, 403, 'This request was not addressed to Footing, or came from another page.');
  }
  if (path === '/enter' && method === 'GET') {
    const cookie = gate.enter(new URLSearchParams(query).get('token'));
    if (cookie === null) {
      return sendPage(
        response,
        403,
        'This address has been used already, or belongs to another run of Footing.',
        'If Footing is open in this browser, <a href="/">go on there</a>. Otherwise start it again and use the address that it prints.',
      );
    }
    response.writeHead(303, { location: '/', 'set-cookie': cookie }).end();
    return;
  }
  if (!gate.hasSession(request)) {
    return sendPage(
      response,
      403,
      'This browser has not been let in.',
      'Use the address that Footing printed when it was started.',
    );
  }
  if (path.startsWith('/request/')) return answerRequest(request, response, path.slice('/request/'.length), session);
  if (method !== 'GET' && method !== 'HEAD') return sendPage(response, 405, 'This can only be read.');
  if (path === '/progress' && method === 'GET') return progress.add(response);
  const file = files.get(path);
  if (!file) return sendPage(response, 404, 'There is nothing at this address.', '<a href="/">Go to Footing</a>.');
  const bytes = await readFile(file.path);
  response.writeHead(200, { 'content-type': file.contentType, 'content-length': bytes.length });
  response.end(method === 'HEAD' ? undefined : bytes);
}

async function answerRequest(
  request: IncomingMessage,
  response: ServerResponse,
  name: string,
  session: Session,
): Promise<void> {
  if (!isRequestName(name)) return sendPage(response, 404, 'There is no such request.');
  if (request.method !== 'POST') return sendPage(response, 405, 'Requests are posted.');
  if (!session.gate.isFromOurPage(request)) return sendPage(response, 403, 'This request came from another page.');
  if (request.headers['content-type'] !== 'application/json') return sendPage(response, 415, 'Requests are JSON.');

  const body = await readBody(request, payloadLimitBytes(name));
  if (body.isWhole) return sendJson(response, 200, await carryRequest(session.core, name, body.text));
  if (body.problem === 'too large') return sendJson(response, 413, refused(tooLarge(name)));
  sendJson(response, 400, refused(notJson(name, 'bytes that are not UTF-8')));
}

function isRequestName(name: string): name is RequestName {
  return (requestNames as readonly string[]).includes(name);
}

function sendJson(response: ServerResponse, status: number, json: string): void {
  response.writeHead(status, { 'content-type': 'application/json; charset=utf-8' }).end(json);
}

/** A plain page of words; `more` is markup of ours, never anything that was sent to us. */
function sendPage(response: ServerResponse, status: number, sentence: string, more = ''): void {
  const page = `<!doctype html><html lang="en"><meta charset="utf-8"><title>Footing</title><h1>Footing</h1><p>${sentence}</p><p>${more}</p></html>`;
  response.writeHead(status, { 'content-type': 'text/html; charset=utf-8' }).end(page);
}
