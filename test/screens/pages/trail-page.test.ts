import { describe, expect, it } from 'vitest';
import type { VerifyReport } from '../../../src-main/contract/trail.ts';
import TrailPage from '../../../src-renderer/pages/TrailPage.vue';
import type { FakeHost } from '../../helpers/fake-host.ts';
import { digest, inventedEntry, inventedProject, inventedTrail } from '../../helpers/invented-project.ts';
import { button, field, mountScreen, settled } from '../../helpers/mount-screen.ts';

const prepare = (host: FakeHost) => {
  host.reply('trail.list', ({ claimId, before }) => ({
    lines: inventedTrail
      .filter((line) => (!claimId || line.claimIds.includes(claimId)) && (!before || line.sequence < before))
      .slice(0, 4),
    hasMore: !before && !claimId,
  }));
  host.reply('trail.entry', () => ({ entry: inventedEntry, previousHash: digest(214), hash: digest(215) }));
};
const open = (sequence: number | null = null) => mountScreen(TrailPage, { props: { sequence }, prepare });

const sound: VerifyReport = {
  isSound: true,
  problems: [],
  nEntries: 218,
  nRecords: 64,
  nContents: 9,
  head: inventedProject.head,
  signatures: [],
};

describe('the trail', () => {
  it('lists what was done by day, newest first, and earlier entries on demand', async () => {
    const { screen } = await open();
    const sequences = () => screen.findAll('ol li a').map((line) => line.attributes('href'));
    expect(sequences()).toEqual(['#/trail/218', '#/trail/217', '#/trail/216', '#/trail/215']);
    expect(screen.text()).toContain('taken back later');
    await button(screen, 'Show earlier entries').trigger('click');
    await settled();
    expect(sequences()).toHaveLength(6);
    expect(screen.findAll('.columns h2').map((day) => day.text())).toEqual(['3 March 2031', '2 March 2031']);
  });

  it('can be narrowed to one claim', async () => {
    const { screen, host } = await open();
    await field(screen, 'Show').findAll('option')[2]!.setValue();
    await settled();
    expect(host.inputs('trail.list').at(-1)).toEqual({ claimId: 2, limit: 100 });
    expect(screen.findAll('ol li')).toHaveLength(3);
  });

  it('shows the head in full', async () => {
    const { screen } = await open();
    expect(screen.find('dl code').text().replaceAll(' ', '')).toBe(inventedProject.head.hash);
  });

  it('shows of one entry what changed from what to what, and its hashes', async () => {
    const { screen } = await open(215);
    const entry = screen.find('article');
    expect(entry.find('del').text()).toBe('before: °C');
    expect(entry.find('ins').text()).toBe('after: K');
    expect(entry.text()).toContain('baseline › start');
    expect(entry.text().replaceAll(' ', '')).toContain(digest(214));
    expect(entry.text().replaceAll(' ', '')).toContain(digest(215));
  });
});

describe('verification', () => {
  it('says that the record is sound', async () => {
    const { screen, host } = await open();
    host.reply('project.verify', () => sound);
    await button(screen, 'Verify').trigger('click');
    await settled();
    expect(screen.find('.outcome').text()).toContain('The record is sound');
    expect(screen.find('.outcome').text()).toContain('218 entries');
  });

  it('names each problem in plain words', async () => {
    const { screen, host } = await open();
    host.reply('project.verify', () => ({
      ...sound,
      isSound: false,
      problems: [
        { code: 'entry-altered', where: 'Entry 117', detail: 'Its hash does not fit.' },
        { code: 'record-altered', where: 'series 1', detail: 'unit is °C and should be K.' },
      ],
      signatures: [
        {
          signatureId: 1,
          claimId: 2,
          revision: 1,
          meaning: 'sign-off',
          signer: 'I. Okonedo',
          fingerprint: 'tern-oak',
          isValid: false,
          reason: 'the finding was changed',
        },
      ],
    }));
    await button(screen, 'Verify').trigger('click');
    await settled();
    const said = screen.find('.outcome').text();
    expect(said).toContain('The record is not sound');
    expect(said).toContain('Entry 117. An entry of the trail was altered after it was written. Its hash does not fit.');
    expect(said).toContain('A record differs from what the trail says it should be.');
    expect(said).toContain('not valid: the finding was changed');
  });

  it('reports results that do not come out again', async () => {
    const { screen, host } = await open();
    host.reply('project.recheck', () => ({
      nResults: 12,
      isIdentical: false,
      engineVersions: ['0.1.0'],
      differences: [
        { resultId: 3, claimId: 2, method: 'recomputation', path: '$.value', stored: '1.872', recomputed: '1.873' },
      ],
    }));
    await button(screen, 'Recheck results').trigger('click');
    await settled();
    expect(screen.find('.outcome').text()).toContain('Stored 1.872, now 1.873.');
    expect(host.inputs('project.recheck')[0]!.jobId).toMatch(/^[0-9a-f-]{36}$/);
  });
});
