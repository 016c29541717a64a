import { sayWeekday } from '@/components/ui/days';

/** A day as it is said in class: "Friday, 4 December". */
export function DayText({ day }: { day: string }) {
  return <time dateTime={day}>{sayWeekday(day)}</time>;
}
