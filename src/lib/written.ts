const kilo = 1000;
const byteUnits = ['bytes', 'kB', 'MB', 'GB'];

/** A file size as a person writes it: three figures at most. */
export function writtenBytes(bytes: number): string {
  const power = bytes < kilo ? 0 : Math.min(byteUnits.length - 1, Math.floor(Math.log10(bytes) / 3));
  const size = bytes / kilo ** power;
  if (bytes === 1) return '1\u00a0byte';
  return `${power === 0 ? size : size.toPrecision(3)}\u00a0${byteUnits[power] ?? ''}`;
}

const dayAndTime = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short' });
const dayOnly = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium' });

export const writtenTime = (iso: string): string => dayAndTime.format(new Date(iso));
export const writtenDay = (iso: string): string => dayOnly.format(new Date(iso));

/** A share of one as whole per cent. Never 100 before all of it is done. */
export const writtenShare = (part: number, whole: number): string =>
  whole === 0 ? '0\u00a0%' : `${part >= whole ? 100 : Math.min(99, Math.floor((part / whole) * 100))}\u00a0%`;
