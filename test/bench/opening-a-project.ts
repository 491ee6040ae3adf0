import Database from 'better-sqlite3';
import { openProject } from '../../src-main/project/open-project.ts';
import { testCore } from '../helpers/test-core.ts';
import type { BenchCase } from './bench-case.ts';

/** Opening, with every check of an untrusted file, beside the driver opening the same file and checking its pages. */
export async function caseOfOpening(): Promise<BenchCase> {
  const { ask, end } = await testCore();
  const { path } = await ask('project.openDemo', {});
  await ask('project.close', {});
  const holder = { reviewer: 'bench', host: 'bench', engineVersion: 'bench' };
  return {
    name: 'opening a project',
    peerName: 'the driver alone: open, quick_check',
    own: () => openProject(path, { holder }).close(),
    peer: () => {
      const db = new Database(path);
      db.pragma('quick_check');
      db.close();
    },
    end: () => void end(),
  };
}
