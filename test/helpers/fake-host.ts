import type { ProgressEvent } from '../../src-main/contract/events.ts';
import { requestNames, type RequestName } from '../../src-main/contract/request-names.ts';
import type { ErrorAnswer, RequestAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import type { WindowBridge } from '../../src-main/contract/window-bridge.ts';

type Reply<Name extends RequestName> = (
  input: RequestInput<Name>,
) => RequestAnswer<Name> | Promise<RequestAnswer<Name>>;

/** Thrown by a reply: the request answers with this error. */
export class Refusal extends Error {
  readonly answer: ErrorAnswer;

  constructor(answer: Partial<ErrorAnswer>) {
    super(answer.code);
    const blank = {
      kind: 'InputError',
      code: 'refused',
      where: 'here',
      expected: 'this',
      received: 'that',
      hint: '',
    } as const;
    this.answer = { ...blank, ...answer };
  }
}

export interface FakeHost {
  /** Everything that the screens asked for, oldest first. */
  readonly asked: { name: RequestName; input: unknown }[];
  reply<Name extends RequestName>(name: Name, reply: Reply<Name>): void;
  /** Inputs of every asking by this name. */
  inputs<Name extends RequestName>(name: Name): RequestInput<Name>[];
  tell(event: ProgressEvent): void;
}

let current = createHost();

function createHost() {
  const asked: FakeHost['asked'] = [];
  const replies = new Map<RequestName, (input: unknown) => unknown>();
  const listeners = new Set<(event: ProgressEvent) => void>();
  return { asked, replies, listeners };
}

async function send(name: RequestName, inputJson: string): Promise<string> {
  const input: unknown = JSON.parse(inputJson);
  current.asked.push({ name, input });
  const reply = current.replies.get(name);
  if (!reply) throw new Error(`the fake host has no reply to ${name}`);
  try {
    return JSON.stringify({ ok: true, value: await reply(input) });
  } catch (error) {
    if (error instanceof Refusal) return JSON.stringify({ ok: false, error: error.answer });
    throw error;
  }
}

/** Stands in for the program behind the window, where the preload script puts it; a fresh one on every call. */
export function installFakeHost(): FakeHost {
  current = createHost();
  const verbs = Object.fromEntries(requestNames.map((name) => [name, (inputJson: string) => send(name, inputJson)]));
  const footing: WindowBridge = {
    verbs: verbs as WindowBridge['verbs'],
    onProgress(listener) {
      const { listeners } = current;
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
  Object.assign(window, { footing });
  const host = current;
  return {
    asked: host.asked,
    reply: (name, reply) => host.replies.set(name, reply as (input: unknown) => unknown),
    inputs: <Name extends RequestName>(name: Name) =>
      host.asked.filter((asking) => asking.name === name).map(({ input }) => input as RequestInput<Name>),
    tell: (event) => host.listeners.forEach((listener) => listener(event)),
  };
}
