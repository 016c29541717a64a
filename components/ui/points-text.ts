/** Points, kept in hundredths, as they are written: 1, 1.5, 2.22. */
export function pointsAsText(points: number): string {
  const text = (Math.abs(points) / 100).toFixed(2).replace(/\.?0+$/, '');
  return points < 0 ? `−${text}` : text;
}
