import type { PublishedValue } from '../../contract/finding.ts';
import { publishedQuantityId } from '../../contract/primitives.ts';
import { decimalsOf, formatInterval, formatNumber } from '../../quantities/notation.ts';
import { publishedQuantityNames } from '../../quantities/quantity-names.ts';
import { oneOf, type Command } from './command.ts';
import { textTable } from './text-table.ts';

export const publishedCommand: Command = {
  name: 'published',
  usage: '[WORD…]',
  summary: 'published values that hold all of the words, with the ids that a finding quotes',
  examples: ['published', 'published aerosol 2014', 'published --quantity transient-climate-response'],
  nPositionals: { min: 0, max: 20 },
  options: { quantity: { value: 'Q', help: `only of this quantity: ${publishedQuantityId.options.join(', ')}` } },
  async run(args, tools) {
    const quantity = oneOf(args, 'quantity', publishedQuantityId.options);
    const wanted = args.positionals.map(plain);
    const { values } = await tools.ask('published.list', {});
    const found = values.filter((value) => {
      const text = plain(`${JSON.stringify(value)} ${publishedQuantityNames[value.quantity].label}`);
      return (quantity === undefined || value.quantity === quantity) && wanted.every((word) => text.includes(word));
    });
    const rows = found.map((value) => [
      value.id,
      numbersOf(value),
      value.unit,
      `${value.edition}, ${value.provenance}`,
    ]);
    return { json: found, lines: found.length === 0 ? ['Nothing published is found by this.'] : textTable(rows) };
  },
};

function numbersOf({ best, ranges }: PublishedValue): string {
  const decimals = decimalsOf([best, ...ranges.flatMap(({ interval: { low, high } }) => [low, high])]);
  const spans = ranges.map(({ interval, words }) => `${words} ${formatInterval(interval, '', decimals)}`);
  return [best === null ? '' : formatNumber(best, decimals), ...spans].filter(Boolean).join('; ');
}

/** CO₂ is found by co2. */
function plain(text: string): string {
  return text.normalize('NFKD').toLowerCase();
}
