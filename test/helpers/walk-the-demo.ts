import { networkInterfaces } from 'node:os';
import type { Answer } from '../../src-main/contract/requests.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import { enter, send } from './http-client.ts';
import { startLoopback } from './loopback.ts';

/** Everything that a reviewer does between opening a project and reading its report. */
const steps: [RequestName, object][] = [
  ['session.get', {}],
  ['claim.view', { claimId: 1 }],
  ['claim.derive', { claimId: 1 }],
  ['claim.recompute', { claimId: 1 }],
  ['claim.testAssumptions', { claimId: 1 }],
  ['claim.sweep', { claimId: 1, minYears: 20 }],
  ['series.get', { seriesId: 1 }],
  ['trail.list', { limit: 100 }],
  ['project.verify', {}],
  ['project.recheck', {}],
  ['report.render', {}],
];

export interface DemoWalk {
  /** Of each request, its name and whether it was answered. */
  answers: Record<string, boolean>;
  /** Every file of the screens, with its status. */
  pages: Record<string, number>;
  /** Names of the network interfaces that this process sees. */
  interfaces: string[];
  exitStatus: number | null;
}

/** Starts the built loopback host with the worked example, walks through it, and stops it. */
export async function walkTheDemo(home: string): Promise<DemoWalk> {
  const host = await startLoopback(home, ['--demo']);
  const cookie = await enter(host.firstAddress);
  const headers = { cookie, origin: host.origin, 'content-type': 'application/json' };

  const pages: Record<string, number> = {};
  const index = await send(host.origin, { path: '/', headers });
  for (const [, path = ''] of index.body.matchAll(/(?:src|href)="\.?(\/assets\/[^"]+)"/g)) {
    pages[path] = (await send(host.origin, { path, headers })).status;
  }
  const answers: Record<string, boolean> = {};
  for (const [name, input] of steps) {
    const { body } = await send(host.origin, {
      path: `/request/${name}`,
      method: 'POST',
      headers,
      body: JSON.stringify(input),
    });
    answers[name] = (JSON.parse(body) as Answer<RequestName>).ok;
  }
  const { exitStatus } = await host.stop();
  return { answers, pages, interfaces: Object.keys(networkInterfaces()), exitStatus };
}

if (process.argv[1] === import.meta.filename) {
  console.log(JSON.stringify(await walkTheDemo(process.argv[2] ?? '')));
}
