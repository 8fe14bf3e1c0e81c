/** U+0000, and halves of a surrogate pair, which a text cut in the middle of an emoji leaves behind. */
const UNSTORABLE = /\0|\p{Surrogate}/gu;
const REPLACEMENT = '\ufffd';

/** Whether a text can be kept in the database and hashed: neither PostgreSQL nor RFC 8785 takes these characters. */
export function isStorable(text: string): boolean {
  return text.search(UNSTORABLE) === -1;
}

/** A value of JSON with every text in it storable: what cannot be kept becomes the replacement character. */
export function storable<T>(value: T): T {
  if (typeof value === 'string') return value.replace(UNSTORABLE, REPLACEMENT) as T;
  if (Array.isArray(value)) return value.map(storable) as T;
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, held]) => [key, storable(held)])) as T;
}
