import type { TextFile } from './decode-text.ts';
import type { VariableFile } from './net-cdf/variable-file.ts';

/** One sheet of a workbook, its rows as lines of comma-separated text: line 17 is row 17. */
export interface Sheet {
  name: string;
  file: TextFile;
}

/** What a received file turned out to be, by its first bytes. */
export type FileContent =
  | { kind: 'text'; file: TextFile }
  | { kind: 'workbook'; sheets: readonly Sheet[] }
  | { kind: 'variables'; file: VariableFile };

/** A received file, unpacked and ready for a reader to look at. */
export interface OpenedFile {
  fileName: string;
  sizeBytes: number;
  content: FileContent;
}
