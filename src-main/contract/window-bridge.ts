import type { ProgressEvent } from './events.ts';
import type { RequestName } from './request-names.ts';

/** What the preload script puts on the window: one function per request, from JSON text to JSON text. */
export interface WindowBridge {
  verbs: Readonly<Record<RequestName, (inputJson: string) => Promise<string>>>;
  /** Calls back with what running jobs tell; answers the way to stop listening. */
  onProgress(listener: (event: ProgressEvent) => void): () => void;
}
