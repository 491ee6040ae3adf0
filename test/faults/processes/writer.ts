/**
 * A second process that works on a project, for tests that stop it or get in its way.
 *
 *   writer.ts hold PATH              opens it and keeps it open
 *   writer.ts work PATH SEED         changes it over and over, telling each committed head
 *   writer.ts take-turns PATH N      opens, changes and closes it N times, waiting for others to be done
 *   writer.ts die-inside PATH        kills itself in the middle of a large change, pages already written
 *   writer.ts create-and-work PATH   creates it, then as work
 *   writer.ts fill PATH              adds content until it cannot
 */
import { closeSync, openSync, unlinkSync, writeSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { isFootingError } from '../../../src-main/errors.ts';
import { createProject } from '../../../src-main/project/create-project.ts';
import { openProject } from '../../../src-main/project/open-project.ts';
import type { Project } from '../../../src-main/project/project.ts';

const [mode = '', path = '', parameter = '0'] = process.argv.slice(2);
const holder = { reviewer: `W. Process ${process.pid}`, host: 'test process', engineVersion: '0.0.1' };
const doing = () => ({
  reviewer: { name: 'W. Process', role: '' },
  at: new Date().toISOString(),
  engineVersion: '0.0.1',
});

/** Written at once, not when the process has time: what is told has been committed. */
function tell(value: unknown): void {
  writeSync(1, JSON.stringify(value) + '\n');
}

function bytesOf(length: number, seed: number): Uint8Array {
  const bytes = new Uint8Array(length);
  for (let index = 0, state = seed; index < length; index++) {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    bytes[index] = state >>> 24;
  }
  return bytes;
}

function importFile(project: Project, fileName: string, bytes: Uint8Array): void {
  project.command({ ...doing(), action: 'import dataset', subject: fileName }, (change) => {
    const contentDigest = change.addContent(bytes);
    const dataset = change.add('dataset', {
      fileName,
      sizeBytes: bytes.length,
      contentDigest,
      importedAt: doing().at,
      readerId: 'delimited',
      readerVersion: '1',
      options: {},
      choices: [],
      nRows: 0,
      leftOut: [],
      notes: [],
      licence: 'invented',
    });
    change.add('series', {
      datasetId: dataset.id,
      name: fileName,
      label: '',
      quantity: 'other',
      agent: null,
      unit: '1',
      step: 'year',
      baseline: null,
      partialYears: [],
      valuesDigest: contentDigest,
      startYear: 1990,
      endYear: 1990,
      nPresent: 1,
      nMissing: 0,
      nAbsent: 0,
    });
  });
}

function work(project: Project, seed: number): never {
  for (let round = 0; ; round++) {
    importFile(
      project,
      `file ${seed} ${round}`,
      bytesOf(1 + ((seed * 7919 + round * 104729) % 60_000), seed * 1000 + round),
    );
    tell(project.head());
    if (round % 3 === 1) {
      project.undo(doing());
      tell(project.head());
    }
    if (round % 6 === 4) {
      project.redo(doing());
      tell(project.head());
    }
  }
}

async function takeTurns(nTurns: number): Promise<void> {
  for (let turn = 0; turn < nTurns;) {
    try {
      const project = openProject(path, { holder });
      // Fails when anybody else holds the project at this moment.
      closeSync(openSync(`${path}.held`, 'wx'));
      const { title } = project.get('project', 1);
      project.command({ ...doing(), action: 'rename project', subject: 'count' }, (change) =>
        change.put('project', { ...project.get('project', 1), title: String(Number(title) + 1) }),
      );
      unlinkSync(`${path}.held`);
      project.close();
      turn++;
    } catch (error) {
      if (!isFootingError(error) || error.fields.code !== 'in-use') throw error;
      await wait(1 + Math.random() * 3);
    }
  }
}

function dieInside(project: Project): void {
  project.command({ ...doing(), action: 'import dataset', subject: 'never to be seen' }, (change) => {
    // More than SQLite's cache of 16 MB, so that pages reach the file before the change is complete.
    for (let piece = 0; piece < 30; piece++) change.addContent(bytesOf(1_000_000, piece));
    process.kill(process.pid, 'SIGKILL');
  });
}

function fill(project: Project): void {
  try {
    for (let piece = 0; piece < 1000; piece++) {
      importFile(project, `piece ${piece}`, bytesOf(100_000, piece));
      tell(project.head());
    }
  } catch (error) {
    tell(isFootingError(error) ? error.fields.code : String(error));
  } finally {
    project.close();
  }
}

const open = () => openProject(path, { holder });
if (mode === 'hold') {
  // Kept in use: what nobody refers to any more is closed, and its lock let go.
  const held = open();
  tell('open');
  setInterval(() => held.head(), 1000);
} else if (mode === 'work') work(open(), Number(parameter));
else if (mode === 'take-turns') await takeTurns(Number(parameter));
else if (mode === 'die-inside') dieInside(open());
else if (mode === 'fill') fill(open());
else if (mode === 'create-and-work') {
  const project = createProject(path, { ...doing(), title: 'Made by a process', isInvented: true, holder });
  tell(project.head());
  work(project, Number(parameter));
} else throw new Error(`unknown mode ${mode}`);
