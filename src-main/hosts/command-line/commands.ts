import type { Command } from './command.ts';
import { computeCommands } from './compute-commands.ts';
import { claimCommands } from './claim-commands.ts';
import { dataCommands } from './data-commands.ts';
import { findingCommands } from './finding-commands.ts';
import { projectCommands } from './project-commands.ts';
import { publishedCommand } from './published-command.ts';

/** All commands, in the order in which a review uses them. */
export const commands: readonly Command[] = [
  ...projectCommands,
  ...dataCommands,
  ...claimCommands,
  publishedCommand,
  ...findingCommands,
  ...computeCommands,
];
