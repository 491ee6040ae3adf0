import { readFile } from 'node:fs/promises';
import { protocol, type Session } from 'electron';
import { appOrigin, appScheme, isAppAddress } from './app-address.ts';
import { pageHeaders } from '../page-headers.ts';
import { rendererFiles } from '../renderer-files.ts';

/** Must run before Electron is ready. A scheme of our own, because pages from `file://` may read other files. */
export function registerAppScheme(): void {
  protocol.registerSchemesAsPrivileged([
    { scheme: appScheme, privileges: { standard: true, secure: true, supportFetchAPI: true, codeCache: true } },
  ]);
}

/** Serves the built screens at `footing://app/`, and nothing else. */
export function serveApp(session: Session, rendererDirectory: string): void {
  const files = rendererFiles(rendererDirectory);
  session.protocol.handle(appScheme, async ({ url, method }) => {
    const file = method === 'GET' && isAppAddress(url) ? files.get(pathOf(url)) : undefined;
    if (!file) return new Response('There is nothing at this address.', { status: 404, headers: pageHeaders });
    const headers = { ...pageHeaders, 'content-type': file.contentType };
    return new Response(await readFile(file.path), { headers });
  });
}

function pathOf(address: string): string {
  return address.slice(appOrigin.length).replace(/[?#].*$/s, '');
}
