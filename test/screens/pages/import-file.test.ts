import { describe, expect, it, vi } from 'vitest';
import type { ImportPreview } from '../../../src-main/contract/series.ts';
import ImportFile from '../../../src-renderer/pages/import/ImportFile.vue';
import { Refusal, type FakeHost } from '../../helpers/fake-host.ts';
import { inventedPreview, inventedProject } from '../../helpers/invented-project.ts';
import { button, field, mountScreen, settled } from '../../helpers/mount-screen.ts';

const file = new File(['jahr;air\n1961;-0,12\n'], 'quay-thermometer.csv');
const sound: ImportPreview = { ...inventedPreview, badRows: [] };

async function mountImport(preview: ImportPreview, prepare?: (host: FakeHost) => void) {
  const mounted = await mountScreen(ImportFile, {
    props: { file, nWaiting: 1 },
    prepare: (host) => {
      host.reply('data.preview', () => preview);
      host.reply('data.import', () => ({ project: inventedProject, datasetId: 4, seriesIds: [5] }));
      prepare?.(host);
    },
  });
  await settled();
  return mounted;
}

const importButton = 'Import this series';

describe('a file on its way in', () => {
  it('shows what was recognised and why, and its first rows', async () => {
    const { screen, host } = await mountImport(inventedPreview);
    expect(host.inputs('data.preview')).toEqual([
      { fileName: 'quay-thermometer.csv', bytes: btoa('jahr;air\n1961;-0,12\n'), options: {} },
    ]);
    expect(screen.text()).toContain('Recognised as a table of delimited text');
    expect(screen.text()).toContain(inventedPreview.reader.why);
    expect(screen.text()).toContain('Rows were not in time order');
    expect(screen.text()).toContain('2030: the last row may cover part of the year');
    const head = screen.findAll('table')[0]!;
    expect(head.findAll('th').map((cell) => cell.text())).toEqual(['jahrtime', 'airvalue', 'watervalue', 'remark']);
    expect(head.findAll('tbody tr')).toHaveLength(4);
  });

  it('cannot be imported before unit and baseline have been said', async () => {
    const { screen, host } = await mountImport(sound);
    expect(button(screen, importButton).attributes('disabled')).toBeDefined();
    await field(screen, 'Unit').setValue('K');
    expect(button(screen, importButton).attributes('disabled')).toBeDefined();
    await screen.find('[aria-label="Baseline, first year"]').setValue('1961');
    await screen.find('[aria-label="Baseline, last year"]').setValue('1990');
    await field(screen, 'Origin and licence').setValue('Harbour office, invented.');
    await button(screen, importButton).trigger('click');
    await settled();
    expect(host.inputs('data.import')).toMatchObject([
      {
        fileName: 'quay-thermometer.csv',
        leaveOutBadRows: false,
        licence: 'Harbour office, invented.',
        choices: [
          {
            key: 'column-1',
            name: 'quay-thermometer-air',
            quantity: 'temperature-anomaly',
            unit: 'K',
            baseline: { start: 1961, end: 1990 },
          },
        ],
      },
    ]);
    expect(screen.emitted('done')).toHaveLength(1);
  });

  it('lists rows that cannot be used, and waits for a decision about them', async () => {
    const { screen, host } = await mountImport(inventedPreview);
    await field(screen, 'Unit').setValue('K');
    await field(screen, 'not known').setValue(true);
    const rows = screen.findAll('table')[1]!.findAll('tbody tr');
    expect(rows.map((row) => row.find('td').text())).toEqual(['23', '41']);
    expect(rows[0]!.text()).toContain('“o.17” is not a number');
    expect(button(screen, importButton).attributes('disabled')).toBeDefined();

    const [leaveOut, stop] = screen.findAll('input[type=radio]');
    await stop!.setValue();
    expect(button(screen, importButton).attributes('disabled')).toBeDefined();
    await leaveOut!.setValue();
    await button(screen, importButton).trigger('click');
    await settled();
    expect(host.inputs('data.import')).toMatchObject([{ leaveOutBadRows: true, choices: [{ baseline: null }] }]);
  });

  it('is read again when the reviewer says how it is to be read', async () => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] });
    try {
      const { screen, host } = await mountScreen(ImportFile, {
        props: { file, nWaiting: 1 },
        prepare: (fake) => fake.reply('data.preview', () => sound),
      });
      await vi.waitFor(() => expect(screen.find('h2').exists()).toBe(true));
      const [semicolonFirst] = field(screen, 'Columns are parted by').findAll('option');
      await semicolonFirst!.setValue();
      const [pointFirst] = field(screen, 'Decimal mark').findAll('option');
      await pointFirst!.setValue();
      await vi.advanceTimersByTimeAsync(300);
      const [, ...later] = host.inputs('data.preview');
      expect(later).toHaveLength(1);
      expect(later[0]!.options).toMatchObject({
        readerId: 'delimited',
        delimited: { delimiter: ',', decimalMark: '.', timeColumn: 0, valueColumns: [1, 2] },
      });
    } finally {
      vi.useRealTimers();
    }
  });

  it('can be given to another reader, which starts from its own recognition', async () => {
    const { screen, host } = await mountImport(sound);
    const gistemp = field(screen, 'Read it as').findAll('option')[1]!;
    await gistemp.setValue();
    await settled();
    expect(host.inputs('data.preview').at(-1)!.options).toEqual({ readerId: 'gistemp' });
  });

  it('of several sheets can be read from another one, which is recognised anew', async () => {
    const sheets = ['Quay', 'Harbour'];
    const { screen, host } = await mountImport({ ...sound, sheet: 'Quay', sheets });
    expect(
      field(screen, 'Sheet')
        .findAll('option')
        .map((option) => option.text()),
    ).toEqual(sheets);
    expect(screen.text()).not.toContain('Columns are parted by');
    expect(screen.text()).toContain('Row with the names');
    await field(screen, 'Unit').setValue('K');
    await field(screen, 'not known').setValue(true);

    host.reply('data.preview', () => ({ ...sound, sheet: 'Harbour', sheets }));
    await field(screen, 'Sheet').findAll('option')[1]!.setValue();
    await settled();
    expect(host.inputs('data.preview').at(-1)!.options).toEqual({ sheet: 'Harbour' });
    expect((field(screen, 'Unit').element as HTMLInputElement).value).toBe('');

    await field(screen, 'Read it as').findAll('option')[1]!.setValue();
    await settled();
    expect(host.inputs('data.preview').at(-1)!.options).toEqual({ readerId: 'gistemp', sheet: 'Harbour' });
    await field(screen, 'Unit').setValue('K');
    await field(screen, 'not known').setValue(true);
    await button(screen, importButton).trigger('click');
    await settled();
    expect(host.inputs('data.import')).toMatchObject([{ options: { sheet: 'Harbour' } }]);
  });

  it('offers neither sheets nor readers where there is nothing to choose', async () => {
    const [only] = sound.readers;
    const { screen } = await mountImport({ ...sound, readers: [only!], sheet: 'Quay', sheets: ['Quay'] });
    const labels = screen.findAll('label').map((label) => label.text());
    expect(labels).not.toContain('Sheet');
    expect(labels).not.toContain('Read it as');
  });

  it('keeps the last good preview, and is not imported, when the new settings do not fit', async () => {
    const { screen, host } = await mountImport(sound);
    await field(screen, 'Unit').setValue('K');
    await field(screen, 'not known').setValue(true);
    host.reply('data.preview', () => {
      throw new Refusal({ where: 'quay-thermometer.csv', hint: 'Choose the other decimal mark.' });
    });
    await field(screen, 'Read it as').findAll('option')[2]!.setValue();
    await settled();
    expect(screen.find('[role=alert]').text()).toContain('Choose the other decimal mark.');
    expect(screen.text()).toContain('The file cannot be read with these settings.');
    expect(button(screen, importButton).attributes('disabled')).toBeDefined();
  });

  it('keeps what the reviewer wrote when the import is refused', async () => {
    const { screen } = await mountImport(sound, (host) =>
      host.reply('data.import', () => {
        throw new Refusal({ where: 'quay-thermometer.csv', hint: 'Choose another name.' });
      }),
    );
    await field(screen, 'Unit').setValue('K');
    await field(screen, 'not known').setValue(true);
    await button(screen, importButton).trigger('click');
    await settled();
    expect(screen.find('[role=alert]').text()).toContain('Choose another name.');
    expect((field(screen, 'Unit').element as HTMLInputElement).value).toBe('K');
    expect(screen.emitted('done')).toBeUndefined();
  });

  it('that is empty is refused before it is sent', async () => {
    const { screen, host } = await mountScreen(ImportFile, {
      props: { file: new File([], 'nothing.csv'), nWaiting: 2 },
    });
    await settled();
    expect(screen.find('[role=alert]').text()).toContain('0 bytes');
    expect(host.inputs('data.preview')).toHaveLength(0);
    await button(screen, 'Pass over this file').trigger('click');
    expect(screen.emitted('done')).toHaveLength(1);
  });

  it('says when the same bytes are there already', async () => {
    const { screen } = await mountImport({ ...sound, alreadyImportedAs: 2 });
    expect(screen.text()).toContain('in this project already, as file 2');
  });
});
