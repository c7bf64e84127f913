const one = /^([A-Z]{1,3})(\d{1,4})([A-Z]?)$/;
/** A list of more than this is a slip of the pen: "R1-R5000". */
const mostInARange = 200;

/**
 * The designators that a cell names, with ranges written out and left-out letters put back: "R1-R3, 7" is R1, R2, R3 and
 * R7. Null where it is no such list.
 */
export function designatorsIn(cell: string): string[] | null {
  const names: string[] = [];
  let letters = '';
  for (const part of partsOfList(cell)) {
    const written = writtenOut(part, letters);
    if (written === null) return null;
    letters = written.letters;
    names.push(...written.names);
  }
  return names.length === 0 || names.length > mostInARange ? null : names;
}

function writtenOut(part: string, lettersBefore: string): { names: string[]; letters: string } | null {
  const [first = '', second, ...more] = part.split('-');
  const from = named(first, lettersBefore);
  if (from === null || more.length > 0) return null;
  const { letters, figures } = from;
  if (second === undefined) return { names: [from.name], letters };
  const to = named(second, letters);
  const count = to?.letters === letters ? to.figures - figures + 1 : 0;
  if (count < 1 || count > mostInARange) return null;
  return { names: Array.from({ length: count }, (_, at) => `${letters}${figures + at}`), letters };
}

/** "R1 thru R5 and R7" as "R1-R5" and "R7". */
const partsOfList = (cell: string): string[] =>
  cell
    .trim()
    .replace(/\s*(?:[-–]|\b(?:thru|through|to)\b)\s*/g, '-')
    .split(/\s*[,;&]\s*|\s+and\s+|\s+/)
    .filter((each) => each !== '');

type Named = { name: string; letters: string; figures: number };

/** A name of its own, or one that leaves out the letters of the one before. */
function named(text: string, letters: string): Named | null {
  const found = one.exec(/^\d/.test(text) ? letters + text : text);
  if (found === null) return null;
  const [name, own = '', figures = ''] = found;
  return { name, letters: own, figures: Number(figures) };
}
