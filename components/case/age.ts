/** How long something has been open, in the one unit that says it: minutes under an hour, hours under a day, then days. */
const minute = 60_000;

export function ageOf(openedAt: string, now: number): string {
  const minutes = Math.max(0, Math.floor((now - Date.parse(openedAt)) / minute));
  if (minutes < 1) return 'just now';
  if (minutes < 60) return `${minutes} min`;
  const hours = Math.floor(minutes / 60);
  return hours < 24 ? `${hours} h` : `${Math.floor(hours / 24)} d`;
}

/** When it was, in words: `just now`, `12 min ago`. */
export function agoOf(at: string, now: number): string {
  const age = ageOf(at, now);
  return age === 'just now' ? age : `${age} ago`;
}

/** `day 3, 09:15`: days since the case was opened (the day of opening is day 0) and the time of day where the reader is. */
export function dayOf(at: string, openedAt: string): string {
  const time = new Date(at);
  const opened = new Date(openedAt);
  const dayNumber = (date: Date): number => Date.UTC(date.getFullYear(), date.getMonth(), date.getDate()) / 86_400_000;
  const clock = `${String(time.getHours()).padStart(2, '0')}:${String(time.getMinutes()).padStart(2, '0')}`;
  return `day ${dayNumber(time) - dayNumber(opened)}, ${clock}`;
}
