import type { Claim, StatementQuestion } from '../contract/claim.ts';
import { sensitivities } from './quantity-names.ts';

interface Question {
  id: string;
  question: string;
  why: string;
  options: string[];
  applies(statement: Claim['statement']): boolean;
}

const speaksOfSensitivity = ({ quantity }: Claim['statement']) => sensitivities.includes(quantity);

const questions: Question[] = [
  {
    id: 'kind-of-sensitivity',
    question: 'Which kind of sensitivity does the source say this is?',
    why: 'A slope of a record so far, a transient response and an equilibrium are three numbers; only like may be held against like.',
    options: ['it says so in words', 'only the context suggests it', 'it does not say'],
    applies: speaksOfSensitivity,
  },
  {
    id: 'doubling-or-e-folding',
    question: 'Is the number per doubling of CO₂, or per e-folding (per unit of the natural logarithm)?',
    why: 'The two differ by the factor ln 2 = 0.693.',
    options: ['per doubling, as printed', 'per e-folding, as printed', 'not printed: taken from the context'],
    applies: speaksOfSensitivity,
  },
  {
    id: 'degrees',
    question: 'Are the degrees Celsius (or kelvin) or Fahrenheit?',
    why: 'A difference of 1 °C is one of 1.8 °F.',
    options: ['°C or K, as printed', '°F, as printed', 'not printed: taken from the context'],
    applies: ({ quantity }) => sensitivities.includes(quantity) || quantity === 'trend',
  },
  {
    id: 'is-bound',
    question: 'Is it stated as a value or as a limit?',
    why: 'A limit claims more than a value: that everything left out could only move the number one way.',
    options: ['a value', 'an upper limit', 'a lower limit'],
    applies: () => true,
  },
  {
    id: 'per-what',
    question: 'Is the trend per year or per decade, and over which years?',
    why: 'A factor of ten is easily lost between a chart and a sentence.',
    options: ['as printed', 'taken from the context'],
    applies: ({ quantity }) => quantity === 'trend',
  },
  {
    id: 'uncertainty-stated',
    question: 'Does the source state an uncertainty, and at which level?',
    why: 'A likely range (66 %) and a very likely range (90 %) of the same number differ by a factor of about 1.7.',
    options: ['none stated', 'stated with its level', 'stated without a level'],
    applies: () => true,
  },
];

/** The questions a careful colleague would ask about this statement, with the answers so far. */
export function statementQuestions(
  statement: Claim['statement'],
  answers: Readonly<Record<string, string>>,
): StatementQuestion[] {
  return questions
    .filter((question) => question.applies(statement))
    .map(({ id, question, why, options }) => ({ id, question, why, options, answer: answers[id] ?? null }));
}
