import type { z } from 'zod';
import { claim } from '../contract/claim.ts';
import { finding, mark, note, signature } from '../contract/finding.ts';
import { projectRecord, source } from '../contract/project.ts';
import { result } from '../contract/result.ts';
import { dataset, series } from '../contract/series.ts';
import type { RecordKind } from '../contract/trail.ts';
import { InputError } from '../errors.ts';

/** What each kind of record must look like, on the way in and on the way out. */
export const recordSchemas = {
  project: projectRecord,
  source,
  dataset,
  series,
  claim,
  result,
  mark,
  note,
  finding,
  signature,
} as const satisfies Record<RecordKind, z.ZodType>;

export type RecordOf<Kind extends RecordKind> = z.infer<(typeof recordSchemas)[Kind]>;
export type NewRecord<Kind extends RecordKind> = Omit<RecordOf<Kind>, 'id'>;

/** Checks a record against its kind; the first thing wrong is named by its path. */
export function parseRecord<Kind extends RecordKind>(kind: Kind, value: unknown): RecordOf<Kind> {
  const parsed = recordSchemas[kind].safeParse(value);
  if (parsed.success) return parsed.data as RecordOf<Kind>;
  const [issue] = parsed.error.issues;
  throw new InputError({
    code: 'record-shape',
    where: [kind, ...(issue?.path ?? [])].join('.'),
    expected: `a ${kind} as the contract describes it`,
    received: `a value for which this holds: ${issue?.message ?? 'unknown'}`,
  });
}
