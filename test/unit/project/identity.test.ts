import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { InputError, isFootingError } from '../../../src-main/errors.ts';
import { identityStore } from '../../../src-main/project/identity.ts';
import { verifyEd25519 } from '../../../src-main/project/verify-ed25519.ts';
import { temporaryFolder } from '../../helpers/sample-project.ts';

const passphrase = 'an invented passphrase, é';

function codeOf(work: () => unknown): string {
  try {
    work();
  } catch (error) {
    if (isFootingError(error)) return error.fields.code;
    throw error;
  }
  return 'none';
}

describe('identityStore', () => {
  it('knows nobody at first, then a name, and a key once one is made', () => {
    const folder = join(temporaryFolder(), 'reviewer');
    const store = identityStore(folder);
    expect(store.reviewer()).toBeNull();
    expect(codeOf(() => store.createKey(passphrase))).toBe('no-reviewer');
    expect(codeOf(() => store.unlock(passphrase))).toBe('no-key');
    const named = { name: 'R. Example', role: 'reviewer', publicKey: null, fingerprint: null };
    expect(store.setReviewer({ name: 'R. Example', role: 'reviewer' })).toEqual(named);
    expect(identityStore(folder).reviewer()).toEqual(named);
    expect(codeOf(() => store.unlock(passphrase))).toBe('no-key');

    const keyed = store.createKey(passphrase);
    expect(keyed.publicKey).toMatch(/^[0-9a-f]{64}$/);
    expect(keyed.fingerprint).toMatch(/^[0-9a-f]{4}( [0-9a-f]{4}){9}$/);
    expect(identityStore(folder).reviewer()).toEqual(keyed);
    expect(codeOf(() => store.createKey('another passphrase'))).toBe('key-exists');
    expect(store.setReviewer({ name: 'R. B. Example', role: '' })).toEqual({
      ...keyed,
      name: 'R. B. Example',
      role: '',
    });
  });

  it('signs with the passphrase that the key was made with, however it is typed, and no other', () => {
    const store = identityStore(temporaryFolder());
    store.setReviewer({ name: 'R. Example', role: '' });
    const { publicKey } = store.createKey(passphrase.normalize('NFC'));
    const signer = store.unlock(passphrase.normalize('NFD'));
    const bytes = Buffer.from('a statement');
    expect(signer.publicKey).toBe(publicKey);
    expect(signer.sign(bytes)).toBe(signer.sign(bytes));
    expect(verifyEd25519(signer.publicKey, bytes, signer.sign(bytes))).toBe(true);
    expect(codeOf(() => store.unlock(`${passphrase} `))).toBe('wrong-passphrase');
    expect(() => store.unlock('')).toThrow(InputError);
  });

  it('keeps one file for its owner only, in which nothing secret stands open', () => {
    const folder = temporaryFolder();
    const store = identityStore(folder);
    store.setReviewer({ name: 'R. Example', role: '' });
    store.createKey(passphrase);
    expect(readdirSync(folder)).toEqual(['identity.json']);
    expect(statSync(join(folder, 'identity.json')).mode & 0o777).toBe(0o600);
    const text = readFileSync(join(folder, 'identity.json'), 'utf8');
    expect(text).not.toContain(passphrase);
    const { key } = JSON.parse(text) as { key: { ciphertext: string; scrypt: { n: number } } };
    // PKCS #8 begins like this (RFC 8410, section 7); in the clear it would stand here.
    expect(key.ciphertext).not.toContain('302e020100300506032b6570');
    expect(key.scrypt.n).toBeGreaterThanOrEqual(2 ** 15);
  });

  it('notices when the file was changed', () => {
    const folder = temporaryFolder();
    const path = join(folder, 'identity.json');
    const store = identityStore(folder);
    store.setReviewer({ name: 'R. Example', role: '' });
    store.createKey(passphrase);
    const identity = JSON.parse(readFileSync(path, 'utf8')) as { key: { publicKey: string } };
    const other = { ...identity, key: { ...identity.key, publicKey: 'ab'.repeat(32) } };
    writeFileSync(path, JSON.stringify(other));
    expect(codeOf(() => store.unlock(passphrase))).toBe('wrong-passphrase');
    for (const text of [
      '',
      '{',
      '{"version":2}',
      JSON.stringify({ ...identity, key: { ...identity.key, scrypt: { n: 2, r: 8, p: 1, salt: '00' } } }),
    ]) {
      writeFileSync(path, text);
      expect(codeOf(() => store.reviewer())).toBe('identity-unreadable');
    }
  });

  it('says where it could not be kept', () => {
    const path = join(temporaryFolder(), 'a file');
    writeFileSync(path, '');
    const store = identityStore(join(path, 'reviewer'));
    expect(codeOf(() => store.setReviewer({ name: 'R. Example', role: '' }))).toBe('identity-not-written');
  });
});
