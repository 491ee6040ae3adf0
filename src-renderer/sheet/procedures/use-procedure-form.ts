import { reactive, shallowRef, type ShallowRef } from 'vue';
import type { Procedure } from '../../../src-main/contract/procedure.ts';
import type { ErrorAnswer } from '../../../src-main/contract/requests.ts';
import type { UncertainInput } from '../../../src-main/contract/uncertain-input.ts';
import { draftOfInput, inputDraftProblem, inputOfDraft, type InputDraft } from '../../components/input-draft.ts';
import { useClaimSheet } from '../use-claim-sheet.ts';

interface Field<Key extends string> {
  key: Key;
  label: string;
  unit: string;
  isOptional?: boolean;
}

interface ProcedureForm<Key extends string> {
  rows: (Field<Key> & { draft: InputDraft })[];
  error: ShallowRef<ErrorAnswer | null>;
  /** What has been written, once nothing keeps it from being used; null, with the error set, until then. */
  inputs(): Record<Key, UncertainInput | null> | null;
  keep(procedure: Procedure): Promise<void>;
  fillIn(values: Partial<Record<Key, UncertainInput | null>>): void;
}

/** A procedure that works from a few figures with their ranges: written first, kept when the reviewer says so. */
export function useProcedureForm<Key extends string>(
  fields: readonly Field<Key>[],
  stored: Partial<Record<Key, UncertainInput | null>>,
): ProcedureForm<Key> {
  const { change } = useClaimSheet();
  const error = shallowRef<ErrorAnswer | null>(null);
  const rows = fields.map((field) => ({ ...field, draft: reactive(draftOfInput(stored[field.key])) }));

  function problemOf({ label, isOptional, draft }: (typeof rows)[number]): ErrorAnswer | null {
    if (inputOfDraft(draft) || isOptional) return inputDraftProblem(label, draft);
    return {
      kind: 'InputError',
      code: 'input-incomplete',
      where: label,
      expected: 'a number',
      received: 'nothing',
      hint: '',
    };
  }

  return {
    rows,
    error,
    inputs() {
      error.value = rows.map(problemOf).find((problem) => problem !== null) ?? null;
      if (error.value) return null;
      return Object.fromEntries(rows.map(({ key, draft }) => [key, inputOfDraft(draft)])) as Record<
        Key,
        UncertainInput | null
      >;
    },
    async keep(procedure) {
      error.value = await change({ procedure });
    },
    fillIn(values) {
      for (const { key, draft } of rows) {
        if (values[key]) Object.assign(draft, draftOfInput(values[key]));
      }
    },
  };
}
