import {
  createCipheriv,
  createDecipheriv,
  createPrivateKey,
  generateKeyPairSync,
  type KeyObject,
  randomBytes,
  scryptSync,
  sign,
} from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import type { Reviewer } from '../contract/finding.ts';
import { InputError } from '../errors.ts';
import { fingerprint } from './fingerprint.ts';
import { makeFolders } from './make-folders.ts';
import { writeFileAtomically } from './write-file-atomically.ts';

/** A reviewer whose key has been unlocked. */
export interface Signer {
  /** Raw Ed25519 public key, hexadecimal. */
  publicKey: string;
  /** Ed25519 signature of the bytes, hexadecimal. */
  sign(bytes: Uint8Array): string;
}

/** Who reviews on this machine. Kept outside every project. */
export interface IdentityStore {
  /** null until somebody has said who they are. */
  reviewer(): Reviewer | null;
  setReviewer(reviewer: { name: string; role: string }): Reviewer;
  /** @throws InputError no-reviewer, key-exists */
  createKey(passphrase: string): Reviewer;
  /** @throws InputError no-key, wrong-passphrase */
  unlock(passphrase: string): Signer;
}

const hex = (nBytes: number) => z.string().regex(new RegExp(`^[0-9a-f]{${2 * nBytes}}$`));

const lockedKey = z.object({
  publicKey: hex(32),
  /** scrypt (RFC 7914): cost and block size as used, so that later versions may raise them for new keys. */
  scrypt: z.object({
    n: z
      .int()
      .min(2 ** 15)
      .max(2 ** 22),
    r: z.literal(8),
    p: z.literal(1),
    salt: hex(16),
  }),
  /** AES-256-GCM over the PKCS #8 form of the private key, with the public key as additional data. */
  nonce: hex(12),
  ciphertext: z.string().regex(/^[0-9a-f]+$/),
  tag: hex(16),
});
type LockedKey = z.infer<typeof lockedKey>;

const identityFile = z.object({
  version: z.literal(1),
  name: z.string(),
  role: z.string(),
  key: lockedKey.nullable(),
});
type IdentityFile = z.infer<typeof identityFile>;

/** 2^17 is the OWASP cheat sheet's first choice for scrypt with r = 8, p = 1: 128 MiB and about a third of a second. */
const scryptCost = 2 ** 17;

/**
 * The reviewer's identity in a folder of this machine: name, role and, once one is needed, an Ed25519 key pair
 * (RFC 8032) whose private half is encrypted with a passphrase. It never enters a project.
 */
export function identityStore(folder: string): IdentityStore {
  const path = join(folder, 'identity.json');

  function read(): IdentityFile | null {
    let text: string;
    try {
      text = readFileSync(path, 'utf8');
    } catch (error) {
      if (error instanceof Error && 'code' in error && /^(ENOENT|ENOTDIR)$/.test(String(error.code))) return null;
      throw unreadable(path, error);
    }
    try {
      return identityFile.parse(JSON.parse(text));
    } catch (error) {
      throw unreadable(path, error);
    }
  }

  function write(identity: IdentityFile): Reviewer {
    try {
      makeFolders(folder, 0o700);
      writeFileAtomically(path, JSON.stringify(identity, null, 2) + '\n');
    } catch (error) {
      throw unwritable(path, error);
    }
    return asReviewer(identity);
  }

  return {
    reviewer() {
      const identity = read();
      return identity && asReviewer(identity);
    },
    setReviewer: ({ name, role }) => write({ version: 1, name, role, key: read()?.key ?? null }),
    createKey(passphrase) {
      const identity = read();
      if (!identity) {
        const hint = 'Give your name first: on the start page, or with --reviewer on the command line.';
        throw identityError('no-reviewer', 'the name of the reviewer before a key is made', 'none', hint);
      }
      if (identity.key) {
        throw identityError(
          'key-exists',
          'no signing key yet',
          'one that is there already',
          'Signatures are made with the key that is there.',
        );
      }
      return write({ ...identity, key: lockNewKey(passphrase) });
    },
    unlock(passphrase) {
      const key = read()?.key;
      if (!key) throw identityError('no-key', 'a signing key', 'none yet', 'Make one first: choose a passphrase.');
      const privateKey = unlockKey(key, passphrase);
      return { publicKey: key.publicKey, sign: (bytes) => sign(null, bytes, privateKey).toString('hex') };
    },
  };
}

function asReviewer({ name, role, key }: IdentityFile): Reviewer {
  return { name, role, publicKey: key?.publicKey ?? null, fingerprint: key && fingerprint(key.publicKey) };
}

function lockNewKey(passphrase: string): LockedKey {
  const pair = generateKeyPairSync('ed25519');
  // The last 32 bytes of the SubjectPublicKeyInfo form are the raw key (RFC 8410, section 4).
  const publicKey = pair.publicKey.export({ type: 'spki', format: 'der' }).subarray(-32);
  const kdf = { n: scryptCost, r: 8 as const, p: 1 as const, salt: randomBytes(16).toString('hex') };
  const nonce = randomBytes(12);
  const cipher = createCipheriv('aes-256-gcm', passphraseKey(passphrase, kdf), nonce).setAAD(publicKey);
  const secret = pair.privateKey.export({ type: 'pkcs8', format: 'der' });
  const ciphertext = Buffer.concat([cipher.update(secret), cipher.final()]);
  return {
    publicKey: publicKey.toString('hex'),
    scrypt: kdf,
    nonce: nonce.toString('hex'),
    ciphertext: ciphertext.toString('hex'),
    tag: cipher.getAuthTag().toString('hex'),
  };
}

function unlockKey({ publicKey, scrypt, nonce, ciphertext, tag }: LockedKey, passphrase: string): KeyObject {
  const decipher = createDecipheriv('aes-256-gcm', passphraseKey(passphrase, scrypt), Buffer.from(nonce, 'hex'))
    .setAAD(Buffer.from(publicKey, 'hex'))
    .setAuthTag(Buffer.from(tag, 'hex'));
  try {
    const secret = Buffer.concat([decipher.update(Buffer.from(ciphertext, 'hex')), decipher.final()]);
    return createPrivateKey({ key: secret, type: 'pkcs8', format: 'der' });
  } catch {
    const hint = 'Try again. A forgotten passphrase cannot be recovered; signatures already made stay valid.';
    throw identityError('wrong-passphrase', 'the passphrase that the signing key was locked with', 'another one', hint);
  }
}

/** Normalised, so that the same words typed on another keyboard or system give the same key. */
function passphraseKey(passphrase: string, { n, r, p, salt }: LockedKey['scrypt']): Buffer {
  return scryptSync(passphrase.normalize('NFKC'), Buffer.from(salt, 'hex'), 32, { N: n, r, p, maxmem: 256 * n * r });
}

function identityError(code: string, expected: string, received: string, hint?: string): InputError {
  return new InputError({ code, where: 'Identity', expected, received, ...(hint && { hint }) });
}

function unwritable(path: string, error: unknown): InputError {
  return new InputError({
    code: 'identity-not-written',
    where: path,
    expected: 'a place where the name and key of the reviewer can be kept',
    received: error instanceof Error ? error.message : String(error),
    hint: 'Make the folder writable, or name another in FOOTING_HOME.',
  });
}

function unreadable(path: string, error: unknown): InputError {
  return new InputError({
    code: 'identity-unreadable',
    where: path,
    expected: 'the identity file that Footing wrote',
    received: error instanceof Error ? error.message : String(error),
    hint: 'Put it back from a copy; or move it away and give your name again (a new key will then be made).',
  });
}
