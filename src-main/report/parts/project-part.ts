import type { Report } from '../../contract/project.ts';
import { facts, html, nothing, table, type Html } from '../html.ts';
import { bytesText, timeText } from '../words.ts';
import { digestPart } from './digest-part.ts';

/** What holds for the whole report: the material under review, and the state of the trail that this report witnesses. */
export function projectPart({ sources, head, writtenAt, engineVersion, claims }: Report): Html {
  return html`<section class="page" aria-labelledby="project">
    <h1 id="project">Sources and trail</h1>
    <h2>Sources</h2>
    ${
      sources.length === 0
        ? nothing('No source is entered in the project.')
        : table(
            'The material under review',
            [{ heading: 'Source' }, { heading: 'Details' }, { heading: 'File as received' }],
            sources.map((source) => [
              html`${source.title}
                <div class="quiet">source ${source.id}, ${source.kind}</div>`,
              source.details === '' ? '–' : source.details,
              source.file
                ? html`${source.file.name}
                    <div class="quiet">${bytesText(source.file.sizeBytes)}</div>
                    ${digestPart(source.file.digest)}`
                : 'not attached',
            ]),
            'sources',
          )
    }
    <h2>Trail</h2>
    <p>
      Everything done in the project is in its trail, entry by entry, each with the SHA-256 hash of the one before. The
      head of the trail when this report was written:
    </p>
    ${facts([
      ['Entry', String(head.sequence)],
      ['Head hash', digestPart(head.hash)],
      ['Report written', `${timeText(writtenAt)}, with Footing ${engineVersion}`],
      ['Claims in it', String(claims.length)],
    ])}
    <p>
      A rewrite of the whole file cannot be prevented on someone’s own machine, only made evident: this hash witnesses
      the trail up to here.
    </p>
  </section>`;
}
