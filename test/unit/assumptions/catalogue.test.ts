import { describe, expect, it } from 'vitest';
import { catalogue, catalogueEntries } from '../../../src-main/assumptions/catalogue.ts';
import { assumptionId } from '../../../src-main/contract/result.ts';

describe('catalogue', () => {
  it('holds every assumption of the contract once', () => {
    expect(catalogue.map(({ id }) => id).sort()).toEqual([...assumptionId.options].sort());
  });

  it('is plain data for the screens, complete and without a full stop after titles', () => {
    expect(JSON.parse(JSON.stringify(catalogueEntries))).toEqual(catalogueEntries);
    for (const entry of catalogueEntries) {
      expect(Object.keys(entry).sort()).toEqual([
        'explanation',
        'formula',
        'group',
        'id',
        'method',
        'needs',
        'shortTitle',
        'source',
        'title',
      ]);
      expect(Object.values(entry).every((text) => text.length > 0)).toBe(true);
      expect(entry.title).not.toMatch(/\.$/);
      expect(entry.shortTitle.length).toBeLessThan(25);
    }
  });
});
