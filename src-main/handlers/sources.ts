import type { Handlers } from './context.ts';
import { projectView } from './project-view.ts';
import { InputError } from '../errors.ts';

export const sourceHandlers: Handlers<'source.save' | 'source.remove'> = {
  'source.save'({ id, file, ...description }, { workspace }) {
    const project = workspace.open();
    const earlier = id === undefined ? null : project.get('source', id);
    workspace.change(earlier ? 'change source' : 'add source', description.title, (change) => {
      const bytes = file ? Buffer.from(file.bytes, 'base64') : null;
      const attached =
        file && bytes ? { name: file.name, sizeBytes: bytes.byteLength, digest: change.addContent(bytes) } : null;
      // No file given keeps the one that is there; null takes it away.
      const record = { ...description, file: file === undefined ? (earlier?.file ?? null) : attached };
      return earlier ? change.put('source', { ...record, id: earlier.id }) : change.add('source', record);
    });
    return projectView(project);
  },
  'source.remove'({ sourceId }, { workspace }) {
    const project = workspace.open();
    const claims = project.list('claim').filter((claim) => claim.statement.sourceId === sourceId);
    if (claims.length > 0) {
      throw new InputError({
        code: 'source-in-use',
        where: `Source ${sourceId}`,
        expected: 'a source that no claim names',
        received: `claim ${claims.map((claim) => claim.id).join(', ')} taken from it`,
        hint: 'Point the claims to another source or remove them first.',
      });
    }
    workspace.change('remove source', `source ${sourceId}`, (change) => change.remove('source', sourceId));
    return projectView(project);
  },
};
