import { type DocNode, type Mark, type Zone } from '#shared/document/define-block.ts';
import type { DoubtMark } from '#shared/document/marks.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { allNodes, textOf } from '#shared/document/text-of.ts';
import { between, movedZone } from '#shared/document/zones.ts';
import { overlap } from './picture/figures.ts';
import type { Reading } from './reading.ts';
import { documentOf } from './structure.ts';

export type Taken = {
  document: PageDocument;
  /** Words that nobody had touched and that the new reading is surer of. */
  improved: number;
  /** Words that a person wrote, and that the new reading gives otherwise: left as they are, with a doubt. */
  proposed: number;
};

type Word = { zone: Zone; text: string; confidence: number; doubt: Mark | undefined };

/** Two boxes are of the same print when they share this much of the smaller one. */
const sameShare = 0.6;
/** Against what a person wrote only a confident reading is worth a look. */
const worthProposing = 80;

/**
 * A document that people have worked on, after another reading of its page. Zones move to the new picture; a word that
 * stands as the machine had left it takes the new reading where that is surer; what a person wrote stays, and gets a
 * proposal where the new reading says something that neither the person nor the earlier reading did.
 */
export function takeReading(document: PageDocument, before: Reading, after: Reading): Taken {
  const earlier = new Map(wordsOf(documentOf(before)).map((word) => [word.zone.join(), word]));
  const later = placesOf(wordsOf(documentOf(after)));
  const matrix = between(before.transform, after.transform);
  const count = { improved: 0, proposed: 0 };
  const move = (zone: Zone): Zone => movedZone(zone, matrix);

  const visit = (node: DocNode): DocNode => {
    if (node.type === 'text') return visitText(node);
    const content = node.content?.map(visit);
    return { ...movedAttributes(node, move), ...(content === undefined ? {} : { content }) };
  };
  const visitText = (node: DocNode): DocNode => {
    const word = wordOf(node);
    if (word === null) return node;
    const moved = withMarks(node, { ...word, zone: move(word.zone) });
    const read = later(move(word.zone));
    if (read === null) return moved;
    const verdict = judge(word, { earlier: earlier.get(word.zone.join()), read });
    if (verdict === 'improve') {
      count.improved += 1;
      return withMarks({ ...node, text: read.text }, read);
    }
    if (verdict === 'propose') {
      count.proposed += 1;
      const attrs: DoubtMark = { reason: 'read-differently', proposals: [read.text] };
      return withMarks(node, { ...word, zone: read.zone, doubt: { type: 'doubt', attrs } });
    }
    return moved;
  };
  return { document: visit(document) as PageDocument, ...count };
}

function judge(
  word: Word,
  { earlier, read }: { earlier: Word | undefined; read: Word },
): 'keep' | 'improve' | 'propose' {
  if (isUntouched(word, earlier)) {
    const isNews = read.text !== word.text || (word.doubt !== undefined && read.doubt === undefined);
    return isNews && read.confidence > word.confidence ? 'improve' : 'keep';
  }
  const isNews = read.text !== word.text && read.text !== earlier?.text;
  return isNews && word.doubt === undefined && read.confidence >= worthProposing ? 'propose' : 'keep';
}

/** A doubt that is gone was settled by a person, who thereby vouched for the word. */
const isUntouched = (word: Word, earlier: Word | undefined): boolean =>
  earlier?.text === word.text && (earlier.doubt === undefined) === (word.doubt === undefined);

const wordsOf = (document: DocNode): Word[] => [...allNodes(document)].flatMap((node) => wordOf(node) ?? []);

function wordOf(node: DocNode): Word | null {
  const attrs = node.marks?.find(({ type }) => type === 'word')?.attrs;
  if (node.type !== 'text' || attrs === undefined) return null;
  return {
    zone: attrs['zone'] as Zone,
    confidence: Number(attrs['confidence']),
    text: textOf(node),
    doubt: node.marks?.find(({ type }) => type === 'doubt'),
  };
}

/** Bold and the like stay; the place and the doubt are the word's own. */
function withMarks(node: DocNode, { zone, confidence, doubt }: Word): DocNode {
  const kept = (node.marks ?? []).filter(({ type }) => type !== 'word' && type !== 'doubt');
  const place: Mark = { type: 'word', attrs: { zone, confidence } };
  return { ...node, marks: [...kept, place, ...(doubt === undefined ? [] : [doubt])] };
}

function movedAttributes(node: DocNode, move: (zone: Zone) => Zone): DocNode {
  const zone = node.attrs?.['zone'] as Zone | null | undefined;
  return zone === undefined || zone === null ? node : { ...node, attrs: { ...node.attrs, zone: move(zone) } };
}

/** Finds the one word that lies where a zone does; none where two words share the place, as after a changed division. */
function placesOf(words: readonly Word[]): (zone: Zone) => Word | null {
  const bandHeight = 64;
  const bands = new Map<number, Word[]>();
  for (const word of words) {
    const [, y, , h] = word.zone;
    for (let band = Math.floor(y / bandHeight); band <= Math.floor((y + h) / bandHeight); band += 1)
      bands.set(band, [...(bands.get(band) ?? []), word]);
  }
  return (zone) => {
    const near = bands.get(Math.floor((zone[1] + zone[3] / 2) / bandHeight)) ?? [];
    const touching = near.filter((word) => Math.max(overlap(zone, word.zone), overlap(word.zone, zone)) > sameShare);
    const [only, ...others] = touching;
    if (only === undefined || others.length > 0) return null;
    return Math.min(overlap(zone, only.zone), overlap(only.zone, zone)) > sameShare / 2 ? only : null;
  };
}
