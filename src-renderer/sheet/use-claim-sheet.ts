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
  let nUnderWay = 0;

  const ask: ClaimSheetStore['ask'] = async (name, input) => {
    const number = (newest += 1);
    nUnderWay += 1;
    const answer = await session.ask(name, { ...input, claimId } as RequestInput<typeof name>);
    nUnderWay -= 1;
    if (answer.ok && number === newest) view.value = answer.value;
    if (name === 'claim.view') error.value = answer.ok ? null : answer.error;
    else if (view.value?.trail[0]?.hash !== session.project.value?.head.hash) catchUp();
    return answer.ok ? null : answer.error;
  };
  /** Requests of the sheet bring the new sheet themselves. */
  const catchUp = () => {
    if (nUnderWay === 0) void ask('claim.view', {});
  };
  const store: ClaimSheetStore = { view, error, ask, change: (patch) => ask('claim.update', { change: patch }) };

  watch(() => session.project.value?.head.hash, catchUp, { immediate: true });
  provide(sheetKey, store);
  return store;
}

/** A form's own copy of a stored text. It follows what is stored, but never over words that are still being written. */
export function useOwnCopy<Text extends string | null>(stored: () => Text): Ref<Text> {
  const own = shallowRef(stored()) as ShallowRef<Text>;
  watch(stored, (now, before) => {
    if (own.value === before) own.value = now;
  });
  return own;
}
