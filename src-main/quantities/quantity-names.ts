import type { ClaimUnit } from '../contract/stated.ts';
import type { QuantityId } from '../contract/primitives.ts';

export interface QuantityName {
  label: string;
  /** For axes and table cells. */
  symbol: string;
  /** One line, for readers who do not know the term. */
  definition: string;
  /** Units in which a claim can state it. */
  units: readonly ClaimUnit[];
}

const perDoubling = ['K per doubling', '°F per doubling'] as const;

/** What each kind of stated number is called and what it means. */
export const quantityNames: Readonly<Record<QuantityId, QuantityName>> = {
  'apparent-sensitivity': {
    label: 'apparent sensitivity',
    symbol: 'b·ln 2',
    definition:
      'Slope of observed warming on the logarithm of CO₂, times ln 2. It is none of ECS, effective sensitivity or TCR until it is shown what it may stand for.',
    units: [...perDoubling, 'K per e-folding'],
  },
  'effective-climate-sensitivity': {
    label: 'effective climate sensitivity',
    symbol: 'EffCS',
    definition:
      'Equilibrium warming for doubled CO₂ if the climate feedback found over a given period or experiment stayed as it is.',
    units: perDoubling,
  },
  'equilibrium-climate-sensitivity': {
    label: 'equilibrium climate sensitivity',
    symbol: 'ECS',
    definition:
      'Change of global mean surface air temperature once the climate has settled after CO₂ was doubled and held, slow ice-sheet and Earth-system feedbacks left out.',
    units: perDoubling,
  },
  'transient-climate-response': {
    label: 'transient climate response',
    symbol: 'TCR',
    definition:
      'Warming at the time CO₂ has doubled while it rises by 1 % a year, as a 20-year mean around year 70; the oceans are still taking up heat.',
    units: perDoubling,
  },
  trend: {
    label: 'temperature trend',
    symbol: 'trend',
    definition: 'Slope of a straight line through temperature against time.',
    units: ['K per decade', 'K per year'],
  },
  'radiative-forcing': {
    label: 'radiative forcing',
    symbol: 'F',
    definition:
      'Change of the energy balance at the top of the atmosphere that a change of composition imposes, before the surface has warmed.',
    units: ['W/m²'],
  },
  'climate-feedback': {
    label: 'climate feedback parameter',
    symbol: 'λ',
    definition:
      'How much more energy the planet gives off for each degree of warming; positive when it restores the balance. The negative of AR6’s α.',
    units: ['W/m² per K'],
  },
  share: {
    label: 'share of a change',
    symbol: 'share',
    definition:
      'A part of a warming or forcing over the whole of it, in per cent. Parts of opposite sign make shares above 100 %.',
    units: ['%'],
  },
  ratio: {
    label: 'ratio of two stated numbers',
    symbol: 'ratio',
    definition: 'A number obtained by dividing one stated number by another.',
    units: [
      '1',
      '%',
      'ppm',
      'W/m²',
      'W/m² per K',
      'K per doubling',
      '°F per doubling',
      'K per e-folding',
      'K per decade',
      'K per year',
    ],
  },
};

/** Kinds of number that say how much the planet warms for more CO2. */
export function isSensitivity(quantity: QuantityId): boolean {
  return quantityNames[quantity].units.includes('K per doubling') && quantity !== 'ratio';
}
