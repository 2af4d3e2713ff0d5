const ALPHABET = '0123456789abcdefghjkmnpqrstvwxyz';

/** 16 base-32 characters; `randomUUID` is missing on plain http off localhost. */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => ALPHABET[byte & 31]).join('');
}
