/** Base 32 without the letters that read as others (i, l, o, u). */
const ID_LETTERS = '0123456789abcdefghjkmnpqrstvwxyz';

/** Bytes an id is made of, one letter each. */
export const ID_BYTES = 16;

/** What an id of the plan looks like; opaque otherwise. */
export const ID_PATTERN = /^[0-9a-hjkmnp-tv-z]{16}$/;

/**
 * An id from bytes, random ones or a digest.
 *
 * @param bytes  at least 16; five bits of each are taken
 * @returns 16 base-32 letters
 * @throws RangeError if there are fewer bytes (programmer error)
 */
export function idOf(bytes: Uint8Array): string {
  if (bytes.length < ID_BYTES) throw new RangeError(`An id takes ${ID_BYTES} bytes`);
  return Array.from(bytes.subarray(0, ID_BYTES), (byte) => ID_LETTERS.charAt(byte & 31)).join('');
}
