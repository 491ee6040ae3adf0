import type { TextFile } from './decode-text.ts';
import { isNegative } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { parseNumber } from './parse-number.ts';
import { partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import { type Row, type ValueColumn, placeName } from './row.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { type Limits, seriesValues, standardLimits } from './series-values.ts';
import { splitLine } from './split-line.ts';
import { type Table, firstTextLine, isComment, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

/** What a column holds. */
type Role =
  'year' | 'month' | 'decimal' | Variable | 'uncertainty' | 'trend-uncertainty' | 'deviation' | 'days' | 'other';
type Variable = 'average' | 'deseasonalised' | 'interpolated' | 'trend';

interface Layout {
  table: Table;
  roles: Role[];
  gas: Gas;
  site: { name: string; id: string } | null;
  comments: string;
}

interface Gas {
  id: string;
  name: string;
  unit: string;
  /** Mole fractions that its published records stay within, in its unit: growth rates and other gases lie outside. */
  range: readonly [number, number];
}

const gases: readonly Gas[] = [
  { id: 'co2', name: 'CO2', unit: 'ppm', range: [250, 700] },
  { id: 'ch4', name: 'CH4', unit: 'ppb', range: [1000, 3500] },
  { id: 'n2o', name: 'N2O', unit: 'ppb', range: [250, 500] },
  { id: 'sf6', name: 'SF6', unit: 'ppt', range: [1, 50] },
];

const variables: Record<Variable, { name: string; id: string }> = {
  average: { name: 'mean', id: '' },
  deseasonalised: { name: 'mean, seasonal cycle removed', id: '-deseasonalised' },
  interpolated: { name: 'mean, gaps filled by interpolation', id: '-interpolated' },
  trend: { name: 'trend', id: '-trend' },
};

/** Column names of the CSV files and of headers without a comment mark. */
const namedRoles: readonly [RegExp, Role][] = [
  [/^year$/i, 'year'],
  [/^month$/i, 'month'],
  [/^decimal/i, 'decimal'],
  [/^(average|mean|monthly)$/i, 'average'],
  [/^de-?season/i, 'deseasonalised'],
  [/^interpolated$/i, 'interpolated'],
  [/^trend$/i, 'trend'],
  [/^(unc|average_unc)$/i, 'uncertainty'],
  [/^trend_unc$/i, 'trend-uncertainty'],
  [/^(sdev|st\.?dev)/i, 'deviation'],
  [/^#?n?days$/i, 'days'],
];
const marks: readonly number[] = [-99.99, -999.99, -9.99, -0.99, -1];
const maxSample = 400;
const maxColumns = 8;
const maxListed = 12;

/** Greenhouse-gas records of NOAA's Global Monitoring Laboratory: monthly and annual means, as text and CSV. */
export const noaaGml: Reader = {
  id: 'noaa-gml',
  title: 'NOAA GML CO2 and other greenhouse gases',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const step = layout.roles.includes('month') ? 'monthly' : 'annual';
    return { certainty: 0.9, why: `Comments and columns are those of NOAA GML's ${step} ${layout.gas.name} files` };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) {
      const expected = 'rows of a NOAA GML file: year, month, decimal date, average, …; or year, mean, uncertainty';
      throw otherFormat(file, firstTextLine(file, ['#']), expected);
    }
    const { table, roles } = layout;
    const timeColumn = roles.indexOf('year');
    const monthColumn = roles.indexOf('month');
    const columns = valueColumns(roles);
    const read = readRows(table, {
      nCells: roles.length,
      decimalMark: '.',
      timeColumn,
      placeOf: (cells) => yearPlace(cells[timeColumn] ?? '', monthColumn === -1 ? null : (cells[monthColumn] ?? '')),
      columns,
    });
    return {
      series: offeredSeries(layout, read.rows),
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [...read.notes, ...notesOn(layout, read.rows)],
      columns: table.headerLine === 0 ? roles : table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const comments = file.lines.filter((line) => isComment(line, ['#'])).join('\n');
  const first = firstTextLine(file, ['#']);
  const text = file.lines[first] ?? '';
  const hasHeader = /^\s*"?year\b/i.test(text);
  const delimiter = text.includes(',') ? ',' : 'blanks';
  const columns = splitLine(text, delimiter) ?? [];
  if (hasHeader ? columns.some((name) => roleOfName(name) === 'other') : columns.length > maxColumns) return null;
  const table = splitTable(file, { delimiter, commentMarks: ['#'], headerLine: hasHeader ? first + 1 : 0 });
  const sample = table.lines
    .slice(0, maxSample)
    .flatMap(({ cells }) => (cells ? [cells.map((cell) => parseNumber(cell, '.'))] : []));
  const roles = hasHeader ? table.header.map(roleOfName) : rolesByCount(sample);
  const average = roles?.indexOf('average') ?? -1;
  if (roles === null || average === -1 || roles.includes('other') || roles[0] !== 'year') return null;
  const isNamed = /\bNOAA\b|\bGML\b|\bESRL\b|Scripps/.test(comments);
  // Without the provider's comments only the monthly layout, with its decimal date, is beyond doubt.
  if (!isNamed && !roles.includes('decimal')) return null;
  if (roles.includes('decimal') && !hasMatchingDates(sample, roles)) return null;
  const level = median(sample.map((row) => row[average] ?? null));
  const gas = gasOf(comments, level);
  return gas && { table, roles, gas, site: siteOf(comments, file.fileName), comments };
}

function roleOfName(name: string): Role {
  return namedRoles.find(([pattern]) => pattern.test(name))?.[1] ?? 'other';
}

/** The columns of the text files, whose header is a comment; told by their number and the size of the values. */
function rolesByCount(sample: readonly (readonly (number | null)[])[]): Role[] | null {
  const nCells = sample[0]?.length ?? 0;
  const fifth = median(sample.map((row) => row[4] ?? null));
  const fourth = median(sample.map((row) => row[3] ?? null));
  const isUncertainty = fifth < fourth / 2;
  switch (nCells) {
    case 2:
      return ['year', 'average'];
    case 3:
      return ['year', 'average', 'uncertainty'];
    case 5:
      return ['year', 'month', 'decimal', 'average', 'trend'];
    case 7:
      return isUncertainty
        ? ['year', 'month', 'decimal', 'average', 'uncertainty', 'trend', 'trend-uncertainty']
        : ['year', 'month', 'decimal', 'average', 'interpolated', 'trend', 'days'];
    case 8:
      return ['year', 'month', 'decimal', 'average', 'deseasonalised', 'days', 'deviation', 'uncertainty'];
    default:
      return null;
  }
}

/** Daily and weekly files have a day of the month where the monthly ones have the decimal date. */
function hasMatchingDates(sample: readonly (readonly (number | null)[])[], roles: readonly Role[]): boolean {
  const [year, decimal] = [roles.indexOf('year'), roles.indexOf('decimal')];
  const nMatching = sample.filter((row) => Math.floor(row[decimal] ?? 0) === row[year]).length;
  return nMatching * 2 > sample.length;
}

function gasOf(comments: string, level: number): Gas | null {
  const said = /\b(CO2|CH4|N2O|SF6) expressed as/.exec(comments)?.[1]?.toLowerCase();
  const mentioned = gases.filter(({ name }) => new RegExp(`\\b${name}\\b`).test(comments));
  const gas =
    gases.find(({ id }) => id === said) ??
    (mentioned.length === 1 ? mentioned[0] : undefined) ??
    gases.find(({ id }) => id === 'co2');
  return gas && level >= gas.range[0] && level <= gas.range[1] ? gas : null;
}

function siteOf(comments: string, fileName: string): Layout['site'] {
  const global = { name: 'global mean', id: 'global' };
  const maunaLoa = { name: 'Mauna Loa', id: 'mauna-loa' };
  if (/global(ly)? (averag|mean|annual|monthly|atmospheric)/i.test(comments)) return global;
  if (/mauna loa|keeling|scripps/i.test(comments)) return maunaLoa;
  if (/_gl\b|global/i.test(fileName)) return global;
  return /_mlo\b|mauna/i.test(fileName) ? maunaLoa : null;
}

function valueColumns(roles: readonly Role[]): ValueColumn[] {
  return roles.flatMap((role, index) => {
    if (role === 'year' || role === 'month' || role === 'decimal') return [];
    const isMissing = role in variables ? (value: number) => marks.includes(value) : isNegative;
    return [{ index, name: role, isMissing }];
  });
}

function offeredSeries({ roles, gas, site, comments }: Layout, rows: readonly Row[]): ReadSeries[] {
  const valueRoles = valueColumns(roles).map(({ name }) => name);
  const step = roles.includes('month') ? 'month' : 'year';
  const stepName = step === 'month' ? 'monthly' : 'annual';
  return (Object.keys(variables) as Variable[]).flatMap((variable) => {
    const place = valueRoles.indexOf(variable);
    if (place === -1) return [];
    const uncertainty = valueRoles.indexOf(variable === 'trend' ? 'trend-uncertainty' : 'uncertainty');
    const hasLimits = uncertainty !== -1 && (variable === 'average' || variable === 'trend');
    const values = seriesValues(rows, place, hasLimits ? limitsOf(uncertainty, valueRoles.indexOf('deviation')) : null);
    return {
      key: variable,
      suggestedName: `${gas.id}${site ? `-${site.id}` : ''}-${stepName}${variables[variable].id}`,
      label: `${gas.name}${site ? `, ${site.name}` : ''}, ${stepName} ${variables[variable].name}`,
      quantity: gas.id === 'co2' ? 'co2' : 'other',
      agent: null,
      unit: gas.unit,
      unitFrom: new RegExp(`\\b${gas.unit}\\b`).test(comments) ? 'file' : 'provider',
      step,
      baseline: null,
      baselineFrom: 'not needed',
      partialYears: partialYears(values),
      isMain: variable === 'average',
      values,
    } satisfies ReadSeries;
  });
}

function notesOn({ roles, gas, site, comments }: Layout, rows: readonly Row[]): string[] {
  const notes = [`${gas.name} is a mole fraction in dry air (${gas.unit}).`];
  if (gas.id === 'co2' && !/X20\d\d/.test(comments)) {
    notes.push(
      'The file does not name its calibration scale: NOAA GML has used WMO X2019 since 2021, WMO X2007 before.',
    );
  }
  if (site === null) notes.push('The file does not say whether this is one station or a global mean.');
  if (valueColumns(roles).some(({ name }) => name === 'uncertainty')) {
    notes.push('Limits are one standard uncertainty to either side (68.27 %), from the column of uncertainties.');
  }
  const deviation = valueColumns(roles).findIndex(({ name }) => name === 'deviation');
  const interpolated = rows.filter((row) => deviation !== -1 && row.values[deviation] === null && isOwnRecord(row));
  if (interpolated.length > 0) {
    const listed = interpolated.slice(0, maxListed).map(placeName).join(', ');
    notes.push(
      `Interpolated by the provider (no standard deviation in the file): ${listed}${interpolated.length > maxListed ? ', …' : ''}.`,
    );
  }
  return notes;
}

/** Earlier values are not the provider's own and have no standard deviations throughout. */
function isOwnRecord({ year, month }: Row): boolean {
  return year * 12 + (month ?? 1) >= 1974 * 12 + 5;
}

/** Interpolated months state an uncertainty of zero; without a standard deviation there are no limits. */
function limitsOf(uncertainty: number, deviation: number): Limits {
  const limits = standardLimits(uncertainty);
  return {
    ...limits,
    of: (row, value) =>
      deviation !== -1 && row.values[deviation] === null ? { lower: null, upper: null } : limits.of(row, value),
  };
}

function median(values: readonly (number | null)[]): number {
  const sorted = values.filter((value) => value !== null).toSorted((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}
