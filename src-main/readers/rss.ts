import type { TextFile } from './decode-text.ts';
import { nameOf } from './name-of.ts';
import { otherFormat } from './other-format.ts';
import { partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { splitLine } from './split-line.ts';
import { type Table, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

interface Layout {
  table: Table;
  /** Latitude bands in the order of the columns; the first is the provider's "global" one. */
  bands: string[];
}

/** Year, month, and nine bands of latitude. */
const nCells = 11;
const maxHeaderLines = 10;
const baseline = { start: 1979, end: 1998 };
const widestBand = '-70.0/82.5';
const layers: Record<string, string> = {
  tlt: 'lower troposphere (TLT)',
  tmt: 'middle troposphere (TMT)',
  ttt: 'troposphere (TTT)',
  tts: 'troposphere to stratosphere (TTS)',
  tls: 'lower stratosphere (TLS)',
};

/** Satellite temperatures of Remote Sensing Systems (RSS_Monthly_MSU_AMSU_Channel_*.txt), monthly by latitude band. */
export const rss: Reader = {
  id: 'rss',
  title: 'RSS satellite temperatures',
  version: '1',

  recognise(file): Recognition | null {
    return layoutOf(file) === null
      ? null
      : {
          certainty: 0.9,
          why: 'Name or header are those of RSS, and rows have year, month and nine bands of latitude',
        };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) {
      throw otherFormat(
        file,
        0,
        `header lines of RSS with the band ${widestBand}, and rows of year, month and nine bands`,
      );
    }
    const { table, bands } = layout;
    const read = readRows(table, {
      nCells,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => yearPlace(cells[0] ?? '', cells[1] ?? ''),
      columns: bands.map((name, place) => ({ index: place + 2, name, isMissing: (value) => value <= -99 })),
    });
    const layer = layers[/_(tlt|tmt|ttt|tts|tls)_/i.exec(file.fileName)?.[1]?.toLowerCase() ?? ''];
    return {
      series: bands.map((band, place): ReadSeries => {
        const values = seriesValues(read.rows, place);
        const id = nameOf(band.replaceAll('-', 's').replaceAll('/', ' to '));
        return {
          key: id,
          suggestedName: `rss-${id}-monthly`,
          label: `RSS ${layer ?? 'satellite temperature'}, latitudes ${band}, monthly mean`,
          quantity: 'temperature-anomaly',
          agent: null,
          unit: 'K',
          unitFrom: 'provider',
          step: 'month',
          baseline,
          baselineFrom: 'provider',
          partialYears: partialYears(values),
          isMain: place === 0,
          values,
        };
      }),
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [
        ...read.notes,
        'Unit (°C, of which differences are the same in K) and base period (1979–1998) are the provider’s.',
        `These are temperatures of a layer of air (${layer ?? 'which one, the file name does not say'}) seen from satellites, not surface temperatures.`,
        `The widest band, ${bands[0]}, does not reach the poles: it is not a global mean.`,
        ...(bands.length < nCells - 2
          ? ['The header does not name all bands; only those that it names are offered.']
          : []),
      ],
      columns: ['year', 'month', ...bands, ...Array.from({ length: nCells - 2 - bands.length }, () => '')],
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const first = file.lines
    .slice(0, maxHeaderLines)
    .findIndex((line) => /^\s*(19|20)\d\d\s+\d{1,2}\s+-?[\d.]/.test(line));
  if (first === -1 || splitLine(file.lines[first] ?? '', 'blanks')?.length !== nCells) return null;
  const header = file.lines.slice(0, first).join('\n');
  const isNamed = /^RSS_Monthly/i.test(file.fileName) || /\bRSS\b|remote sensing systems|\bA?MSU\b/i.test(header);
  if (!isNamed) return null;
  const lines = file.lines.map((line, place) => (place < first ? '' : line));
  const table = splitTable({ ...file, lines }, { delimiter: 'blanks', commentMarks: ['#'], headerLine: 0 });
  return { table, bands: bandsOf(header) };
}

/** The bands that the header names from south to north, one for each column; else the first alone. */
function bandsOf(header: string): string[] {
  const bands = [...header.matchAll(/(-?\d+(?:\.\d+)?) ?\/ ?(-?\d+(?:\.\d+)?)/g)]
    .filter(([, south, north]) => Number(south) < Number(north))
    .map(([, south, north]) => `${south}/${north}`);
  return bands.length === nCells - 2 && new Set(bands).size === bands.length ? bands : [bands[0] ?? widestBand];
}
