/**
 * The name of a file that goes out: period, then the practical or else the section, then what it holds. Letters a to
 * z, digits and hyphens, so that no system changes it.
 * @example exportFileName({ period: '3', subject: 'Desk caddy', kind: 'grades' }) // 'period-3-desk-caddy-grades.csv'
 */
export function exportFileName({
  period,
  subject,
  kind,
}: {
  period: string;
  subject: string;
  kind: 'grades' | 'sizes';
}): string {
  const parts = ['period', plain(period, 20), plain(subject, 60), kind].filter((part) => part !== '');
  return `${parts.join('-')}.csv`;
}

function plain(text: string, most: number): string {
  return text
    .normalize('NFKD')
    .replaceAll(/\p{M}/gu, '')
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .slice(0, most)
    .replaceAll(/^-|-$/g, '');
}
