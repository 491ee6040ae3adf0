import mono from '@fontsource-variable/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-wght-normal.woff2?inline';
import sansExtended from '@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-ext-wght-normal.woff2?inline';
import sans from '@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2?inline';
import greek from '@fontsource-variable/literata/files/literata-greek-wght-normal.woff2?inline';
import serifExtended from '@fontsource-variable/literata/files/literata-latin-ext-wght-normal.woff2?inline';
import serif from '@fontsource-variable/literata/files/literata-latin-wght-normal.woff2?inline';

/** The bundled fonts as data URIs. Loaded on demand only: together a third of a megabyte. */
export const fontFiles = { sans, sansExtended, serif, serifExtended, greek, mono };
