import { escapeMarkup } from '../figures/svg-text.ts';
import { textRuns } from '../figures/text-runs.ts';

/** Markup that is known to be safe. Only this file makes it. */
export class Html {
  readonly markup: string;
  constructor(markup: string) {
    this.markup = markup;
  }
}

export type HtmlValue = string | number | Html | null | readonly HtmlValue[];

/**
 * Markup with values put in. Every string is escaped; inside a text, subscripts and superscripts that the fonts lack
 * become elements; inside an attribute (right after `="`) they stay as they are. `null` leaves nothing.
 */
export function html(parts: TemplateStringsArray, ...values: readonly HtmlValue[]): Html {
  let markup = parts[0] ?? '';
  values.forEach((value, index) => {
    const isAttribute = (parts[index] ?? '').endsWith('="');
    markup += valueMarkup(value, isAttribute) + (parts[index + 1] ?? '');
  });
  return new Html(markup);
}

function valueMarkup(value: HtmlValue, isAttribute: boolean): string {
  if (value === null) return '';
  if (value instanceof Html) return value.markup;
  if (typeof value === 'number') return String(value);
  if (typeof value === 'string') return isAttribute ? escapeMarkup(value) : textMarkup(value);
  return value.map((each) => valueMarkup(each, isAttribute)).join('');
}

const tags = { base: null, sub: 'sub', super: 'sup' } as const;

function textMarkup(content: string): string {
  return textRuns(content)
    .map(({ content: run, level }) => {
      const tag = tags[level];
      return tag === null ? escapeMarkup(run) : `<${tag}>${escapeMarkup(run)}</${tag}>`;
    })
    .join('');
}

/** Paragraphs of a longer text, parted by empty lines; single line ends stay line ends. */
export function paragraphs(content: string, className: string): Html[] {
  return content
    .split(/\n\s*\n/)
    .map((paragraph) => paragraph.trim())
    .filter((paragraph) => paragraph !== '')
    .map((paragraph) => html`<p class="${className}">${joined(paragraph.split(/\r?\n/), html`<br />`)}</p>`);
}

/** Values with something between them. */
export function joined(values: readonly HtmlValue[], between: HtmlValue): HtmlValue[] {
  return values.flatMap((value, index) => (index === 0 ? [value] : [between, value]));
}

export interface Column {
  readonly heading: string;
  /** Set to the right, with figures of equal width. */
  readonly isNumber?: boolean;
}

/** A table, with a caption where no heading above says what it is; the first cell of a row names the row. */
export function table(
  caption: HtmlValue,
  columns: readonly Column[],
  rows: readonly (readonly HtmlValue[])[],
  className = 'plain',
): Html {
  const alignment = (at: number) => (columns[at]?.isNumber ? 'n' : 't');
  const headings = columns.map(({ heading }, at) => html`<th scope="col" class="${alignment(at)}">${heading}</th>`);
  const body = rows.map((row) => {
    const cells = row.map((cell, at) =>
      at === 0
        ? html`<th scope="row" class="${alignment(at)}">${cell}</th>`
        : html`<td class="${alignment(at)}">${cell}</td>`,
    );
    return html`<tr>
      ${cells}
    </tr>`;
  });
  return html`<table class="${className}">
    ${
      caption === null
        ? null
        : html`<caption>
            ${caption}
          </caption>`
    }
    <thead>
      <tr>
        ${headings}
      </tr>
    </thead>
    <tbody>
      ${body}
    </tbody>
  </table>`;
}

/** Terms and what is said of each. */
export function facts(entries: readonly (readonly [term: string, value: HtmlValue])[]): Html {
  return html`<dl>
    ${entries.map(
      ([term, value]) =>
        html`<dt>${term}</dt>
          <dd>${value}</dd>`,
    )}
  </dl>`;
}

/** Why a part has nothing to show. */
export function nothing(reason: string): Html {
  return html`<p class="empty">${reason}</p>`;
}
