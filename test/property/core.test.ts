import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { errorAnswer, requests } from '../../src-main/contract/requests.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import { errorSentence } from '../../src-main/errors.ts';
import { passphrase } from '../helpers/command-line.ts';
import { preparation, requestsArbitrary, type AnyRequest } from '../helpers/request-arbitrary.ts';
import { testCore, type TestCore } from '../helpers/test-core.ts';

const nRuns = 4;
const nRequests = 50;

/** Requests that went well at least once over all runs: a test in which everything is refused would prove nothing. */
const succeeded = new Set<RequestName>();

async function send({ core, ask }: TestCore, path: string, { name, input }: AnyRequest): Promise<void> {
  const before = (await ask('project.view', {})).head;
  const answer = await core.handle(name, JSON.parse(JSON.stringify(input)));
  const sent = `${name} ${JSON.stringify(input)}`.slice(0, 2000);
  if (answer.ok) {
    succeeded.add(name);
    const form = requests[name].answer.safeParse(answer.value);
    expect(form.error?.issues, sent).toBeUndefined();
  } else {
    const error = errorAnswer.parse(answer.error);
    const sentence = `${sent}\n→ ${errorSentence(error)}`;
    expect(error.code, sentence).not.toBe('unexpected');
    expect(error.where && error.expected && error.received, sentence).toBeTruthy();
    const { project } = await ask('session.get', {});
    expect(project?.head ?? before, sentence).toEqual(before);
  }
  if (name === 'project.close' && answer.ok) await ask('project.open', { path });
}

describe('the core under any sequence of requests', () => {
  it(
    'answers in the form of the contract, refuses without a fault of its own and without a trace, and keeps a record ' +
      'that verifies and computes again to the last digit',
    async () => {
      await fc.assert(
        fc.asyncProperty(
          fc.array(requestsArbitrary, { minLength: nRequests, maxLength: nRequests }),
          async (sequence) => {
            const test = await testCore();
            try {
              await test.ask('identity.create', { passphrase });
              const { path } = await test.ask('project.create', { title: 'Invented' });
              for (const request of [...preparation, ...sequence.flat()]) await send(test, path, request);
              // Whatever the requests left behind can be looked at.
              const { claims, series } = await test.ask('project.view', {});
              for (const { id } of claims) await test.ask('claim.view', { claimId: id });
              for (const { id } of series) await test.ask('series.get', { seriesId: id });
              await test.ask('report.render', {});
              expect((await test.ask('project.verify', {})).problems).toEqual([]);
              expect((await test.ask('project.recheck', {})).differences).toEqual([]);
            } finally {
              await test.end();
            }
          },
        ),
        // Making a failure smaller takes minutes; the request that failed is in its message.
        { seed: 20260102, numRuns: nRuns, endOnFailure: true },
      );
      expect([...succeeded]).toEqual(
        expect.arrayContaining([
          'data.import',
          'claim.recompute',
          'claim.testAssumptions',
          'finding.save',
          'finding.sign',
          'finding.revise',
          'trail.undo',
        ]),
      );
    },
    60_000,
  );
});
