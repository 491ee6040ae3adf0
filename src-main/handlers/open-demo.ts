import { fitsLine } from '../contract/procedure.ts';
import { readdirSync, readFileSync, rmSync } from 'node:fs';
import { basename, join } from 'node:path';
import { workedExample, type WorkedExample } from '../contract/worked-example.ts';
import { engineVersion } from '../engine-version.ts';
import { createProject } from '../project/create-project.ts';
import { claimHandlers } from './claims.ts';
import type { HandlerContext } from './context.ts';
import { dataHandlers } from './data.ts';
import { findingHandlers } from './findings.ts';
import { freePath } from './free-path.ts';
import { holder } from './holder.ts';
import { makeFolder } from './make-folder.ts';
import { runClaimMethod } from './run-claim-method.ts';
import { sourceHandlers } from './sources.ts';

/**
 * Makes a project of the worked example, doing step by step what its reviewer did, through the same handlers and with
 * the same trail entries as by hand. The finding is left unsigned.
 */
export async function openDemo(context: HandlerContext, directory: string): Promise<void> {
  const folder = exampleFolder(context.places.demoProjects);
  const example = workedExample.parse(JSON.parse(readFileSync(join(folder, 'claims.json'), 'utf8')));
  const { workspace } = context;
  const path = freePath(makeFolder(directory), example.title);
  const reviewer = workspace.identity.reviewer() ?? example.reviewer;
  const doing = { reviewer: { name: reviewer.name, role: reviewer.role }, at: context.now(), engineVersion };
  const { title } = example;
  workspace.replace(
    createProject(path, { title, isInvented: true, holder: { ...holder(context), reviewer: reviewer.name }, ...doing }),
    { standIn: example.reviewer },
  );

  const read = (inside: string) => ({
    name: basename(inside),
    bytes: readFileSync(join(folder, inside)).toString('base64'),
  });
  try {
    await fill();
  } catch (error) {
    // Half an example would mislead: whoever opens it takes it for the whole.
    workspace.replace(null);
    rmSync(path, { force: true });
    throw error;
  }

  async function fill(): Promise<void> {
    for (const { path: inside, ...source } of example.sources) {
      await sourceHandlers['source.save']({ ...source, file: inside ? read(inside) : null }, context);
    }
    for (const { path: inside, options, choices, licence } of example.datasets) {
      const { name: fileName, bytes } = read(inside);
      await dataHandlers['data.import'](
        { fileName, bytes, options, choices, licence, leaveOutBadRows: false },
        context,
      );
    }
    for (const step of example.claims) await reviewClaim(step, context);
  }
}

async function reviewClaim(
  { claim, minYears, marks, notes, finding }: WorkedExample['claims'][number],
  context: HandlerContext,
) {
  const created = await claimHandlers['claim.create'](claim, context);
  const claimId = created.claim.id;
  if (created.claim.derivation.length > 0) await runClaimMethod(context, claimId, 'derivation', {});
  await runClaimMethod(context, claimId, 'recomputation', {});
  if (fitsLine(created.claim.procedure)) await runClaimMethod(context, claimId, 'estimators', {});
  await runClaimMethod(context, claimId, 'assumptions', {});
  if (minYears !== null) await runClaimMethod(context, claimId, 'claim-sweep', { minYears });
  for (const mark of marks) await claimHandlers['claim.mark']({ claimId, ...mark }, context);
  for (const text of notes) await claimHandlers['note.add']({ claimId, text }, context);
  await findingHandlers['finding.save']({ claimId, ...finding }, context);
}

function exampleFolder(demoProjects: string): string {
  const [first] = readdirSync(demoProjects, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name)
    .sort();
  return join(demoProjects, first ?? '');
}
