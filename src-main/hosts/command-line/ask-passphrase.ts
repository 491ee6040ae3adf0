import { createInterface } from 'node:readline/promises';
import { Writable } from 'node:stream';
import { badUsage } from './command.ts';

/** Asks in the terminal, without showing what is typed. */
export async function askPassphrase(isNew: boolean): Promise<string> {
  const nowhere = new Writable({ write: (_chunk, _encoding, done) => done() });
  const terminal = createInterface({ input: process.stdin, output: nowhere, terminal: true });
  const givingUp = new AbortController();
  terminal.once('SIGINT', () => givingUp.abort()).once('close', () => givingUp.abort());
  const ask = async (words: string) => {
    process.stderr.write(words);
    const answer = await terminal.question('', { signal: givingUp.signal });
    process.stderr.write('\n');
    return answer;
  };
  try {
    if (!isNew) return await ask('Passphrase of the signing key: ');
    const passphrase = await ask('Passphrase to protect the new signing key: ');
    if ((await ask('The same once more: ')) === passphrase) return passphrase;
    throw badUsage('Passphrase', 'the same words twice', 'two that differ', 'Nothing was signed; try again.');
  } catch (error) {
    if (!givingUp.signal.aborted) throw error;
    process.stderr.write('\n');
    throw badUsage('Passphrase', 'a passphrase', 'none', 'Nothing was signed.');
  } finally {
    terminal.close();
  }
}
