import type { Database, Statement } from 'better-sqlite3';
import type { RecordKind } from '../contract/trail.ts';
import { InputError } from '../errors.ts';

/** Keeps what has been signed as it was signed, whoever asks. */
export class FrozenRecords {
  readonly #latestIsSigned: Statement<[number], number>;
  readonly #isCited: Statement<[number], number>;

  constructor(db: Database) {
    this.#latestIsSigned = db
      .prepare<[number], number>(
        `SELECT body ->> '$.isSigned' FROM finding WHERE claim_id = ? ORDER BY body ->> '$.revision' DESC LIMIT 1`,
      )
      .pluck();
    this.#isCited = db
      .prepare<[number], number>(
        `SELECT 1 FROM finding, json_each(finding.body, '$.resultIds') AS cited
         WHERE finding.body ->> '$.isSigned' AND cited.value = ?`,
      )
      .pluck();
  }

  /** @throws InputError frozen */
  refuseChange(kind: RecordKind, id: number, before: string | null, after: string | null): void {
    const reason = this.#reason(kind, id, before, after);
    if (reason === null) return;
    throw new InputError({
      code: 'frozen',
      where: `${kind} ${id}`,
      expected: 'a record that no signature covers',
      received: reason,
      hint: 'Make a new revision of the finding, which says what changes and why.',
    });
  }

  #reason(kind: RecordKind, id: number, before: string | null, after: string | null): string | null {
    const isNew = before === null;
    if (kind === 'signature' && !isNew) return 'a signature, which is never changed or removed';
    if (kind === 'finding' && !isNew && member(before, 'isSigned') === true) return 'a signed finding';
    if (kind === 'result' && !isNew && this.#isCited.get(id) !== undefined)
      return 'a result that a signed finding cites';
    const claimId = kind === 'claim' ? id : kind === 'mark' ? member(before ?? after, 'claimId') : null;
    if (typeof claimId === 'number' && this.#latestIsSigned.get(claimId) === 1) {
      return `part of claim ${claimId}, whose finding is signed`;
    }
    return null;
  }
}

function member(body: string | null, key: string): unknown {
  return body === null ? undefined : (JSON.parse(body) as Record<string, unknown>)[key];
}
