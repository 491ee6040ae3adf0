import { expect, it } from 'vitest';
import {
  gtCFromGtCO2,
  gtCFromPpm,
  gtCO2FromGtC,
  gtCO2PerGtC,
  gtCO2PerGtCWholeMasses,
  gtCPerPpm,
  otherGtCPerPpm,
  ppmFromGtC,
} from '../../../src-main/quantities/carbon-units.ts';
import { expectClose } from '../../helpers/close.ts';

const printed = (digits: number) => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});
const near = { rel: 1e-15, abs: 0, why: 'one multiplication and one division' };

it('1 ppm is 2.124 GtC, 7.782 GtCO2 with 3.664 and 7.788 with 44/12', () => {
  expect(gtCFromPpm(1)).toBe(2.124);
  expectClose(gtCO2FromGtC(gtCFromPpm(1)), 7.782, printed(3));
  expectClose(gtCO2FromGtC(gtCFromPpm(1), gtCO2PerGtCWholeMasses), 7.788, printed(3));
});

it('the factors follow from molar masses', () => {
  // Standard atomic weights: C 12.011, O 15.999.
  expectClose(44.009 / 12.011, 3.664058, printed(6));
  expectClose(gtCO2PerGtC, 44.009 / 12.011, printed(3));
  expectClose(gtCO2PerGtCWholeMasses, 3.666667, printed(6));
});

it('2.124 lies 0.3 % below the factor from the mass of dry air', () => {
  // 5.1352e18 kg of dry air (Trenberth & Smith 2005, from memory) of 28.9647 g/mol.
  const fromDryAir = ((5.1352e21 / 28.9647) * 1e-6 * 12.011) / 1e15;
  expectClose(fromDryAir, 2.1295, printed(4));
  expectClose(gtCPerPpm, fromDryAir, { rel: 0.003, abs: 0, why: 'CO2 in the stratosphere lags behind' });
  expect(otherGtCPerPpm.map((other) => other.gtCPerPpm)).toEqual([2.12, 2.123, 2.13]);
});

it('there and back, with either factor', () => {
  for (const factor of [2.124, 2.13]) expectClose(ppmFromGtC(gtCFromPpm(137, factor), factor), 137, near);
  for (const factor of [3.664, 44 / 12]) expectClose(gtCFromGtCO2(gtCO2FromGtC(9.7, factor), factor), 9.7, near);
});
