import type { Check, Rubric } from '@/lib/scoring';
import { PointsInBoth } from '../../_components/points-in-both';

/** The checks of each piece and of the whole work: what they look at and what each level loses. */
export function CheckRules({ rubric }: { rubric: Rubric }) {
  const groups = checkGroups(rubric);
  return (
    <>
      {groups.map(({ check, where }) => (
        <CheckRule key={`${where}/${check.id}`} rubric={rubric} check={check} where={where} />
      ))}
      {rubric.workChecks.map((check) => (
        <CheckRule key={check.id} rubric={rubric} check={check} where="Looked at once, for the whole work" />
      ))}
    </>
  );
}

function CheckRule({ rubric, check, where }: { rubric: Rubric; check: Check; where: string }) {
  const costly = check.levels.filter(({ lose }) => lose > 0);
  return (
    <>
      <dt>{check.label}</dt>
      <dd>
        {where}.{' '}
        {costly.map(({ label, lose }) => (
          <span key={label}>
            “{label}” loses <PointsInBoth rubric={rubric} points={lose} />.{' '}
          </span>
        ))}
        {costly.length === 0 ? 'It costs nothing.' : null}
      </dd>
    </>
  );
}

/** Each check once, with the parts it is Looked at on. */
function checkGroups(rubric: Rubric): { check: Check; where: string }[] {
  const groups = new Map<string, { check: Check; labels: string[] }>();
  for (const { label, checks } of rubric.lines) {
    for (const check of checks) {
      const key = JSON.stringify(check);
      const group = groups.get(key) ?? { check, labels: [] };
      group.labels.push(label);
      groups.set(key, group);
    }
  }
  return [...groups.values()].map(({ check, labels }) => ({
    check,
    where:
      labels.length === rubric.lines.length
        ? 'Looked at on every piece'
        : `Looked at on ${labels.join(', ')}`,
  }));
}
