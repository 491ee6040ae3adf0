import type { Procedure } from '../../src-main/contract/procedure.ts';
import ProcedureSeriesForm from '../../src-renderer/sheet/ProcedureSeriesForm.vue';
import { button, field, settled, type Screen } from './mount-screen.ts';
import { inventedSheet, mountOnSheet } from './sheet-screen.ts';

export interface ProcedureForm extends Screen {
  /** The control that stands beside this label, or is described so in a table. */
  control(name: string): ReturnType<typeof field>;
  /** Writes into controls by their names, in this order. */
  fill(values: Readonly<Record<string, string>>): Promise<void>;
  press(name: string): Promise<void>;
  /** Its text. */
  shown(name: string): string;
  /** Controls that can be worked, help left aside. */
  workable(): string[];
  /** Every procedure that was kept. */
  kept(): unknown[];
  refusal(): string;
}

/** What is written into a form that is then not kept, and what it says. */
export interface Refused {
  name: string;
  change: Readonly<Record<string, string>>;
  says: RegExp;
}

/** The choice of procedure on an invented sheet: with one stored, or with a kind chosen that is not filled in yet. */
export async function procedureForm(
  stored: Procedure | null,
  options: { choose?: Procedure['kind']; isFrozen?: boolean } = {},
): Promise<ProcedureForm> {
  const sheet = inventedSheet({ isFrozen: options.isFrozen ?? false });
  const mounted = await mountOnSheet(ProcedureSeriesForm, {
    view: { ...sheet, claim: { ...sheet.claim, procedure: stored } },
  });
  const { screen, host } = mounted;
  const control: ProcedureForm['control'] = (name) => {
    const inTable = screen.find(`[aria-label="${name}"]`);
    return inTable.exists() ? inTable : field(screen, name);
  };
  if (options.choose) {
    await control('How the source gets the number').setValue(options.choose);
    await settled();
  }
  return {
    ...mounted,
    control,
    async fill(values) {
      for (const [name, value] of Object.entries(values)) await control(name).setValue(value);
    },
    async press(name) {
      await button(screen, name).trigger('click');
      await settled();
    },
    shown: (name) => (control(name).element as HTMLInputElement).value,
    workable: () =>
      screen
        .findAll('input, select, textarea, button:not([aria-expanded])')
        .filter((one) => one.attributes('disabled') === undefined)
        .map((one) => one.attributes('aria-label') ?? one.attributes('id') ?? one.text()),
    kept: () => host.inputs('claim.update').map(({ change }) => change.procedure),
    refusal: () => screen.get('[role=alert]').text(),
  };
}
