/** Measured times as ratios: each case beside a peer that does the least that could do, in the same run. */
import { caseOfOpening } from './opening-a-project.ts';
import { caseOfRecomputing } from './recomputing-a-claim.ts';
import { printRatios } from './print-ratios.ts';

await printRatios([caseOfOpening, caseOfRecomputing]);
