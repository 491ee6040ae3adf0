import { basename } from 'node:path';
import { seriesQuantity } from '../../contract/series.ts';
import type { BadRow, ImportPreview, OfferedSeries, ReadOptions, Series, SeriesChoice } from '../../contract/series.ts';
import { baselineText } from './baseline-text.ts';
import { badUsage, oneOf, type Command, type CommandArguments, type CommandTools } from './command.ts';

export const importCommand: Command = {
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
    sheet: { value: 'NAME', help: 'sheet of a workbook to use instead of the recognised one' },
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
    // All are read before any is imported: a file that cannot be used leaves the project as it was.
    const wanted = [];
    for (const file of files) wanted.push(await chooseFrom(file, args, tools));
    refuseMixedUnits(args, wanted);
    if (args.has('refuse-bad-rows')) refuseBadRows(wanted);
    const licence = args.option('licence');
    const imported: Imported[] = [];
    for (const { file, preview, given, choices } of wanted) {
      const { datasetId, seriesIds, project } = await tools.ask('data.import', {
        ...given,
        choices,
        leaveOutBadRows: !args.has('refuse-bad-rows'),
        ...(licence === undefined ? {} : { licence }),
      });
      const { reader, nRows, badRows: leftOut, notes, alreadyImportedAs } = preview;
      const series = project.series.filter((row) => seriesIds.includes(row.id));
      imported.push({ file, datasetId, reader, nRows, leftOut, notes, alreadyImportedAs, series });
    }
    return { json: imported, lines: imported.flatMap(importLines) };
  },
};

interface Imported extends Pick<ImportPreview, 'reader' | 'nRows' | 'notes' | 'alreadyImportedAs'> {
  file: string;
  datasetId: number;
  leftOut: BadRow[];
  series: Series[];
}

interface Wanted {
  file: string;
  given: { fileName: string; bytes: string; options: ReadOptions };
  preview: ImportPreview;
  taken: OfferedSeries[];
  choices: SeriesChoice[];
}

async function chooseFrom(file: string, args: CommandArguments, tools: CommandTools): Promise<Wanted> {
  const readerId = args.option('reader');
  const sheet = args.option('sheet');
  const given = {
    fileName: basename(file),
    bytes: tools.readFile(file).toString('base64'),
    options: { ...(readerId === undefined ? {} : { readerId }), ...(sheet === undefined ? {} : { sheet }) },
  };
  const preview = await tools.ask('data.preview', given);
  const taken = takenSeries(preview, args);
  return { file, given, preview, taken, choices: choicesFor(taken, args) };
}

function takenSeries({ fileName, series }: ImportPreview, args: CommandArguments): OfferedSeries[] {
  const keys = args.options('series');
  const unknown = keys.find((key) => !series.some((offered) => offered.key === key));
  const taken = series.filter(({ key, isMain }) => (keys.length > 0 ? keys.includes(key) : args.has('all') || isMain));
  if (unknown === undefined && taken.length > 0) return taken;
  const list = series.map(({ key }) => key).join(', ');
  throw badUsage('--series', `series of ${fileName}: ${list}`, unknown ?? 'none', 'Or --all for all of them.');
}

function choicesFor(taken: readonly OfferedSeries[], args: CommandArguments): SeriesChoice[] {
  const name = args.option('as');
  const nFiles = args.positionals.length - 1;
  if (name !== undefined && (taken.length > 1 || nFiles > 1)) {
    const found = nFiles > 1 ? `${nFiles} files` : `${taken.length} series: ${taken.map(({ key }) => key).join(', ')}`;
    throw badUsage('--as', 'one file and one series to name', found, 'Choose one with --series.');
  }
  const quantity = oneOf(args, 'quantity', seriesQuantity.options);
  const unit = args.option('unit');
  const baseline = args.option('baseline');
  return taken.map(({ key }) => ({
    key,
    ...(name === undefined ? {} : { name }),
    ...(quantity === undefined ? {} : { quantity }),
    ...(unit === undefined ? {} : { unit }),
    ...(baseline === undefined ? {} : { baseline: readBaseline(baseline) }),
  }));
}

/** One unit, or one baseline, is not for temperatures and concentrations alike. */
function refuseMixedUnits(args: CommandArguments, wanted: readonly Wanted[]): void {
  const option = ['unit', 'baseline'].find((name) => args.has(name));
  if (option === undefined || args.has('quantity')) return;
  const quantities = new Set(wanted.flatMap(({ taken }) => taken.map(({ quantity }) => quantity)));
  if (quantities.size <= 1) return;
  throw badUsage(`--${option}`, 'series of one quantity', [...quantities].join(' and '), 'Import them one by one.');
}

function refuseBadRows(wanted: readonly Wanted[]): void {
  for (const { file, preview } of wanted) {
    const [first] = preview.badRows;
    if (!first) continue;
    const found = `${preview.badRows.length} that cannot, the first in line ${first.line}: ${first.reason}`;
    throw badUsage(file, 'rows that can all be used', found, 'Mend the file, or leave out --refuse-bad-rows.');
  }
}

function readBaseline(text: string): { start: number; end: number } {
  const [, start, end] = /^(\d{4})\s*[-–]\s*(\d{4})$/.exec(text) ?? [];
  if (start && end && Number(start) <= Number(end)) return { start: Number(start), end: Number(end) };
  throw badUsage('--baseline', 'two years, such as 1951-1980', text);
}

function importLines({ file, reader, nRows, leftOut, notes, alreadyImportedAs, series }: Imported): string[] {
  const again =
    alreadyImportedAs === null ? [] : [`The same bytes are in the project as dataset ${alreadyImportedAs}.`];
  return [
    `${file}: ${reader.title} (${reader.why})`,
    `  ${nRows} rows read, ${leftOut.length} left out`,
    ...leftOut.map(({ line, reason, text }) => `  left out, line ${line}: ${reason} — ${text.slice(0, 80)}`),
    ...[...notes, ...again].map((note) => `  note: ${note}`),
    ...series.flatMap((row) => [
      `  series ${row.id} ${row.name}: ${row.quantity}, ${row.unit || 'unit unknown'}, ${row.startYear}–${row.endYear} by ${row.step}, ${baselineText(row)}, ${row.nMissing} missing, ${row.nAbsent} absent`,
      ...row.partialYears.map(({ year, note }) => `    part year ${year}: ${note}`),
    ]),
  ];
}
