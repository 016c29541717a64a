import { DeviationStrip } from '@/components/rule/deviation-strip';
import { AttemptSign } from './grade-cell';

/** What the signs of the table mean. */
export function Legend() {
  return (
    <ul className="mt-3 flex flex-wrap items-center gap-x-6 gap-y-2 text-label text-ink-2">
      <li className="flex items-center gap-2">
        <DeviationStrip under={200} over={200} full={400} dearestUnder={200} dearestOver={100} />
        lost under, lost over
      </li>
      <li className="flex items-center gap-2">
        <AttemptSign number={2} /> second attempt
      </li>
      <li>
        <strong className="tnum font-[700] text-ink">91</strong> published
      </li>
      <li>
        <span className="tnum font-[380] text-ink">91</span> still being recorded
      </li>
      <li>A word carries no number; zero does.</li>
      <li>over 100: points for the prediction</li>
      <li>term: simple mean of what is published, percent</li>
    </ul>
  );
}
