import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { facts, html, joined, paragraphs, table } from '../../../src-main/report/html.ts';

describe('html', () => {
  it('escapes texts and attributes, keeps markup, drops null', () => {
    expect(html`<p title="${'a"b'}">${'<i>'}${html`<b>x</b>`}${null}${[1, ' & ']}</p>`.markup).toBe(
      '<p title="a&quot;b">&lt;i&gt;<b>x</b>1 &amp; </p>',
    );
  });

  it('sets subscripts in texts, and leaves attributes alone', () => {
    expect(html`<p title="${'CO₂'}">${'CO₂ at 10⁻⁵'}</p>`.markup).toBe(
      '<p title="CO₂">CO<sub>2</sub> at 10<sup>−5</sup></p>',
    );
  });

  it('never lets a string become markup, in a text or in an attribute', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (content) => {
        const { markup } = html`<p title="${content}">${content}</p>`;
        const tags = markup.match(/<[^>]*>/g) ?? [];
        expect(tags.every((tag) => /^<p title="[^"<>]*">$|^<\/p>$|^<\/?su[bp]>$/.test(tag))).toBe(true);
      }),
    );
  });
});

describe('paragraphs', () => {
  it('parts a text at empty lines and keeps single line ends', () => {
    const parts = paragraphs(' one\ntwo \n\n \nthree', 'say').map(({ markup }) => markup);
    expect(parts).toEqual(['<p class="say">one<br />two</p>', '<p class="say">three</p>']);
  });
});

describe('table and facts', () => {
  it('name columns and rows for those who hear them', () => {
    const { markup } = table('Of what', [{ heading: 'Name' }, { heading: 'Value', isNumber: true }], [['a', 1]]);
    expect(markup).toContain('<caption>');
    expect(markup.match(/<th scope="col"/g)).toHaveLength(2);
    expect(markup).toContain('<th scope="row" class="t">a</th>');
    expect(markup).toContain('<td class="n">1</td>');
  });

  it('pair terms with what is said of them', () => {
    expect(facts([['Term', 'x < y']]).markup).toMatch(/<dt>Term<\/dt>\s*<dd>x &lt; y<\/dd>/);
  });

  it('joined puts something between values only', () => {
    expect(joined(['a', 'b', 'c'], ', ')).toEqual(['a', ', ', 'b', ', ', 'c']);
    expect(joined([], ', ')).toEqual([]);
  });
});
