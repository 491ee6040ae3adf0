import { expect, it } from 'vitest';
import {
  gasConstant,
  molPerLAtm,
  molPerM3Pa,
  waterAirRatio,
  type MolPerM3Pa,
} from '../../../src-main/quantities/solubility-units.ts';
import { expectClose } from '../../helpers/close.ts';

const co2 = 3.3e-4 as MolPerM3Pa;

it('turns mol m⁻³ Pa⁻¹ into mol L⁻¹ atm⁻¹ and back', () => {
  expectClose(molPerLAtm(co2), 0.033437, { rel: 0, abs: 5e-7, why: 'half a unit of the last digit' });
  expectClose(molPerM3Pa(molPerLAtm(co2)), co2, { rel: 1e-15, abs: 0, why: 'one multiplication and one division' });
});

it('has the ratio of concentrations grow with temperature for one Henry’s constant', () => {
  expectClose(waterAirRatio(co2, 298.15), 0.81806, { rel: 0, abs: 5e-6, why: 'half a unit of the last digit' });
  expectClose(waterAirRatio(co2, 596.3), 1.63612, { rel: 0, abs: 1e-5, why: 'twice the above' });
});

it('has the gas constant of the SI: Avogadro’s times Boltzmann’s', () => {
  expectClose(gasConstant, 6.02214076e23 * 1.380649e-23, { rel: 1e-15, abs: 0, why: 'one product' });
});

it('knows no unit at run time: a solubility is a plain number', () => {
  expect(JSON.stringify({ co2 })).toBe('{"co2":0.00033}');
});
