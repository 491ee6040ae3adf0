import type { PublishedQuantityId, QuantityId } from '../contract/primitives.ts';
import type { ClaimUnit } from '../contract/stated.ts';

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
  'effective-radiative-forcing': {
    label: 'effective radiative forcing',
    symbol: 'ERF',
    definition:
      'Change of the net downward flux at the top of the atmosphere after the atmosphere has adjusted, surface temperature left as it was.',
    units: ['W/m²'],
  },
  'radiative-forcing': {
    label: 'radiative forcing',
    symbol: 'RF',
    definition:
      'The older measure: change of the net downward flux after the temperatures of the stratosphere alone have adjusted.',
    units: ['W/m²'],
  },
  'climate-feedback': {
    label: 'climate feedback parameter',
    symbol: 'λ',
    definition:
      'How much more energy the planet gives off for each degree of warming; positive when it restores the balance. The negative of AR6’s α.',
    units: ['W/m² per K'],
  },
  'co2-change': {
    label: 'change of CO₂ in the air',
    symbol: 'ΔC',
    definition: 'By how much the mole fraction of CO₂ in dry air rises or falls.',
    units: ['ppm'],
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

/** The kinds of sensitivity, from the slope of a record to the settled climate. */
export const sensitivities: readonly PublishedQuantityId[] = [
  'apparent-sensitivity',
  'transient-climate-response',
  'effective-climate-sensitivity',
  'equilibrium-climate-sensitivity',
];

/** The same for all that publications state; their units are those of the table of published values. */
export const publishedQuantityNames: Readonly<
  Record<PublishedQuantityId, Omit<QuantityName, 'units'> & { units: readonly string[] }>
> = {
  ...quantityNames,
  'feedback-parameter': {
    label: 'net climate feedback',
    symbol: 'α',
    definition:
      'Change of the net downward flux at the top of the atmosphere per kelvin of surface warming. In AR6’s sign a negative one restores; λ = −α.',
    units: ['W/m² per K'],
  },
  'feedback-term': {
    label: 'feedback term',
    symbol: 'αᵢ',
    definition: 'The part of the net climate feedback that one process makes up.',
    units: ['W/m² per K'],
  },
  'pattern-effect': {
    label: 'pattern effect',
    symbol: 'α′',
    definition:
      'How much less restoring the feedback of the settled climate is than that of the historical period, because the pattern of warming changes.',
    units: ['W/m² per K'],
  },
  'ocean-uptake-damping': {
    label: 'ocean heat uptake damping',
    symbol: 'κ',
    definition: 'Heat taken up by the ocean per kelvin of surface warming, its efficacy included, while forcing rises.',
    units: ['W/m² per K'],
  },
  'effective-doubling-forcing': {
    label: 'effective forcing of a CO₂ doubling',
    symbol: 'F₂ₓ',
    definition:
      'Effective radiative forcing of doubled CO₂: after the atmosphere has adjusted, before the surface warms.',
    units: ['W/m²'],
  },
  'adjusted-doubling-forcing': {
    label: 'stratospherically adjusted forcing of a CO₂ doubling',
    symbol: 'F₂ₓ (adjusted)',
    definition: 'Radiative forcing of doubled CO₂ after the temperatures of the stratosphere alone have adjusted.',
    units: ['W/m²'],
  },
  'tropospheric-adjustment': {
    label: 'tropospheric adjustment',
    symbol: 'adjustment',
    definition: 'By how much the effective forcing of an agent differs from its stratospherically adjusted one.',
    units: ['%'],
  },
  'energy-imbalance': {
    label: 'Earth’s energy imbalance',
    symbol: 'N',
    definition: 'Net downward flux at the top of the atmosphere: heat that the planet takes up.',
    units: ['W/m²'],
  },
  'energy-inventory': {
    label: 'Earth’s energy gain',
    symbol: 'ΔH',
    definition: 'Heat that ocean, land, ice and air have taken up over a period; 1 ZJ = 10²¹ J.',
    units: ['ZJ'],
  },
  'inventory-share': {
    label: 'share of the energy gain',
    symbol: 'share',
    definition: 'The part of the energy gain that one of ocean, land, ice and air took up.',
    units: ['%'],
  },
  warming: {
    label: 'observed warming',
    symbol: 'ΔT',
    definition: 'Change of mean surface temperature between two periods, as observed.',
    units: ['K'],
  },
  'attributed-warming': {
    label: 'attributed warming',
    symbol: 'ΔT (cause)',
    definition: 'The part of a warming that is assessed to come from one cause.',
    units: ['K'],
  },
};
