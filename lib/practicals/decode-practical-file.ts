import { MAX_PRACTICAL_FILE_BYTES } from './practical-file';

/**
 * The text of a file's bytes, which are UTF-8 as JSON is, with or without a byte order mark. Refused with a reason:
 * more than 1 MB, and bytes that are no UTF-8. Pure; never throws.
 *
 * @example decodePracticalFile(new Uint8Array([0x7b, 0x7d])) // { ok: true, text: '{}' }
 */
export function decodePracticalFile(
  bytes: Uint8Array,
): { ok: true; text: string } | { ok: false; reason: string } {
  if (bytes.length > MAX_PRACTICAL_FILE_BYTES) {
    const megabytes = (bytes.length / 1_000_000).toFixed(1);
    return { ok: false, reason: `This file has ${megabytes} MB. A practical file has at most 1 MB.` };
  }
  try {
    return { ok: true, text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    return {
      ok: false,
      reason: 'This file is no text in UTF-8, so it is no practical file. Nothing was made.',
    };
  }
}
