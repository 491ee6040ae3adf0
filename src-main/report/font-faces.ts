import { fontFiles } from './font-files.ts';

interface FontFace {
  readonly family: string;
  readonly file: string;
  readonly style: 'normal' | 'italic';
  readonly weights: string;
  /** Unicode ranges, and the same as a test; null: always there. */
  readonly range: string | null;
  readonly isNeededBy: RegExp | null;
}

const extended = { range: 'U+0100-02AF, U+1E00-1EFF, U+2020', isNeededBy: /[\u0100-\u02af\u1e00-\u1eff\u2020]/u };
const greekOnly = { range: 'U+0370-03FF', isNeededBy: /[\u0370-\u03ff]/u };
const always = { range: null, isNeededBy: null };
const sans = { family: 'Atkinson Hyperlegible Next', style: 'normal', weights: '200 800' } as const;
const serif = { family: 'Literata', style: 'normal', weights: '200 900' } as const;

const sansFaces: readonly FontFace[] = [
  { ...sans, file: fontFiles.sans, ...always },
  { ...sans, file: fontFiles.sansExtended, ...extended },
];
const greekFaces: readonly FontFace[] = [{ ...serif, file: fontFiles.greek, ...greekOnly }];
const textFaces: readonly FontFace[] = [
  { ...serif, file: fontFiles.serif, ...always },
  { ...serif, file: fontFiles.serifExtended, ...extended },
  { family: 'Atkinson Hyperlegible Mono', file: fontFiles.mono, style: 'normal', weights: '200 800', ...always },
];

/** Style rules that carry the fonts of a figure inside its file; only those that `content` needs. */
export function figureFontFaces(content: string): string {
  return rules([...sansFaces, ...greekFaces], content);
}

/** Style rules that carry the fonts of the report inside it; only those that `content` needs. */
export function reportFontFaces(content: string): string {
  return rules([...sansFaces, ...textFaces, ...greekFaces], content);
}

function rules(faces: readonly FontFace[], content: string): string {
  return faces
    .filter(({ isNeededBy }) => isNeededBy === null || isNeededBy.test(content))
    .map(
      ({ family, file, style, weights, range }) =>
        `@font-face{font-family:"${family}";font-style:${style};font-weight:${weights};` +
        `src:url(${file}) format("woff2")${range === null ? '' : `;unicode-range:${range}`}}`,
    )
    .join('');
}
