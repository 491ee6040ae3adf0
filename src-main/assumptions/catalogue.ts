import type { CatalogueEntry } from '../contract/result.ts';
import { anchorYear } from './anchor-year.ts';
import type { Assumption } from './assumption.ts';
import { independentErrors } from './independent-errors.ts';
import { likeForLike } from './like-for-like.ts';
import { omittedForcings } from './omitted-forcings.ts';
import { quotedRange } from './quoted-range.ts';
import { rSquared } from './r-squared.ts';
import { transientAsEquilibrium } from './transient-as-equilibrium.ts';
import { window } from './window.ts';
import { zeroIntercept } from './zero-intercept.ts';

/** All assumptions, in the order of the catalogue. A new one is a file and a line here. */
export const catalogue: readonly Assumption[] = [
  zeroIntercept,
  anchorYear,
  window,
  independentErrors,
  rSquared,
  omittedForcings,
  transientAsEquilibrium,
  likeForLike,
  quotedRange,
];

/** The catalogue as plain data, without the tests. */
export const catalogueEntries: readonly CatalogueEntry[] = catalogue.map(
  ({ id, group, title, shortTitle, explanation, method, formula, needs, source }) => ({
    id,
    group,
    title,
    shortTitle,
    explanation,
    method,
    formula,
    needs,
    source,
  }),
);
