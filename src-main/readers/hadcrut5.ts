import type { TextFile } from './decode-text.ts';
import { otherFormat } from './other-format.ts';
import { type PartialYear, partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { Reader, Reading, Recognition } from './reader.ts';
import { seriesValues, statedLimits } from './series-values.ts';
import { type Table, splitTable } from './split-table.ts';
import { type TimeForm, recogniseTime } from './time-form.ts';

const header =
  /^Time,Anomaly \(deg C\),Lower confidence limit \((\d+\.?\d*)%\),Upper confidence limit \((\d+\.?\d*)%\)$/i;
const baseline = { start: 1961, end: 1990 };
/** A last year whose limits are this many times as wide as those of the years before it is taken as a part year. */
const suspiciousWidening = 2;
const nYearsBefore = 10;

interface Layout {
  table: Table;
  time: TimeForm;
  levelPercent: number;
}

/** HadCRUT5 summary series (and the land and sea series of the same layout), annual and monthly. */
export const hadcrut5: Reader = {
  id: 'hadcrut5',
  title: 'HadCRUT5',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const step = layout.time.step === 'year' ? 'annual' : 'monthly';
    return { certainty: 0.95, why: `The header is that of HadCRUT5's ${step} summary series` };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null)
      throw otherFormat(
        file,
        0,
        'the header Time,Anomaly (deg C),Lower confidence limit (2.5%),Upper confidence limit (97.5%)',
      );
    const { table, time, levelPercent } = layout;
    const read = readRows(table, {
      nCells: 4,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => time.placeOf(cells[0] ?? ''),
      columns: ['anomaly', 'lower limit', 'upper limit'].map((name, place) => ({
        index: place + 1,
        name,
        isMissing: isFillValue,
      })),
    });
    const values = seriesValues(read.rows, 0, statedLimits(1, 2, levelPercent));
    const doubt = time.step === 'year' ? lastYearInDoubt(values) : { partial: [], notes: [] };
    const name = nameOfSeries(file.fileName);
    return {
      series: [
        {
          key: 'anomaly',
          suggestedName: `${name.id}-${time.step === 'year' ? 'annual' : 'monthly'}`,
          label: `${name.title}, ${time.step === 'year' ? 'annual' : 'monthly'} mean`,
          quantity: 'temperature-anomaly',
          agent: null,
          unit: 'K',
          unitFrom: 'file',
          step: time.step,
          baseline,
          baselineFrom: 'provider',
          partialYears: time.step === 'year' ? doubt.partial : partialYears(values),
          isMain: true,
          values,
        },
      ],
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [
        ...read.notes,
        'Anomalies in °C; differences are the same in K, so the unit is K.',
        'The base period 1961–1990 is the provider’s.',
        `Limits are the provider’s, at ${levelPercent} %.`,
        ...doubt.notes,
      ],
      columns: table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const match = header.exec((file.lines[0] ?? '').trim());
  if (match === null) return null;
  const table = splitTable(file, { delimiter: ',', commentMarks: ['#'], headerLine: 1 });
  const time = recogniseTime(
    table.lines.map(({ cells }) => cells?.[0] ?? ''),
    '.',
  );
  return time && { table, time, levelPercent: Number(match[2]) - Number(match[1]) };
}

function isFillValue(value: number): boolean {
  return value <= -99 || value >= 1e19;
}

/** Whether the last annual value stands on part of a year: the file has no mark for it, only wider limits. */
function lastYearInDoubt({ years, lower, upper }: ReturnType<typeof seriesValues>): {
  partial: PartialYear[];
  notes: string[];
} {
  const widths = years.map((_, place) => (upper?.[place] ?? Number.NaN) - (lower?.[place] ?? Number.NaN));
  const [year, width] = [years.at(-1) ?? 0, widths.at(-1) ?? Number.NaN];
  const before = widths.slice(-nYearsBefore - 1, -1).filter((one) => one > 0);
  const widest = Math.max(...before);
  if (before.length === 0 || !(width > 0)) {
    return { partial: [], notes: [`Whether ${year}, the last year, is whole cannot be told from the file.`] };
  }
  const times = (width / widest).toFixed(1);
  if (width <= suspiciousWidening * widest) {
    return {
      partial: [],
      notes: [
        `The file has no mark for a part year. The limits of ${year}, the last year, are ${times} times as wide as the widest of the ${before.length} years before, so nothing speaks for one.`,
      ],
    };
  }
  const reason = `its limits are ${times} times as wide as the widest of the ${before.length} years before`;
  return {
    partial: [{ year, note: `probably a part year: ${reason}; the file itself does not say` }],
    notes: [`${year}, the last year, is probably a part year. The file has no mark for it, but ${reason}.`],
  };
}

function nameOfSeries(fileName: string): { title: string; id: string } {
  const product = /(hadcrut|crutem|hadsst)[._ -]?(\d)/i.exec(fileName);
  const known: Record<string, string> = { hadcrut: 'HadCRUT', crutem: 'CRUTEM', hadsst: 'HadSST' };
  const name = product ? `${known[(product[1] ?? '').toLowerCase()] ?? ''}${product[2] ?? ''}` : 'HadCRUT5';
  const region = /northern/i.test(fileName)
    ? 'northern hemisphere'
    : /southern/i.test(fileName)
      ? 'southern hemisphere'
      : /tropics/i.test(fileName)
        ? 'tropics'
        : 'global';
  const variant = /non_?infilled/i.test(fileName) ? ', not infilled' : '';
  const id = [
    name.toLowerCase(),
    region === 'global' ? '' : region.replace(' ', '-'),
    variant === '' ? '' : 'not-infilled',
  ];
  return { title: `${name}${variant}, ${region}`, id: id.filter((part) => part !== '').join('-') };
}
