const DAY = 86_400_000;
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const dayAndTime = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
});

/** As "3 Nov 2026". */
export const formatDay = (instant: string): string => day.format(new Date(instant));

/** As "3 Nov 2026, 14:32". */
export const formatDayAndTime = (instant: string): string => dayAndTime.format(new Date(instant));

/** How long ago, in whole days or less: "today", "yesterday", "5 days". */
export function formatAge(instant: string, now: Date = new Date()): string {
  const days = Math.floor((now.getTime() - new Date(instant).getTime()) / DAY);
  if (days <= 0) return 'today';
  return days === 1 ? 'yesterday' : `${days} days`;
}

/** As "1 mark" or "7 marks". */
export const countOf = (count: number, one: string, many = `${one}s`): string =>
  `${count.toLocaleString('en-GB')} ${count === 1 ? one : many}`;
