import { describe, expect, it } from 'vitest';
import type { DelimitedOptions } from '../../../src-main/contract/series.ts';
import { errorOf, offered, preview, steps, valuesOf } from './fixtures/preview.ts';

const table = 'year,level\n1990,1.5\n1991,1.7\n1992,1.6\n';

function withOptions(delimited: DelimitedOptions): { delimited: DelimitedOptions } {
  return { delimited };
}

describe('delimited: how the text is built', () => {
  it.each<[string, string, Partial<DelimitedOptions>]>([
    ['commas', table, { delimiter: ',', decimalMark: '.', headerLine: 1 }],
    ['semicolons', table.replaceAll(',', ';'), { delimiter: ';', decimalMark: '.' }],
    ['tabs', table.replaceAll(',', '\t'), { delimiter: '\t', decimalMark: '.' }],
    ['blanks', table.replaceAll(',', '   '), { delimiter: 'blanks', decimalMark: '.' }],
    [
      'semicolons and decimal commas',
      table.replaceAll(',', ';').replaceAll('.', ','),
      { delimiter: ';', decimalMark: ',' },
    ],
    [
      'tabs and decimal commas',
      table.replaceAll(',', '\t').replaceAll('.', ','),
      { delimiter: '\t', decimalMark: ',' },
    ],
    [
      'blanks and decimal commas',
      table.replaceAll(',', ' ').replaceAll('.', ','),
      { delimiter: 'blanks', decimalMark: ',' },
    ],
    [
      'commas and quoted decimal commas',
      table.replaceAll(/(\d+)\.(\d)/g, '"$1,$2"'),
      { delimiter: ',', decimalMark: ',' },
    ],
    ['commas with blanks around', table.replaceAll(',', ' , '), { delimiter: ',', decimalMark: '.' }],
    ['quoted cells', table.replaceAll(/[^,\n]+/g, '"$&"'), { delimiter: ',', decimalMark: '.' }],
    [
      'a header in a comment',
      `# made by hand\n#\n# year level\n${table.replace('year,level\n', '').replaceAll(',', ' ')}`,
      { commentMark: '#', headerLine: 3 },
    ],
    [
      'percent comments and an underline',
      `% made by hand\nyear level\n---- -----\n${table.replace('year,level\n', '').replaceAll(',', ' ')}`,
      { commentMark: '%', headerLine: 2 },
    ],
    ['a title and a blank line above the header', `An invented level\n\n${table}`, { headerLine: 3 }],
    ['no header', table.replace('year,level\n', ''), { headerLine: 0 }],
    ['CRLF and a byte order mark', `\uFEFF${table.replaceAll('\n', '\r\n')}`, { delimiter: ',', headerLine: 1 }],
    ['empty columns at the end', table.replaceAll('\n', ',,\n'), { delimiter: ',' }],
    ['more delimiters at the end of rows than in the header', table.replaceAll(/(\d)\n/g, '$1,\n'), { delimiter: ',' }],
  ])('recognises %s', (_, text, options) => {
    const found = preview(text);
    expect(found.reader.id).toBe('delimited');
    expect(found.head.options).toMatchObject(options);
    expect(found.badRows).toEqual([]);
    expect(steps(valuesOf(text, found.series[0]?.key ?? ''))).toEqual(['1990: 1.5', '1991: 1.7', '1992: 1.6']);
  });

  it('shows the first lines as they are, and how they were split', () => {
    const { head } = preview(`An invented level\n${table}`);
    expect(head.lines).toEqual(['An invented level', 'year,level', '1990,1.5', '1991,1.7', '1992,1.6']);
    expect(head.columns).toEqual(['year', 'level']);
    expect(head.rows[0]).toEqual(['1990', '1.5']);
  });

  it('notes a decimal comma with an example', () => {
    expect(preview('year;level\n1990;1,500\n1991;1,7\n').notes.join('\n')).toContain('“1,500” is 1.5');
  });

  it('warns where the comma may part thousands', () => {
    expect(preview('year\tlevel\n1990\t1,234\n1991\t1,240\n').notes.join('\n')).toContain('If it parts thousands');
    expect(preview('year\tlevel\n1990\t1,234\n1991\t1,24\n').notes.join('\n')).not.toContain('thousands');
  });

  it('finds the header above damaged first rows, and lists these', () => {
    const text = 'site,year,level\nA,1990,abc\nA,1991,1.7\nA,1992,1.6\nA,1993,1.5\n';
    const found = preview(text);
    expect(found.head.columns).toEqual(['site', 'year', 'level']);
    expect(found.badRows.map(({ line }) => line)).toEqual([2]);
    const headless = preview('1990,abc\n1991,1.7\n1992,1.6\n1993,1.5\n');
    expect(headless.badRows.map(({ line }) => line)).toEqual([1]);
  });

  it('joins a header of several lines above each other, and quoted line ends in one', () => {
    const stacked =
      'Yr, Mn, CO2, seasonally,\n , , , adjusted,\n , , [ppm], [ppm],\n1990,1,401.5,401.1\n1990,2,402.5,401.2\n1990,3,403.5,401.3\n';
    const found = preview(stacked);
    expect(found.head.columns).toEqual(['Yr', 'Mn', 'CO2 [ppm]', 'seasonally adjusted [ppm]']);
    expect(offered(found, 'co2-ppm')).toMatchObject({ unit: 'ppm', unitFrom: 'file', quantity: 'co2', step: 'month' });
    const quoted = 'year,"level\nin m"\n1990,1.5\n1991,1.7\n';
    expect(preview(quoted).head.columns).toEqual(['year', 'level\nin m']);
    expect(preview(quoted).nRows).toBe(2);
  });

  it('gives row numbers without a name a column', () => {
    const text = '"year" "level"\n"1" 1990 1.5\n"2" 1991 1.7\n"3" 1992 1.6\n';
    expect(steps(valuesOf(text, 'level'))).toEqual(['1990: 1.5', '1991: 1.7', '1992: 1.6']);
    const comma = ',year,level\n0,1990,1.5\n1,1991,1.7\n2,1992,1.6\n';
    expect(preview(comma).series.map(({ key }) => key)).toEqual(['level']);
  });

  it('takes a line of units below the header into the names', () => {
    const found = preview('year,co2\n-,ppm\n1990,400.1\n1991,401.5\n');
    expect(found.head.columns).toEqual(['year', 'co2 ppm']);
    expect(found.series[0]).toMatchObject({ quantity: 'co2', unit: 'ppm', unitFrom: 'file' });
  });

  it('reads Latin-1 and UTF-16 headers', () => {
    const latin = Uint8Array.from([...'year,T (\u00b0C)\n1990,9.5\n1991,14.5\n'].map((letter) => letter.charCodeAt(0)));
    expect(preview(latin).series[0]).toMatchObject({ label: 'T (°C)', unit: '°C' });
    const units = [...'\uFEFFyear\tT (\u00b0C)\r\n1990\t9.5\r\n1991\t14.5\r\n'].flatMap((letter) => [
      letter.charCodeAt(0) % 256,
      letter.charCodeAt(0) >> 8,
    ]);
    expect(preview(Uint8Array.from(units)).series[0]).toMatchObject({ label: 'T (°C)', unit: '°C' });
  });

  it('finds the header of any number of lines of text', () => {
    const text = `${Array.from({ length: 180 }, (_, line) => `Line ${line} of a long story, with a comma.`).join('\n')}\n${table}`;
    expect(preview(text).head.options?.headerLine).toBe(181);
    expect(preview(text).head.lines.at(-1)).toBe('1992,1.6');
  });
});

describe('delimited: time', () => {
  it.each<[string, string, string[]]>([
    ['year and month columns', 'Year,Month,level\n1990,1,1.5\n1990,2,1.7\n', ['1990-01: 1.5', '1990-02: 1.7']],
    ['months by name', 'year\tmonth\tlevel\n1990\tJan\t1.5\n1990\tFeb\t1.7\n', ['1990-01: 1.5', '1990-02: 1.7']],
    [
      'unnamed year and month columns',
      '1990 1 1.5\n1990 2 1.7\n1990 3 1.6\n',
      ['1990-01: 1.5', '1990-02: 1.7', '1990-03: 1.6'],
    ],
    [
      'a date beside a year',
      'Date,Year,level\n1990-01-15,1990,1.5\n1990-02-15,1990,1.7\n',
      ['1990-01: 1.5', '1990-02: 1.7'],
    ],
    [
      'decimal years',
      'time,level\n1990.042,1.5\n1990.125,1.7\n1990.208,1.6\n',
      ['1990-01: 1.5', '1990-02: 1.7', '1990-03: 1.6'],
    ],
    ['the year in a later column', 'site,year,level\nA,1990,1.5\nA,1991,1.7\n', ['1990: 1.5', '1991: 1.7']],
    ['years CE of any size', 'YearAD,level\n1,1.5\n2,1.7\n', ['1: 1.5', '2: 1.7']],
  ])('reads %s', (_, text, expected) => {
    expect(steps(valuesOf(text, preview(text).series[0]?.key ?? ''))).toEqual(expected);
  });

  it('says that numbers with a percent sign are not offered', () => {
    const found = preview('year,level,share\n1990,1.5,20%\n1991,1.7,-2.5 %\n1992,1.8,3%\n');
    expect(found.series.map(({ key }) => key)).toEqual(['level']);
    expect(found.notes.join('\n')).toContain('carry a percent sign: share');
  });

  it('does not offer a column that repeats the time', () => {
    const found = preview('year month decimal level\n1990 1 1990.042 1.5\n1990 2 1990.125 1.7\n1990 3 1990.208 1.7\n');
    expect(found.series.map(({ key }) => key)).toEqual(['level']);
    const three = 'YearAD CH4spl YearAD CO2spl\n1 640.5 1.0 276.5\n2 640.1 2.0 276.7\n3 639.5 3.0 276.8\n';
    expect(preview(three, { readerId: 'delimited' }).series.map(({ key }) => key)).toEqual(['ch4spl', 'co2spl']);
    expect(preview('1990 1.5 1990\n1991 1.7 1991\n1992 1.8 1992\n').series).toHaveLength(1);
  });

  it('reads a table of years and months across as a monthly series beside the annual column', () => {
    const header = 'Year,Jan,Feb,Mar,Apr,May,Jun,Jul,Aug,Sep,Oct,Nov,Dec,Annual';
    const numbered = 'Year,1,2,3,4,5,6,7,8,9,10,11,12,Annual';
    const rows =
      '1990,1,2,3,4,5,6,7,8,9,10,11,12,6.5\n1991,2,3,4,5,6,7,8,9,10,11,NaN,NaN,NaN\n1992,1,2,3,4,5,6,7,8,9,10,11,12,6.5\n';
    for (const text of [`${header}\n${rows}`, `${numbered}\n${rows}`]) {
      const found = preview(text);
      expect(found.series.map(({ key, step }) => [key, step])).toEqual([
        ['monthly', 'month'],
        ['annual', 'year'],
      ]);
      expect(offered(found, 'monthly')).toMatchObject({
        nPresent: 34,
        nMissing: 2,
        partialYears: [{ year: 1991, note: '10 of 12 months have a value' }],
      });
      expect(steps(valuesOf(text, 'monthly')).slice(10, 14)).toEqual([
        '1990-11: 11',
        '1990-12: 12',
        '1991-01: 2',
        '1991-02: 3',
      ]);
      expect(valuesOf(text, 'annual').values).toEqual([6.5, null, 6.5]);
    }
  });

  it('leaves absent steps absent and counts them', () => {
    const found = preview('year,level\n1990,1.5\n1993,1.7\n1994,1.6\n');
    expect(found.series[0]).toMatchObject({ nPresent: 3, nMissing: 0, nAbsent: 2 });
  });
});

describe('delimited: rows that cannot be used', () => {
  it('lists each with its line in the file, its text and the reason', () => {
    const text = [
      'An invented level',
      'year,level,other',
      '1990,1.5,1',
      '1991,abc,2',
      '1992,1.6',
      '',
      'year,level,other',
      '19x3,1.7,4',
      '1994,"1.8,5',
      '1995,1.9,6',
      '1996,2.0,7',
      '1997,2.1,8',
      'Trend,0.1,0.2',
      'Source: invented',
    ].join('\n');
    const found = preview(text);
    expect(found.badRows).toEqual([
      { line: 4, text: '1991,abc,2', reason: 'column level: “abc” is not a number' },
      { line: 5, text: '1992,1.6', reason: 'has 2 cells where the table has 3' },
      { line: 7, text: 'year,level,other', reason: 'repeats the header of line 2' },
      { line: 8, text: '19x3,1.7,4', reason: '“19x3” states no time of the kind the other rows state' },
      { line: 9, text: '1994,"1.8,5', reason: 'a quotation mark is opened and not closed' },
      { line: 13, text: 'Trend,0.1,0.2', reason: '“Trend” states no time of the kind the other rows state' },
      { line: 14, text: 'Source: invented', reason: 'text, not a row of the table' },
    ]);
    expect(found.nRows).toBe(4);
    expect(steps(valuesOf(text, 'level'))).toEqual(['1990: 1.5', '1995: 1.9', '1996: 2', '1997: 2.1']);
  });

  it('leaves out a row said twice, and the later of two that disagree, naming both lines', () => {
    const text = 'year,level\n1990,1.5\n1991,1.7\n1990,1.5\n1992,1.6\n1993,1.4\n1991,1.8\n';
    const found = preview(text);
    expect(found.badRows).toEqual([
      { line: 4, text: '1990,1.5', reason: 'repeats line 2' },
      {
        line: 7,
        text: '1991,1.8',
        reason: 'gives 1991 again with other values than line 3, which is kept: level 1.7 there, 1.8 here',
      },
    ]);
    expect(found.notes).toContain('Conflict: lines 3 and 7 give different values for 1991; line 7 is left out.');
    expect(steps(valuesOf(text, 'level'))).toEqual(['1990: 1.5', '1991: 1.7', '1992: 1.6', '1993: 1.4']);
  });

  it('puts unsorted rows in order and says so', () => {
    const unsorted = preview('year,level\n1990,1.5\n1992,1.6\n1991,1.7\n1993,1.8\n');
    expect(unsorted.notes).toContain('Line 4 is out of order; the values were put in order of time.');
    const descending = 'year,level\n1992,1.6\n1991,1.7\n1990,1.5\n';
    expect(preview(descending).notes.join('\n')).toContain('from the newest to the oldest');
    expect(steps(valuesOf(descending, 'level'))).toEqual(['1990: 1.5', '1991: 1.7', '1992: 1.6']);
  });

  it('refuses daily values instead of keeping one day of each month', () => {
    const days = Array.from(
      { length: 90 },
      (_, day) => `${new Date(Date.UTC(1990, 0, 1 + day)).toISOString().slice(0, 10)},${day}.5`,
    );
    const { fields } = errorOf(`date,level\n${days.join('\n')}\n`);
    expect(fields).toMatchObject({ code: 'repeated-times', where: 'table.csv, line 3' });
    expect(fields.hint).toContain('averaged to months');
  });

  it('asks for the month column where years repeat', () => {
    const text = 'year,period,level\n1990,a,1.5\n1990,b,1.7\n1990,c,1.6\n1991,a,1.8\n1991,b,1.9\n';
    expect(errorOf(text).fields.hint).toContain('which column holds the month');
  });
});

describe('delimited: missing values', () => {
  it.each([
    '',
    'NaN',
    'nan',
    'NA',
    'N/A',
    '#N/A',
    'null',
    '***',
    '****',
    '-',
    '--',
    '.',
    '..',
    '-99.99',
    '-99.9',
    '-999',
    '-999.0',
    '-9999',
    '1e20',
    '9.96921e36',
  ])('reads “%s” as missing, keeps its place and counts it', (mark) => {
    const text = `year,level,other\n1990,-0.5,1\n1991,${mark},2\n1992,-0.99,3\n1993,0.2,4\n`;
    const found = preview(text);
    expect(offered(found, 'level')).toMatchObject({ nPresent: 3, nMissing: 1, nAbsent: 0 });
    expect(valuesOf(text, 'level').values).toEqual([-0.5, null, -0.99, 0.2]);
    expect(found.notes.join('\n')).toContain(mark === '' ? 'empty cells once' : `“${mark}” once`);
  });

  it('keeps -99.9 as a value where other values lie near it', () => {
    expect(valuesOf('year,level\n1990,-80.5\n1991,-99.9\n1992,-95\n', 'level').values).toEqual([-80.5, -99.9, -95]);
  });

  it('takes negative numbers as missing only in columns that cannot be negative', () => {
    const text = 'year,level,unc,ndays\n1990,-0.99,0.2,25\n1991,-9.99,-0.99,-1\n1992,-1,-9.99,28\n';
    expect(valuesOf(text, 'level').values).toEqual([-0.99, -9.99, -1]);
    expect(valuesOf(text, 'unc').values).toEqual([0.2, null, null]);
    expect(valuesOf(text, 'ndays').values).toEqual([25, null, 28]);
  });

  it('takes exactly the stated marks when they are stated', () => {
    const text = 'year,level\n1990,7\n1991,8\n1992,-999\n1993,7.0\n';
    expect(valuesOf(text, 'level', withOptions({ missingMarks: ['7'] })).values).toEqual([null, 8, -999, null]);
  });

  it('takes the mark that the text above the table states', () => {
    const text = 'An invented level\nMissing: -99\nyear,level,other\n1990,-99,1\n1991,1.5,-99\n1992,-98,3\n';
    expect(valuesOf(text, 'level').values).toEqual([null, 1.5, -98]);
    expect(preview(text).head.options?.missingMarks).toEqual(['-99']);
  });

  it('does not offer a column without any value', () => {
    const found = preview('year,level,empty\n1990,1.5,-999\n1991,1.7,-999\n');
    expect(found.series.map(({ key }) => key)).toEqual(['level']);
  });
});

describe('delimited: options override what was recognised', () => {
  const wide = 'a;b;c;d\n1990;1,5;2001;7\n1991;1,7;2002;8\n1992;1,6;2003;9\n';

  it('time and value columns', () => {
    expect(steps(valuesOf(wide, 'b', withOptions({ timeColumn: 2 })))).toEqual(['2001: 1.5', '2002: 1.7', '2003: 1.6']);
    const found = preview(wide, withOptions({ valueColumns: [3] }));
    expect(found.series.map(({ key }) => key)).toEqual(['d']);
  });

  it('delimiter, decimal mark, comment mark and header line', () => {
    const text = '*note\nyear|x;level\n1990;1,5\n1991;1,7\n';
    const options = withOptions({ delimiter: ';', decimalMark: ',', commentMark: '*', headerLine: 2 });
    expect(preview(text, options).head.columns).toEqual(['year|x', 'level']);
    expect(preview(text, withOptions({ headerLine: 0 })).head.columns).toEqual(['column 1', 'column 2']);
  });

  it('the month column', () => {
    const text = 'year,season,level\n1990,1,1.5\n1990,2,1.7\n1990,3,1.6\n';
    expect(steps(valuesOf(text, 'level', withOptions({ monthColumn: 1 })))).toEqual([
      '1990-01: 1.5',
      '1990-02: 1.7',
      '1990-03: 1.6',
    ]);
    const annual = 'year,month,level\n1990,7,1.5\n1991,7,1.7\n';
    expect(steps(valuesOf(annual, 'level', withOptions({ monthColumn: null })))).toEqual(['1990: 1.5', '1991: 1.7']);
  });

  it('a bad cell in a column that is not taken does not matter', () => {
    const text = 'year,level,other\n1990,1.5,1\n1991,1.7,?\n1992,1.6,3\n';
    expect(preview(text).badRows).toHaveLength(1);
    expect(preview(text, withOptions({ valueColumns: [1] })).badRows).toEqual([]);
  });

  it.each<[DelimitedOptions, string]>([
    [{ headerLine: 99 }, 'no-such-line'],
    [{ timeColumn: 9 }, 'no-such-column'],
    [{ monthColumn: 9 }, 'no-such-column'],
    [{ valueColumns: [9] }, 'no-such-column'],
    [{ timeColumn: 0 }, 'no-time'],
    [{ delimiter: '\t' }, 'no-table'],
  ])('says what is wrong with %j', (options, code) => {
    const { fields } = errorOf('name,level,year\na,1,1990\nb,2,1991\nc,3,1992\n', withOptions(options));
    expect(fields.code).toBe(code);
    expect(fields.where).toContain('table.csv');
    expect(fields.hint).toBeTruthy();
  });

  it('the options it reports read the file in the same way', () => {
    for (const text of [
      table,
      wide,
      'Year Month x\n1990 1 -99.99\n1990 2 3.5\n',
      'year level unc\n1990 -0.99 0.1\n1991 *** -0.99\n1992 0.3 0.1\n',

      '# c\n1990.5 1\n1991.5 2\n1992.5 3\n',
    ]) {
      const first = preview(text);
      const again = preview(text, { delimited: first.head.options ?? {} });
      expect(again.series).toEqual(first.series);
      expect(again.head.options).toEqual(first.head.options);
    }
  });
});

describe('delimited: files that are no table', () => {
  it.each([
    ['prose', 'This is a letter.\nIt has no table in it.\n'],
    ['prose with years', 'In 1990 there were 5 of them.\nSince then, none.\n'],
    ['words beside years', 'year,name\n1990,a\n1991,b\n'],
    ['numbers without years', '0.5,0.7\n0.3,0.1\n0.2,0.6\n'],
    ['a single column', '1990\n1991\n1992\n'],
    ['a table without any value', 'year,level\n1990,-999\n1991,-999\n'],
  ])('refuses %s, naming the file and a line', (_, text) => {
    const { fields } = errorOf(text, {}, 'letter.txt');
    expect(fields.where).toMatch(/^letter\.txt, line \d+$/);
    expect(['no-table', 'no-numbers']).toContain(fields.code);
    expect(fields.hint).toBeTruthy();
  });
});
