import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { RequestAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import { errorSentence } from '../../src-main/errors.ts';
import { createCore, type Core } from '../../src-main/handlers/handle.ts';
import { directRunner } from './direct-runner.ts';

export interface TestCore {
  core: Core;
  /** A folder of its own, gone at the end. */
  folder: string;
  /** A request that is expected to go well. */
  ask<Name extends RequestName>(name: Name, input: RequestInput<Name>): Promise<RequestAnswer<Name>>;
  end(): Promise<void>;
}

/** The whole core over a folder of its own, with an invented reviewer and a clock that moves a second per look. */
export async function testCore(): Promise<TestCore> {
  const folder = mkdtempSync(join(tmpdir(), 'footing-'));
  let seconds = 0;
  const core = createCore({
    host: 'command line',
    jobs: directRunner(),
    installation: join(import.meta.dirname, '..', '..'),
    home: folder,
    now: () => new Date(Date.UTC(2026, 0, 2, 9, 0, (seconds += 1))).toISOString(),
  });
  const ask: TestCore['ask'] = async (name, input) => {
    const answer = await core.handle(name, input);
    if (!answer.ok) throw new Error(`${name}: ${errorSentence(answer.error)}`);
    return answer.value as RequestAnswer<typeof name>;
  };
  await ask('reviewer.set', { name: 'Ilse Varrow-Oyelaran', role: 'reviewer (invented)' });
  const end = async () => {
    await core.close();
    rmSync(folder, { recursive: true, force: true });
  };
  return { core, folder, ask, end };
}
