import { existsSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { describe, expect, it, onTestFinished, vi } from 'vitest';
import { acquireWriterLock, type WriterLock } from '../../../src-main/project/writer-lock.ts';
import { holder, temporaryFolder } from '../../helpers/sample-project.ts';

const named = (reviewer: string) => ({ ...holder, reviewer });

/** Lets others in at the n-th moment at which a lock is about to be taken hold of. */
function atAttempt(nth: number, interlude: () => void): void {
  let n = 0;
  const exec = Object.getOwnPropertyDescriptor(Database.prototype, 'exec')?.value as (
    this: Database.Database,
    sql: string,
  ) => Database.Database;
  const spy = vi.spyOn(Database.prototype, 'exec').mockImplementation(function (this: Database.Database, sql: string) {
    if (sql === 'BEGIN IMMEDIATE' && ++n === nth) interlude();
    return exec.call(this, sql);
  });
  onTestFinished(() => spy.mockRestore());
}

describe('acquireWriterLock', () => {
  it('refuses the second, naming the first, until the first lets go', () => {
    const path = join(temporaryFolder(), 'a.footing');
    const first = acquireWriterLock(path, named('First'));
    expect(() => acquireWriterLock(path, named('Second'))).toThrow(/First has open since \d{4}-\d\d-\d\dT/);
    first.release();
    first.release();
    expect(existsSync(`${path}.footing-lock`)).toBe(false);
    acquireWriterLock(path, named('Second')).release();
  });

  it('is not held up by the file that a killed process left, and names the present holder rather than that one', () => {
    const path = join(temporaryFolder(), 'a.footing');
    const left = new Database(`${path}.footing-lock`);
    left.exec('CREATE TABLE holder (id INTEGER PRIMARY KEY CHECK (id = 1), body TEXT NOT NULL) STRICT');
    left.prepare('INSERT INTO holder VALUES (1, ?)').run(JSON.stringify({ ...named('Long gone'), token: 'old' }));
    left.close();
    const lock = acquireWriterLock(path, named('First'));
    expect(() => acquireWriterLock(path, named('Second'))).toThrow(/First has open/);
    lock.release();
  });

  it.each([1, 2])('holds only the file that is there when others come and go at step %i of taking it', (step) => {
    const path = join(temporaryFolder(), 'a.footing');
    let third: WriterLock | undefined;
    atAttempt(step, () => {
      acquireWriterLock(path, named('Second')).release();
      third = acquireWriterLock(path, named('Third'));
    });
    expect(() => acquireWriterLock(path, named('First'))).toThrow(/Third has open/);
    expect(existsSync(`${path}.footing-lock`)).toBe(true);
    third?.release();
  });

  it('takes what it can get when the others have gone again', () => {
    const path = join(temporaryFolder(), 'a.footing');
    atAttempt(2, () => acquireWriterLock(path, named('Second')).release());
    const lock = acquireWriterLock(path, named('First'));
    expect(() => acquireWriterLock(path, named('Second'))).toThrow(/First has open/);
    lock.release();
  });

  it('says so when there is something else under the name of its file', () => {
    const path = join(temporaryFolder(), 'a.footing');
    writeFileSync(`${path}.footing-lock`, 'something else '.repeat(100));
    expect(() => acquireWriterLock(path, holder)).toThrow(/Delete this file if nobody has the project open/);
  });

  it('says so when the folder cannot be written', () => {
    expect(() => acquireWriterLock('/proc/a.footing', holder)).toThrow(/a file and folder that may be written/);
  });
});
