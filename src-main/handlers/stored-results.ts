import type { ComputeValue } from '../contract/compute.ts';
import type { Result, ResultMethod } from '../contract/result.ts';
import type { Project } from '../project/project.ts';

export interface StoredAnswer<Method extends ResultMethod> {
  result: Result;
  answer: ComputeValue<Method>;
}

/** The newest stored result of a method for a claim, with its answer. */
export function latestAnswer<Method extends ResultMethod>(
  project: Project,
  claimId: number,
  method: Method,
): StoredAnswer<Method> | null {
  const result = project
    .list('result')
    .filter((row) => row.claimId === claimId && row.method === method)
    .at(-1);
  return result ? { result, answer: readAnswer<Method>(project, result) } : null;
}

/** A stored answer; its digest was checked when it was read. */
export function readAnswer<Method extends ResultMethod>(project: Project, result: Result): ComputeValue<Method> {
  return JSON.parse(project.content(result.answerDigest).toString('utf8')) as ComputeValue<Method>;
}
