import type { SectionId } from '../../src-main/contract/project.ts';

/** The seven sections of a sheet, in the order in which a claim is checked. */
export const sectionNames: Readonly<Record<SectionId, string>> = {
  statement: 'Statement',
  arithmetic: 'Arithmetic',
  data: 'Data',
  recomputation: 'Recomputation',
  assumptions: 'Assumptions',
  robustness: 'Robustness',
  finding: 'Finding',
};
