import type { TextFile } from './decode-text.ts';
import { numericMarksOf } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { parseNumber } from './parse-number.ts';
import { readRows } from './read-rows.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { splitLine } from './split-line.ts';
import { type Table, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

/** A smoothed concentration, and the column of years that stands before it. */
interface Spline {
  gas: 'co2' | 'ch4' | 'n2o';
  index: number;
  yearColumn: number;
}

interface Layout {
  table: Table;
  splines: Spline[];
}

const maxTextLines = 1000;
const yearName = /^(year|yr)/i;
const gases = {
  co2: { name: 'CO2', unit: 'ppm' },
  ch4: { name: 'CH4', unit: 'ppb' },
  n2o: { name: 'N2O', unit: 'ppb' },
} as const;

/** Ice-core splines of the Law Dome (law2006.txt): CO2, CH4 and N2O a year from year 1 on. */
export const iceCore: Reader = {
  id: 'ice-core',
  title: 'Law Dome ice cores',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const names = layout.splines.map(({ gas }) => gases[gas].name);
    return {
      certainty: 0.9,
      why: `A header with YearAD and spline columns, as in the Law Dome files: ${names.join(', ')}`,
    };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) throw otherFormat(file, 0, 'a header with YearAD and CO2spl, as in law2006.txt');
    const { table, splines } = layout;
    const yearColumn = splines[0]?.yearColumn ?? 0;
    const read = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn: yearColumn,
      placeOf: (cells) => yearPlace(cells[yearColumn] ?? '', null),
      columns: splines.map(({ gas, index }) => {
        const numbers = table.lines.map(({ cells }) => parseNumber(cells?.[index] ?? '', '.'));
        return { index, name: gases[gas].name, isMissing: numericMarksOf(numbers) };
      }),
    });
    const lastLine = Math.max(...read.rows.map(({ line }) => line));
    const below = read.badRows.filter(({ line }) => line > lastLine);
    return {
      series: splines.map(({ gas }, place): ReadSeries => {
        const { name, unit } = gases[gas];
        return {
          key: gas,
          suggestedName: `${gas}-law-dome-annual`,
          label: `${name}, Law Dome ice cores, spline`,
          quantity: gas === 'co2' ? 'co2' : 'other',
          agent: null,
          unit,
          unitFrom: new RegExp(`${name}[^\\n]{0,80}\\b${unit}`, 'i').test(textOf(file)) ? 'file' : 'provider',
          step: 'year',
          baseline: null,
          baselineFrom: 'not needed',
          partialYears: [],
          isMain: gas === 'co2',
          values: seriesValues(read.rows, place),
        };
      }),
      nRows: read.rows.length,
      badRows: read.badRows.filter((row) => !below.includes(row)),
      notes: [
        ...read.notes,
        'Values are a spline through measurements on air from ice: variations shorter than 20 years are damped by half or more, so no single year can be told from its neighbours.',
        ...(below.length > 0 ? [`Other tables and remarks follow in ${below.length} lines under the splines.`] : []),
      ],
      columns: table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const place = file.lines
    .slice(0, maxTextLines)
    .findIndex((line) => /\bCO2\s?spl/i.test(line) && /\b(year|yr)/i.test(line));
  if (place === -1) return null;
  const header = splitLine(file.lines[place] ?? '', 'blanks') ?? [];
  const splines = (['co2', 'ch4', 'n2o'] as const).flatMap((gas): Spline[] => {
    const index = header.findIndex((name) => new RegExp(`^${gas}spl`, 'i').test(name));
    const yearColumn = header.findLastIndex((name, column) => column < index && yearName.test(name));
    return index === -1 || yearColumn === -1 ? [] : [{ gas, index, yearColumn }];
  });
  const [co2] = splines;
  if (co2?.gas !== 'co2') return null;
  const table = splitTable(file, { delimiter: 'blanks', commentMarks: ['#'], headerLine: place + 1 });
  const nRows = table.lines.filter(({ cells }) => yearPlace(cells?.[co2.yearColumn] ?? '', null) !== null).length;
  if (nRows === 0) return null;
  return { table, splines: splines.filter((spline) => statesSameYears(table, co2.yearColumn, spline.yearColumn)) };
}

/** Each gas has a column of years; where they state others than that of CO2, the gas is left to the delimited reader. */
function statesSameYears(table: Table, first: number, other: number): boolean {
  return table.lines.every(
    ({ cells }) => cells?.length !== table.header.length || Number(cells[first]) === Number(cells[other]),
  );
}

function textOf({ lines }: TextFile): string {
  return lines.slice(0, maxTextLines).join('\n');
}
