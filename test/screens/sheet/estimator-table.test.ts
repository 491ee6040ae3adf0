import { mount } from '@vue/test-utils';
import { beforeEach, describe, expect, it } from 'vitest';
import EstimatorTable from '../../../src-renderer/sheet/EstimatorTable.vue';
import ResidualTests from '../../../src-renderer/sheet/ResidualTests.vue';
import { inventedComparison } from '../../helpers/invented-comparison.ts';

const table = () =>
  mount(EstimatorTable, { props: { comparison: inventedComparison, stated: 'at most 1.9' }, attachTo: document.body });
const cells = (row: { findAll: ReturnType<typeof table>['findAll'] }) =>
  row.findAll('th, td').map((cell) => cell.text());

beforeEach(() => document.body.replaceChildren());

describe('EstimatorTable', () => {
  it('has the stated number above, and a row for each estimator with digits that its smallest error decides', () => {
    const rows = table().findAll('tbody tr:not(.words)');
    expect(rows).toHaveLength(1 + inventedComparison.estimates.length);
    expect(cells(rows[0]!).slice(0, 3)).toEqual(['Stated', '', 'at most 1.9']);
    expect(cells(rows[1]!)).toEqual([
      'Least squares, classical errors procedure’s own',
      '',
      '1.87',
      '± 0.04',
      '1.79 – 1.96',
      '−0.03',
    ]);
    expect(cells(rows[5]!)).toEqual(['Theil–Sen', '', '2.21', '', '2.01 – 2.41', '+0.31']);
  });

  it('keeps the full precision within reach', () => {
    const titles = table()
      .findAll('td[title]')
      .map((cell) => cell.attributes('title'));
    expect(titles).toContain('1.874');
    expect(titles).toContain('It has no standard error of its own');
  });

  it('shows doubts beside their number at once, and the convention when its row is opened', async () => {
    const screen = table();
    expect(screen.text()).toContain('This estimator always fits an intercept.');
    expect(screen.text()).not.toContain('as gls-ar1-ml has it');
    const opener = screen.findAll('button').find((one) => one.text() === 'AR(1) errors, maximum likelihood');
    expect(opener?.attributes('aria-expanded')).toBe('false');
    await opener?.trigger('click');
    expect(opener?.attributes('aria-expanded')).toBe('true');
    expect(screen.get(`#${opener?.attributes('aria-controls')}`).text()).toBe(
      'as gls-ar1-ml has it. ρ = 0.520, σ = 0.0930',
    );
    await opener?.trigger('click');
    expect(screen.text()).not.toContain('as gls-ar1-ml has it');
  });

  it('opens and closes all conventions together', async () => {
    const screen = table();
    const all = screen.get('caption button');
    await all.trigger('click');
    for (const { convention } of inventedComparison.estimates) expect(screen.text()).toContain(convention);
    expect(all.text()).toBe('Hide the conventions');
    await all.trigger('click');
    expect(screen.text()).not.toContain('as theil-sen has it');
  });
});

describe('ResidualTests', () => {
  it('has for each test what it asks, its convention, its figures and its doubts', () => {
    const rows = mount(ResidualTests, { props: { tests: inventedComparison.residualTests } }).findAll('tbody tr');
    const [durbinWatson, breuschGodfrey] = rows.map(cells);
    expect(durbinWatson?.slice(2)).toEqual(['0.96', '–', '–']);
    expect(durbinWatson?.[1]).toContain('Without an intercept the published bounds do not apply.');
    expect(breuschGodfrey?.slice(2)).toEqual(['16.20', '3', '0.001']);
    expect(breuschGodfrey?.[1]).toContain('n R² of the residuals on the line’s own design; χ²');
  });
});
