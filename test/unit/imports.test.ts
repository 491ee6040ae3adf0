import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { posix } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { folderOf, importProblem, importTable } from '../helpers/import-table.ts';
import { importsOf } from '../helpers/imports-of.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));

function sourceFiles(folder: string): string[] {
  return readdirSync(root + folder, { recursive: true, encoding: 'utf8' })
    .map((name) => `${folder}/${name.replaceAll('\\', '/')}`)
    .filter((path) => /\.(ts|vue)$/.test(path));
}

const files = [...sourceFiles('src-main'), ...sourceFiles('src-renderer')];
const imports = files.flatMap((path) => importsOf(path, readFileSync(root + path, 'utf8')));

/** Cycles of a graph, each from its first file back to it. */
function cycles(edges: ReadonlyMap<string, readonly string[]>): string[][] {
  const found: string[][] = [];
  const done = new Set<string>();
  const visit = (node: string, trail: string[]): void => {
    const start = trail.indexOf(node);
    if (start >= 0) found.push([...trail.slice(start), node]);
    if (start >= 0 || done.has(node)) return;
    for (const next of edges.get(node) ?? []) visit(next, [...trail, node]);
    done.add(node);
  };
  for (const node of edges.keys()) visit(node, []);
  return found;
}

describe('the imports of the sources', () => {
  it('are found', () => {
    expect(files.length).toBeGreaterThan(100);
    expect(imports.length).toBeGreaterThan(files.length);
    expect(imports).toContainEqual({ from: 'src-main/launch.ts', specifier: './loopback.ts', isTypeOnly: false });
    expect(imports).toContainEqual({
      from: 'src-main/preload.ts',
      specifier: './contract/events.ts',
      isTypeOnly: true,
    });
  });

  it('keep to the table of who may import whom', () => {
    const problems = imports
      .map((one) => ({ ...one, problem: importProblem(one) }))
      .filter(({ problem }) => problem !== null);
    expect(problems.map(({ from, specifier, problem }) => `${from} → ${specifier}: ${problem}`)).toEqual([]);
  });

  it('name files that exist, with their extension', () => {
    const missing = imports
      .filter(({ specifier }) => specifier.startsWith('.'))
      .filter(
        ({ from, specifier }) => !existsSync(root + posix.join(posix.dirname(from), specifier.replace(/\?.*$/, ''))),
      );
    expect(missing).toEqual([]);
  });

  it('form no cycle, not even of types', () => {
    const edges = new Map<string, string[]>();
    for (const { from, specifier } of imports) {
      if (specifier.startsWith('.'))
        edges.set(from, [...(edges.get(from) ?? []), posix.join(posix.dirname(from), specifier)]);
    }
    expect(cycles(edges).map((cycle) => cycle.join(' → '))).toEqual([]);
  });

  it('come from folders that the table knows', () => {
    const folders = new Set(sourceFiles('src-main').map(folderOf));
    expect([...folders].filter((folder) => !(folder in importTable))).toEqual([]);
  });
});

describe('the table', () => {
  const problem = (from: string, specifier: string, isTypeOnly = false) =>
    importProblem({ from, specifier, isTypeOnly });

  it.each([
    ['src-main/statistics/ols.ts', '../climate/forcing.ts'],
    ['src-main/climate/forcing.ts', '../robustness/window-sweep.ts'],
    ['src-main/quantities/units.ts', '../statistics/ols.ts'],
    ['src-main/contract/claim.ts', '../quantities/units.ts'],
    ['src-main/assumptions/window.ts', '../project/project.ts'],
    ['src-main/readers/noaa/monthly.ts', '../../project/project.ts'],
    ['src-main/project/project.ts', '../handlers/handle.ts'],
    ['src-main/handlers/claims.ts', '../hosts/carry-request.ts'],
    ['src-main/hosts/electron/menu.ts', '../../project/project.ts'],
    ['src-main/cli.ts', './project/project.ts'],
    ['src-main/cli.ts', './main.ts'],
    ['src-main/hosts/command-line/help.ts', '../../quantities/units.ts'],
    ['src-main/cli.ts', '../src-renderer/main.ts'],
    ['src-main/other/thing.ts', '../errors.ts'],
    ['src-renderer/App.vue', '../src-main/handlers/handle.ts'],
    ['src-renderer/App.vue', '../src-main/quantities/units.ts'],
    ['src-renderer/App.vue', 'electron'],
    ['src-renderer/App.vue', 'node:fs'],
    ['src-main/statistics/ols.ts', 'node:fs'],
    ['src-main/project/project.ts', 'fs'],
    ['src-main/project/project.ts', 'electron'],
    ['src-main/handlers/claims.ts', 'better-sqlite3'],
    ['src-main/handlers/claims.ts', 'node:worker_threads'],
    ['src-main/hosts/command-line/help.ts', 'node:http'],
    ['src-main/hosts/loopback/read-body.ts', 'node:https'],
    ['src-main/hosts/loopback/read-body.ts', 'node:net'],
    ['src-main/figures/axis.ts', 'vue'],
  ])('refuses %s → %s', (from, specifier) => {
    expect(problem(from, specifier)).toMatch(/./);
  });

  it.each([
    ['src-main/statistics/ols.ts', '../quantities/units.ts'],
    ['src-main/statistics/deep/ols.ts', '../quadrature.ts'],
    ['src-main/robustness/sweep.ts', '../climate/forcing.ts'],
    ['src-main/handlers/claims.ts', '../project/project.ts'],
    ['src-main/hosts/electron/menu.ts', '../../handlers/handle.ts'],
    ['src-main/hosts/electron/menu.ts', 'electron'],
    ['src-main/loopback.ts', './hosts/loopback/run-loopback.ts'],
    ['src-renderer/App.vue', '../src-main/quantities/notation.ts'],
    ['src-renderer/App.vue', './pages/StartPage.vue'],
    ['src-renderer/App.vue', 'vue'],
  ])('allows %s → %s', (from, specifier) => {
    expect(problem(from, specifier)).toBeNull();
  });

  it('lets the renderer take types, and only types, from behind the bridge', () => {
    expect(problem('src-renderer/App.vue', '../src-main/handlers/handle.ts', true)).toBeNull();
    expect(importsOf('a.vue', '<script setup lang="ts">import { type A, b } from \'./x.ts\'</script>')).toEqual([
      { from: 'a.vue', specifier: './x.ts', isTypeOnly: false },
    ]);
  });

  it('finds a cycle', () => {
    const edges = new Map([
      ['a', ['b']],
      ['b', ['c', 'd']],
      ['d', ['a']],
    ]);
    expect(cycles(edges)).toEqual([['a', 'b', 'd', 'a']]);
  });
});
