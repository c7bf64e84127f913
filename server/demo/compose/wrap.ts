const hardSpace = '\u00a0';

/** A typist keeps a number and its unit on one line. */
const numberAndUnit = /([\d½]%?) (?=(?:mc|kc|cps|percent|volts?|v|watts?|ohms|µv|µµf|mfd|db|Ω|meg)\b)/g;

/** Breaks at spaces; a word longer than the line stands out. */
export function wrap(text: string, columns: number): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.replaceAll(numberAndUnit, `$1${hardSpace}`).split(' ')) {
    if (line !== '' && line.length + 1 + word.length > columns) {
      lines.push(line);
      line = word;
    } else {
      line = line === '' ? word : `${line} ${word}`;
    }
  }
  return [...lines, line].map((each) => each.replaceAll(hardSpace, ' '));
}
