import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';
import { describe, expect, it } from 'vitest';

const root = new URL('../../', import.meta.url);
const folders = ['src-main/statistics', 'src-main/climate'];

interface Row {
  name: string;
  levels: string[];
  paths: string[];
  decides: string;
}

const rows: Row[] = readFileSync(new URL('./INDEX.md', import.meta.url), 'utf8')
  .split('\n')
  .filter((line) => line.startsWith('| `'))
  .map((line) => {
    const [name = '', levels = '', paths = '', decides = ''] = line
      .split('|')
      .slice(1, -1)
      .map((cell) => cell.trim());
    return {
      name: name.replaceAll('`', ''),
      levels: levels.split(', '),
      paths: paths.split(', ').map((path) => path.replaceAll('`', '')),
      decides,
    };
  });

async function exportedFunctions(folder: string): Promise<string[]> {
  const files = readdirSync(new URL(folder, root), { recursive: true, encoding: 'utf8' }).filter((name) =>
    name.endsWith('.ts'),
  );
  const modules = await Promise.all(
    files.map(
      async (name) => (await import(pathToFileURL(new URL(`${folder}/${name}`, root).pathname).href)) as object,
    ),
  );
  return modules.flatMap((module) =>
    Object.entries(module).flatMap(([name, value]) => (typeof value === 'function' ? [name] : [])),
  );
}

describe('INDEX.md', () => {
  it('has one row for each function that statistics and climate export, and no other', async () => {
    const exported = (await Promise.all(folders.map(exportedFunctions))).flat();
    expect(exported.length).toBeGreaterThan(30);
    expect(rows.map(({ name }) => name).sort()).toEqual(exported.sort());
  });

  it.each(rows)(
    '$name rests on something outside itself, and the named tests use it',
    ({ name, levels, paths, decides }) => {
      expect(levels.every((level) => /^[A-E]$/.test(level))).toBe(true);
      expect(levels.some((level) => 'ABC'.includes(level))).toBe(true);
      expect(decides).not.toBe('');
      for (const path of paths) {
        const file = new URL(`test/${path}`, root);
        expect(existsSync(file), path).toBe(true);
        expect(readFileSync(file, 'utf8'), path).toMatch(new RegExp(`\\b${name}\\b`));
      }
    },
  );
});
