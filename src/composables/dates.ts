const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const longMonths = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];
const two = (n: number) => String(n).padStart(2, '0');

/** `12 Mar`, and `12 Mar 2025` when the year is not the present one. */
export function shortDay(iso: string, now: Date = new Date()): string {
  const date = new Date(iso);
  const day = `${date.getDate()} ${months[date.getMonth()]}`;
  return date.getFullYear() === now.getFullYear() ? day : `${day} ${date.getFullYear()}`;
}

/** `14:32`, in the reader's time zone. */
export function clock(iso: string): string {
  const date = new Date(iso);
  return `${two(date.getHours())}:${two(date.getMinutes())}`;
}

/** `14:32:08` */
export function clockSeconds(iso: string): string {
  return `${clock(iso)}:${two(new Date(iso).getSeconds())}`;
}

/** `12 Mar 14:32`; of another year the day with the year. */
export function shortDayTime(iso: string, now: Date = new Date()): string {
  const sameYear = new Date(iso).getFullYear() === now.getFullYear();
  return sameYear ? `${shortDay(iso, now)} ${clock(iso)}` : shortDay(iso, now);
}

/** `13 March 2026` */
export function longDay(iso: string): string {
  const date = new Date(iso);
  return `${date.getDate()} ${longMonths[date.getMonth()]} ${date.getFullYear()}`;
}
