import { checkHeader } from './check-header.ts';
import { checkSchema } from './check-schema.ts';
import { connectReadOnly } from './connection.ts';
import { checkSideFiles } from './side-files.ts';
import { parseRecord } from './records.ts';

/** The title of the project in a file; null when the file is not one that would open. */
export function readProjectTitle(path: string): string | null {
  try {
    checkHeader(path);
    checkSideFiles(path);
    const { db, close } = connectReadOnly(path);
    try {
      if (checkSchema(db).differences.length > 0) return null;
      const body = db.prepare<[], string>('SELECT body FROM project WHERE id = 1').pluck().get();
      return body === undefined ? null : parseRecord('project', JSON.parse(body)).title;
    } finally {
      close();
    }
  } catch {
    return null;
  }
}
