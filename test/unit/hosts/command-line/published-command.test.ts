import { describe, expect, it } from 'vitest';
import { publishedHandlers } from '../../../../src-main/handlers/published.ts';
import type { CommandTools } from '../../../../src-main/hosts/command-line/command.ts';
import { publishedCommand } from '../../../../src-main/hosts/command-line/published-command.ts';

async function published(words: string[], quantity?: string) {
  const library = publishedHandlers['published.list'];
  const tools = { ask: async () => library({}, {} as never) } as unknown as CommandTools;
  const { json, lines } = await publishedCommand.run(
    {
      positionals: words,
      option: (name) => (name === 'quantity' ? quantity : undefined),
      options: () => [],
      has: () => false,
    },
    tools,
  );
  return { ids: (json as { id: string }[]).map(({ id }) => id), lines };
}

describe('footing published', () => {
  it('finds what holds all of the words, CO₂ as it is typed', async () => {
    const { ids, lines } = await published(['CO2', '1750–2019']);
    expect(ids).toEqual(['ar6-erf-co2']);
    expect(lines[0]?.split(/ {2,}/)).toEqual([
      'ar6-erf-co2',
      '2.16; 5–95 % range 1.90 – 2.41',
      'W/m²',
      'IPCC AR6 WG1 (2021), seen',
    ]);
  });

  it('keeps to one quantity, and knows which there are', async () => {
    const { ids } = await published([], 'transient-climate-response');
    expect(ids[0]).toBe('ar6-tcr');
    expect(ids).not.toContain('ar6-ecs');
    await expect(published([], 'tcr')).rejects.toThrow(/one of apparent-sensitivity/);
  });

  it('says when nothing is found', async () => {
    expect(await published(['phlogiston'])).toEqual({ ids: [], lines: ['Nothing published is found by this.'] });
  });
});
