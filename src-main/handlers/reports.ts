import { existsSync, renameSync, writeFileSync } from 'node:fs';
import { join, parse } from 'node:path';
import { cautions } from '../contract/cautions.ts';
import type { Report, ReportClaim } from '../contract/project.ts';
import { engineVersion } from '../engine-version.ts';
import { catalogueEntries } from '../assumptions/catalogue.ts';
import { canonicalJson } from '../project/canonical-json.ts';
import type { Project } from '../project/project.ts';
import { reportHtml } from '../report/report-html.ts';
import { claimView } from './claim-view.ts';
import type { Handlers } from './context.ts';
import { fileProblem } from './file-problem.ts';
import { fillIn } from './fill-in.ts';
import { makeFolder } from './make-folder.ts';
import { claimSeries } from './procedure-series.ts';

export const reportHandlers: Handlers<'report.render' | 'report.write'> = {
  async 'report.render'({ claimIds }, { workspace, now }) {
    const report = assembleReport(workspace.open(), claimIds, now());
    return { html: await reportHtml(report), report };
  },
  async 'report.write'({ directory, formats, claimIds }, { workspace, now }) {
    const report = assembleReport(workspace.open(), claimIds, now());
    const folder = makeFolder(directory);
    const files: string[] = [];
    for (const format of formats) {
      const text = format === 'html' ? await reportHtml(report) : `${canonicalJson(report)}\n`;
      files.push(writeWhole(join(folder, `report.${format}`), text));
    }
    return { files };
  },
};

/**
 * A report is either all there or not there at all, and never replaces an earlier one: that bears witness to the trail
 * as it was.
 */
function writeWhole(path: string, text: string): string {
  const unfinished = `${path}.unfinished`;
  try {
    writeFileSync(unfinished, text);
    if (existsSync(path)) renameSync(path, freeName(path));
    renameSync(unfinished, path);
  } catch (error) {
    throw fileProblem('report-not-written', path, 'a file that can be written', error);
  }
  return path;
}

/** `report-earlier-1.html` beside `report.html`, or the next number that is free. */
function freeName(path: string): string {
  const { dir, name, ext } = parse(path);
  let copy = 1;
  while (existsSync(join(dir, `${name}-earlier-${copy}${ext}`))) copy += 1;
  return join(dir, `${name}-earlier-${copy}${ext}`);
}

export function assembleReport(project: Project, claimIds: number[] | undefined, writtenAt: string): Report {
  const { title, isInvented } = project.get('project', 1);
  const claims = claimIds ? claimIds.map((id) => project.get('claim', id)) : project.list('claim');
  return {
    title,
    isInvented,
    engineVersion,
    writtenAt,
    head: project.head(),
    claims: claims.map((claim) => reportClaim(project, claim.id)),
    sources: project.list('source'),
    cautions: [...cautions],
  };
}

function reportClaim(project: Project, claimId: number): ReportClaim {
  const view = claimView(project, claimId);
  const { claim, recomputation, assumptions } = view;
  const finding = view.findings.at(-1) ?? null;
  const used = seriesOf(project, claimId);
  const datasetIds = new Set(used.map((series) => series.datasetId));
  const cited = new Set(finding?.resultIds ?? []);
  const quoted = finding?.publishedValueIds ?? [];
  return {
    claim,
    source: project.list('source').find((source) => source.id === claim.statement.sourceId) ?? null,
    stem: view.stem,
    figures: Object.values(view.figures).filter((figure) => figure !== null),
    agreement: recomputation?.answer.agreement ?? null,
    recomputation: recomputation?.answer ?? null,
    derivation: view.derivation?.answer ?? null,
    ledger: (assumptions?.answer.outcomes ?? []).map((outcome) => ({
      outcome,
      title: catalogueEntries.find((entry) => entry.id === outcome.id)?.title ?? outcome.id,
      mark: view.marks.find((mark) => mark.assumptionId === outcome.id) ?? null,
    })),
    ladder: assumptions?.answer.ladder ?? null,
    sweep: view.sweep?.answer ?? null,
    estimators: view.estimators?.answer ?? null,
    conclusion: finding?.conclusion ?? null,
    finding,
    findingText: finding ? fillIn(finding.text, view.fillIns).text : '',
    earlierFindings: view.findings.slice(0, -1),
    published: view.published.filter((value) => quoted.length === 0 || quoted.includes(value.id)),
    signatures: view.signatures.flatMap((signature) => {
      const check = view.signatureChecks.find((candidate) => candidate.signatureId === signature.id);
      return check ? [{ signature, check }] : [];
    }),
    datasets: project.list('dataset').filter((dataset) => datasetIds.has(dataset.id)),
    series: used,
    notes: view.notes,
    results: project
      .list('result')
      .filter((result) => result.claimId === claimId && (cited.size === 0 || cited.has(result.id))),
  };
}

/** The series that a claim's procedure and evidence name. */
function seriesOf(project: Project, claimId: number) {
  const ids = Object.values(claimSeries(project.get('claim', claimId)));
  return project.list('series').filter((series) => ids.includes(series.id));
}
