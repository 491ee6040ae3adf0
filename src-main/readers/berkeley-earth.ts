import { statedBasePeriods } from './base-period.ts';
import type { TextFile } from './decode-text.ts';
import { isNegative } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { RowsRead, ValueColumn } from './row.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues, symmetricLimits } from './series-values.ts';
import { type Table, isComment, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

/** Rows between one line that names the treatment of sea ice and the next. */
interface Block {
  id: string;
  name: string;
  table: Table;
}

const nCells = 12;
const columnNames = [
  'year',
  'month',
  ...['monthly', 'annual', '5-year', '10-year', '20-year'].flatMap((name) => [name, `${name} uncertainty`]),
];
const columns: ValueColumn[] = [
  { index: 2, name: 'monthly', isMissing: () => false },
  { index: 3, name: 'monthly uncertainty', isMissing: isNegative },
  { index: 4, name: 'annual', isMissing: () => false },
  { index: 5, name: 'annual uncertainty', isMissing: isNegative },
];
/** Means from January to December stand at June. */
const annualAtMonth = 6;
const levelPercent = 95;

/** Berkeley Earth summary files (*_complete.txt): monthly anomalies and centred moving averages. */
export const berkeleyEarth: Reader = {
  id: 'berkeley-earth',
  title: 'Berkeley Earth',
  version: '1',

  recognise(file): Recognition | null {
    if (blocksOf(file).length === 0) return null;
    return { certainty: 0.95, why: 'Comments name Berkeley Earth, and rows have its twelve columns' };
  },

  read(file): Reading {
    const blocks = blocksOf(file);
    const [first] = blocks;
    if (first === undefined) {
      throw otherFormat(file, 0, 'comments marked % that name Berkeley Earth, and rows of twelve columns');
    }
    const comments = commentsOf(file);
    const reads = blocks.map((block) => ({ block, read: readBlock(block) }));
    return {
      series: reads.flatMap(({ block, read }, place) => offeredSeries(block, read, { isMain: place === 0, comments })),
      nRows: reads.reduce((n, { read }) => n + read.rows.length, 0),
      badRows: reads.flatMap(({ read }) => read.badRows),
      notes: [
        ...reads.flatMap(({ read }) => read.notes),
        'Anomalies in °C; differences are the same in K, so the unit is K. Limits are the provider’s, at 95 %.',
        'Annual means are the moving averages that stand at June: those from January to December.',
        ...(blocks.length > 1
          ? [
              'The file holds two records below each other, by how temperature over sea ice is inferred; each is offered.',
            ]
          : []),
      ],
      columns: columnNames,
      table: first.table,
      options: null,
    };
  },
};

function blocksOf(file: TextFile): Block[] {
  if (!/berkeley earth/i.test(commentsOf(file))) return [];
  const starts = file.lines.flatMap((line, place) => {
    const ice = isComment(line, ['%']) ? /inferred from (air|water) temp/i.exec(line)?.[1]?.toLowerCase() : undefined;
    return ice === undefined ? [] : [{ place, ice }];
  });
  const parts = starts.length > 1 ? starts : [{ place: 0, ice: null }];
  const blocks = parts.map(({ place, ice }, index) => {
    const end = parts[index + 1]?.place ?? file.lines.length;
    const lines = file.lines.map((line, at) => (at >= place && at < end ? line : ''));
    const table = splitTable({ ...file, lines }, { delimiter: 'blanks', commentMarks: ['%'], headerLine: 0 });
    return { id: ice ?? 'temperature', name: ice === null ? '' : `, sea ice from ${ice} temperature`, table };
  });
  const areWhole = blocks.every(
    ({ table }) => table.lines.filter(({ cells }) => cells?.length === nCells).length * 2 > table.lines.length,
  );
  return areWhole ? blocks : [];
}

function readBlock({ table }: Block): RowsRead {
  return readRows(table, {
    nCells,
    decimalMark: '.',
    timeColumn: 0,
    placeOf: (cells) => yearPlace(cells[0] ?? '', cells[1] ?? ''),
    columns,
  });
}

function offeredSeries(
  { id, name }: Block,
  { rows }: RowsRead,
  { isMain, comments }: { isMain: boolean; comments: string },
): ReadSeries[] {
  const stated = statedBasePeriods(comments);
  const baseline = (stated.length === 1 ? stated[0] : undefined) ?? null;
  const part = id === 'temperature' ? '' : `-${id}`;
  const common = {
    quantity: 'temperature-anomaly',
    agent: null,
    unit: 'K',
    unitFrom: /celsius/i.test(comments) ? 'file' : 'provider',
    baseline,
    baselineFrom: baseline === null ? 'unknown' : 'file',
  } as const;
  const monthly = seriesValues(rows, 0, halfWidths(1));
  const years = rows
    .filter(({ month, values }) => month === annualAtMonth && values[2] !== null)
    .map((row) => ({ ...row, month: null }));
  return [
    {
      ...common,
      key: `${id}-monthly`,
      suggestedName: `berkeley-earth${part}-monthly`,
      label: `Berkeley Earth${name}, monthly mean`,
      step: 'month',
      partialYears: partialYears(monthly),
      isMain,
      values: monthly,
    },
    ...(years.length === 0
      ? []
      : [
          {
            ...common,
            key: `${id}-annual`,
            suggestedName: `berkeley-earth${part}-annual`,
            label: `Berkeley Earth${name}, annual mean`,
            step: 'year' as const,
            partialYears: [],
            isMain: false,
            values: seriesValues(years, 2, halfWidths(3)),
          },
        ]),
  ];
}

function halfWidths(place: number): ReturnType<typeof symmetricLimits> {
  return symmetricLimits(place, levelPercent, (stated) => stated);
}

function commentsOf(file: TextFile): string {
  return file.lines
    .filter((line) => isComment(line, ['%']))
    .map((line) => line.replace(/^\s*%\s?/, ''))
    .join(' ');
}
