/**
 * Looking for words of a patient in bytes of any kind: as they are, in capitals and in small letters, as UTF-16 in both orders, and as base64
 * at each of its three alignments (RFC 4648: three bytes are four letters; the letters at both ends also hold bits of what stands beside).
 */

const ways: readonly ((word: string) => Buffer[])[] = [
  (word) => [word, word.toUpperCase(), word.toLowerCase()].map((form) => Buffer.from(form, 'latin1')),
  (word) => [Buffer.from(word, 'utf16le'), Buffer.from(word, 'utf16le').swap16()],
  (word) => [0, 1, 2].map((phase) => base64At(Buffer.from(word, 'latin1'), phase)),
  (word) => [0, 1, 2].map((phase) => base64At(Buffer.from(word, 'utf16le'), phase)),
];

/** The letters that depend on nothing but `bytes` when `phase` other bytes stand before them in their group of three. */
function base64At(bytes: Buffer, phase: number): Buffer {
  const letters = Buffer.concat([Buffer.alloc(phase), bytes])
    .toString('base64')
    .replace(/=+$/, '');
  const whole = Math.floor(((phase + bytes.length) * 8) / 6);
  return Buffer.from(letters.slice(Math.ceil((phase * 8) / 6), whole), 'latin1');
}

/** The words of `words` that are somewhere in `place`, in whatever form. */
export const wordsIn = (place: Buffer, words: readonly string[]): string[] =>
  words.filter((word) => ways.some((way) => way(word).some((needle) => place.includes(needle))));
