import type { Database, Statement } from 'better-sqlite3';
import { trailEntry, type TrailEntry, type TrailHead } from '../contract/trail.ts';
import { ProjectError } from '../errors.ts';
import { canonicalJson } from './canonical-json.ts';
import { digest } from './digest.ts';

/** What the first entry follows. */
export const emptyHead: TrailHead = { sequence: 0, hash: '0'.repeat(64) };

export interface TrailRow {
  sequence: number;
  entry: string;
  hash: string;
}

export function entryHash(previousHash: string, entryText: string): string {
  return digest(previousHash + entryText);
}

/** The append-only trail and its head. */
export class TrailTable {
  readonly #readHead: Statement<[], TrailHead>;
  readonly #writeHead: Statement<[number, string]>;
  readonly #readRow: Statement<[number], TrailRow>;
  readonly #readLast: Statement<[], TrailRow>;
  readonly #readAfter: Statement<[number], TrailRow>;
  readonly #insert: Statement<[number, string, string]>;

  constructor(db: Database) {
    this.#readHead = db.prepare<[], TrailHead>('SELECT sequence, hash FROM head');
    this.#writeHead = db.prepare<[number, string]>('INSERT OR REPLACE INTO head (id, sequence, hash) VALUES (1, ?, ?)');
    this.#readRow = db.prepare<[number], TrailRow>('SELECT sequence, entry, hash FROM trail WHERE sequence = ?');
    this.#readLast = db.prepare<[], TrailRow>('SELECT sequence, entry, hash FROM trail ORDER BY sequence DESC LIMIT 1');
    this.#readAfter = db.prepare<[number], TrailRow>(
      'SELECT sequence, entry, hash FROM trail WHERE sequence > ? ORDER BY sequence',
    );
    this.#insert = db.prepare<[number, string, string]>('INSERT INTO trail (sequence, entry, hash) VALUES (?, ?, ?)');
  }

  head(): TrailHead {
    return this.#readHead.get() ?? emptyHead;
  }

  rowsAfter(sequence: number): IterableIterator<TrailRow> {
    return this.#readAfter.iterate(sequence);
  }

  row(sequence: number): TrailRow | undefined {
    return this.#readRow.get(sequence);
  }

  /** Appends an entry behind the head and moves the head. Refuses when the trail does not end where the head says. */
  append(entryWithoutSequence: Omit<TrailEntry, 'sequence'>): TrailHead {
    const head = this.head();
    const last = this.#readLast.get() ?? emptyHead;
    if (last.sequence !== head.sequence || last.hash !== head.hash) {
      throw new ProjectError({
        code: 'trail-broken',
        where: 'trail',
        expected: `entry ${head.sequence} as the last one, as the head says`,
        received: `entry ${last.sequence} with another hash or place`,
        hint: 'Nothing was written. Verify the project; continue on an earlier copy of the file.',
      });
    }
    const sequence = head.sequence + 1;
    const text = canonicalJson(trailEntry.parse({ sequence, ...entryWithoutSequence }));
    const hash = entryHash(head.hash, text);
    this.#insert.run(sequence, text, hash);
    this.#writeHead.run(sequence, hash);
    return { sequence, hash };
  }
}

/** @throws ProjectError entry-unreadable */
export function parseEntry({ sequence, entry }: TrailRow): TrailEntry {
  try {
    return trailEntry.parse(JSON.parse(entry));
  } catch {
    throw new ProjectError({
      code: 'entry-unreadable',
      where: `trail entry ${sequence}`,
      expected: 'an entry as Footing writes it',
      received: 'something else',
      hint: 'The file was changed from outside. Verify the project; continue on an earlier copy of the file.',
    });
  }
}
