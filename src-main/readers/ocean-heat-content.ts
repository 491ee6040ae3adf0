import type { TextFile } from './decode-text.ts';
import { heatUptakeNotes } from './heat-uptake-notes.ts';
import { isNegative } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { readRows } from './read-rows.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues, standardLimits } from './series-values.ts';
import { type Table, firstTextLine, splitTable } from './split-table.ts';
import { type TimeForm, recogniseTime } from './time-form.ts';

interface Layout {
  table: Table;
  time: TimeForm;
}

const header = ['YEAR', 'WO', 'WOse', 'NH', 'NHse', 'SH', 'SHse'];
const areas = [
  { column: 'WO', id: 'world', name: 'world ocean' },
  { column: 'NH', id: 'north', name: 'northern hemisphere' },
  { column: 'SH', id: 'south', name: 'southern hemisphere' },
];
/** The unit of the file, in J. */
const joulesPerUnit = 1e22;
const baseline = { start: 1955, end: 2006 };

/** Ocean heat content of NOAA's National Centers for Environmental Information (h22-*.dat). */
export const oceanHeatContent: Reader = {
  id: 'ocean-heat-content',
  title: 'NOAA NCEI ocean heat content',
  version: '1',

  recognise(file): Recognition | null {
    return layoutOf(file) === null
      ? null
      : { certainty: 0.95, why: `The header is ${header.join(' ')}, as in NCEI's heat content files` };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) throw otherFormat(file, 0, `the header ${header.join(' ')}`);
    const { table, time } = layout;
    const read = readRows(table, {
      nCells: header.length,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => time.placeOf(cells[0] ?? ''),
      columns: header
        .slice(1)
        .map((name, place) => ({ index: place + 1, name, isMissing: name.endsWith('se') ? isNegative : isFillValue })),
    });
    const isPentadal = /pent/i.test(file.fileName);
    return {
      series: areas.map(({ column, id, name }): ReadSeries => {
        const place = header.indexOf(column) - 1;
        const depth = /w0-(\d+)m/i.exec(file.fileName)?.[1];
        return {
          key: id,
          suggestedName: `ohc${depth ? `-${depth}m` : ''}-${id}${isPentadal ? '-pentadal' : '-annual'}`,
          label: `Ocean heat content${depth ? ` 0–${depth} m` : ''}, ${name}, ${isPentadal ? 'five-year' : 'annual'} mean`,
          quantity: 'other',
          agent: null,
          unit: '10²² J',
          unitFrom: 'provider',
          step: 'year',
          baseline,
          baselineFrom: 'provider',
          partialYears: [],
          isMain: id === 'world',
          values: seriesValues(read.rows, place, standardLimits(place + 1)),
        };
      }),
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [
        ...(time.note === null ? [] : [time.note]),
        ...read.notes,
        'The unit is 10²² J, of which one is ten zettajoules (ZJ). Values are differences from the mean of 1955–2006.',
        'Limits are one standard error to either side (68.27 %).',
        ...heatUptakeNotes('WO', seriesValues(read.rows, 0), joulesPerUnit),
        ...(isPentadal ? ['Five-year means overlap from row to row, so neighbouring values are not independent.'] : []),
      ],
      columns: header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const first = firstTextLine(file);
  if ((file.lines[first] ?? '').trim().split(/\s+/).join(' ') !== header.join(' ')) return null;
  const table = splitTable(file, { delimiter: 'blanks', commentMarks: [], headerLine: first + 1 });
  const time = recogniseTime(
    table.lines.map(({ cells }) => cells?.[0] ?? ''),
    '.',
  );
  return time?.step === 'year' ? { table, time } : null;
}

function isFillValue(value: number): boolean {
  return value <= -99;
}
