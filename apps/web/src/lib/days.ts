import dayjs from 'dayjs';

/** Today in the reader's own calendar, `YYYY-MM-DD`. */
export const today = (): string => dayjs().format('YYYY-MM-DD');

/** Whole days from one civil date to another; negative when `to` lies before. */
export const daysBetween = (from: string, to: string): number => dayjs(to).diff(dayjs(from), 'day');
