import { describe, expect, it, vi } from 'vitest';
import { cautions } from '../../../src-main/contract/cautions.ts';
import type { Report } from '../../../src-main/contract/project.ts';
import ReportPage from '../../../src-renderer/pages/ReportPage.vue';
import type { FakeHost } from '../../helpers/fake-host.ts';
import { inventedProject } from '../../helpers/invented-project.ts';
import { button, field, mountScreen, settled } from '../../helpers/mount-screen.ts';

const report: Report = {
  title: 'Marrowick harbour review',
  isInvented: true,
  engineVersion: '0.1.0',
  writtenAt: '2031-03-03T15:00:00.000Z',
  head: inventedProject.head,
  sources: [],
  cautions: [...cautions],
  claims: [],
};
const prepare = (host: FakeHost) => {
  host.reply('report.render', () => ({ html: '<!doctype html><title>Report</title>', report }));
  host.reply('report.write', ({ directory, formats }) => ({
    files: formats.map((format) => `${directory}/report.${format}`),
  }));
};

describe('the report', () => {
  it('is shown with its cautions and the head that it stands on', async () => {
    const { screen } = await mountScreen(ReportPage, { prepare });
    const page = screen.find('article');
    for (const caution of cautions) expect(page.text()).toContain(caution);
    expect(page.text()).toContain('invented data');
    expect(page.text().replaceAll(' ', '')).toContain(inventedProject.head.hash);
  });

  it('is written beside the project, unless said otherwise', async () => {
    const { screen, host } = await mountScreen(ReportPage, { prepare });
    await field(screen, 'data (JSON)').setValue(false);
    await button(screen, 'Write the report').trigger('click');
    await settled();
    expect(host.inputs('report.write')).toEqual([{ directory: '/home/okonedo/Footing', formats: ['html'] }]);
    expect(screen.text()).toContain('/home/okonedo/Footing/report.html');
  });

  it('can be saved as a file of the reviewer’s choosing', async () => {
    const saved: { name: string; blob: Blob | undefined }[] = [];
    const blobs: Blob[] = [];
    vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => `blob:${blobs.push(blob as Blob)}`);
    vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (this: HTMLAnchorElement) {
      saved.push({ name: this.download, blob: blobs.at(-1) });
    });
    const { screen } = await mountScreen(ReportPage, { prepare });
    await button(screen, 'Save the page elsewhere').trigger('click');
    expect(saved.map(({ name }) => name)).toEqual(['marrowick-harbour-review-report.html']);
    await expect(saved[0]!.blob!.text()).resolves.toBe('<!doctype html><title>Report</title>');
    vi.restoreAllMocks();
  });

  it('says what is needed before there can be one', async () => {
    const { screen } = await mountScreen(ReportPage, {
      prepare,
      session: { project: { ...inventedProject, claims: [] } },
    });
    expect(screen.text()).toContain('Nothing to report yet');
  });
});
