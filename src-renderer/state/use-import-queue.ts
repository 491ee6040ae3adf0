import { shallowRef, type ShallowRef } from 'vue';

export interface WaitingFile {
  /** Tells two files of the same name apart. */
  number: number;
  file: File;
}

/** Files that were dropped or chosen and have not been imported yet; the first is the one being looked at. */
const waiting = shallowRef<readonly WaitingFile[]>([]);
let received = 0;

export interface ImportQueue {
  waiting: Readonly<ShallowRef<readonly WaitingFile[]>>;
  add: (files: readonly File[]) => void;
  /** Takes the first file off. */
  next: () => void;
}

export function useImportQueue(): ImportQueue {
  return {
    waiting,
    add: (files) => (waiting.value = [...waiting.value, ...files.map((file) => ({ number: ++received, file }))]),
    next: () => (waiting.value = waiting.value.slice(1)),
  };
}
