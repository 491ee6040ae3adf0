import type { Handlers } from './context.ts';
import { projectView } from './project-view.ts';

export const trailHandlers: Handlers<'trail.list' | 'trail.entry' | 'trail.undo' | 'trail.redo'> = {
  'trail.list'({ claimId, before, limit }, { workspace }) {
    const lines = workspace.open().trailLines({ claimId, before, limit: limit + 1 });
    return { lines: lines.slice(0, limit), hasMore: lines.length > limit };
  },
  'trail.entry': ({ sequence }, { workspace }) => workspace.open().trailEntry(sequence),
  'trail.undo'(_, { workspace }) {
    workspace.open().undo(workspace.signed());
    return projectView(workspace.open());
  },
  'trail.redo'(_, { workspace }) {
    workspace.open().redo(workspace.signed());
    return projectView(workspace.open());
  },
};
