import { basename } from 'node:path';
import { source } from '../../contract/project.ts';
import { baselineText } from './baseline-text.ts';
import { badUsage, oneOf, type Command } from './command.ts';
import { importCommand } from './import-command.ts';
import { textTable } from './text-table.ts';

export const dataCommands: Command[] = [
  importCommand,
  {
    name: 'series',
    usage: 'FILE',
    summary: 'lists series with unit, span, step, gaps, baseline and digest',
    examples: ['series review.footing'],
    nPositionals: { min: 1, max: 1 },
    options: {},
    async run({ positionals: [path = ''] }, tools) {
      const { series } = await tools.ask('project.open', { path, readOnly: true });
      const rows = series.map((row) => [
        String(row.id),
        row.name,
        row.unit || '?',
        `${row.startYear}–${row.endYear}`,
        row.step,
        `${row.nMissing} missing, ${row.nAbsent} absent`,
        baselineText(row),
        row.valuesDigest.slice(0, 12),
      ]);
      return {
        json: series,
        lines: rows.length > 0 ? textTable(rows) : ['No series yet. footing import FILE DATA… brings some in.'],
      };
    },
  },
  {
    name: 'source',
    usage: 'FILE MATERIAL…',
    summary: 'attaches the material under review, as received',
    examples: ['source review.footing talk.txt --kind transcript --title "Talk at the harbour"'],
    nPositionals: { min: 2, max: 100 },
    options: {
      title: { value: 'TITLE', help: 'title; the file name unless given' },
      kind: { value: 'KIND', help: `${source.shape.kind.options.join(', ')}; other unless given` },
      details: { value: 'TEXT', help: 'author, date, occasion' },
    },
    async run(args, tools) {
      const [path = '', ...files] = args.positionals;
      const kind = oneOf(args, 'kind', source.shape.kind.options) ?? 'other';
      const title = args.option('title');
      if (title !== undefined && files.length > 1) {
        throw badUsage('--title', 'one source to give it to', `${files.length}`, 'Attach them one by one.');
      }
      const attached = files.map((file) => ({
        title: title ?? basename(file),
        kind,
        details: args.option('details') ?? '',
        file: { name: basename(file), bytes: tools.readFile(file).toString('base64') },
      }));
      let view = await tools.ask('project.open', { path });
      for (const one of attached) view = await tools.ask('source.save', one);
      const lines = view.sources.map(
        ({ id, title: name, kind: sort, file }) =>
          `source ${id}  ${name} (${sort})  ${file?.digest.slice(0, 12) ?? 'no file'}`,
      );
      return { json: view.sources, lines };
    },
  },
];
