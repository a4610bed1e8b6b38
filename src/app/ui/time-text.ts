const DAY_MS = 86_400_000;

/** `13:20` in the viewer's zone. */
export function clockTime(atMs: number): string {
  return new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' }).format(atMs);
}

/** `9 Mar 2026, 16:40 CET` in the viewer's zone. */
export function dateAndTime(atMs: number): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    timeZoneName: 'short',
  }).format(atMs);
}

/** `9 March`, without the year while it is this one. */
export function dayText(atMs: number, nowMs: number): string {
  const sameYear = new Date(atMs).getFullYear() === new Date(nowMs).getFullYear();
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    ...(sameYear ? {} : { year: 'numeric' }),
  }).format(atMs);
}

/** `Today, 10 March`, `Yesterday, 9 March`, else the day alone. */
export function dayHeading(atMs: number, nowMs: number): string {
  const days = dayNumber(nowMs) - dayNumber(atMs);
  const day = dayText(atMs, nowMs);
  return days === 0 ? `Today, ${day}` : days === 1 ? `Yesterday, ${day}` : day;
}

/** How long ago, coarsely: `4 hours`, `1 day`, `now` under an hour. */
export function waitingText(sinceMs: number, nowMs: number): string {
  const hours = Math.floor((nowMs - sinceMs) / 3_600_000);
  if (hours < 1) return 'now';
  if (hours < 24) return counted(hours, 'hour');
  return counted(Math.floor((nowMs - sinceMs) / DAY_MS), 'day');
}

/** `1 day`, `3 days`. */
export function counted(count: number, word: string): string {
  return `${count} ${word}${count === 1 ? '' : 's'}`;
}

/** Number of the calendar day in the viewer's zone, for comparing days. */
function dayNumber(atMs: number): number {
  const date = new Date(atMs);
  return Math.floor(Date.UTC(date.getFullYear(), date.getMonth(), date.getDate()) / DAY_MS);
}
