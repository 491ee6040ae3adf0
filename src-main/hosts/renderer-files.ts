import { readdirSync } from 'node:fs';
import { extname, join } from 'node:path';

const contentTypes: Readonly<Record<string, string>> = {
  '.css': 'text/css; charset=utf-8',
  '.html': 'text/html; charset=utf-8',
  '.ico': 'image/x-icon',
  '.js': 'text/javascript; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.png': 'image/png',
  '.svg': 'image/svg+xml',
  '.woff2': 'font/woff2',
};

export interface RendererFile {
  path: string;
  contentType: string;
}

/**
 * The built screens by the address they are served at. A host looks addresses up here and nowhere else, so no address
 * can lead out of the folder; links and files of unknown kind are not served.
 */
export function rendererFiles(directory: string): ReadonlyMap<string, RendererFile> {
  const files = new Map<string, RendererFile>();
  const walk = (folder: string, address: string) => {
    for (const entry of readdirSync(folder, { withFileTypes: true })) {
      const path = join(folder, entry.name);
      const contentType = contentTypes[extname(entry.name)];
      if (entry.isDirectory()) walk(path, `${address}${entry.name}/`);
      else if (entry.isFile() && contentType) files.set(address + entry.name, { path, contentType });
    }
  };
  walk(directory, '/');
  const index = files.get('/index.html');
  if (index) files.set('/', index);
  return files;
}
