import { InputError } from '../../errors.ts';

export function damagedNetCdf(fileName: string, received: string): InputError {
  return new InputError({
    code: 'damaged-file',
    where: fileName,
    expected: 'a whole NetCDF file',
    received,
    hint: 'Look whether the download broke off; if other programs open the file, export the time series as text.',
  });
}
