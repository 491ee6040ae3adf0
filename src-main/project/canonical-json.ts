import canonicalize from 'canonicalize';
import { InputError } from '../errors.ts';

/**
 * Canonical JSON: the one text that a value has, so that equal values have equal digests.
 *
 * Stricter than the library below it, which follows JSON.stringify in quietly turning what JSON cannot say into
 * something that it can: NaN, ±Infinity, lone surrogates, undefined in an array, dates, typed arrays and class
 * instances are refused here with their place. Members that are undefined are left out, as absent optional fields.
 *
 * @throws InputError not-json
 * Source  RFC 8785 (2020), JSON Canonicalization Scheme
 * Checked test/reference/canonical-json.test.ts against the RFC's number table, sample and sorting example
 */
export function canonicalJson(value: unknown): string {
  refuseWhatJsonCannotSay(value, '$', new Set());
  const text = canonicalize(value);
  if (text === undefined) throw notJson('$', 'undefined');
  return text;
}

function refuseWhatJsonCannotSay(value: unknown, place: string, above: Set<object>): void {
  if (value === null || typeof value === 'boolean') return;
  if (typeof value === 'string') return refuseLoneSurrogates(value, place);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw notJson(place, String(value));
    return;
  }
  if (typeof value !== 'object') throw notJson(place, typeof value);
  if (above.has(value)) throw notJson(place, 'an object that contains itself');
  above.add(value);
  if (Array.isArray(value)) {
    for (let index = 0; index < value.length; index++)
      refuseWhatJsonCannotSay(value[index], `${place}[${index}]`, above);
  } else {
    if (!isPlainObject(value)) throw notJson(place, `an instance of ${value.constructor?.name ?? 'a class'}`);
    for (const [key, member] of Object.entries(value)) {
      refuseLoneSurrogates(key, `${place} (a member's name)`);
      if (member !== undefined) refuseWhatJsonCannotSay(member, `${place}.${key}`, above);
    }
  }
  above.delete(value);
}

function refuseLoneSurrogates(text: string, place: string): void {
  if (!text.isWellFormed()) throw notJson(place, 'text with half of a surrogate pair');
}

function isPlainObject(value: object): boolean {
  const prototype: unknown = Object.getPrototypeOf(value);
  return (prototype === Object.prototype || prototype === null) && !('toJSON' in value);
}

function notJson(place: string, received: string): InputError {
  return new InputError({
    code: 'not-json',
    where: place,
    expected:
      'a value that JSON can carry: finite numbers, well-formed text, true, false, null, lists and plain objects',
    received,
  });
}
