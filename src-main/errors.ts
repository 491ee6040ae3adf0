/**
 * The three kinds of error that Footing raises on purpose, as data: the sentence is built from the fields,
 * so it can be tested, translated, and carried over the bridge without a stack trace.
 */
export interface ErrorFields {
  /** Stable identifier in kebab-case, for programs. */
  code: string;
  /** What the message is about: a function, a file and line, a field. */
  where: string;
  /** What was required. */
  expected: string;
  /** What came instead. */
  received: string;
  /** The way out. */
  hint?: string;
}

abstract class FootingError extends Error {
  readonly fields: ErrorFields;

  constructor(fields: ErrorFields) {
    super(errorSentence(fields));
    this.fields = fields;
  }
}

/** The caller asked for something impossible: a wrong length, an unknown name, a file that is not what it says. */
export class InputError extends FootingError {
  override readonly name = 'InputError';
}

/** A fair question without a trustworthy answer: singular, not converged, outside a fit's published range. */
export class NumericError extends FootingError {
  override readonly name = 'NumericError';
}

/** The project file: in use, unreadable, altered, from a newer version. */
export class ProjectError extends FootingError {
  override readonly name = 'ProjectError';
}

export type ErrorKind = 'InputError' | 'NumericError' | 'ProjectError';

/** Name + requirement + what came instead + way out. */
export function errorSentence({ where, expected, received, hint }: ErrorFields): string {
  const sentence = `${where}: expected ${expected}, but found ${received}.`;
  return hint ? `${sentence} ${hint}` : sentence;
}

export function isFootingError(error: unknown): error is InputError | NumericError | ProjectError {
  return error instanceof FootingError;
}
