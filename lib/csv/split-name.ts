/**
 * A name written as one text. With a comma the family name stands before it; without one the last word is the family
 * name. Spaces are evened out, and letters composed (NFC), so that the same name is the same text.
 * @example splitName('Quispe, Wayra') // { familyName: 'Quispe', givenName: 'Wayra' }
 */
export function splitName(text: string): { familyName: string; givenName: string } {
  const name = tidyName(text);
  const comma = name.indexOf(',');
  if (comma >= 0) {
    return { familyName: name.slice(0, comma).trim(), givenName: name.slice(comma + 1).trim() };
  }
  const space = name.lastIndexOf(' ');
  return { familyName: name.slice(space + 1), givenName: space < 0 ? '' : name.slice(0, space) };
}

/** One space between words, none around them, letters composed. Control characters stay, to be refused. */
export function tidyName(text: string): string {
  return text
    .normalize('NFC')
    .replaceAll(/\p{Zs}+/gu, ' ')
    .replaceAll(/^[\p{Zs}\r\n]+|[\p{Zs}\r\n]+$/gu, '');
}
