import { format, parseISO } from 'date-fns';

/** A day as it is said in class: "Friday, December 4". */
export function DayText({ day }: { day: string }) {
  return <time dateTime={day}>{format(parseISO(day), 'EEEE, MMMM d')}</time>;
}
