import type { ExchangeKind, ExchangeSourceId } from '../../contract/carbon.ts';
import { exchangeSourceNames } from '../../quantities/exchange-source-names.ts';
import { henrySolubility } from './henry-solubility.ts';
import { humphreys2024 } from './humphreys2024.ts';
import { takahashi1993 } from './takahashi1993.ts';
import { weiss1974 } from './weiss1974.ts';

export interface ExchangeSource {
  label: string;
  kind: Exclude<ExchangeKind, 'record'>;
  needsSalinity: boolean;
  /** d ln pCO2/dT, 1/K. */
  slopePerK(temperatureC: number, salinity: number): number;
  /** Where the law was fitted or holds, °C, and how that is known. */
  range: { lowC: number; highC: number; origin: string };
}

const measured = { lowC: 2.1, highC: 24.5, origin: 'the span of the measurements, on one water of S 35.38' };

/**
 * The laws from which an exchange coefficient can be taken. A dissolved amount held fixed, the pressure rises as the
 * solubility falls, so that slope is −d ln K0/dT.
 */
export const exchangeSources: Readonly<Record<ExchangeSourceId, ExchangeSource>> = {
  weiss1974: {
    label: exchangeSourceNames.weiss1974,
    kind: 'solubility',
    needsSalinity: true,
    slopePerK: (temperatureC, salinity) => -weiss1974(temperatureC, salinity).dLnSolubilityPerK,
    range: { lowC: -1, highC: 40, origin: 'the span of the published tables (from memory)' },
  },
  'henry-vant-hoff': {
    label: exchangeSourceNames['henry-vant-hoff'],
    kind: 'solubility',
    needsSalinity: false,
    slopePerK: (temperatureC) => -henrySolubility(temperatureC).dLnSolubilityPerK,
    range: { lowC: 5, highC: 45, origin: '20 K about the reference of 25 °C, a choice made here: none is published' },
  },
  takahashi1993: {
    label: exchangeSourceNames.takahashi1993,
    kind: 'isochemical',
    needsSalinity: false,
    slopePerK: (temperatureC) => takahashi1993(temperatureC, 'linear'),
    range: measured,
  },
  'takahashi1993-quadratic': {
    label: exchangeSourceNames['takahashi1993-quadratic'],
    kind: 'isochemical',
    needsSalinity: false,
    slopePerK: (temperatureC) => takahashi1993(temperatureC, 'quadratic'),
    range: measured,
  },
  'humphreys2024-fit': {
    label: exchangeSourceNames['humphreys2024-fit'],
    kind: 'isochemical',
    needsSalinity: false,
    slopePerK: (temperatureC) => humphreys2024(temperatureC, 'fit'),
    range: measured,
  },
  'humphreys2024-enthalpy': {
    label: exchangeSourceNames['humphreys2024-enthalpy'],
    kind: 'isochemical',
    needsSalinity: false,
    slopePerK: (temperatureC) => humphreys2024(temperatureC, 'enthalpy'),
    range: { lowC: -2, highC: 35, origin: 'the temperatures of the surface ocean, a choice made here' },
  },
};
