import { basename } from 'node:path';
import type { BadRow, ImportPreview, SeriesChoice } from '../../contract/series.ts';
import { seriesQuantity } from '../../contract/series.ts';
import { badUsage, type Command, type CommandArguments } from './command.ts';
import { textTable } from './text-table.ts';

export const dataCommands: Command[] = [
  {
    name: 'import',
    usage: 'FILE DATA…',
    summary: 'imports datasets; the format is recognised from the content',
    examples: [
      'import review.footing GLB.Ts+dSST.csv co2_mm_mlo.txt',
      'import review.footing readings.csv --as harbour-air --quantity temperature-anomaly --unit K --baseline 1951-1980',
    ],
    nPositionals: { min: 2, max: 100 },
    options: {
      as: { value: 'NAME', help: 'name of the series; for one file with one series' },
      reader: { value: 'ID', help: 'reader to use instead of the recognised one' },
      series: { value: 'KEY', help: 'take this series of the file; may be repeated', isRepeatable: true },
      all: { help: 'take all series of the file, not only its main ones' },
      quantity: { value: 'Q', help: seriesQuantity.options.join(', ') },
      unit: { value: 'U', help: 'unit, where the file does not give it' },
      baseline: { value: 'A-B', help: 'baseline period, such as 1951-1980' },
      licence: { value: 'TEXT', help: 'licence or source note, kept with the file' },
      'refuse-bad-rows': {
        help: 'import nothing when a row cannot be used; otherwise such rows are left out, listed and recorded',
      },
    },
    async run(args, tools) {
      const [path = '', ...files] = args.positionals;
      await tools.ask('project.open', { path });
      const imported = [];
      for (const file of files) {
        const bytes = tools.readFile(file).toString('base64');
        const reader = args.option('reader');
        const options = reader ? { readerId: reader } : {};
        const fileName = basename(file);
        const preview = await tools.ask('data.preview', { fileName, bytes, options });
        const choices = chooseSeries(preview, args, files.length);
        const licence = args.option('licence');
        const { datasetId, seriesIds, project } = await tools.ask('data.import', {
          fileName,
          bytes,
          options,
          choices,
          leaveOutBadRows: !args.has('refuse-bad-rows'),
          ...(licence === undefined ? {} : { licence }),
        });
        const series = project.series.filter((row) => seriesIds.includes(row.id));
        imported.push({
          file,
          datasetId,
          reader: preview.reader,
          nRows: preview.nRows,
          leftOut: preview.badRows,
          notes: preview.notes,
          series,
        });
      }
      const text = imported.flatMap(({ file, reader, nRows, leftOut, notes, series }) => [
        `${file}: ${reader.title} (${reader.why})`,
        `  ${nRows} rows read, ${leftOut.length} left out`,
        ...leftOut.map(badRowLine),
        ...notes.map((note) => `  note: ${note}`),
        ...series.map(
          (row) =>
            `  series ${row.id} ${row.name}: ${row.quantity}, ${row.unit || 'unit unknown'}, ${row.startYear}–${row.endYear} by ${row.step}, ${row.nMissing} missing, ${row.nAbsent} absent`,
        ),
      ]);
      return { json: imported, text: text.join('\n') };
    },
  },
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
        row.baseline ? `vs ${row.baseline.start}–${row.baseline.end}` : 'no baseline',
        row.valuesDigest.slice(0, 12),
      ]);
      return {
        json: series,
        text: rows.length > 0 ? textTable(rows) : 'No series yet. footing import FILE DATA… brings some in.',
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
      kind: { value: 'KIND', help: 'talk, deck, paper, transcript, notes, figure or other' },
      details: { value: 'TEXT', help: 'author, date, occasion' },
    },
    async run(args, tools) {
      const [path = '', ...files] = args.positionals;
      let view = await tools.ask('project.open', { path });
      for (const file of files) {
        view = await tools.ask('source.save', {
          title: args.option('title') ?? basename(file),
          kind: (args.option('kind') ?? 'other') as 'other',
          details: args.option('details') ?? '',
          file: { name: basename(file), bytes: tools.readFile(file).toString('base64') },
        });
      }
      const text = view.sources.map(
        (source) =>
          `source ${source.id}  ${source.title} (${source.kind})  ${source.file?.digest.slice(0, 12) ?? 'no file'}`,
      );
      return { json: view.sources, text: text.join('\n') };
    },
  },
];

function chooseSeries(preview: ImportPreview, args: CommandArguments, nFiles: number): SeriesChoice[] {
  const keys = args.options('series');
  const taken = preview.series.filter((series) =>
    keys.length > 0 ? keys.includes(series.key) : args.has('all') || series.isMain,
  );
  if (taken.length === 0) {
    throw badUsage(
      '--series',
      `one of ${preview.series.map((series) => series.key).join(', ')}`,
      keys.join(', ') || 'none',
    );
  }
  const name = args.option('as');
  if (name !== undefined && (taken.length > 1 || nFiles > 1)) {
    throw badUsage(
      '--as',
      'one file and one series to name',
      `${nFiles} file(s), ${taken.length} series`,
      'Choose one with --series.',
    );
  }
  const quantity = args.option('quantity');
  const known = seriesQuantity.safeParse(quantity);
  if (quantity !== undefined && !known.success) {
    throw badUsage('--quantity', `one of ${seriesQuantity.options.join(', ')}`, quantity);
  }
  const unit = args.option('unit');
  const baseline = args.option('baseline');
  return taken.map(({ key }) => ({
    key,
    ...(name === undefined ? {} : { name }),
    ...(known.success ? { quantity: known.data } : {}),
    ...(unit === undefined ? {} : { unit }),
    ...(baseline === undefined ? {} : { baseline: readBaseline(baseline) }),
  }));
}

function readBaseline(text: string): { start: number; end: number } {
  const [, start, end] = /^(\d{4})\s*[-–]\s*(\d{4})$/.exec(text) ?? [];
  if (start && end && Number(start) <= Number(end)) return { start: Number(start), end: Number(end) };
  throw badUsage('--baseline', 'two years, such as 1951-1980', text);
}

function badRowLine({ line, reason, text }: BadRow): string {
  return `  left out, line ${line}: ${reason} — ${text.slice(0, 80)}`;
}
