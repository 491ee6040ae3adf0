import type { PublishedValue } from '../../../src-main/contract/finding.ts';
import type { PublishedQuantityId } from '../../../src-main/contract/primitives.ts';
import type { PublishedConflict, PublishedDefinition, PublishedLibrary } from '../../../src-main/contract/published.ts';
import { publishedQuantityNames } from '../../../src-main/quantities/quantity-names.ts';
import { citationText } from '../../components/published-words.ts';

export interface PublishedFilter {
  /** All of these words must stand somewhere in a value. */
  words: string;
  quantity: PublishedQuantityId | null;
  edition: string | null;
}

export interface PublishedGroupData {
  quantity: PublishedQuantityId;
  values: PublishedValue[];
  definitions: PublishedDefinition[];
  conflicts: PublishedConflict[];
}

/** The values that a filter lets through, by quantity, each group with what is said about its values. */
export function filterPublished(library: PublishedLibrary, filter: PublishedFilter): PublishedGroupData[] {
  const wanted = plain(filter.words).split(/\s+/).filter(Boolean);
  const found = library.values.filter((value) => {
    if (filter.quantity !== null && value.quantity !== filter.quantity) return false;
    if (filter.edition !== null && value.edition !== filter.edition) return false;
    const text = wordsOf(value);
    return wanted.every((word) => text.includes(word));
  });
  const quantities = [...new Set(found.map(({ quantity }) => quantity))];
  return quantities.map((quantity) => {
    const values = found.filter((value) => value.quantity === quantity);
    const ids = new Set(values.map(({ id }) => id));
    return {
      quantity,
      values,
      definitions: library.definitions.filter((one) => one.quantity === quantity),
      conflicts: library.conflicts.filter(({ valueIds }) => valueIds.some((id) => ids.has(id))),
    };
  });
}

function wordsOf(value: PublishedValue): string {
  const { label, symbol } = publishedQuantityNames[value.quantity];
  return plain([citationText(value), value.subject, label, symbol, value.remark ?? ''].join(' '));
}

/** CO₂ is found by co2, a true minus by a hyphen: as they are typed. */
function plain(text: string): string {
  return text
    .normalize('NFKD')
    .replaceAll(/[\u2212\u2013]/g, '-')
    .toLowerCase();
}
