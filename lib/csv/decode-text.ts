export type DecodedText = { ok: true; text: string; note: string | null } | { ok: false; reason: string };

/** Far more than a roster of 500 students; a file beyond it is something else. */
export const MAX_FILE_BYTES = 1_000_000;

const SAVE_AS_CSV = 'Open it in the program it came from and save it as “CSV, UTF-8”, or paste the names.';

const SIGNATURES: { bytes: readonly number[]; what: string }[] = [
  { bytes: [0x50, 0x4b, 0x03, 0x04], what: 'a spreadsheet or another packed file' },
  { bytes: [0xd0, 0xcf, 0x11, 0xe0], what: 'an old spreadsheet' },
  { bytes: [0x25, 0x50, 0x44, 0x46], what: 'a PDF' },
  { bytes: [0x89, 0x50, 0x4e, 0x47], what: 'a picture' },
  { bytes: [0xff, 0xd8, 0xff], what: 'a picture' },
];

/**
 * The text of a file that a person chose. UTF-8 with or without a byte order mark; UTF-16 that begins with one is
 * decoded, and `note` says so. Refused, with a sentence on what to do: an empty file, one past `MAX_FILE_BYTES`, one
 * that is no text, and bytes that are no UTF-8 (a wrong character is a wrong name). Pure; never throws.
 * @example decodeText(new Uint8Array([0xef, 0xbb, 0xbf, 0x41])) // { ok: true, text: 'A', note: null }
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (bytes.length === 0) return refuse('This file is empty. Choose another one, or paste the names.');
  if (bytes.length > MAX_FILE_BYTES) return refuse(tooLong(bytes.length));
  const known = SIGNATURES.find(({ bytes: first }) => first.every((byte, index) => bytes[index] === byte));
  if (known) return refuse(`This is ${known.what}, not CSV. ${SAVE_AS_CSV}`);
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return decodeUtf16(bytes, 'utf-16le');
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return decodeUtf16(bytes, 'utf-16be');
  return decodeUtf8(bytes);
}

/** Why a file of this many bytes is not read. */
export function tooLong(byteCount: number): string {
  const megabytes = (byteCount / 1_000_000).toFixed(1);
  return `This file has ${megabytes} MB; a roster of 500 students has less than 0.1 MB. Choose the CSV of one section, or paste the names.`;
}

function decodeUtf8(bytes: Uint8Array): DecodedText {
  if (bytes.includes(0)) {
    return refuse(
      looksLikeUtf16(bytes)
        ? `This file seems to be UTF-16 without its mark, so its letters cannot be told for certain. ${SAVE_AS_CSV}`
        : `This file is no text. ${SAVE_AS_CSV}`,
    );
  }
  try {
    return checked(new TextDecoder('utf-8', { fatal: true }).decode(bytes), null);
  } catch {
    return refuse(
      `This file is not in UTF-8: letters such as é or ö would come in wrong. ${SAVE_AS_CSV} Nothing was changed.`,
    );
  }
}

function decodeUtf16(bytes: Uint8Array, encoding: 'utf-16le' | 'utf-16be'): DecodedText {
  try {
    const text = new TextDecoder(encoding, { fatal: true }).decode(bytes);
    return checked(text, 'This file was in UTF-16; its letters were taken over as they are.');
  } catch {
    return refuse(`This file begins like UTF-16 but is not. ${SAVE_AS_CSV}`);
  }
}

/** Text has tabs and line ends; other control characters in any number mean a file that only looks like text. */
function checked(text: string, note: string | null): DecodedText {
  const strange = (text.match(/\p{Cc}/gu) ?? []).filter((mark) => !'\t\n\r'.includes(mark)).length;
  if (strange > 8 && strange * 50 > text.length) return refuse(`This file is no text. ${SAVE_AS_CSV}`);
  return text.trim() === ''
    ? refuse('This file has no line with anything in it. Choose another one, or paste the names.')
    : { ok: true, text, note };
}

/** Letters of western names fill every second byte of UTF-16 with nothing. */
function looksLikeUtf16(bytes: Uint8Array): boolean {
  const sample = bytes.subarray(0, 400);
  const zeros = [0, 0];
  sample.forEach((byte, index) => {
    if (byte === 0) zeros[index % 2] = (zeros[index % 2] ?? 0) + 1;
  });
  return Math.max(...zeros) * 3 > sample.length;
}

function refuse(reason: string): DecodedText {
  return { ok: false, reason };
}
