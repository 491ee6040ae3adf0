import { statedBasePeriods } from './base-period.ts';
import type { TextFile } from './decode-text.ts';
import { nameOf } from './name-of.ts';
import { otherFormat } from './other-format.ts';
import { partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { type Table, firstTextLine, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

/** Names over columns that belong to the region named last before them. */
const surfaces = ['Land', 'Ocean'];
const layers: Record<string, string> = {
  lt: 'lower troposphere',
  mt: 'mid-troposphere',
  tp: 'tropopause',
  ls: 'lower stratosphere',
};

/** Satellite temperatures of the University of Alabama in Huntsville (uahncdc_*.txt), monthly by region. */
export const uah: Reader = {
  id: 'uah',
  title: 'UAH satellite temperatures',
  version: '1',

  recognise(file): Recognition | null {
    return tableOf(file) === null
      ? null
      : { certainty: 0.95, why: 'The header begins with Year Mo Globe Land Ocean NH, as in UAH’s files' };
  },

  read(file): Reading {
    const table = tableOf(file);
    if (table === null) throw otherFormat(file, 0, 'a header Year Mo Globe Land Ocean NH …');
    const regions = regionsOf(table.header);
    const read = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => yearPlace(cells[0] ?? '', cells[1] ?? ''),
      columns: regions.map((name, place) => ({ index: place + 2, name, isMissing: (value) => value <= -99 })),
    });
    const lastLine = Math.max(...read.rows.map(({ line }) => line));
    const remarks = read.badRows.filter(({ line }) => line > lastLine);
    const layer = layers[/_(lt|mt|tp|ls)_/i.exec(file.fileName)?.[1]?.toLowerCase() ?? ''];
    const stated = statedBasePeriods(file.lines.slice(lastLine).join('\n'));
    const baseline = (stated.length === 1 ? stated[0] : undefined) ?? null;
    return {
      series: regions.map((region, place): ReadSeries => {
        const values = seriesValues(read.rows, place);
        return {
          key: nameOf(region),
          suggestedName: `uah-${nameOf(region)}-monthly`,
          label: `UAH ${layer ?? 'satellite temperature'}, ${region}, monthly mean`,
          quantity: 'temperature-anomaly',
          agent: null,
          unit: 'K',
          unitFrom: 'provider',
          step: 'month',
          baseline,
          baselineFrom: baseline === null ? 'unknown' : 'file',
          partialYears: partialYears(values),
          isMain: region === 'Globe',
          values,
        };
      }),
      nRows: read.rows.length,
      badRows: read.badRows.filter((row) => !remarks.includes(row)),
      notes: [
        ...read.notes,
        'The unit is the provider’s: °C, of which differences are the same in K.',
        `These are temperatures of a layer of air (${layer ?? 'which one, the file does not say'}) seen from satellites, not surface temperatures.`,
        ...(remarks.length === 0
          ? []
          : [
              `Repeated header, trends and remarks under the table, as in all files of this kind: lines ${remarks.map(({ line }) => line).join(', ')}.`,
            ]),
      ],
      columns: ['Year', 'Mo', ...regions],
      table,
      options: null,
    };
  },
};

function tableOf(file: TextFile): Table | null {
  const first = firstTextLine(file);
  if (!/^\s*Year\s+Mo\s+Globe\s+Land\s+Ocean\s+NH\b/i.test(file.lines[first] ?? '')) return null;
  return splitTable(file, { delimiter: 'blanks', commentMarks: ['#'], headerLine: first + 1 });
}

/** "Land" and "Ocean" come once for each region: "NH Land", "NH Ocean". */
function regionsOf(header: readonly string[]): string[] {
  let region = '';
  return header.slice(2).map((name) => {
    if (surfaces.includes(name)) return `${region} ${name}`;
    region = name;
    return name;
  });
}
