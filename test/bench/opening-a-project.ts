import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { openProject } from '../../src-main/project/open-project.ts';
import type { BenchCase } from './bench-case.ts';

/** Opening, with every check of an untrusted file, beside the driver opening the same file and checking its pages. */
export function caseOfOpening(): BenchCase {
  const folder = mkdtempSync(join(tmpdir(), 'footing-bench-'));
  const cli = join(import.meta.dirname, '..', '..', 'out', 'main', 'cli.js');
  const made = execFileSync(process.execPath, [cli, 'demo', folder, '--json'], {
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'ignore'],
  });
  const { project: path } = JSON.parse(made) as { project: string };
  const holder = { reviewer: 'bench', host: 'bench', engineVersion: 'bench' };
  return {
    name: 'opening a project',
    own: () => {
      openProject(path, { holder }).close();
      return [];
    },
    peers: [
      {
        name: 'the driver alone: open, quick_check',
        work: () => {
          const db = new Database(path);
          db.pragma('quick_check');
          db.close();
          return [];
        },
      },
    ],
    end: () => rmSync(folder, { recursive: true }),
  };
}
