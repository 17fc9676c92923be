/**
 * Write a path into a JSON value as a pointer in URI fragment form, such as `#/samples/3/massMg`.
 *
 * @param path keys and array indices from the root; empty for the whole value
 * @source RFC 6901 section 3 (escapes `~0`, `~1`) and section 6 (fragment, percent encoding of RFC 3986)
 */
export function jsonPointer(path: readonly PropertyKey[]): string {
  return `#${path.map((step) => `/${encodeStep(String(step))}`).join('')}`;
}

/** Characters that RFC 3986 allows in a fragment beyond what `encodeURIComponent` leaves alone. */
const allowedInFragment = /%(?:24|26|2B|2C|3A|3B|3D|3F|40)/g;

/** A half of a surrogate pair without its other half: not a character, so percent encoding has no bytes for it. */
const loneSurrogate = /\p{Surrogate}/gu;

function encodeStep(step: string): string {
  const escaped = step.replace(loneSurrogate, '\uFFFD').replaceAll('~', '~0').replaceAll('/', '~1');
  return encodeURIComponent(escaped).replace(allowedInFragment, (code) => decodeURIComponent(code));
}
