import type { ProgressEvent } from '../../src-main/contract/events.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';

/** Whatever carries requests to the core: the Electron process around this window, or the program behind this page. */
export interface Host {
  /** From the input as JSON text to the answer as JSON text; rejects when the host has gone away. */
  send(name: RequestName, inputJson: string): Promise<string>;
  onProgress(listener: (event: ProgressEvent) => void): () => void;
  /** Calls back with true when the host goes away and with false when it is there again. */
  onAbsence(listener: (isAway: boolean) => void): () => void;
}
