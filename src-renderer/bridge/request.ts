import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { Answer, ErrorAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import { host } from './host.ts';

/** What a request answers when nobody is there to answer it. */
export const hostGone: ErrorAnswer = {
  kind: 'ProjectError',
  code: 'host-gone',
  where: 'Footing',
  expected: 'an answer from the program behind this window',
  received: 'none: it has been closed, or its session is over',
  hint: 'Everything up to the last answer is stored. Start Footing again and open the project there.',
};

/** Asks the core for one thing. Never throws: what goes wrong is in the answer. */
export async function request<Name extends RequestName>(name: Name, input: RequestInput<Name>): Promise<Answer<Name>> {
  // JSON drops what must not travel: reactive proxies, functions, undefined fields.
  const inputJson = JSON.stringify(input);
  try {
    return JSON.parse(await host().send(name, inputJson)) as Answer<Name>;
  } catch {
    return { ok: false, error: hostGone };
  }
}
