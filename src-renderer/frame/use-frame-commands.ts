import type { Route } from '../state/route.ts';
import { goTo } from '../state/use-route.ts';
import { useCommands, type Command } from '../state/use-commands.ts';
import { useSession } from '../state/use-session.ts';
import { useTheme, type ThemeChoice } from '../state/use-theme.ts';

/** The commands that are there on every page: pages, claims, undo, the project, the paper. */
export function useFrameCommands({
  openReviewer,
  openProject,
}: {
  openReviewer: () => void;
  openProject: () => void;
}): void {
  const { project, ask, undo, redo } = useSession();
  const { choice } = useTheme();

  const place = (label: string, route: Route, words?: string): Command => ({ label, words, run: () => goTo(route) });
  const paper = (theme: ThemeChoice): Command => ({
    label: `Paper: ${theme}`,
    words: 'theme appearance colours light dark',
    run: () => (choice.value = theme),
  });

  useCommands(() => {
    const open = project.value;
    return [
      ...(open
        ? [
            ...open.claims.map(({ id, title, status }) => ({
              ...place(`Claim ${id}: ${title}`, { page: 'claim', claimId: id, section: null }),
              words: status,
            })),
            place('Go to Sources', { page: 'sources' }, 'material talks decks papers'),
            place('Go to Series', { page: 'series' }, 'data datasets files import'),
            place('Go to Claims', { page: 'claims' }),
            place(
              'Go to the Published values',
              { page: 'published', claimId: null },
              'assessed ranges ECS TCR forcing feedback IPCC AR6 likelihood',
            ),
            place('Go to the Trail', { page: 'trail', sequence: null }, 'history record'),
            place('Go to the Report', { page: 'report' }, 'save write export'),
            ...(open.undo ? [{ label: `Undo: ${open.undo}`, keys: 'Ctrl Z', words: 'take back', run: undo }] : []),
            ...(open.redo ? [{ label: `Redo: ${open.redo}`, keys: 'Ctrl Shift Z', run: redo }] : []),
            ...(open.isReadOnly
              ? []
              : [
                  place('New claim', { page: 'new-claim' }, 'add take up a stated number'),
                  place('Import a data file', { page: 'series' }, 'add series dataset csv'),
                ]),
            { label: 'Rename the project', words: 'title file path', run: openProject },
            { label: 'Close the project', words: 'open another start', run: () => ask('project.close', {}) },
          ]
        : []),
      { label: 'Change who is reviewing', words: 'reviewer name role identity', run: openReviewer },
      paper('light'),
      paper('dark'),
      paper('as the system'),
    ];
  });
}
