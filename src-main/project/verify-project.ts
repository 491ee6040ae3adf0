import { realpathSync } from 'node:fs';
import { recordKind, type VerifyProblem, type VerifyReport } from '../contract/trail.ts';
import { ProjectError } from '../errors.ts';
import { checkHeader } from './check-header.ts';
import { type Connection, connectReadOnly } from './connection.ts';
import { type RawTables, readRawTables } from './raw-tables.ts';
import { checkSideFiles } from './side-files.ts';
import { asProjectError } from './sqlite-error.ts';
import { emptyHead } from './trail-table.ts';
import { compareWithHead, verifyChain } from './verify-chain.ts';
import { verifyContents } from './verify-contents.ts';
import { compareNumbering, compareRecords, replay } from './verify-records.ts';
import { verifySignatures } from './verify-signatures.ts';

/**
 * Looks for every way in which a project file is not what its trail says: walks the hash chain, carries all entries
 * out again from nothing and compares the outcome with the tables, recomputes the digests of all content, and checks
 * the signatures. Files that openProject refuses are verified as far as they can be read.
 *
 * @throws ProjectError not-found, not-a-project, other-application for a file that holds no project, newer-version,
 *   foreign-journal, busy
 */
export function verifyProject(path: string): VerifyReport {
  const refusal = refusalOfHeader(path);
  const headerProblems = refusal ? [problemOf(refusal)] : [];
  const realPath = realpathSync(path);
  checkSideFiles(realPath);
  let connection: Connection | undefined;
  try {
    connection = connectReadOnly(realPath);
    // One state of the file throughout, though a writer may be at work beside.
    connection.db.exec('BEGIN');
    const tables = readRawTables(connection.db);
    // A database without a trail behind another program's header is no project at all.
    if (refusal && !tables.trail) throw refusal;
    return verifyTables(tables, headerProblems);
  } catch (error) {
    const reason = asProjectError(error, realPath);
    if (!(reason instanceof ProjectError) || reason.fields.code !== 'damaged') throw reason;
    return unreadable([...headerProblems, { code: 'file-damaged', where: 'file', detail: reason.fields.received }]);
  } finally {
    connection?.close();
  }
}

function verifyTables(tables: RawTables, headerProblems: VerifyProblem[]): VerifyReport {
  const { trail, heads, records, numbering, contentDigests } = tables;
  const problems = [...headerProblems, ...tables.problems];
  if (trail) {
    const chain = verifyChain(trail);
    const replayed = replay(chain.entries);
    problems.push(...chain.problems, ...replayed.problems);
    if (heads) problems.push(...compareWithHead(chain.last, heads[0]));
    for (const kind of recordKind.options) {
      const rows = records.get(kind);
      if (rows) problems.push(...compareRecords(kind, rows, replayed));
      if (numbering) problems.push(...compareNumbering(kind, numbering.get(kind), replayed));
    }
    if (contentDigests) problems.push(...verifyContents(contentDigests, chain.entries));
  }
  const signatures = verifySignatures(tables);
  problems.push(...signatures.problems);
  return {
    isSound: problems.length === 0,
    problems,
    nEntries: trail?.length ?? 0,
    nRecords: [...records.values()].reduce((sum, rows) => sum + (rows?.length ?? 0), 0),
    nContents: contentDigests?.size ?? 0,
    head: heads?.[0] ?? emptyHead,
    signatures: signatures.checks,
  };
}

/** What the header would be refused for, where the rest may be a project all the same. */
function refusalOfHeader(path: string): ProjectError | null {
  try {
    checkHeader(path);
    return null;
  } catch (error) {
    if (!(error instanceof ProjectError)) throw error;
    if (error.fields.code === 'other-application' || error.fields.code === 'unknown-version') return error;
    throw error;
  }
}

function problemOf({ fields }: ProjectError): VerifyProblem {
  return { code: 'schema', where: 'file header', detail: `it is that of ${fields.received}` };
}

function unreadable(problems: VerifyProblem[]): VerifyReport {
  return { isSound: false, problems, nEntries: 0, nRecords: 0, nContents: 0, head: emptyHead, signatures: [] };
}
