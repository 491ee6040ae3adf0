import type { RequestName } from '../contract/request-names.ts';
import type { Answer, ErrorAnswer } from '../contract/requests.ts';
import type { Core } from '../handlers/handle.ts';
import { payloadLimitBytes } from './payload-limit.ts';

/** Far deeper than any input of the contract; what goes deeper would exhaust the stack of whoever reads it. */
const deepestLevel = 64;

/** Carries one request from a window to the core and its answer back: JSON text in, JSON text out. */
export async function carryRequest(core: Core, name: RequestName, payload: unknown): Promise<string> {
  if (typeof payload !== 'string') return refused(notJson(name, typeof payload));
  if (Buffer.byteLength(payload) > payloadLimitBytes(name)) return refused(tooLarge(name));
  let input: unknown;
  try {
    input = JSON.parse(payload);
  } catch (error) {
    return refused(notJson(name, error instanceof Error ? error.message : 'something else'));
  }
  if (isDeeperThan(input, deepestLevel)) return refused(tooDeep(name));
  return JSON.stringify(await core.handle(name, input));
}

function isDeeperThan(value: unknown, levels: number): boolean {
  let level = [value];
  for (let depth = 0; depth <= levels && level.length > 0; depth += 1) {
    level = level.flatMap((one) => (typeof one === 'object' && one !== null ? (Object.values(one) as unknown[]) : []));
  }
  return level.length > 0;
}

function tooDeep(name: RequestName): ErrorAnswer {
  return {
    kind: 'InputError',
    code: 'request-too-deep',
    where: name,
    expected: `an input of at most ${deepestLevel} levels of lists and objects`,
    received: 'more levels',
    hint: '',
  };
}

export function tooLarge(name: RequestName): ErrorAnswer {
  return {
    kind: 'InputError',
    code: 'request-too-large',
    where: name,
    expected: `an input of at most ${payloadLimitBytes(name) / 1_000_000} MB`,
    received: 'a longer one',
    hint: 'Split the file, or leave out the columns that are not needed.',
  };
}

export function notJson(name: RequestName, received: string): ErrorAnswer {
  return {
    kind: 'InputError',
    code: 'request-not-json',
    where: name,
    expected: 'an input as JSON text',
    received,
    hint: '',
  };
}

/** An answer that the core never saw. */
export function refused(error: ErrorAnswer): string {
  return JSON.stringify({ ok: false, error } satisfies Answer<RequestName>);
}
