import { onScopeDispose, shallowReactive } from 'vue';

/** Something that can be done from the command list. */
export interface Command {
  /** What it does, as a verb phrase: "Add a source". */
  label: string;
  /** Further words under which it can be found. */
  words?: string;
  /** The keys that do the same, as they are written on the keys. */
  keys?: string;
  run: () => unknown;
}

const offered = shallowReactive(new Set<() => Command[]>());

/** Every command that is offered now, in the order in which the parts of the screen offered them. */
export function allCommands(): Command[] {
  return [...offered].flatMap((offer) => offer());
}

/** Offers commands for as long as the calling part of the screen is shown. */
export function useCommands(offer: () => Command[]): void {
  offered.add(offer);
  onScopeDispose(() => offered.delete(offer));
}

/** The commands in which every word of the query occurs, those whose label begins with it first. */
export function findCommands(commands: readonly Command[], query: string): Command[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  const text = ({ label, words: more = '' }: Command) => `${label} ${more}`.toLowerCase();
  const found = commands.filter((command) => words.every((word) => text(command).includes(word)));
  const rank = ({ label }: Command) => (label.toLowerCase().startsWith(words.join(' ')) ? 0 : 1);
  return found.sort((a, b) => rank(a) - rank(b));
}
