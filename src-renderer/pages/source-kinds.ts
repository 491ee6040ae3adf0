import type { Source } from '../../src-main/contract/project.ts';

/** What a source can be, in words. */
export const sourceKinds: readonly { value: Source['kind']; label: string }[] = [
  { value: 'talk', label: 'talk' },
  { value: 'deck', label: 'slide deck' },
  { value: 'paper', label: 'paper' },
  { value: 'transcript', label: 'transcript' },
  { value: 'notes', label: 'notes' },
  { value: 'figure', label: 'figure' },
  { value: 'other', label: 'other' },
];

export const sourceKindName = (kind: Source['kind']): string =>
  sourceKinds.find(({ value }) => value === kind)?.label ?? kind;
