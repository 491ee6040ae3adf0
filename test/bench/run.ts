/**
 * Measured times as ratios: each case beside peers in the same run. Ends with status 1 when a target was missed or the
 * two sides came to different values.
 */
import { caseOfBootstrapping } from './bootstrapping-a-slope.ts';
import { caseOfEnergyBudget } from './drawing-an-energy-budget.ts';
import { caseOfFitting } from './fitting-a-line.ts';
import { caseOfOpening } from './opening-a-project.ts';
import { printRatios } from './print-ratios.ts';
import { caseOfRecomputing } from './recomputing-a-claim.ts';
import { caseOfEnsemble } from './running-an-ensemble.ts';
import { caseOfSweepingMonths } from './sweeping-months.ts';
import { caseOfSweeping } from './sweeping-windows.ts';

const isAllWell = await printRatios([
  caseOfOpening,
  caseOfRecomputing,
  caseOfFitting,
  caseOfSweeping,
  caseOfSweepingMonths,
  caseOfBootstrapping,
  caseOfEnergyBudget,
  caseOfEnsemble,
]);
if (!isAllWell) process.exitCode = 1;
