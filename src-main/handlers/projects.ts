import { readdirSync, realpathSync, statSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { createProject } from '../project/create-project.ts';
import { openProject } from '../project/open-project.ts';
import { readProjectTitle } from '../project/read-project-title.ts';
import { verifyProject } from '../project/verify-project.ts';
import type { Handlers } from './context.ts';
import { fileProblem } from './file-problem.ts';
import { freePath } from './free-path.ts';
import { holder } from './holder.ts';
import { makeFolder } from './make-folder.ts';
import { openDemo } from './open-demo.ts';
import { projectView } from './project-view.ts';
import { recheck } from './recheck.ts';

type Names =
  | 'projects.list'
  | 'project.create'
  | 'project.open'
  | 'project.openDemo'
  | 'project.close'
  | 'project.view'
  | 'project.rename'
  | 'project.verify'
  | 'project.recheck';

export const projectHandlers: Handlers<Names> = {
  'projects.list'({ directory }, { places }) {
    const folder = directory ? resolve(directory) : makeFolder(places.projects);
    const entries = readFolder(folder).filter((entry) => !entry.name.startsWith('.'));
    return {
      directory: folder,
      parent: dirname(folder) === folder ? null : dirname(folder),
      folders: entries.filter((entry) => entry.isDirectory()).map((entry) => join(folder, entry.name)),
      projects: entries
        .filter((entry) => entry.isFile() && entry.name.endsWith('.footing'))
        .map((entry) => {
          const path = join(folder, entry.name);
          return {
            path,
            fileName: entry.name,
            title: readProjectTitle(path),
            modifiedAt: statSync(path).mtime.toISOString(),
          };
        })
        .sort((one, other) => other.modifiedAt.localeCompare(one.modifiedAt)),
    };
  },

  'project.create'({ title, directory, path }, context) {
    const { workspace, places } = context;
    const signed = workspace.signed();
    const file = path ? resolve(path) : freePath(directory ?? places.projects, title);
    makeFolder(dirname(file));
    workspace.replace(createProject(file, { title, isInvented: false, holder: holder(context), ...signed }));
    return projectView(workspace.open());
  },

  'project.open'({ path, readOnly = false }, context) {
    const { workspace } = context;
    const file = realPath(path);
    if (workspace.project?.path === file && workspace.project.isReadOnly === readOnly)
      return projectView(workspace.project);
    workspace.replace(openProject(file, { readOnly, holder: holder(context) }));
    return projectView(workspace.open());
  },

  async 'project.openDemo'({ directory }, context) {
    await openDemo(context, directory ?? context.places.projects);
    return projectView(context.workspace.open());
  },

  'project.close'(_, { workspace }) {
    workspace.replace(null);
    return {};
  },

  'project.view': (_, { workspace }) => projectView(workspace.open()),

  'project.rename'({ title }, { workspace }) {
    const project = workspace.open();
    workspace.change('rename project', title, (change) =>
      change.put('project', { ...project.get('project', 1), title }),
    );
    return projectView(project);
  },

  'project.verify': ({ path }, { workspace }) => verifyProject(path ? resolve(path) : workspace.open().path),

  'project.recheck': ({ jobId }, context) => recheck(context, jobId),
};

function readFolder(folder: string) {
  try {
    return readdirSync(folder, { withFileTypes: true });
  } catch (error) {
    throw fileProblem('folder-unreadable', folder, 'a folder that can be read', error);
  }
}

/** One file may have many names; the open project goes by its own. */
function realPath(path: string): string {
  try {
    return realpathSync(path);
  } catch {
    return resolve(path);
  }
}
