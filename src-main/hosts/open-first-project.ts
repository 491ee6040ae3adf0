import type { ErrorAnswer } from '../contract/requests.ts';
import type { Core } from '../handlers/handle.ts';
import type { LaunchOptions } from './launch-options.ts';

/** Opens what the options ask for; null when there is nothing to say about it. */
export async function openFirstProject(
  core: Core,
  { isDemo, projectPath }: LaunchOptions,
): Promise<ErrorAnswer | null> {
  if (!isDemo && projectPath === null) return null;
  const answer = isDemo
    ? await core.handle('project.openDemo', {})
    : await core.handle('project.open', { path: projectPath });
  return answer.ok ? null : answer.error;
}
