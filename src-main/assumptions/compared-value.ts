import type { ClaimComputation } from '../contract/compute.ts';
import type { PublishedValue } from '../contract/finding.ts';
import { InputError } from '../errors.ts';
import { publishedValues } from '../quantities/published-values.ts';

/**
 * The published value that the source holds the number against; null where it names none.
 *
 * @throws InputError unknown-published-value
 */
export function comparedValue({ evidence: { comparedWith } }: ClaimComputation): PublishedValue | null {
  if (comparedWith === null) return null;
  const found = publishedValues.find(({ id }) => id === comparedWith);
  if (found) return found;
  throw new InputError({
    code: 'unknown-published-value',
    where: 'compared with',
    expected: 'the id of a published value',
    received: `“${comparedWith}”`,
    hint: 'Choose one from the list of published values.',
  });
}
