import type { ClaimUnit } from '../../contract/stated.ts';
import { InputError } from '../../errors.ts';

/** @throws InputError `unit-mismatch` when a procedure gives another unit than the statement names */
export function checkStatedUnit(procedure: string, stated: ClaimUnit, gives: ClaimUnit): void {
  if (stated === gives) return;
  throw new InputError({
    code: 'unit-mismatch',
    where: `procedure ${procedure}`,
    expected: `a statement in ${gives}`,
    received: `a statement in ${stated === '1' ? 'a plain number' : stated}`,
    hint: 'Correct the unit of the statement, or choose another procedure.',
  });
}
