/**
 * Write a value as canonical JSON: keys in order of their UTF-16 code units, no whitespace, numbers as ECMAScript prints them.
 *
 * Members that are `undefined` are left out, as `JSON.stringify` does.
 *
 * @throws TypeError with the JSON Pointer of whatever JSON cannot hold: non-finite numbers, lone surrogates,
 *   undefined elsewhere, bigint, functions, symbols, instances of classes (typed arrays, Date) and cycles
 * @source RFC 8785 section 3.2
 */
export function canonicalJson(value: unknown): string {
  return write(value, '#', new Set());
}

function write(value: unknown, at: string, ancestors: Set<object>): string {
  switch (typeof value) {
    case 'number':
      if (!Number.isFinite(value)) throw new TypeError(`expected a finite number at ${at}, got ${value}`);
      return JSON.stringify(value);
    case 'string':
      return writeText(value, at);
    case 'boolean':
      return String(value);
    case 'object':
      return value === null ? 'null' : writeContainer(value, at, ancestors);
    default:
      throw new TypeError(`JSON cannot hold the ${typeof value} at ${at}`);
  }
}

/** Half a surrogate pair is not Unicode text; RFC 8785 section 3.2.2.2 ends the writing there. */
const loneSurrogate = /\p{Surrogate}/u;

function writeText(text: string, at: string): string {
  if (loneSurrogate.test(text)) throw new TypeError(`the text at ${at} holds half a surrogate pair`);
  return JSON.stringify(text);
}

function writeContainer(value: object, at: string, ancestors: Set<object>): string {
  if (ancestors.has(value)) throw new TypeError(`the value at ${at} contains itself`);
  ancestors.add(value);
  const text = Array.isArray(value) ? writeArray(value, at, ancestors) : writeObject(value, at, ancestors);
  ancestors.delete(value);
  return text;
}

function writeArray(values: readonly unknown[], at: string, ancestors: Set<object>): string {
  const parts: string[] = [];
  // Not `map`: it would skip the holes of a sparse array instead of refusing them.
  for (let index = 0; index < values.length; index += 1) parts.push(write(values[index], `${at}/${index}`, ancestors));
  return `[${parts.join(',')}]`;
}

function writeObject(value: object, at: string, ancestors: Set<object>): string {
  const prototype: unknown = Object.getPrototypeOf(value);
  if (prototype !== Object.prototype && prototype !== null) {
    throw new TypeError(`expected a plain object at ${at}, got an instance of ${value.constructor?.name ?? 'a class'}`);
  }
  const members: string[] = [];
  // The default sort compares UTF-16 code units, which is the order RFC 8785 section 3.2.3 asks for.
  for (const key of Object.keys(value).sort()) {
    const member: unknown = Reflect.get(value, key);
    if (member !== undefined) members.push(`${writeText(key, at)}:${write(member, `${at}/${key}`, ancestors)}`);
  }
  return `{${members.join(',')}}`;
}
