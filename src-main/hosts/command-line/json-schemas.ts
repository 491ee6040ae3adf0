import { z } from 'zod';
import { claimDraft } from '../../contract/claim.ts';
import { computeMethods } from '../../contract/compute.ts';
import { figure } from '../../contract/figure.ts';
import { report } from '../../contract/project.ts';
import { requests } from '../../contract/requests.ts';
import { trailEntry } from '../../contract/trail.ts';
import { workedExample } from '../../contract/worked-example.ts';
import { commandAnswers, commandRefusal } from './command-answers.ts';

/** Every form that Footing reads or writes, by name. */
const schemas: Record<string, z.ZodType> = {
  claim: claimDraft,
  report,
  figure,
  'trail-entry': trailEntry,
  'worked-example': workedExample,
  ...Object.fromEntries(Object.entries(commandAnswers).map(([name, answer]) => [`command.${name}`, answer])),
  refusal: commandRefusal,
  ...Object.fromEntries(
    Object.entries(computeMethods).flatMap(([name, { input, value }]) => [
      [`compute.${name}`, withMethod(name, input)],
      [`compute.${name}.value`, value],
    ]),
  ),
  ...Object.fromEntries(
    Object.entries(requests).flatMap(([name, { input, answer }]) => [
      [name, input],
      [`${name}.answer`, answer],
    ]),
  ),
};

export function schemaNames(): string[] {
  return Object.keys(schemas).sort();
}

export function schemaOf(name: string): object | null {
  const schema = Object.hasOwn(schemas, name) ? schemas[name] : undefined;
  if (!schema) return null;
  return z.toJSONSchema(schema, {
    io: 'input',
    unrepresentable: 'any',
    // A field that is not listed is refused on the way in, and never there on the way out.
    override: ({ jsonSchema }) => {
      if (jsonSchema.properties) jsonSchema.additionalProperties ??= false;
    },
  });
}

/** A compute request as it is sent: the inputs of the method beside its name. */
function withMethod(name: string, input: z.ZodObject): z.ZodType {
  return input.safeExtend({ method: z.literal(name) });
}
