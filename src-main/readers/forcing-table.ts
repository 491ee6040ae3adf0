import type { TextFile } from './decode-text.ts';
import { numericMarksOf } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { nameOf } from './name-of.ts';
import { parseNumber } from './parse-number.ts';
import { readRows } from './read-rows.ts';
import type { Row, ValueColumn } from './row.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { type Delimiter, splitLine } from './split-line.ts';
import { type Table, firstTextLine, isComment, splitTable } from './split-table.ts';
import { type TimeForm, recogniseTime } from './time-form.ts';

interface Layout {
  table: Table;
  timeColumn: number;
  time: TimeForm;
  agents: { index: number; column: string; agent: string }[];
  provider: string | null;
  comments: string;
}

/** Names of columns that state the time or the ends of its intervals. */
const timeNames = ['year', 'years', 'timebound_lower', 'time', '', 'timebound_upper'];
/** Agents under one name, whatever a file calls them. */
const synonyms: Record<string, string> = {
  anthro: 'total-anthropogenic',
  anthropogenic: 'total-anthropogenic',
  'total-anthro': 'total-anthropogenic',
  natural: 'total-natural',
  nonco2wmghg: 'nonco2-wmghg',
  volcano: 'volcanic',
  volcanoes: 'volcanic',
  aerosols: 'aerosol',
  'total-aerosol': 'aerosol',
};
/** Columns that tables of emissions or concentrations do not have. */
const tellingAgents = [
  'solar',
  'volcanic',
  'aerosol',
  'aerosol-radiation-interactions',
  'aerosol-cloud-interactions',
  'contrails',
  'total-anthropogenic',
];
const mainAgents = ['total', 'total-anthropogenic', 'co2'];
/** No forcing of the industrial era is as large, in W/m². */
const largestForcingWm2 = 50;
/** Sums of parts agree with the stated total within rounding of the printed digits. */
const roundingWm2 = 1e-3;

/** Effective radiative forcing, a row for each year and a column for each agent. */
export const forcingTable: Reader = {
  id: 'forcing-table',
  title: 'Forcing by agent (AR6, IGCC and the like)',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const columns = layout.agents.slice(0, 3).map(({ column }) => column);
    const whose =
      layout.provider === null
        ? 'Columns are forcing agents'
        : `Columns are those of the ${layout.provider} forcing tables`;
    return { certainty: layout.provider === null ? 0.7 : 0.95, why: `${whose}: ${columns.join(', ')}, …` };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) {
      throw otherFormat(file, 0, 'a header with a year and forcing agents: year, co2, ch4, …, solar, volcanic, total');
    }
    const { table, timeColumn, time } = layout;
    const read = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn,
      placeOf: (cells) => time.placeOf(cells[timeColumn] ?? ''),
      columns: valueColumns(layout),
    });
    return {
      series: offeredSeries(file, layout, read.rows),
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [...(time.note === null ? [] : [time.note]), ...read.notes, ...notesOn(file, layout, read.rows)],
      columns: table.header.map((name, column) => name || `column ${column + 1}`),
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const first = firstTextLine(file, ['#']);
  const text = file.lines[first] ?? '';
  const delimiter: Delimiter = text.includes(',')
    ? ','
    : text.includes(';')
      ? ';'
      : text.includes('\t')
        ? '\t'
        : 'blanks';
  const agents = agentsOf(splitLine(text, delimiter) ?? []);
  const has = (agent: string): boolean => agents.some((one) => one.agent === agent);
  if (!tellingAgents.some(has) || !(has('co2') || has('total'))) return null;
  const table = splitTable(file, { delimiter, commentMarks: ['#'], headerLine: first + 1 });
  const names = table.header.map((name) => name.toLowerCase());
  const timeColumn = timeNames.map((name) => names.indexOf(name)).find((column) => column !== -1) ?? -1;
  const time =
    timeColumn === -1
      ? null
      : recogniseTime(
          table.lines.map(({ cells }) => cells?.[timeColumn] ?? ''),
          '.',
        );
  if (time?.step !== 'year') return null;
  const largest = Math.max(
    ...table.lines.flatMap(({ cells }) => agents.map(({ index }) => parseNumber(cells?.[index] ?? '', '.') ?? 0)),
  );
  if (largest > largestForcingWm2) return null;
  const isAr6 = has('chapter2-other-anthro') && has('other-wmghg');
  const isIgcc = has('nonco2-wmghg') && has('total-anthropogenic') && has('aerosol-radiation-interactions');
  const comments = file.lines.filter((line, place) => place < first || isComment(line, ['#'])).join('\n');
  return { table, timeColumn, time, agents, provider: isAr6 ? 'AR6' : isIgcc ? 'IGCC' : null, comments };
}

/** Columns as agent ids: lower case, hyphens, one name for one thing ("anthro" is total-anthropogenic). */
function agentsOf(header: readonly string[]): Layout['agents'] {
  const agents: Layout['agents'] = [];
  header.forEach((column, index) => {
    if (timeNames.includes(column.toLowerCase())) return;
    const plain = nameOf(column.replace(/\b(erf|forcing|rf)\b|\(.*\)|\[.*\]/gi, ' '));
    const agent = synonyms[plain] ?? plain;
    const isTaken = agents.some((other) => other.agent === agent);
    agents.push({ index, column, agent: isTaken ? `${agent}-${index + 1}` : agent });
  });
  return agents;
}

function valueColumns({ table, agents }: Layout): ValueColumn[] {
  return agents.map(({ index, column }) => {
    const numbers = table.lines.map(({ cells }) => parseNumber(cells?.[index] ?? '', '.'));
    return { index, name: column, isMissing: numericMarksOf(numbers) };
  });
}

function offeredSeries(file: TextFile, layout: Layout, rows: readonly Row[]): ReadSeries[] {
  const percentile = percentileOf(file.fileName);
  const unitFrom = unitSource(layout);
  return layout.agents.map(({ agent, column }, place) => ({
    key: agent,
    suggestedName: `erf-${agent}${percentile === null ? '' : `-p${String(percentile).padStart(2, '0')}`}`,
    label: `Effective radiative forcing, ${column.replaceAll('_', ' ')}${percentile === null ? '' : `, ${percentile}th percentile`}`,
    quantity: 'forcing',
    agent,
    unit: unitFrom === 'unknown' ? '' : 'W/m²',
    unitFrom,
    step: 'year',
    baseline: null,
    baselineFrom: 'not needed',
    partialYears: [],
    isMain: mainAgents.includes(agent),
    values: seriesValues(rows, place),
  }));
}

function unitSource({ table, provider, comments }: Layout): ReadSeries['unitFrom'] {
  if (/\bW ?\/? ?m ?\^?(?:[-−⁻]?2|²|⁻²|\*\*-?2)/i.test(`${comments} ${table.header.join(' ')}`)) return 'file';
  return provider === null ? 'unknown' : 'provider';
}

function percentileOf(fileName: string): number | null {
  const match = /(?:^|[_.-])pc?(\d\d)(?=[_.-])/i.exec(fileName);
  return match ? Number(match[1]) : null;
}

function notesOn(file: TextFile, layout: Layout, rows: readonly Row[]): string[] {
  const notes: string[] = [];
  if (layout.provider !== null) {
    notes.push(
      'Forcing is relative to 1750. Solar and volcanic forcing need not be zero there, so neither need be the total.',
    );
  }
  if (unitSource(layout) === 'unknown') notes.push('The file does not state the unit.');
  const percentile = percentileOf(file.fileName);
  if (percentile !== null) {
    notes.push(`By its name the file holds ${percentile}th percentiles, not best estimates.`);
  }
  if (isSum(layout, rows) === false) {
    notes.push('The total is not the sum of its parts, as it would be for best estimates: percentiles do not add up.');
  }
  return notes;
}

/** Whether the total is the sum of its anthropogenic, solar and volcanic parts; null when they are not all there. */
function isSum({ agents }: Layout, rows: readonly Row[]): boolean | null {
  const places = ['total', 'total-anthropogenic', 'solar', 'volcanic'].map((agent) =>
    agents.findIndex((one) => one.agent === agent),
  );
  if (places.includes(-1)) return null;
  return rows.every(({ values }) => {
    const [total, ...parts] = places.map((place) => values[place] ?? null);
    if (total === undefined || total === null || parts.includes(null)) return true;
    return Math.abs(parts.reduce<number>((sum, part) => sum + (part ?? 0), 0) - total) <= roundingWm2;
  });
}
