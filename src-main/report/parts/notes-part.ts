import type { ReportClaim } from '../../contract/project.ts';
import { html, nothing, paragraphs, type Html } from '../html.ts';
import { timeText } from '../words.ts';

/** What the reviewers wrote in the margin. */
export function notesPart({ notes }: ReportClaim): Html {
  if (notes.length === 0)
    return html`<h2>Notes</h2>
      ${nothing('There are no notes in the margin.')}`;
  return html`<h2>Notes</h2>
    ${notes.map(
      (note) =>
        html`<div class="note">
          ${paragraphs(note.text, 'prose')}
          <p class="quiet">${note.author}, ${timeText(note.writtenAt)}</p>
        </div>`,
    )}`;
}
