import { zoneAround } from '#shared/document/define-block.ts';
import { type LineKind, classifyLine } from './classify-line.ts';
import { type Line, lineText, median, middleOf, rightOf } from './lines.ts';

/** Lines that belong together, and what the first of them starts. */
export type Group = { kind: LineKind; lines: Line[] };

// In line pitches. Print sets paragraphs a quarter to a half of a line apart; a line's own middle wanders by a tenth.
const surelyApart = 1.35;
const apartAfterSentence = 1.2;
// In letter heights.
const indentLetters = 0.7;
const outdentLetters = 0.25;

/** Lines gathered into blocks; what a line is and how far it stands from the one before decide where one begins. */
export function gatherLines(lines: readonly Line[]): Group[] {
  const groups: Group[] = [];
  const measures = { letter: median(lines.map(({ zone }) => zone[3])), pitch: linePitch(lines) };
  for (const [index, line] of lines.entries()) {
    const kind = classifyLine(line);
    const group = groups.at(-1);
    const before = lines[index - 1];
    if (group === undefined || before === undefined || startsNew({ line, kind, group, before }, measures))
      groups.push({ kind, lines: [line] });
    else group.lines.push(line);
  }
  return groups;
}

function linePitch(lines: readonly Line[]): number {
  const steps = lines.slice(1).map((line, index) => middleOf(line.zone) - middleOf(lines[index]?.zone ?? line.zone));
  return median(steps.filter((step) => step > 0));
}

type Meeting = { line: Line; kind: LineKind; group: Group; before: Line };
type Measures = { letter: number; pitch: number };

function startsNew(meeting: Meeting, { letter, pitch }: Measures): boolean {
  const { line, kind, group, before } = meeting;
  const step = middleOf(line.zone) - middleOf(before.zone);
  const isNear = step > 0 && step < pitch * surelyApart;
  if (group.kind.kind === 'heading' && kind.kind === 'heading') return !isNear || group.kind.level !== kind.level;
  if (kind.kind !== 'text' || standsAlone.has(group.kind.kind) || endsInCapitals(meeting)) return true;
  const isSentenceOver = /[.:]["')]?$/.test(lineText(before));
  // A step back up the page is the next column: the paragraph goes on there unless its sentence is over.
  if (!isNear) return step >= 0 || isSentenceOver;
  return isSentenceOver && (step > pitch * apartAfterSentence || isSetOff(meeting, letter));
}

/** What never goes on in the next line, however close that is. */
const standsAlone = new Set<LineKind['kind']>(['admonition-word', 'heading']);

/** A caption all in capitals is over where small letters begin. */
const endsInCapitals = ({ line, group, before }: Meeting): boolean =>
  group.kind.kind === 'caption' && !/[a-z]{2}/.test(lineText(before)) && /[a-z]{3}/.test(lineText(line));

/** Set off by where its first line begins: further in than its paragraph, or further out than the text of its step. */
function isSetOff({ line, group }: Meeting, letter: number): boolean {
  const left = line.zone[0];
  if (group.kind.kind === 'step') return left < stepLeft(group) - letter * outdentLetters;
  const zone = zoneAround(group.lines.map((each) => each.zone));
  const inside = left - zone[0];
  return group.kind.kind === 'text' && inside > letter * indentLetters && left < rightOf(zone);
}

/** Where the text of a step begins: at its second line, or behind the marker while there is but one. */
function stepLeft({ kind, lines }: Group): number {
  const [first, ...more] = lines;
  if (more.length > 0) return Math.min(...more.map(({ zone }) => zone[0]));
  const behind = first?.words[kind.kind === 'step' ? kind.markerWords : 0];
  return behind?.box[0] ?? 0;
}
