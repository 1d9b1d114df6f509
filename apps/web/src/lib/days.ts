/** Today in the reader's own calendar, `YYYY-MM-DD`. */
export function today(now = new Date()): string {
  const two = (part: number) => String(part).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}

/** Whole days from one civil date to another; negative when `to` lies before. */
export function daysBetween(from: string, to: string): number {
  const utc = (date: string) => {
    const [year = 0, month = 1, day = 1] = date.split('-').map(Number);
    return Date.UTC(year, month - 1, day);
  };
  return (utc(to) - utc(from)) / 86_400_000;
}
