export interface BenchCase {
  name: string;
  /** What the time is measured against, in words. */
  peerName: string;
  own(): void;
  peer(): void;
  /** Removes what the case made. */
  end(): void;
}
