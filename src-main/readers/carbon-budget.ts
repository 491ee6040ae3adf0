import type { TextFile } from './decode-text.ts';
import { otherFormat } from './other-format.ts';
import { readRows } from './read-rows.ts';
import type { Row } from './row.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { type Delimiter, splitLine } from './split-line.ts';
import { type Table, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

interface Term {
  id: string;
  pattern: RegExp;
  label: string;
}

interface Layout {
  table: Table;
  /** The terms that the table has, with their columns. */
  found: (Term & { index: number })[];
  isUnitStated: boolean;
}

/** Sources are positive, and so are sinks: the budget is sources minus growth and sinks. */
const terms: readonly Term[] = [
  { id: 'fossil-emissions', pattern: /^fossil.*emissions|^fossil fuel/i, label: 'fossil emissions' },
  { id: 'land-use-emissions', pattern: /^land.use.change/i, label: 'land-use change emissions' },
  { id: 'atmospheric-growth', pattern: /^atmospheric growth/i, label: 'atmospheric growth' },
  { id: 'ocean-sink', pattern: /^ocean sink/i, label: 'ocean sink' },
  { id: 'land-sink', pattern: /^land sink/i, label: 'land sink' },
  { id: 'cement-carbonation-sink', pattern: /^cement carbonation/i, label: 'cement carbonation sink' },
  { id: 'budget-imbalance', pattern: /^budget imbalance/i, label: 'budget imbalance' },
];
const needed = ['fossil-emissions', 'land-use-emissions', 'atmospheric-growth', 'ocean-sink', 'land-sink'];
const delimiters: readonly Delimiter[] = [',', ';', '\t'];
/** Text above the table takes 15 to 22 rows. */
const maxLinesAbove = 60;
/** Terms are printed with more digits than this, in GtC/yr. */
const roundingGtCPerYr = 1e-3;
/** From here on growth and sinks are estimated year by year. */
const firstFullYear = 1959;

/** Global Carbon Budget: the tables “Historical Budget” (from 1750) and “Global Carbon Budget” (from 1959). */
export const carbonBudget: Reader = {
  id: 'carbon-budget',
  title: 'Global Carbon Budget',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const isHistorical = Number(layout.table.lines[0]?.cells?.[0]) < firstFullYear;
    return {
      // Of the two tables in one workbook the longer one is offered first.
      certainty: isHistorical ? 0.96 : 0.95,
      why: `The header has the terms of the budget: ${layout.found.map(({ label }) => label).join(', ')}`,
    };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) {
      throw otherFormat(file, 0, 'a header Year, fossil emissions …, land-use change emissions, atmospheric growth, …');
    }
    const { table, found } = layout;
    const read = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => yearPlace(cells[0] ?? '', null),
      columns: found.map(({ index, label }) => ({ index, name: label, isMissing: () => false })),
    });
    return {
      series: found.map((term, place) => offered(term, layout, read.rows, place)),
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [...read.notes, ...notesOn(layout, read.rows)],
      columns: table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  for (const [place, line] of file.lines.slice(0, maxLinesAbove).entries()) {
    if (!/^\W*year\b.*fossil/i.test(line)) continue;
    for (const delimiter of delimiters) {
      const cells = splitLine(line, delimiter) ?? [];
      const found = terms.flatMap((term) => {
        const index = cells.findIndex((cell) => term.pattern.test(cell));
        return index === -1 ? [] : [{ ...term, index }];
      });
      if (!needed.every((id) => found.some((term) => term.id === id))) continue;
      const table = splitTable(file, { delimiter, commentMarks: ['#'], headerLine: place + 1 });
      return { table, found, isUnitStated: /\bGt ?C ?\/ ?yr/i.test(file.lines.slice(0, place).join('\n')) };
    }
  }
  return null;
}

function offered({ id, label }: Term, { isUnitStated }: Layout, rows: readonly Row[], place: number): ReadSeries {
  return {
    key: id,
    suggestedName: `gcb-${id}`,
    label: `Global Carbon Budget, ${label}${id === 'fossil-emissions' ? ', cement carbonation not subtracted' : ''}`,
    quantity: 'other',
    agent: null,
    unit: 'GtC/yr',
    unitFrom: isUnitStated ? 'file' : 'provider',
    step: 'year',
    baseline: null,
    baselineFrom: 'not needed',
    partialYears: [],
    isMain: id !== 'budget-imbalance',
    values: seriesValues(rows, place),
  };
}

function notesOn({ found }: Layout, rows: readonly Row[]): string[] {
  const hasCement = found.some(({ id }) => id === 'cement-carbonation-sink');
  const firstYear = rows[0]?.year ?? firstFullYear;
  return [
    'Values are in GtC/yr, billion tonnes of carbon a year; one of carbon is 3.664 of CO2.',
    ...(hasCement
      ? [
          'Fossil emissions are without the uptake by cement. That is a column of its own, positive as a sink: subtract it once, from emissions, or count it among the sinks; never add it.',
        ]
      : []),
    ...noteClosure(found, rows),
    ...(firstYear < firstFullYear
      ? [
          `Before ${firstFullYear}, growth comes from ice cores and the sinks from models or reconstructions: they do not show single years.`,
        ]
      : []),
    'Uncertainties stand in the text above the table, not beside the values; none is attached to the series.',
  ];
}

/** Whether fossil + land use − growth − sinks is the stated imbalance, in how many years it can be told. */
function noteClosure(found: Layout['found'], rows: readonly Row[]): string[] {
  const places = terms.map(({ id }) => found.findIndex((term) => term.id === id));
  if (places.includes(-1)) return [];
  const differences = rows.flatMap(({ year, values }) => {
    const parts = places.map((place) => values[place] ?? Number.NaN);
    if (parts.some(Number.isNaN)) return [];
    const [fossil = 0, landUse = 0, ...lessThese] = parts;
    return [{ year, open: Math.abs(lessThese.reduce((sum, part) => sum - part, fossil + landUse)) }];
  });
  const open = differences.filter((one) => one.open > roundingGtCPerYr);
  if (differences.length === 0) return [];
  return open.length === 0
    ? [
        `Emissions minus growth, ocean, land and cement sinks give the stated imbalance in all ${differences.length} years that have every term.`,
      ]
    : [
        `The terms do not add up to the stated imbalance in ${open.length} of ${differences.length} years, first in ${open[0]?.year}: columns or signs may be exchanged.`,
      ];
}
