import type { TrailEntry, VerifyProblem } from '../contract/trail.ts';

/** Holds the stored content against its digests, and against the entries that brought it in. */
export function verifyContents(
  contentDigests: ReadonlyMap<string, string>,
  entries: readonly TrailEntry[],
): VerifyProblem[] {
  const expected = new Map(
    entries.flatMap(({ sequence, content }) => content.map((name) => [name, sequence] as const)),
  );
  const problems: VerifyProblem[] = [];
  for (const [name, actual] of contentDigests) {
    const where = whereOf(name);
    if (name !== actual)
      problems.push({ code: 'content-altered', where, detail: `its bytes have the digest ${actual}` });
    if (!expected.has(name)) {
      problems.push({ code: 'content-without-entry', where, detail: 'no trail entry accounts for it' });
    }
  }
  for (const [name, sequence] of expected) {
    if (contentDigests.has(name)) continue;
    problems.push({ code: 'content-missing', where: whereOf(name), detail: `trail entry ${sequence} brought it in` });
  }
  return problems;
}

function whereOf(name: string): string {
  return `content ${name}`;
}
