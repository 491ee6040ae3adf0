import { describe, expect, it } from 'vitest';
import type { z } from 'zod';
import { claimDraft } from '../../../src-main/contract/claim.ts';
import { computeMethods } from '../../../src-main/contract/compute.ts';
import { requests } from '../../../src-main/contract/requests.ts';
import { errorSentence, InputError } from '../../../src-main/errors.ts';
import { checkInput } from '../../../src-main/handlers/check-input.ts';

const draft = {
  title: 'Invented',
  statement: { words: 'w', quantity: 'trend', value: '0.2', unit: 'K per decade' },
  procedure: { kind: 'trend', seriesId: 'warming' },
};

function problem(schema: z.ZodType, input: unknown) {
  try {
    checkInput('claim', schema, input);
  } catch (error) {
    if (error instanceof InputError) return error.fields;
    throw error;
  }
  return null;
}

describe('an input in the form asked for', () => {
  it('comes back with its fields', () => {
    expect(checkInput('claim', claimDraft, draft)).toEqual(draft);
  });

  it('may leave out what is optional, also as undefined', () => {
    expect(problem(claimDraft, { ...draft, seed: undefined })).toBeNull();
  });

  it('may hold a million numbers', () => {
    const x = Array.from({ length: 1_000_000 }, (_, place) => place);
    const request = { x, y: x, intercept: true, covariance: { kind: 'classical' } };
    expect(problem(computeMethods.regression.input, request)).toBeNull();
  });
});

describe('an input in another form', () => {
  const withStatement = (change: object) => ({ ...draft, statement: { ...draft.statement, ...change } });
  const withProcedure = (change: object) => ({ ...draft, procedure: { ...draft.procedure, ...change } });

  it.each<[string, unknown, string, string, string]>([
    ['is no object', [], 'claim', 'an object', 'a list of 0'],
    ['is nothing', null, 'claim', 'an object', 'null'],
    ['lacks a field', { ...draft, title: undefined }, 'claim.title', 'text', 'nothing'],
    ['holds a number for text', { ...draft, title: 7 }, 'claim.title', 'text', '7'],
    ['is too short', { ...draft, title: '' }, 'claim.title', 'text with a length of at least 1', 'empty text'],
    ['names an unknown unit', withStatement({ unit: 'K per moon' }), 'claim.statement.unit', 'one of', '“K per moon”'],
    ['is no number as printed', withStatement({ value: 'two' }), 'claim.statement.value', 'as printed', '“two”'],
    ['names an unknown kind', withProcedure({ kind: 'guess' }), 'claim.procedure.kind', 'one of', '“guess”'],
    ['has another kind of reference', withProcedure({ seriesId: {} }), 'claim.procedure.seriesId', 'text', 'an object'],
    ['counts too many months', withProcedure({ minMonths: 13 }), 'claim.procedure.minMonths', 'at most 12', '13'],
    ['has a fraction', { ...draft, seed: 1.5 }, 'claim.seed', 'a whole number', '1.5'],
    ['is not finite', { ...draft, seed: Infinity }, 'claim.seed', 'a finite number', 'Infinity'],
    ['is wrong inside a list', { ...draft, derivation: ['a', 1] }, 'claim.derivation[1]', 'text', '1'],
  ])(
    'that %s is refused, with the place, what belongs there and what was found',
    (_, input, where, expected, received) => {
      const found = problem(claimDraft, input);
      expect(found).toMatchObject({ code: 'input-form', where, received });
      expect(found?.expected).toContain(expected);
    },
  );

  it('is shown shortened when it is long', () => {
    const found = problem(claimDraft, { ...draft, title: 'x'.repeat(100_000) });
    expect(found?.expected).toBe('text with a length of at most 200');
    expect(found?.received).toMatch(/^“x{80}…” \(100000 characters\)$/);
  });

  it('of a form with alternatives is told of the one it follows furthest', () => {
    const input = {
      x: [
        [1, 2],
        [3, 'four'],
      ],
      y: [1, 2],
      intercept: true,
      covariance: { kind: 'classical' },
    };
    expect(problem(computeMethods.regression.input, input)).toMatchObject({
      where: 'claim.x[1][1]',
      received: '“four”',
    });
  });

  it('says how many more places are wrong', () => {
    expect(problem(claimDraft, { title: 1, statement: 2 })?.hint).toMatch(/^1 more place/);
  });

  it('makes a sentence without the words of the checker', () => {
    for (const input of [
      null,
      {},
      { ...draft, title: '' },
      withStatement({ unit: 'x' }),
      withProcedure({ kind: 'x' }),
    ]) {
      const fields = problem(claimDraft, input);
      expect(fields && errorSentence(fields)).not.toMatch(/Invalid|Too (big|small)|discriminator|undefined/);
    }
  });
});

describe('a field that is not known', () => {
  it.each([
    ['at the top', { ...draft, procedur: {} }, 'claim', 'procedur'],
    ['inside', { ...draft, procedure: { ...draft.procedure, Window: null } }, 'claim.procedure', 'Window'],
    [
      'of another alternative',
      { ...draft, procedure: { ...draft.procedure, anchor: null } },
      'claim.procedure',
      'anchor',
    ],
    ['named like a prototype', JSON.parse(`{"__proto__":{},${JSON.stringify(draft).slice(1)}`), 'claim', '__proto__'],
    ['named like a method', { ...draft, constructor: 1 }, 'claim', 'constructor'],
  ])('%s is refused rather than passed over', (_, input, where, name) => {
    expect(problem(claimDraft, input)).toMatchObject({ code: 'unknown-field', where, received: `a field “${name}”` });
  });

  it('is let through where any field may stand', () => {
    expect(problem(requests.compute.input, { method: 'regression', x: [1] })).toBeNull();
    expect(problem(claimDraft, { ...draft, answers: { 'any-question': 'yes', constructor: 'no' } })).toBeNull();
  });
});
