import type { ErrorAnswer } from '../../src-main/contract/requests.ts';

/** As many bytes as a request carries. */
const maxFileBytes = 64 * 1024 * 1024;

/** What is wrong with a file before it is sent; null when nothing is. */
export function fileProblem(file: File): ErrorAnswer | null {
  if (file.size > 0 && file.size <= maxFileBytes) return null;
  return {
    kind: 'InputError',
    code: file.size === 0 ? 'empty-file' : 'file-too-large',
    where: file.name,
    expected: 'a file of 1 byte to 64 MiB',
    received: `${file.size} bytes`,
    hint: file.size === 0 ? 'Fetch the file again: it holds nothing.' : 'Cut the file down to the part that is needed.',
  };
}

/** The bytes of a file as they are, in base64: how they cross the bridge. */
export function fileBytes(file: File): Promise<string> {
  return new Promise((resolve, reject) => {
    const reader = new FileReader();
    reader.addEventListener('load', () => {
      const dataUrl = typeof reader.result === 'string' ? reader.result : '';
      resolve(dataUrl.slice(dataUrl.indexOf(',') + 1));
    });
    reader.addEventListener('error', () => reject(reader.error ?? new Error(`${file.name} cannot be read`)));
    reader.readAsDataURL(file);
  });
}
