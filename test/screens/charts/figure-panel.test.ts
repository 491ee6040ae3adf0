import { flushPromises, mount, type VueWrapper } from '@vue/test-utils';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { nextTick } from 'vue';
import type { Figure } from '../../../src-main/contract/figure.ts';
import { darkPalette, lightPalette } from '../../../src-main/figures/palette.ts';
import { RecordingCanvas } from '../../../src-main/figures/recording-canvas.ts';
import FigurePanel from '../../../src-renderer/charts/FigurePanel.vue';
import { saveFile } from '../../../src-renderer/state/save-file.ts';
import { installFakeHost, Refusal, type FakeHost } from '../../helpers/fake-host.ts';
import { sampleStem } from '../../unit/figures/sample-stem.ts';
import { sampleXy } from '../../unit/figures/sample-xy.ts';

vi.mock('../../../src-renderer/state/save-file.ts');

let host: FakeHost;
let panel: VueWrapper;
let painted: RecordingCanvas[];

/** happy-dom has no canvas; this one notes what is painted on it. */
function recordCanvases(): void {
  painted = [];
  const contexts = new Map<HTMLCanvasElement, RecordingCanvas>();
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockImplementation(function (this: HTMLCanvasElement) {
    const known = contexts.get(this);
    if (known) return known as never;
    const recording = new RecordingCanvas(this.width, this.height);
    Object.defineProperty(recording, 'canvas', { value: this });
    contexts.set(this, recording);
    painted.push(recording);
    return recording as never;
  });
}

async function show(figure: Figure): Promise<void> {
  panel = mount(FigurePanel, { props: { figure }, attachTo: document.body });
  await flushPromises();
}

beforeEach(() => {
  host = installFakeHost();
  recordCanvases();
  document.documentElement.dataset.theme = 'light';
});
afterEach(() => {
  panel.unmount();
  vi.restoreAllMocks();
  vi.mocked(saveFile).mockClear();
});

describe('FigurePanel with a stem', () => {
  beforeEach(() => show(sampleStem));

  it('draws it as a picture with a name, its caption and its data digests', () => {
    const picture = panel.get('svg');
    expect(picture.attributes('role')).toBe('img');
    expect(picture.attributes('aria-label')).toContain('recomputed as stated 1.87');
    expect(panel.get('figcaption').text()).toContain('Bars are 5–95 %.');
    expect(panel.get('figcaption code').text()).toBe('aaaaaa…aaaa');
    expect(panel.get('figcaption code').attributes('title')).toBe('a'.repeat(64));
  });

  it('has the same numbers as a table, made when asked for, with their full precision in titles', async () => {
    const details = panel.get<HTMLDetailsElement>('details');
    expect(details.get('summary').text()).toBe('Show as table');
    expect(details.find('table').exists()).toBe(false);
    details.element.open = true;
    await details.trigger('toggle');
    const rows = details.findAll('tbody tr').map((row) => row.findAll('th, td').map((cell) => cell.text()));
    expect(rows).toHaveLength(2 + sampleStem.rows.length + sampleStem.bands.length);
    expect(rows[1]?.slice(0, 6)).toEqual(['recomputed as stated', '', '1.874', '1.74', '2.01', '95']);
    expect(details.get('tbody tr:nth-child(2) td.number').attributes('title')).toBe('1.874');
    expect(details.findAll('thead th[scope="col"]')).toHaveLength(8);
    expect(details.findAll('tbody th[scope="row"]')).toHaveLength(rows.length);
  });

  it('follows the theme', async () => {
    expect(panel.html()).toContain(lightPalette.stated);
    document.documentElement.dataset.theme = 'dark';
    await vi.waitFor(() => expect(panel.html()).toContain(darkPalette.stated));
    expect(panel.html()).not.toContain(lightPalette.stated);
  });

  it('sets a label that looks like markup as text', async () => {
    const [row] = sampleStem.rows;
    if (!row) throw new Error('the sample has rows');
    await panel.setProps({ figure: { ...sampleStem, rows: [{ ...row, label: '<img src=x>' }] } });
    expect(panel.find('img').exists()).toBe(false);
    expect(panel.get('svg').text()).toContain('<img src=x>');
  });
});

describe('FigurePanel, saving', () => {
  const bytes = 'written';

  it.each(['svg', 'png', 'csv'] as const)('asks the core for %s and hands the file over', async (format) => {
    await show(sampleXy);
    host.reply('figure.export', () => ({ fileName: `air.${format}`, mediaType: 'x/y', bytes: btoa(bytes) }));
    const button = panel.findAll('button').find((each) => each.text() === `Save Air as ${format.toUpperCase()}`);
    await button?.trigger('click');
    await flushPromises();
    expect(host.inputs('figure.export')).toEqual([{ figure: sampleXy, format }]);
    expect(saveFile).toHaveBeenCalledOnce();
    const [name, content] = vi.mocked(saveFile).mock.calls[0] ?? [];
    expect(name).toBe(`air.${format}`);
    expect(content?.type).toBe('x/y');
    expect(await content?.text()).toBe(bytes);
  });

  it('says what went wrong and saves nothing', async () => {
    await show(sampleXy);
    host.reply('figure.export', () => {
      throw new Refusal({ where: 'saving a figure as PNG', hint: 'Save the figure as SVG; it needs no library.' });
    });
    await panel.get('[role="group"] button').trigger('click');
    await flushPromises();
    expect(panel.get('[role="alert"]').text()).toContain('Save the figure as SVG');
    expect(saveFile).not.toHaveBeenCalled();
  });
});

describe('FigurePanel with two axes', () => {
  const texts = () => (painted.at(-1)?.nodes ?? []).flatMap((node) => ('text' in node ? [node.text] : []));

  it('paints the chart on a canvas with a name', async () => {
    await show(sampleXy);
    const canvas = panel.get('canvas');
    expect(canvas.attributes('role')).toBe('img');
    expect(canvas.attributes('aria-label')).toBe('Air. Air temperature at an invented harbour.');
    for (const content of ['Year', 'T − T₀ (K)', 'air', 'line as stated']) expect(texts()).toContain(content);
  });

  it('paints again in the colours of the other theme, and for another figure', async () => {
    await show(sampleXy);
    const colours = () => JSON.stringify(painted.at(-1)?.nodes);
    expect(colours()).toContain(lightPalette.stated);
    document.documentElement.dataset.theme = 'dark';
    await vi.waitFor(() => expect(colours()).toContain(darkPalette.stated));
    await panel.setProps({ figure: { ...sampleXy, xLabel: 'another axis' } });
    await nextTick();
    expect(texts()).toContain('another axis');
  });
});
