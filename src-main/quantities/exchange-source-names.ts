import type { ExchangeSourceId } from '../contract/carbon.ts';

/** The laws from which an exchange coefficient of CO2 can be taken, by name. */
export const exchangeSourceNames: Readonly<Record<ExchangeSourceId, string>> = {
  weiss1974: 'Weiss 1974, solubility',
  'henry-vant-hoff': 'Henry and van ’t Hoff, solubility in pure water',
  takahashi1993: 'Takahashi 1993, linear',
  'takahashi1993-quadratic': 'Takahashi 1993, quadratic',
  'humphreys2024-fit': 'Humphreys 2024, fitted to Takahashi 1993',
  'humphreys2024-enthalpy': 'Humphreys 2024, from reaction enthalpies',
};
