import type { ReportClaim } from '../../contract/project.ts';
import type { Dataset, Series } from '../../contract/series.ts';
import { formatYears } from '../../quantities/notation.ts';
import { facts, html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { bytesText, timeText, unitText } from '../words.ts';
import { digestPart } from './digest-part.ts';

/** Which files the number was computed from: as received, how they were read, and what was left out. */
export function dataPart({ datasets, series }: ReportClaim): Html {
  if (datasets.length === 0) {
    return html`<h2>Data</h2>
      ${nothing('No data were used: the procedure starts from stated numbers, or its series are not chosen yet.')}`;
  }
  return html`<h2>Data</h2>
    ${datasets.map((dataset) =>
      datasetPart(
        dataset,
        series.filter(({ datasetId }) => datasetId === dataset.id),
      ),
    )}`;
}

function datasetPart(dataset: Dataset, series: readonly Series[]): Html {
  const options = JSON.stringify(dataset.options);
  return html`<section class="together">
    <h3>${dataset.fileName}</h3>
    ${facts([
      ['SHA-256', digestPart(dataset.contentDigest)],
      [
        'As received',
        `${bytesText(dataset.sizeBytes)}, ${dataset.nRows} rows, imported ${timeText(dataset.importedAt)}`,
      ],
      ['Reader', `${dataset.readerId}, version ${dataset.readerVersion}${options === '{}' ? '' : `, told ${options}`}`],
      ['Provider’s note', dataset.licence === '' ? 'none given' : dataset.licence],
      [
        'Noticed',
        dataset.notes.length === 0
          ? 'nothing out of the ordinary'
          : dataset.notes.map((note) => html`<div>${note}</div>`),
      ],
    ])}
    ${table(
      'Series taken from it',
      [
        { heading: 'Series' },
        { heading: 'Unit and baseline' },
        { heading: 'Span' },
        { heading: 'Values', isNumber: true },
        { heading: 'Missing, absent', isNumber: true },
      ],
      series.map((one): HtmlValue[] => [
        html`${one.name}
          <div class="quiet">series ${one.id}${one.label === '' ? null : `, ${one.label}`}</div>
          ${one.partialYears.map(({ year, note }) => html`<div class="quiet">${String(year)} in part: ${note}</div>`)}`,
        html`${unitText(one.unit)}
          <div class="quiet">${one.baseline ? `relative to ${formatYears(one.baseline)}` : 'no baseline'}</div>`,
        html`${formatYears({ start: one.startYear, end: one.endYear })}
          <div class="quiet">by ${one.step}</div>`,
        one.nPresent,
        `${one.nMissing}, ${one.nAbsent}`,
      ]),
      'series',
    )}
    ${facts([['Values, SHA-256', valueDigests(series)]])}
    ${
      dataset.leftOut.length === 0
        ? nothing('No row of this file was left out.')
        : table(
            `Rows left out by the reviewer’s decision: ${dataset.leftOut.length} of ${dataset.nRows}`,
            [{ heading: 'Line', isNumber: true }, { heading: 'As it stands in the file' }, { heading: 'Reason' }],
            dataset.leftOut.map(({ line, text, reason }) => [line, html`<code>${text}</code>`, reason]),
          )
    }
  </section>`;
}

function valueDigests(series: readonly Series[]): HtmlValue {
  return series.map(({ name, valuesDigest }) => {
    const of = series.length === 1 ? null : html`<span class="quiet">${name}</span><br />`;
    return html`<div>${of}${digestPart(valuesDigest)}</div>`;
  });
}
