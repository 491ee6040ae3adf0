import type { ClaimLine, ProjectView } from '../contract/project.ts';
import type { Project } from '../project/project.ts';
import { statedValue } from '../quantities/stated-number.ts';
import { latestAnswer } from './stored-results.ts';

/** The project as the index and the pages show it. */
export function projectView(project: Project): ProjectView {
  return {
    path: project.path,
    project: project.get('project', 1),
    isReadOnly: project.isReadOnly,
    sources: project.list('source'),
    datasets: project.list('dataset'),
    series: project.list('series'),
    claims: project.list('claim').map((claim) => claimLine(project, claim.id)),
    head: project.head(),
    ...project.undoState(),
  };
}

function claimLine(project: Project, claimId: number): ClaimLine {
  const claim = project.get('claim', claimId);
  const { bound, value, unit } = claim.statement;
  const recomputation = latestAnswer(project, claimId, 'recomputation');
  const finding = project
    .list('finding')
    .filter((row) => row.claimId === claimId)
    .at(-1);
  return {
    id: claim.id,
    title: claim.title,
    unit,
    stated: bound === 'equals' ? value : `${bound} ${value}`,
    statedValue: statedValue(value),
    recomputed: recomputation && {
      value: recomputation.answer.value,
      low: recomputation.answer.interval?.low ?? null,
      high: recomputation.answer.interval?.high ?? null,
    },
    status: finding?.conclusion ?? (recomputation ? 'in review' : 'not begun'),
    isSigned: finding?.isSigned ?? false,
  };
}
