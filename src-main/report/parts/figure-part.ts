import type { Figure } from '../../contract/figure.ts';
import type { ReportClaim } from '../../contract/project.ts';
import { figureDrawing } from '../../figures/figure-drawing.ts';
import { printPalette } from '../../figures/palette.ts';
import { svgText } from '../../figures/svg-text.ts';
import { shortDigest } from '../../quantities/notation.ts';
import { Html, html, joined } from '../html.ts';

const pageWidthPx = 700;

type Place = 'recomputation' | 'residuals' | 'windows';

/** The figures of one part of the check: of the window sweep, of the residuals beside something, or all others. */
export function figuresOf({ figures }: ReportClaim, place: Place): Figure[] {
  return figures.filter(({ name }) => placeOf(name) === place);
}

function placeOf(name: string): Place {
  return name.endsWith('-windows') ? 'windows' : name.includes('-residual-') ? 'residuals' : 'recomputation';
}

/** A figure with what it shows and the digests of its data, drawn for the width of the page unless another is given. */
export function figurePart(figure: Figure, widthPx = pageWidthPx): Html {
  const drawing = new Html(svgText(figureDrawing(figure, printPalette, widthPx)));
  const digests = figure.digests.map((digest) => html`<code title="${digest}">${shortDigest(digest)}</code>`);
  const data = digests.length === 0 ? null : html` <span class="digests">From data ${joined(digests, ', ')}.</span>`;
  return html`<figure>
    ${drawing}
    <figcaption>${figure.caption}${data}</figcaption>
  </figure>`;
}
