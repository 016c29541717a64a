import { describe, expect, it } from 'vitest';
import { decodeText, MAX_FILE_BYTES } from '@/lib/csv/decode-text';

const utf8 = (text: string) => new TextEncoder().encode(text);

function utf16(text: string, order: 'le' | 'be', mark = true): Uint8Array {
  const units = [...(mark ? '\u{feff}' : ''), ...text].flatMap((character) =>
    Array.from({ length: character.length }, (_, index) => character.charCodeAt(index)),
  );
  return Uint8Array.from(
    units.flatMap((unit) => (order === 'le' ? [unit & 255, unit >> 8] : [unit >> 8, unit & 255])),
  );
}

const NAMES = 'ID,name\r\n00431,"Bergström, Maja"\r\n00480,"Jurić, Lovro"\r\n';

function reasonOf(bytes: Uint8Array): string {
  const decoded = decodeText(bytes);
  if (decoded.ok) throw new Error(`decoded: ${decoded.text.slice(0, 40)}`);
  return decoded.reason;
}

describe('decodeText', () => {
  it('reads UTF-8, with a byte order mark or without', () => {
    expect(decodeText(utf8(NAMES))).toEqual({ ok: true, text: NAMES, note: null });
    expect(decodeText(utf8(`\u{feff}${NAMES}`))).toEqual({ ok: true, text: NAMES, note: null });
  });

  it('keeps the promise of its example', () => {
    expect(decodeText(new Uint8Array([0xef, 0xbb, 0xbf, 0x41]))).toEqual({ ok: true, text: 'A', note: null });
  });

  it.each(['le', 'be'] as const)('reads UTF-16 with its mark (%s) and says so', (order) => {
    expect(decodeText(utf16(NAMES, order))).toEqual({
      ok: true,
      text: NAMES,
      note: 'This file was in UTF-16; its letters were taken over as they are.',
    });
  });

  it('refuses UTF-16 without its mark, and half a letter of it', () => {
    expect(reasonOf(utf16(NAMES, 'le', false))).toContain('UTF-16 without its mark');
    expect(reasonOf(Uint8Array.from([0xff, 0xfe, 0x41]))).toContain('begins like UTF-16');
  });

  it('refuses another encoding instead of bringing in wrong letters', () => {
    // "Bergström" in Latin-1: a single byte F6 that UTF-8 does not have.
    expect(reasonOf(Uint8Array.from([...utf8('Bergstr'), 0xf6, ...utf8('m')]))).toContain('not in UTF-8');
  });

  it.each([
    ['a spreadsheet', [0x50, 0x4b, 0x03, 0x04, 1, 2]],
    ['an old spreadsheet', [0xd0, 0xcf, 0x11, 0xe0]],
    ['a PDF', [...utf8('%PDF-1.7')]],
    ['a picture', [0x89, 0x50, 0x4e, 0x47]],
  ])('refuses %s by its first bytes and says how to get a CSV', (what, bytes) => {
    expect(reasonOf(Uint8Array.from(bytes))).toMatch(new RegExp(`${what}.*save it as “CSV, UTF-8”`));
  });

  it('refuses what is no text', () => {
    expect(reasonOf(Uint8Array.from({ length: 300 }, (_, index) => (index % 7 === 0 ? 0 : 65)))).toContain(
      'no text',
    );
    expect(reasonOf(Uint8Array.from({ length: 300 }, (_, index) => index % 32))).toContain('no text');
    expect(reasonOf(Uint8Array.from({ length: 300 }, (_, index) => 1 + (index % 31)))).toContain('no text');
  });

  it('refuses a file of 10 MB by its size, and takes one of the largest size', () => {
    expect(reasonOf(new Uint8Array(10_000_000).fill(65))).toMatch(/10\.0 MB.*one section/);
    expect(decodeText(new Uint8Array(MAX_FILE_BYTES).fill(65)).ok).toBe(true);
  });

  it('refuses an empty file and one of nothing but line ends', () => {
    expect(reasonOf(new Uint8Array(0))).toContain('empty');
    expect(reasonOf(utf8('\r\n \r\n'))).toContain('no line');
  });
});
