import { describe, expect, it } from 'vitest';
import { requestNames } from '../../../src-main/contract/request-names.ts';
import { carryRequest } from '../../../src-main/hosts/carry-request.ts';
import { payloadLimitBytes } from '../../../src-main/hosts/payload-limit.ts';
import { fakeCore } from '../../helpers/fake-core.ts';

const nested = (levels: number) => '['.repeat(levels) + '1' + ']'.repeat(levels);

describe('carryRequest', () => {
  const carry = async (name: (typeof requestNames)[number], payload: unknown) => {
    const core = fakeCore();
    const answer = JSON.parse(await carryRequest(core, name, payload)) as unknown;
    return { answer, handled: core.handled };
  };

  it('hands the parsed input on and the answer back as text', async () => {
    const { answer, handled } = await carry('note.add', '{"text":"Δ"}');
    expect(handled).toEqual([{ name: 'note.add', input: { text: 'Δ' } }]);
    expect(answer).toEqual({ ok: true, value: { name: 'note.add', input: { text: 'Δ' } } });
  });

  it.each([undefined, null, 7, {}, new Map(), new Uint8Array(2), '', '{', "{'a':1}"])(
    'lets no %o through',
    async (payload) => {
      const { answer, handled } = await carry('session.get', payload);
      expect(answer).toMatchObject({
        ok: false,
        error: { kind: 'InputError', code: 'request-not-json', where: 'session.get' },
      });
      expect(handled).toEqual([]);
    },
  );

  it('counts bytes, not characters', async () => {
    const limit = payloadLimitBytes('note.add');
    const ofBytes = (bytes: number) => JSON.stringify('é'.repeat((bytes - 2) / 2));
    expect((await carry('note.add', ofBytes(limit))).handled).toHaveLength(1);
    const { answer, handled } = await carry('note.add', ofBytes(limit + 2));
    expect(answer).toMatchObject({ ok: false, error: { code: 'request-too-large' } });
    expect(handled).toEqual([]);
  });

  it('lets nothing through that is nested without end', async () => {
    expect((await carry('compute', nested(64))).handled).toHaveLength(1);
    for (const levels of [65, 400_000]) {
      const { answer, handled } = await carry('compute', nested(levels));
      expect(answer).toMatchObject({ ok: false, error: { code: 'request-too-deep', where: 'compute' } });
      expect(handled).toEqual([]);
    }
  });

  it('has a limit for every request', () => {
    for (const name of requestNames) {
      expect(payloadLimitBytes(name)).toBeGreaterThanOrEqual(1_000_000);
      expect(payloadLimitBytes(name)).toBeLessThanOrEqual(91_000_000);
    }
  });
});
