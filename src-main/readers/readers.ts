import { berkeleyEarth } from './berkeley-earth.ts';
import { carbonBudget } from './carbon-budget.ts';
import { delimited } from './delimited/delimited.ts';
import { forcingTable } from './forcing-table.ts';
import { gistemp } from './gistemp.ts';
import { hadcrut5 } from './hadcrut5.ts';
import { iceCore } from './ice-core.ts';
import { igccGmst } from './igcc-gmst.ts';
import { noaaGml } from './noaa-gml.ts';
import { noaaGlobalTemp } from './noaa-global-temp.ts';
import { oceanHeatContent } from './ocean-heat-content.ts';
import type { Reader } from './reader.ts';
import { rss } from './rss.ts';
import { uah } from './uah.ts';
import { vegaTables } from './vega-tables.ts';

/** Every reader; where several are equally sure of a file, the first is taken. */
export const readers: readonly Reader[] = [
  noaaGml,
  gistemp,
  hadcrut5,
  noaaGlobalTemp,
  berkeleyEarth,
  igccGmst,
  forcingTable,
  oceanHeatContent,
  uah,
  rss,
  iceCore,
  carbonBudget,
  vegaTables,
  delimited,
];
