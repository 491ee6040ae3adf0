import type { LikelihoodMeaning } from '../contract/published.ts';

/**
 * What the likelihood words of the IPCC mean, in per cent; both ends belong to the range, but "more likely than not" begins
 * above 50. A confidence word (very low … very high) is another thing: it weighs evidence and agreement and is no
 * probability.
 *
 * Source: Mastrandrea et al. 2010, guidance note on the treatment of uncertainties; second-hand.
 */
export const likelihoods: readonly LikelihoodMeaning[] = [
  { term: 'virtually certain', lowPercent: 99, highPercent: 100 },
  { term: 'extremely likely', lowPercent: 95, highPercent: 100 },
  { term: 'very likely', lowPercent: 90, highPercent: 100 },
  { term: 'likely', lowPercent: 66, highPercent: 100 },
  { term: 'more likely than not', lowPercent: 50, highPercent: 100 },
  { term: 'about as likely as not', lowPercent: 33, highPercent: 66 },
  { term: 'unlikely', lowPercent: 0, highPercent: 33 },
  { term: 'very unlikely', lowPercent: 0, highPercent: 10 },
  { term: 'extremely unlikely', lowPercent: 0, highPercent: 5 },
  { term: 'exceptionally unlikely', lowPercent: 0, highPercent: 1 },
];
