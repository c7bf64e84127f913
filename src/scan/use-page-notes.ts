import { type RefObject, useCallback, useEffect, useMemo, useRef, useState } from 'react';
import type { DocNode, Zone } from '#shared/document/define-block.ts';
import { type Anchor, type FoundAnchor, anchorAt, findAnchor } from '#shared/document/find-anchor.ts';
import { type FlatText, flatTextOf } from '#shared/document/flat-text.ts';
import { zoneKey } from '#src/blocks/look.ts';
import type { ScanBox } from './scan-boxes.ts';
import { stretchOfRange, textSpots } from './text-places.ts';
import type { PageLink } from './use-page-link.ts';
import { useWordLight } from './word-light.ts';

/** Something that is tied to a place of the page without standing in it. */
export type PageNote = { id: string; anchor: Anchor; /** For the spine. */ label: string; isOpen: boolean };

export type PageNotes = {
  /** Where each note now is. */
  places: ReadonlyMap<string, FoundAnchor>;
  /** The places of open notes as boxes for the scan and the spine. */
  boxes: readonly ScanBox[];
  labelAt: (key: string) => string;
  /** What a new note is about to be made on; `nowhere` when nothing was chosen. */
  draft: Anchor | 'nowhere' | null;
  /** Begins a note on the chosen words, or on the text at the caret. */
  begin: () => void;
  beginAt: (zone: Zone) => void;
  /** Ends the making of a note; the focus goes back to where it was, unless it has a better place to go. */
  endDraft: (keepsFocus?: boolean) => void;
  /** Lights up the place of a note on both leaves; null puts the light out. */
  light: (id: string | null) => void;
  /** Brings the place of a note into sight on both leaves. */
  goTo: (id: string) => void;
  /** The note that was asked for on the scan or the spine, with a count so that the same one can be asked for again. */
  opened: { id: string; count: number } | null;
  openAt: (key: string) => void;
};

type Given = {
  notes: readonly PageNote[];
  /** The text as it is drawn; in the editor a little behind the typing. */
  text: DocNode | null;
  /** The text at this moment. */
  textNow: () => DocNode | null;
  link: PageLink;
};

/** Ties notes to the page as it now stands: their boxes, their light, and the making of new ones. */
export function usePageNotes({ notes, text, textNow, link }: Given): PageNotes {
  const flat = useMemo(() => flatTextOf(text ?? { type: 'doc' }), [text]);
  const places = useMemo(() => new Map(notes.map(({ id, anchor }) => [id, findAnchor(flat, anchor)])), [flat, notes]);
  const { boxes, labels } = useMemo(() => boxesOfNotes(notes, places), [notes, places]);
  const [draft, setDraft] = useState<Anchor | 'nowhere' | null>(null);
  const [lit, setLit] = useState<string | null>(null);
  const [opened, setOpened] = useState<PageNotes['opened']>(null);
  const returnTo = useRef<Element | null>(null);
  const chosen = useLastChosen(link.leaf);
  const { setActive, showOnScan, leaf } = link;

  const resting = useMemo(
    () =>
      notes.flatMap(({ id, isOpen }) => (isOpen && places.get(id)?.state === 'found' ? [stretchAt(places, id)] : [])),
    [notes, places],
  );
  const about = draft === null || draft === 'nowhere' ? null : draft;
  const litStretch = useMemo(
    () => (about === null ? stretchAt(places, lit) : findAnchor(flat, about).stretch),
    [about, flat, places, lit],
  );
  const bringIntoSight = useWordLight({ leaf, flat, resting, lit: litStretch });

  const start = (anchor: Anchor | null): void => {
    if (draft === null) returnTo.current = document.activeElement;
    setDraft(anchor ?? 'nowhere');
    if (anchor?.zone != null) setActive(zoneKey(anchor.zone));
    const stretch = anchor === null ? null : findAnchor(flat, anchor).stretch;
    // On a phone the form opens over the lower part of the sheet: the words must not lie beneath it.
    if (stretch !== null) requestAnimationFrame(() => bringIntoSight(stretch));
  };
  const light = useCallback(
    (id: string | null) => {
      setLit(id);
      const zone = id === null ? null : (places.get(id)?.zone ?? null);
      setActive(zone === null ? null : zoneKey(zone));
    },
    [places, setActive],
  );
  const labelAt = useCallback((key: string) => labels.get(key) ?? '', [labels]);
  return {
    ...{ places, boxes, draft, light, opened },
    labelAt,
    begin: () => start(anchorOfChosen({ leaf, text: textNow(), chosen: chosen(), pinned: link.focusBox })),
    beginAt: (zone) => start({ block: null, quote: '', at: 0, zone }),
    endDraft: (keepsFocus = false) => {
      setDraft(null);
      setActive(null);
      if (!keepsFocus && returnTo.current instanceof HTMLElement) returnTo.current.focus();
    },
    goTo: (id) => {
      const place = places.get(id);
      setLit(id);
      if (place?.zone != null) showOnScan(zoneKey(place.zone));
      if (place?.stretch != null) bringIntoSight(place.stretch);
    },
    openAt: (key) => {
      const note = notes.find(({ id, isOpen }) => isOpen && keyOf(places.get(id)) === key);
      if (note !== undefined) setOpened((before) => ({ id: note.id, count: (before?.count ?? 0) + 1 }));
    },
  };
}

const keyOf = (place: FoundAnchor | undefined): string | null => (place?.zone == null ? null : zoneKey(place.zone));
const stretchAt = (places: PageNotes['places'], id: string | null): FoundAnchor['stretch'] =>
  id === null ? null : (places.get(id)?.stretch ?? null);

/** One box for each place, however many notes it has. */
function boxesOfNotes(
  notes: readonly PageNote[],
  places: PageNotes['places'],
): { boxes: ScanBox[]; labels: Map<string, string> } {
  const labels = new Map<string, string>();
  const boxes: ScanBox[] = [];
  for (const { id, label, isOpen } of notes) {
    const box = places.get(id)?.zone ?? null;
    if (!isOpen || box === null) continue;
    const key = zoneKey(box);
    const before = labels.get(key);
    if (before === undefined) boxes.push({ key, box, kind: 'note' });
    labels.set(key, before === undefined ? label : `${before}; ${label}`);
  }
  return { boxes, labels };
}

/** The last choice made in the text. A press on a button elsewhere may take the choice away before it is asked for. */
function useLastChosen(leaf: RefObject<HTMLElement | null>): () => StaticRange | null {
  const last = useRef<StaticRange | null>(null);
  useEffect(() => {
    const keep = (): void => {
      const selection = document.getSelection();
      if (selection === null || selection.rangeCount === 0) return;
      const range = selection.getRangeAt(0);
      if (leaf.current?.contains(range.commonAncestorContainer) === true) last.current = new StaticRange(range);
    };
    document.addEventListener('selectionchange', keep);
    return () => document.removeEventListener('selectionchange', keep);
  }, [leaf]);
  return useCallback(() => (last.current?.startContainer.isConnected === true ? last.current : null), []);
}

type Choice = {
  leaf: RefObject<HTMLElement | null>;
  text: DocNode | null;
  chosen: StaticRange | null;
  /** What was last gone to on the spine or the scan: how the keyboard chooses in text that has no caret. */
  pinned: Zone | null;
};

function anchorOfChosen({ leaf, text, chosen, pinned }: Choice): Anchor | null {
  const root = leaf.current?.querySelector('.page-text') ?? null;
  if (text === null || root === null) return null;
  const flat = flatTextOf(text);
  const figure = root.querySelector<HTMLElement>('figure.ProseMirror-selectednode')?.dataset['zone'];
  if (figure !== undefined) return anchorOfZone(flat, figure);
  const spots = chosen === null ? null : textSpots(root, flat);
  const isInText = chosen !== null && root.contains(chosen.startContainer);
  if (spots !== null && isInText) return anchorAt(flat, stretchOfRange(spots, chosen));
  return pinned === null ? null : anchorOfZone(flat, zoneKey(pinned));
}

/** A block, or the line of a word, by its place on the scan. */
function anchorOfZone(flat: FlatText, key: string): Anchor | null {
  const isIt = ({ zone }: { zone: Zone | null }): boolean => zone !== null && zoneKey(zone) === key;
  const block = flat.blocks.find(isIt);
  if (block !== undefined && block.from === block.to) return { block: block.id, quote: '', at: 0, zone: block.zone };
  const stretch = block ?? flat.pieces.find(isIt);
  return stretch === undefined ? null : anchorAt(flat, stretch);
}
