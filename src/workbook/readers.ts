/** Where a reader stands in the document, and what it has to say about it. */
export interface Place {
  path: string;
  notes: string[];
}

/** Reads one value of untrusted data, or throws `ReadFailure`. */
export type Reader<T> = (value: unknown, place: Place) => T;

/** One reader a field, none forgotten: a new field does not compile until it is read. */
export type Fields<T> = { readonly [K in keyof T]-?: Reader<T[K]> };

/** Something in the document that cannot be read, with its place. */
export class ReadFailure extends Error {
  override name = 'ReadFailure';
}

const MOST_SHOWN = 40;
const HARMFUL = new Set(['__proto__', 'constructor', 'prototype']);

function inWords(value: unknown): string {
  if (value === undefined) return 'it is missing';
  if (typeof value === 'object' && value !== null) return Array.isArray(value) ? 'it is a list' : 'it is an object';
  const text = typeof value === 'string' ? JSON.stringify(value) : String(value);
  return `it is ${text.length > MOST_SHOWN ? `${text.slice(0, MOST_SHOWN)}…` : text}`;
}

export function fail({ path }: Place, wanted: string, value: unknown): never {
  throw new ReadFailure(`${path || 'The document'} must be ${wanted}; ${inWords(value)}.`);
}

const inside = (place: Place, step: string): Place => ({
  ...place,
  path: place.path ? `${place.path}${step}` : step.replace(/^\./, ''),
});

export const text: Reader<string> = (value, place) =>
  typeof value === 'string' ? value : fail(place, 'a text', value);

/** A text that names something: not empty. */
export const identity: Reader<string> = (value, place) =>
  typeof value === 'string' && value !== '' ? value : fail(place, 'a text that is not empty', value);

/** JSON has no NaN, but 1e999 reads as infinity. */
export const number: Reader<number> = (value, place) =>
  typeof value === 'number' && Number.isFinite(value) ? value : fail(place, 'a number', value);

export const flag: Reader<boolean> = (value, place) =>
  typeof value === 'boolean' ? value : fail(place, 'true or false', value);

export function oneOf<T extends string | number>(...allowed: readonly T[]): Reader<T> {
  const wanted = allowed.map((entry) => JSON.stringify(entry)).join(', ');
  return (value, place) =>
    allowed.find((entry) => entry === value) ?? fail(place, allowed.length > 1 ? `one of ${wanted}` : wanted, value);
}

export function optional<T>(read: Reader<T>): Reader<T | undefined> {
  return (value, place) => (value === undefined ? undefined : read(value, place));
}

export function listOf<T>(read: Reader<T>): Reader<T[]> {
  return (value, place) =>
    Array.isArray(value)
      ? value.map((entry, at) => read(entry, inside(place, `[${at}]`)))
      : fail(place, 'a list', value);
}

/** The value as an object of its own fields; lists and null are none. */
export function object(value: unknown, place: Place): ReadonlyMap<string, unknown> {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return fail(place, 'an object', value);
  return new Map(Object.entries(value));
}

/** An object with these fields. Others are left out, with a note. */
export function record<T extends object>(fields: Fields<T>): Reader<T> {
  return (value, place) => {
    const given = object(value, place);
    for (const key of given.keys()) {
      if (!Object.hasOwn(fields, key))
        place.notes.push(`${inside(place, `.${key}`).path} is not known here and was left out.`);
    }
    const names = Object.keys(fields) as (keyof T & string)[];
    const entries = names.map((key) => [key, fields[key](given.get(key), inside(place, `.${key}`))] as const);
    // The entries hold exactly the fields of T, each read by its own reader: more than fromEntries can tell.
    return Object.fromEntries(entries.filter(([, field]) => field !== undefined)) as T;
  };
}

/** A dictionary with free keys. Keys that reach into JavaScript's own objects are left out, with a note. */
export function dictionaryOf<T>(read: Reader<T>): Reader<Record<string, T>> {
  return (value, place) => {
    const entries: [string, T][] = [];
    for (const [key, entry] of object(value, place)) {
      const at = inside(place, `[${JSON.stringify(key)}]`);
      if (HARMFUL.has(key)) place.notes.push(`${at.path} is not allowed and was left out.`);
      else entries.push([key, read(entry, at)]);
    }
    return Object.fromEntries(entries);
  };
}
