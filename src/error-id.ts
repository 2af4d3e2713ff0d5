const LETTERS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';

/** The id on the error page and in the log, 4 + 4 letters, from the digest that both of them know. */
export function errorIdOf(digest: string): string {
  const [first, second] = [hash(digest, 0x811c9dc5), hash(digest, 0x9e3779b9)];
  return `${fourLetters(first)}-${fourLetters(second)}`;
}

function hash(text: string, seed: number): number {
  let value = seed;
  for (let i = 0; i < text.length; i++) value = Math.imul(value ^ text.charCodeAt(i), 0x01000193);
  value = Math.imul(value ^ (value >>> 15), 0x85ebca6b);
  return (value ^ (value >>> 13)) >>> 0;
}

function fourLetters(value: number): string {
  return [0, 5, 10, 15].map((shift) => LETTERS.charAt((value >>> shift) & 31)).join('');
}
