const LONGEST_TITLE = 120;
const ENDING = /, variant ([A-Z]{1,2})$/;

/** The original is A, so the first variant is B; after Z comes AA. */
export function letterAt(place: number): string {
  const last = String.fromCharCode(65 + (place % 26));
  return place < 26 ? last : letterAt(Math.floor(place / 26) - 1) + last;
}

function placeOf(letter: string): number {
  return [...letter].reduce((place, each) => (place + 1) * 26 + each.charCodeAt(0) - 65, -1);
}

/** The letter that a title ends with, or null where it was given another. */
export function letterOf(title: string): string | null {
  return ENDING.exec(title.trim())?.[1] ?? null;
}

/** The letters of new variants: they go on after those that there are, so that none comes back for other sizes. */
export function nextLetters(titles: readonly string[], count: number): string[] {
  const used = titles.map((title) => placeOf(letterOf(title) ?? 'A'));
  const last = Math.max(titles.length, ...used);
  return Array.from({ length: count }, (_, index) => letterAt(last + 1 + index));
}

/** "Desk caddy, variant B"; a long title gives way to the letter. */
export function variantTitle(title: string, letter: string): string {
  const ending = `, variant ${letter}`;
  return `${title.slice(0, LONGEST_TITLE - ending.length).trimEnd()}${ending}`;
}
