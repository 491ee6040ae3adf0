import type { PublishedDefinition } from '../contract/published.ts';

const ar6 = 'IPCC AR6 WG1 (2021)';
const glossary = 'Annex VII (glossary) and chapter 7, §7.5';

/** What AR6 means by its quantities, in our words; recalled, and held against the text of chapter 7. */
export const publishedDefinitions: readonly PublishedDefinition[] = [
  {
    quantity: 'equilibrium-climate-sensitivity',
    edition: ar6,
    text: 'How far global mean surface air temperature rises, in the end, when CO₂ is doubled from its level before industry and held there. Ice sheets and other slow parts of the Earth system are left as they are. In practice it is estimated as −F2x/α.',
    source: glossary,
    provenance: 'memory',
  },
  {
    quantity: 'effective-climate-sensitivity',
    edition: ar6,
    text: 'The same rise, extrapolated from a climate that has not settled by the feedback it shows: for models, from a line through 150 years after an abrupt quadrupling of CO₂; for the historical record, from its energy budget.',
    source: glossary,
    provenance: 'memory',
  },
  {
    quantity: 'transient-climate-response',
    edition: ar6,
    text: 'How far global mean surface air temperature has risen when CO₂ doubles while it grows by 1 % a year, compounded: the mean of the 20 years around year 70. At that rate CO₂ has doubled after 69.66 years.',
    source: glossary,
    provenance: 'memory',
  },
];
