import type { ErrorAnswer } from '../../contract/requests.ts';
import { badUsage, type Command } from './command.ts';
import { schemaNames, schemaOf } from './json-schemas.ts';

export const computeCommands: Command[] = [
  {
    name: 'compute',
    usage: 'REQUEST.json',
    summary: 'one stateless computation, or an array of them; - reads standard input',
    examples: ['compute request.json', 'compute -', 'schema compute.regression'],
    nPositionals: { min: 1, max: 1 },
    options: {},
    isJsonOnly: true,
    async run({ positionals: [file = ''] }, tools) {
      const request = await tools.readJson(file);
      const answers = [];
      for (const one of Array.isArray(request) ? request : [request])
        answers.push(answerOf(await tools.tryAsk('compute', one)));
      const isEveryOneDone = answers.every((answer) => answer.ok);
      const json = Array.isArray(request) ? answers : answers[0];
      return { json, lines: [], status: isEveryOneDone ? 0 : 2 };
    },
  },
  {
    name: 'schema',
    usage: '[NAME]',
    summary: 'JSON Schema of every request, answer and file that Footing reads or writes',
    examples: ['schema', 'schema claim', 'schema compute.regression', 'schema claim.recompute.answer'],
    nPositionals: { min: 0, max: 1 },
    options: {},
    async run({ positionals: [name] }) {
      if (name === undefined) return { json: schemaNames(), lines: schemaNames() };
      const schema = schemaOf(name);
      if (!schema) throw badUsage('NAME', 'a name that footing schema lists', name);
      return { json: schema, lines: JSON.stringify(schema, null, 2).split('\n') };
    },
  },
];

function answerOf(answer: { ok: true; value: unknown } | { ok: false; error: ErrorAnswer }) {
  if (answer.ok) return answer;
  const { code, where, expected, received, hint } = answer.error;
  return { ok: false as const, error: { code, where, expected, received, hint } };
}
