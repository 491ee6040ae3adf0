import { appendFileSync, copyFileSync, existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { describe, expect, it } from 'vitest';
import type { TrailHead } from '../../src-main/contract/trail.ts';
import { ProjectError } from '../../src-main/errors.ts';
import { openProject } from '../../src-main/project/open-project.ts';
import { readProjectTitle } from '../../src-main/project/read-project-title.ts';
import { verifyProject } from '../../src-main/project/verify-project.ts';
import { startChild } from '../helpers/child-process.ts';
import { doing, emptyProject, holder, temporaryFolder } from '../helpers/sample-project.ts';

const writer = fileURLToPath(new URL('processes/writer.ts', import.meta.url));
const start = (...args: string[]) => startChild(writer, args);

function closedProject(): string {
  const project = emptyProject();
  project.close();
  return project.path;
}

function filesBeside(path: string): string[] {
  return readdirSync(dirname(path)).sort();
}

describe('two processes', () => {
  it('cannot both write; the second is told by whom and since when, and may read', async () => {
    const path = closedProject();
    const before = new Date().toISOString();
    const child = start('hold', path);
    await child.hasTold(1);

    let refusal: unknown;
    try {
      openProject(path, { holder });
    } catch (error) {
      refusal = error;
    }
    expect(refusal).toBeInstanceOf(ProjectError);
    const { code, received } = (refusal as ProjectError).fields;
    expect(code).toBe('in-use');
    const since =
      /W\. Process (\d+) has open since (\S+) \(test process, computer .+, process \1\)/.exec(received)?.[2] ?? '';
    expect(since >= before && since <= new Date().toISOString(), received).toBe(true);

    const reader = openProject(path, { readOnly: true, holder });
    expect(reader.get('project', 1).title).toBe('Invented review');
    reader.close();
    expect(verifyProject(path).isSound).toBe(true);

    child.kill();
    await child.ended;
    openProject(path, { holder }).close();
    expect(filesBeside(path)).toEqual(['review.footing']);
  });

  it('take turns without ever holding the project together, and lose no change', async () => {
    const path = closedProject();
    const project = openProject(path, { holder });
    project.command({ ...doing, action: 'rename project', subject: 'zero' }, (change) =>
      change.put('project', { ...project.get('project', 1), title: '0' }),
    );
    project.close();
    const children = [1, 2, 3, 4].map(() => start('take-turns', path, '15'));
    for (const child of children) expect(await child.ended).toEqual({ code: 0, signal: null, errors: '' });
    expect(readProjectTitle(path)).toBe('60');
    expect(verifyProject(path)).toMatchObject({ isSound: true, nEntries: 62 });
    expect(filesBeside(path)).toEqual(['review.footing']);
  });

  it('read and verify whole states while another writes', async () => {
    const path = closedProject();
    const child = start('work', path, '1');
    await child.hasTold(3);
    const reader = openProject(path, { readOnly: true, holder });
    for (let round = 0; round < 8; round++) {
      const lines = reader.trailLines({ limit: 1000 });
      expect(lines.map(({ sequence }) => sequence)).toEqual(lines.map((_, index) => lines.length - index));
      expect(verifyProject(path).problems).toEqual([]);
      await wait(5);
    }
    const { sequence } = reader.head();
    await child.hasTold(child.told.length + 1);
    expect(reader.head().sequence).toBeGreaterThanOrEqual(sequence);
    reader.close();
    child.kill();
    await child.ended;
    expect(verifyProject(path).problems).toEqual([]);
  });
});

describe('a process that is killed', () => {
  it('at any of 32 moments of its work loses nothing that it had committed', async () => {
    const path = closedProject();
    const random = xoroshiro128plus(20260102);
    let nHalfDone = 0;
    for (let kill = 1; kill <= 32; kill++) {
      const child = start('work', path, String(kill));
      await child.hasTold(uniformInt(random, 1, 4));
      await wait(uniformInt(random, 0, 40));
      child.kill();
      expect(await child.ended).toMatchObject({ signal: 'SIGKILL', errors: '' });
      if (existsSync(`${path}-journal`)) nHalfDone++;

      const committed = child.told.at(-1) as TrailHead;
      expect(verifyProject(path).problems, `kill ${kill}`).toEqual([]);
      const reader = openProject(path, { readOnly: true, holder });
      expect(reader.trailEntry(committed.sequence).hash, `kill ${kill}`).toBe(committed.hash);
      reader.close();
    }
    expect(nHalfDone, 'processes killed inside a change').toBeGreaterThan(0);
    console.info(`32 processes killed, ${nHalfDone} of them inside a change`);
    openProject(path, { holder }).close();
    expect(filesBeside(path)).toEqual(['review.footing']);
    expect(verifyProject(path).problems).toEqual([]);
  }, 180_000);

  it('while it creates a project leaves none or a whole one, and its name free for the next', async () => {
    const random = xoroshiro128plus(7);
    for (let kill = 1; kill <= 10; kill++) {
      const path = join(temporaryFolder(), 'new.footing');
      const child = start('create-and-work', path);
      await wait(uniformInt(random, 60, 260));
      child.kill();
      await child.ended;
      if (!existsSync(path)) {
        expect(child.told).toEqual([]);
        emptyProject(path).close();
      }
      expect(verifyProject(path).problems, `kill ${kill}`).toEqual([]);
      openProject(path, { holder }).close();
      expect(filesBeside(path)).toEqual(['new.footing']);
    }
  });

  it('with pages of an unfinished change in the file: readers see the state before, and write nothing', async () => {
    const path = closedProject();
    const { head } = verifyProject(path);
    const child = start('die-inside', path);
    expect(await child.ended).toMatchObject({ signal: 'SIGKILL' });
    const files = filesBeside(path);
    expect(files).toEqual(['review.footing', 'review.footing-journal', 'review.footing.footing-lock']);
    const bytes = readFileSync(path);

    expect(readProjectTitle(path)).toBe('Invented review');
    expect(verifyProject(path)).toMatchObject({ isSound: true, head, nContents: 0 });
    const reader = openProject(path, { readOnly: true, holder });
    expect(reader.head()).toEqual(head);
    expect(() => reader.command({ ...doing, action: 'x', subject: 'y' }, () => undefined)).toThrow(/read-only/);
    reader.close();
    expect(filesBeside(path)).toEqual(files);
    expect(readFileSync(path).equals(bytes)).toBe(true);

    const project = openProject(path, { holder });
    expect(project.head()).toEqual(head);
    project.close();
    expect(filesBeside(path)).toEqual(['review.footing']);
    expect(verifyProject(path)).toMatchObject({ isSound: true, head });
  });
});

describe('a journal that came along with a project', () => {
  it('is not followed to another file', async () => {
    const path = closedProject();
    await start('die-inside', path).ended;
    const victim = join(dirname(path), 'victim');
    writeFileSync(victim, 'precious');
    appendFileSync(`${path}-journal`, journalEndingThatNames(victim));
    for (const open of [
      () => openProject(path, { holder }),
      () => openProject(path, { readOnly: true, holder }),
      () => verifyProject(path),
    ]) {
      expect(open).toThrow(/journal of another kind/);
    }
    expect(readProjectTitle(path)).toBeNull();
    expect(readFileSync(victim, 'utf8')).toBe('precious');
  });

  it('is refused when it is a write-ahead log', () => {
    const path = closedProject();
    copyFileSync(path, `${path}-wal`);
    expect(() => openProject(path, { holder })).toThrow(/journal of another kind/);
  });
});

describe('a disk that is full', () => {
  it('loses the change that did not fit and nothing before it', async () => {
    const path = closedProject();
    // Files of this process and its child may not grow beyond 1 MiB.
    const prefix = ['sh', '-c', 'ulimit -f 2048; exec "$@"', 'sh'];
    const child = startChild(writer, ['fill', path], { prefix });
    expect(await child.ended).toMatchObject({ code: 0, errors: '' });
    expect(child.told.length).toBeGreaterThan(3);
    expect(child.told.at(-1)).toBe('disk');
    const committed = child.told.at(-2) as TrailHead;
    expect(verifyProject(path)).toMatchObject({ isSound: true, head: committed });
    expect(filesBeside(path)).toEqual(['review.footing']);
  });
});

/** The end of a rollback journal that belongs to a transaction over several files: the name of the file that lists them. */
function journalEndingThatNames(file: string): Buffer {
  const name = Buffer.from(file);
  const number = (value: number) => {
    const bytes = Buffer.alloc(4);
    bytes.writeUInt32BE(value);
    return bytes;
  };
  const checksum = name.reduce((sum, byte) => sum + byte, 0);
  const lockPage = 2 ** 30 / 4096 + 1;
  return Buffer.concat([
    number(lockPage),
    name,
    number(name.length),
    number(checksum),
    Buffer.from('d9d505f920a163d7', 'hex'),
  ]);
}
