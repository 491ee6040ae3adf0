import { isBuiltin } from 'node:module';
import { posix } from 'node:path';

const leaves = ['errors'];
const everyone = [...leaves, 'contract'];
const statistics = [...everyone, 'quantities'];
const climate = [...statistics, 'statistics'];
const robustness = [...climate, 'climate'];
const pure = [...robustness, 'robustness', 'assumptions'];
const handlers = [...pure, 'figures', 'readers', 'sources', 'project', 'jobs', 'report', 'engine-version'];

/**
 * Who may import whom: the folders of src-main, each with the folders that it may import beside itself. The lint rule
 * and the test of all imports both read it here.
 */
export const importTable: Readonly<Record<string, readonly string[]>> = {
  errors: [],
  'engine-version': [],
  contract: leaves,
  quantities: everyone,
  statistics,
  climate,
  robustness,
  assumptions: robustness.concat('robustness'),
  figures: statistics,
  readers: statistics,
  sources: statistics,
  project: [...statistics, 'engine-version'],
  jobs: [...pure, 'sources'],
  report: [...statistics, 'figures', 'engine-version'],
  handlers,
  hosts: [...everyone, 'handlers', 'engine-version'],
  entries: [...everyone, 'hosts', 'handlers', 'jobs'],
};

/** Folders without Node, browser, clock, chance or console: the same answer everywhere. */
export const pureFolders = ['contract', 'quantities', 'statistics', 'climate', 'robustness', 'assumptions', 'figures'];

/** Modules that only some places may use. Those with an empty list reach a network. */
const guardedModules: Readonly<Record<string, readonly string[]>> = {
  electron: ['src-main/hosts/electron/', 'src-main/preload.ts'],
  'better-sqlite3': ['src-main/project/'],
  'node:worker_threads': ['src-main/jobs/', 'src-main/worker.ts'],
  'node:child_process': ['src-main/hosts/'],
  'node:http': ['src-main/hosts/loopback/'],
  ...Object.fromEntries(
    ['node:https', 'node:http2', 'node:net', 'node:tls', 'node:dgram', 'node:dns', 'node:inspector'].map((name) => [
      name,
      [],
    ]),
  ),
};

/** How numbers and quantities are written for people, on every host. */
const wording = ['src-main/quantities/notation.ts', 'src-main/quantities/quantity-names.ts'];
const rendererMayRun = ['src-main/contract/', 'src-main/figures/', ...wording];

export interface Import {
  /** Path of the importing file from the root of the repository, with forward slashes. */
  from: string;
  /** What it names: `./x.ts`, `node:fs`, `vue`. */
  specifier: string;
  isTypeOnly: boolean;
}

/** What is wrong with an import, in a sentence; null when nothing is. */
export function importProblem({ from, specifier, isTypeOnly }: Import): string | null {
  if (!specifier.startsWith('.')) return moduleProblem(from, specifier);
  const to = posix.join(posix.dirname(from), specifier);
  if (from.startsWith('src-renderer/')) return rendererProblem(to, isTypeOnly);
  if (!to.startsWith('src-main/')) return `src-main imports nothing from outside itself, but this is ${to}.`;
  const importer = folderOf(from);
  const imported = folderOf(to);
  if (importer === imported && importer !== 'entries') return null;
  // launch.ts hands over to loopback.ts where there is no Electron.
  if (from === 'src-main/launch.ts' && to === 'src-main/loopback.ts') return null;
  if (importer === 'hosts' && wording.includes(to)) return null;
  const allowed = importTable[importer];
  if (!allowed) return `${importer} is not in the table of who may import whom.`;
  return allowed.includes(imported)
    ? null
    : `${importer} may import ${allowed.join(', ') || 'nothing'}, but this is ${imported}.`;
}

/** The folder of a file, or `entries`, or the name of a file that stands alone. */
export function folderOf(path: string): string {
  const [, first = '', ...rest] = path.split('/');
  if (rest.length > 0) return first;
  const name = first.replace(/\.ts$/, '');
  return name in importTable ? name : 'entries';
}

function rendererProblem(to: string, isTypeOnly: boolean): string | null {
  if (to.startsWith('src-renderer/') || isTypeOnly) return null;
  return rendererMayRun.some((place) => to.startsWith(place))
    ? null
    : `The renderer may run ${rendererMayRun.join(', ')}, but this is ${to}.`;
}

function moduleProblem(from: string, specifier: string): string | null {
  const isOfNode = isBuiltin(specifier);
  if (isOfNode && !specifier.startsWith('node:'))
    return `Modules of Node are named with node:, but this is ${specifier}.`;
  const isPure = from.startsWith('src-renderer/') || pureFolders.includes(folderOf(from));
  if (isOfNode && isPure) return `${from} runs without Node, but this is ${specifier}.`;
  if (specifier === 'vue' && from.startsWith('src-main/')) return 'Only the renderer uses Vue.';
  const places = guardedModules[specifier];
  if (!places || places.some((place) => from.startsWith(place))) return null;
  return `${specifier} is for ${places.join(', ') || 'nobody here'}.`;
}
