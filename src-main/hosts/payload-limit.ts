import type { RequestName } from '../contract/request-names.ts';

const megabyte = 1_000_000;

/** Requests that carry a file: 64 MiB of it as base64, and what is said about it. */
const fileLimitBytes = 91 * megabyte;
const usualLimitBytes = megabyte;

const limits: Partial<Record<RequestName, number>> = {
  'source.save': fileLimitBytes,
  'data.preview': fileLimitBytes,
  'data.import': fileLimitBytes,
  // Whole series and ensembles of them.
  compute: 16 * megabyte,
  'figure.export': 8 * megabyte,
};

/** The longest input of a request, as JSON text in UTF-8. */
export function payloadLimitBytes(name: RequestName): number {
  return limits[name] ?? usualLimitBytes;
}
