import { delimited } from './delimited/delimited.ts';
import { forcingTable } from './forcing-table.ts';
import { gistemp } from './gistemp.ts';
import { hadcrut5 } from './hadcrut5.ts';
import { igccGmst } from './igcc-gmst.ts';
import { noaaGml } from './noaa-gml.ts';
import type { Reader } from './reader.ts';
import { vegaTables } from './vega-tables.ts';

/** Every reader; where several are equally sure of a file, the first is taken. */
export const readers: readonly Reader[] = [noaaGml, gistemp, hadcrut5, forcingTable, igccGmst, vegaTables, delimited];
