import { inject, provide, shallowRef, watch, type InjectionKey, type Ref, type ShallowRef } from 'vue';
import type { Claim } from '../../src-main/contract/claim.ts';
import type { ClaimView } from '../../src-main/contract/project.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { ErrorAnswer, RequestAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import { useSession } from '../state/use-session.ts';

/** Requests that answer with the whole sheet. */
type SheetRequest = {
  [Name in RequestName]: RequestAnswer<Name> extends ClaimView ? Name : never;
}[RequestName];

type OwnInput<Name extends SheetRequest> = Omit<RequestInput<Name>, 'claimId'>;

export interface ClaimSheetStore {
  view: Readonly<ShallowRef<ClaimView | null>>;
  error: Readonly<ShallowRef<ErrorAnswer | null>>;
  /** Sends a request about this claim and takes its answer as the new sheet; the error, or null when it went well. */
  ask<Name extends SheetRequest>(name: Name, input: OwnInput<Name>): Promise<ErrorAnswer | null>;
  /** Changes fields of the claim. */
  change(patch: Partial<Omit<Claim, 'id'>>): Promise<ErrorAnswer | null>;
}

const sheetKey: InjectionKey<ClaimSheetStore> = Symbol('claim sheet');

/** The sheet that the calling section is part of. */
export function useClaimSheet(): ClaimSheetStore {
  const store = inject(sheetKey);
  if (!store) throw new Error('useClaimSheet: this part of the screen is not inside a sheet');
  return store;
}

/** Loads the sheet of a claim and keeps it fresh: also when an undo changes the project from elsewhere. */
export function provideClaimSheet(claimId: number): ClaimSheetStore {
  const session = useSession();
  const view = shallowRef<ClaimView | null>(null);
  const error = shallowRef<ErrorAnswer | null>(null);
  let newest = 0;

  const ask: ClaimSheetStore['ask'] = async (name, input) => {
    const number = (newest += 1);
    const answer = await session.ask(name, { ...input, claimId } as RequestInput<typeof name>);
    if (answer.ok && number === newest) view.value = answer.value as ClaimView;
    if (name === 'claim.view') error.value = answer.ok ? null : answer.error;
    return answer.ok ? null : answer.error;
  };
  const store: ClaimSheetStore = { view, error, ask, change: (patch) => ask('claim.update', { change: patch }) };

  watch(
    () => session.project.value?.head.hash,
    (hash, before) => {
      const known = view.value?.trail[0]?.hash;
      if (before === undefined || hash !== known) void ask('claim.view', {});
    },
    { immediate: true },
  );
  provide(sheetKey, store);
  return store;
}

/** Runs something on every change of a source, starting now: a form's own copy of what is stored. */
export function useOwnCopy<Source, Copy>(source: () => Source, copy: (value: Source) => Copy): Ref<Copy> {
  const own = shallowRef(copy(source())) as ShallowRef<Copy>;
  watch(source, (value) => (own.value = copy(value)));
  return own;
}
