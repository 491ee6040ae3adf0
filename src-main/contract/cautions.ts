/** Shown where a finding is made and in every report. */
export const cautions = [
  'A finding is about a number and the assumptions under it, never about a person.',
  'A recomputation on different data, or on a later version of the same data, is not evidence of an error by the source. The data versions used are listed side by side.',
  'Published ranges are quoted with their edition; a newer assessment may exist.',
  'This is not legal advice. Before a finding about an identifiable person or body is published, follow your organisation’s editorial and legal review; where it goes to a court or a regulator, the rules of that body and a qualified expert come first.',
  'Engineering, flood, heat and insurance decisions need locally applicable codes and licensed practitioners. A global-mean sensitivity is no design value.',
] as const;
