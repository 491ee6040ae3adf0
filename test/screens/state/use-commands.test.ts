import { effectScope } from 'vue';
import { describe, expect, it } from 'vitest';
import { allCommands, findCommands, useCommands } from '../../../src-renderer/state/use-commands.ts';

const command = (label: string, words?: string) => ({ label, words, run: () => undefined });
const labels = (query: string) =>
  findCommands([command('Go to the Trail', 'history'), command('New claim'), command('Claim 1: Ice')], query).map(
    ({ label }) => label,
  );

describe('findCommands', () => {
  it('finds by any words of the label or beside it, in any order and case', () => {
    expect(labels('trail GO')).toEqual(['Go to the Trail']);
    expect(labels('history')).toEqual(['Go to the Trail']);
    expect(labels('sea')).toEqual([]);
  });

  it('puts those first that begin with what was typed', () => {
    expect(labels('claim')).toEqual(['Claim 1: Ice', 'New claim']);
    expect(labels('')).toHaveLength(3);
  });
});

describe('useCommands', () => {
  it('offers commands for as long as the part of the screen lives', () => {
    const before = allCommands().length;
    const scope = effectScope();
    scope.run(() => useCommands(() => [command('Add a source')]));
    expect(allCommands()).toHaveLength(before + 1);
    scope.stop();
    expect(allCommands()).toHaveLength(before);
  });
});
