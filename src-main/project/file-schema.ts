import type { RecordKind } from '../contract/trail.ts';

/** "Foot", big-endian: what makes a SQLite file a Footing project (SQLite's own list of application ids has no such number). */
export const applicationId = 0x466f6f74;
export const schemaVersion = 1;

/** Members of a record that point at another record, or at content by its digest. */
const references: Record<RecordKind, readonly { column: string; path: string; to: RecordKind | 'content' }[]> = {
  project: [],
  source: [{ column: 'file_digest', path: '$.file.digest', to: 'content' }],
  dataset: [{ column: 'content_digest', path: '$.contentDigest', to: 'content' }],
  series: [
    { column: 'dataset_id', path: '$.datasetId', to: 'dataset' },
    { column: 'values_digest', path: '$.valuesDigest', to: 'content' },
  ],
  claim: [
    { column: 'source_id', path: '$.statement.sourceId', to: 'source' },
    { column: 'temperature_series_id', path: '$.procedure.temperatureSeriesId', to: 'series' },
    { column: 'co2_series_id', path: '$.procedure.co2SeriesId', to: 'series' },
    { column: 'trend_series_id', path: '$.procedure.seriesId', to: 'series' },
    { column: 'total_forcing_series_id', path: '$.evidence.totalForcingSeriesId', to: 'series' },
    { column: 'co2_forcing_series_id', path: '$.evidence.co2ForcingSeriesId', to: 'series' },
  ],
  result: [
    { column: 'claim_id', path: '$.claimId', to: 'claim' },
    { column: 'answer_digest', path: '$.answerDigest', to: 'content' },
  ],
  mark: [{ column: 'claim_id', path: '$.claimId', to: 'claim' }],
  note: [{ column: 'claim_id', path: '$.claimId', to: 'claim' }],
  finding: [{ column: 'claim_id', path: '$.claimId', to: 'claim' }],
  signature: [
    { column: 'claim_id', path: '$.claimId', to: 'claim' },
    { column: 'finding_id', path: '$.findingId', to: 'finding' },
    { column: 'payload_digest', path: '$.payloadDigest', to: 'content' },
  ],
};

function recordTable(kind: RecordKind): string {
  const columns = references[kind].map(({ column, path, to }) => {
    const type = to === 'content' ? 'TEXT' : 'INTEGER';
    const target = to === 'content' ? 'content (digest)' : `${to} (id)`;
    return `  ${column} ${type} GENERATED ALWAYS AS (body ->> '${path}') VIRTUAL REFERENCES ${target} DEFERRABLE INITIALLY DEFERRED`;
  });
  return `CREATE TABLE ${kind} (
${['  id INTEGER PRIMARY KEY AUTOINCREMENT', `  body TEXT NOT NULL CHECK (json_valid(body) AND body ->> '$.id' IS id)`, ...columns].join(',\n')}
) STRICT;`;
}

function refusal(table: string, event: 'UPDATE' | 'DELETE'): string {
  return `CREATE TRIGGER ${table}_refuses_${event.toLowerCase()} BEFORE ${event} ON ${table}
BEGIN SELECT RAISE (ABORT, 'rows of ${table} are written once'); END;`;
}

/** The whole schema of a project file. A file whose schema differs from this by a letter is not opened. */
export const schemaSql = [
  'CREATE TABLE content (\n  digest TEXT PRIMARY KEY,\n  bytes BLOB NOT NULL\n) STRICT;',
  ...(Object.keys(references) as RecordKind[]).map(recordTable),
  'CREATE TABLE trail (\n  sequence INTEGER PRIMARY KEY,\n  entry TEXT NOT NULL,\n  hash TEXT NOT NULL\n) STRICT;',
  // The last entry's sequence and hash a second time, so that its removal shows.
  'CREATE TABLE head (\n  id INTEGER PRIMARY KEY CHECK (id = 1),\n  sequence INTEGER NOT NULL,\n  hash TEXT NOT NULL\n) STRICT;',
  ...['trail', 'content'].flatMap((table) => [refusal(table, 'UPDATE'), refusal(table, 'DELETE')]),
].join('\n');
