import type { SeriesValues } from '../../contract/series.ts';
import { isUncertaintyName } from '../delimited/recognise-value-columns.ts';
import { nameOf, stemOf } from '../name-of.ts';
import type { ReadSeries } from '../reader.ts';
import { recogniseMeaning, statedUnit } from '../recognise-meaning.ts';
import { type Variable, type VariableFile, textOf } from './variable-file.ts';

const tellingAttributes = [
  'title',
  'comment',
  'summary',
  'description',
  'reference_period',
  'base_period',
  'climatology',
];
const maxLabelLength = 200;

/** What a variable is, as far as its attributes, those of the file and its values say. */
export function describeVariable(
  file: VariableFile,
  { name, attributes }: Variable,
  values: SeriesValues,
): { series: Omit<ReadSeries, 'step' | 'partialYears' | 'isMain' | 'values'>; notes: string[] } {
  const longName = textOf(attributes, 'long_name') || textOf(attributes, 'standard_name') || name;
  const unit = unitOf(textOf(attributes, 'units'), textOf(attributes, 'standard_name'));
  const preamble = tellingAttributes
    .flatMap((key) =>
      [textOf(file.attributes, key), textOf(attributes, key)].filter(Boolean).map((text) => `${key}: ${text}`),
    )
    .join('\n');
  const column = unit === '' ? longName : `${longName} (${unit})`;
  const { notes, isCelsiusDifference, ...meaning } = recogniseMeaning(
    { column, preamble, fileName: file.fileName },
    values,
  );
  const isUncertainty = isUncertaintyName(name.replaceAll('_', ' ')) || /^uncertainty\b/i.test(longName);
  // What is stated in joules or metres is no temperature, whatever its name says of anomalies.
  const isOtherUnit = unit !== '' && statedUnit(column.replaceAll('_', ' ')) === null;
  return {
    series: {
      key: nameOf(name) || 'variable',
      suggestedName: nameOf(`${stemOf(file.fileName).slice(0, 80)} ${name}`),
      label: `${longName} (${name})`.slice(0, maxLabelLength),
      ...meaning,
      ...(isUncertainty || isOtherUnit
        ? { quantity: 'other' as const, agent: null, baseline: null, baselineFrom: 'not needed' as const }
        : {}),
      ...(isOtherUnit ? { unit, unitFrom: 'file' as const } : {}),
    },
    notes: [
      ...(isOtherUnit ? [] : notes),
      ...(isCelsiusDifference
        ? [`“${name}” is in °C in the file; differences are the same in K, so the unit is K.`]
        : []),
    ],
  };
}

/** CF writes a mole fraction in parts per million as 1e-6; a number without dimension has the unit 1. */
function unitOf(units: string, standardName: string): string {
  const plain = units.trim().slice(0, 40);
  if (/mole_fraction/.test(standardName)) {
    if (plain === '1e-6' || plain === '1.e-6') return 'ppm';
    if (plain === '1e-9' || plain === '1.e-9') return 'ppb';
  }
  return plain === '1' ? '' : plain;
}
