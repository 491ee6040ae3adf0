import type { Database, Statement } from 'better-sqlite3';
import { ProjectError } from '../errors.ts';
import { digest } from './digest.ts';

/** Bytes by their digest: imported files, series values, answers, signed statements. Written once, never changed. */
export class ContentTable {
  readonly #read: Statement<[string], Buffer>;
  readonly #has: Statement<[string], number>;
  readonly #insert: Statement<[string, Uint8Array]>;

  constructor(db: Database) {
    this.#read = db.prepare<[string], Buffer>('SELECT bytes FROM content WHERE digest = ?').pluck();
    this.#has = db.prepare<[string], number>('SELECT 1 FROM content WHERE digest = ?').pluck();
    this.#insert = db.prepare<[string, Uint8Array]>('INSERT INTO content (digest, bytes) VALUES (?, ?)');
  }

  /** @throws ProjectError content-missing, content-altered */
  read(contentDigest: string): Buffer {
    const bytes = this.#read.get(contentDigest);
    if (!bytes) throw contentError('content-missing', contentDigest, 'none');
    const actual = digest(bytes);
    if (actual !== contentDigest) throw contentError('content-altered', contentDigest, `bytes with digest ${actual}`);
    return bytes;
  }

  /** Keeps the bytes, unless they are there already. */
  add(bytes: Uint8Array): { digest: string; isNew: boolean } {
    const contentDigest = digest(bytes);
    if (this.#has.get(contentDigest) !== undefined) return { digest: contentDigest, isNew: false };
    this.#insert.run(contentDigest, bytes);
    return { digest: contentDigest, isNew: true };
  }
}

function contentError(code: string, contentDigest: string, received: string): ProjectError {
  return new ProjectError({
    code,
    where: `content ${contentDigest.slice(0, 12)}…`,
    expected: 'bytes with this digest in the project',
    received,
    hint: 'Verify the project; restore the file from a copy.',
  });
}
