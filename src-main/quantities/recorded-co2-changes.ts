/** A change of CO2 with a change of temperature that a record of the past shows for the whole system. */
export interface RecordedCo2Change {
  label: string;
  fromPpm: number;
  toPpm: number;
  warmingK: number;
  source: string;
  provenance: 'memory';
}

const iceCores = 'ice-core CO2; all values from memory';

/**
 * From the last glacial maximum to the pre-industrial Holocene, under three readings. In all of them warming and CO2 drove
 * each other, with ice sheets, ocean circulation and biology: an upper bound for what warming alone releases.
 */
export const recordedCo2Changes: readonly RecordedCo2Change[] = [
  {
    label: 'Glacial to interglacial, 190 to 280 ppm, 6.1 K global',
    fromPpm: 190,
    toPpm: 280,
    warmingK: 6.1,
    source: `Tierney et al. 2020 for the temperature; ${iceCores}`,
    provenance: 'memory',
  },
  {
    label: 'Glacial to interglacial, 180 to 280 ppm, 5 K global',
    fromPpm: 180,
    toPpm: 280,
    warmingK: 5,
    source: `IPCC AR6, lower end of 5–7 K; ${iceCores}`,
    provenance: 'memory',
  },
  {
    label: 'Glacial to interglacial, 180 to 280 ppm, 9 K in Antarctica',
    fromPpm: 180,
    toPpm: 280,
    warmingK: 9,
    source: `Antarctic temperature, not global; ${iceCores}`,
    provenance: 'memory',
  },
];
