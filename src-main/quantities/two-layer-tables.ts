import type { PublishedValue } from '../contract/finding.ts';
import type { TwoLayerRow } from './two-layer-row.ts';
import { cmip5PartOne, cmip5PartTwo } from './two-layer-tables-cmip5.ts';
import { cmip6Tuning } from './two-layer-tables-cmip6.ts';

/** Parameters by the names of the compute request `two-layer`, so that they can be handed to it. */
export interface TwoLayerModel {
  model: string;
  /** Effective forcing of four times CO2, W/m². */
  quadruplingWm2: number;
  /** Equilibrium warming for four times CO2 as printed, K: F/λ from more digits than the table shows. */
  quadruplingK: number;
  /** λ, W m⁻² K⁻¹; positive restores. */
  feedback: number;
  /** C of the surface layer, W yr m⁻² K⁻¹. */
  heatCapacity: number;
  /** C0 of the deep ocean, W yr m⁻² K⁻¹. */
  deepHeatCapacity: number;
  /** γ, W m⁻² K⁻¹. */
  exchange: number;
  /** ε of the deep ocean's heat uptake. */
  efficacy: number;
}

export interface TwoLayerTable {
  id: string;
  label: string;
  models: readonly TwoLayerModel[];
  edition: string;
  source: string;
  provenance: PublishedValue['provenance'];
  remark: string;
}

/** Published parameter sets, each fitted to the model's own run after an abrupt quadrupling of CO2. */
export const twoLayerTables: readonly TwoLayerTable[] = [
  {
    id: 'geoffroy-2013a-cmip5',
    label: 'CMIP5 models, without efficacy',
    models: cmip5PartOne.map(modelOf),
    edition: 'Geoffroy et al. 2013a',
    source: 'Journal of Climate 26, 1841–1857, tables 3 and 4',
    provenance: 'second-hand',
    remark: 'From public code that cites these tables. Part I of the paper: ε = 1.',
  },
  {
    id: 'geoffroy-2013b-cmip5',
    label: 'CMIP5 models, with efficacy',
    models: cmip5PartTwo.map(modelOf),
    edition: 'Geoffroy et al. 2013b',
    source: 'Journal of Climate 26, 1859–1876, table 1',
    provenance: 'second-hand',
    remark: 'From public code that cites this table.',
  },
  {
    id: 'ar6-cmip6',
    label: 'CMIP6 models, with efficacy',
    models: cmip6Tuning.map(modelOf),
    edition: 'IPCC AR6 WG1 (2021)',
    source: 'Chapter 7, supplementary material: two-layer tuning',
    provenance: 'seen',
    remark: 'In a public copy of the tuning; digits rounded.',
  },
];

function modelOf([
  model,
  quadruplingWm2,
  feedback,
  quadruplingK,
  heatCapacity,
  deepHeatCapacity,
  exchange,
  efficacy,
]: TwoLayerRow): TwoLayerModel {
  return {
    model,
    quadruplingWm2,
    quadruplingK,
    feedback,
    heatCapacity,
    deepHeatCapacity,
    exchange,
    efficacy,
  };
}
