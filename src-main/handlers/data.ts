import { createHash } from 'node:crypto';
import type { RequestInput } from '../contract/requests.ts';
import type { Series, SeriesValues } from '../contract/series.ts';
import { InputError } from '../errors.ts';
import { canonicalJson } from '../project/canonical-json.ts';
import type { Project } from '../project/project.ts';
import { annualMeans } from '../quantities/annual-means.ts';
import { formatYears } from '../quantities/notation.ts';
import { rebase } from '../quantities/rebase.ts';
import { openFile } from '../readers/open-file.ts';
import { previewDataset, readDataset } from '../readers/read-dataset.ts';
import { readValues } from './claim-request.ts';
import { refuseFrozen } from './claims.ts';
import type { Handlers } from './context.ts';
import { projectView } from './project-view.ts';
import { seriesFigure } from './series-figure.ts';
import { claimSeries } from './procedure-series.ts';

type Names = 'data.preview' | 'data.import' | 'dataset.remove' | 'series.get' | 'series.update' | 'series.rebase';

export const dataHandlers: Handlers<Names> = {
  async 'data.preview'({ fileName, bytes, options }, { workspace }) {
    const received = Buffer.from(bytes, 'base64');
    const digest = createHash('sha256').update(received).digest('hex');
    const earlier = workspace.project?.list('dataset').find((row) => row.contentDigest === digest);
    const preview = previewDataset(await openFile(fileName, received), options);
    return { ...preview, digest, alreadyImportedAs: earlier?.id ?? null };
  },

  async 'data.import'(input, { workspace, now }) {
    const received = Buffer.from(input.bytes, 'base64');
    const { fileName, options, choices } = input;
    const read = readDataset(await openFile(fileName, received), options, choices);
    const project = workspace.open();
    refuseUndecided(input, read.badRows.length);
    const names = new Set(project.list('series').map((series) => series.name));
    const ids = workspace.change('import dataset', fileName, (change) => {
      const dataset = change.add('dataset', {
        fileName,
        sizeBytes: received.byteLength,
        contentDigest: change.addContent(received),
        importedAt: now(),
        readerId: read.readerId,
        readerVersion: read.readerVersion,
        options,
        choices,
        nRows: read.nRows,
        leftOut: read.badRows,
        notes: read.notes,
        licence: input.licence ?? '',
      });
      const seriesIds = read.series.map(({ description, values }) => {
        const name = freeName(description.name, names);
        names.add(name);
        const valuesDigest = change.addContent(Buffer.from(canonicalJson(values), 'utf8'));
        return change.add('series', { ...description, name, datasetId: dataset.id, valuesDigest }).id;
      });
      return { datasetId: dataset.id, seriesIds };
    });
    return { project: projectView(project), ...ids };
  },

  'dataset.remove'({ datasetId }, { workspace }) {
    const project = workspace.open();
    const series = project.list('series').filter((row) => row.datasetId === datasetId);
    for (const row of series) refuseInUse(project, row);
    workspace.change('remove dataset', project.get('dataset', datasetId).fileName, (change) => {
      for (const row of series) change.remove('series', row.id);
      change.remove('dataset', datasetId);
    });
    return projectView(project);
  },

  'series.get'({ seriesId }, { workspace }) {
    const project = workspace.open();
    const series = project.get('series', seriesId);
    const values = readValues(project, series.valuesDigest);
    return { series, values, figure: seriesFigure(series, values) };
  },

  'series.update'({ seriesId, ...given }, { workspace }) {
    const project = workspace.open();
    const series = project.get('series', seriesId);
    for (const claim of claimsUsing(project, seriesId)) refuseFrozen(project, claim);
    const taken = project.list('series').some((row) => row.id !== seriesId && row.name === given.name);
    if (taken) {
      throw new InputError({
        code: 'name-taken',
        where: `Series ${seriesId}, name`,
        expected: 'a name that no other series of this project has',
        received: given.name ?? '',
        hint: 'Choose another name.',
      });
    }
    const changed = {
      ...series,
      ...Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined)),
    };
    workspace.change('change series', changed.name, (change) => change.put('series', changed));
    return projectView(project);
  },

  'series.rebase'({ seriesId, baseline, minMonths }, { workspace }) {
    const project = workspace.open();
    const { id: _id, ...series } = project.get('series', seriesId);
    const values = readValues(project, series.valuesDigest);
    const { offset } = rebase(annualMeans({ ...series, values }, minMonths), baseline);
    const shifted = shiftValues(values, -offset);
    const taken = new Set(project.list('series').map((row) => row.name));
    const name = freeName(series.name, taken, `-vs-${baseline.start}-${baseline.end}`);
    const label = `${cut(series.label, 400)}, re-based to ${formatYears(baseline)}`;
    const added = workspace.change('re-base series', name, (change) =>
      change.add('series', {
        ...series,
        name,
        label,
        baseline,
        valuesDigest: change.addContent(Buffer.from(canonicalJson(shifted), 'utf8')),
      }),
    );
    return { project: projectView(project), seriesId: added.id, offset };
  },
};

function refuseUndecided({ fileName, leaveOutBadRows }: RequestInput<'data.import'>, nBadRows: number): void {
  if (nBadRows === 0 || leaveOutBadRows) return;
  throw new InputError({
    code: 'bad-rows',
    where: fileName,
    expected: 'a decision about the rows that cannot be used',
    received: `${nBadRows} such row(s) and no decision`,
    hint: 'Look at them in the preview; leave them out by saying so, or mend the file.',
  });
}

function refuseInUse(project: Project, series: Series): void {
  const claims = claimsUsing(project, series.id);
  if (claims.length === 0) return;
  throw new InputError({
    code: 'series-in-use',
    where: `Series ${series.name}`,
    expected: 'a series that no claim uses',
    received: `claim ${claims.join(', ')} standing on it`,
    hint: 'Choose other series there first.',
  });
}

function claimsUsing(project: Project, seriesId: number): number[] {
  return project
    .list('claim')
    .filter((claim) => Object.values(claimSeries(claim)).includes(seriesId))
    .map((claim) => claim.id);
}

function shiftValues(values: SeriesValues, shift: number): SeriesValues {
  const shifted = (row: (number | null)[]) => row.map((value) => (value === null ? null : value + shift));
  const bounds = (row: (number | null)[] | null) => row && shifted(row);
  return { ...values, values: shifted(values.values), lower: bounds(values.lower), upper: bounds(values.upper) };
}

const maxNameLength = 120;

/** Two versions of one file keep their own names: "gistemp-annual", "gistemp-annual-2". */
function freeName(name: string, taken: ReadonlySet<string>, ending = ''): string {
  const candidate = (mark: string) => cut(name, maxNameLength - mark.length) + mark;
  let free = candidate(ending);
  for (let copy = 2; taken.has(free); copy += 1) free = candidate(`${ending}-${copy}`);
  return free;
}

/** The first characters of a text, never half of one. */
function cut(text: string, length: number): string {
  return text.slice(0, length).replace(/\p{Surrogate}$/u, '');
}
