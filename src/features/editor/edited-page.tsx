import type { Editor } from '@tiptap/core';
import { EditorContent, useEditorState } from '@tiptap/react';
import { type ReactNode, useDeferredValue, useEffect, useMemo, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import type { DocNode } from '#shared/document/define-block.ts';
import type { LookContext } from '#src/blocks/look.ts';
import { toast } from '#src/ui/toast.ts';
import { PageTitle } from '#src/scan/page-title.tsx';
import { boxesOf, type ScanBox } from '#src/scan/scan-boxes.ts';
import { ScanViewer } from '#src/scan/scan-viewer.tsx';
import { Spine, ticksOf } from '#src/scan/spine.tsx';
import { TwoLeaves } from '#src/scan/two-leaves.tsx';
import type { PageLink } from '#src/scan/use-page-link.ts';
import { type PageNote, type PageNotes, usePageNotes } from '#src/scan/use-page-notes.ts';
import { wordsAt } from '#src/scan/words-at.ts';
import { doubtsOf } from './doubts.ts';
import { DoubtStrip } from './doubt-strip.tsx';
import { positionOfZone, zoneAtCaret } from './find-zone.ts';
import { type DeedName, deedOf } from './keys.ts';
import { KeysDialog } from './keys-dialog.tsx';
import { MakeLivePanel } from './make-live-panel.tsx';
import { PageNumbersPanel } from './page-numbers-panel.tsx';
import { PageNotices } from './page-notices.tsx';
import { PartStrip } from './part-strip.tsx';
import { type PrintedNumber, printedNumber } from './printed-number.ts';
import { ReadAgainPanel } from './read-again-panel.tsx';
import { SaveBar } from './save-bar.tsx';
import { Toolbar } from './toolbar.tsx';
import { useDoubtWalk } from './use-doubt-walk.ts';
import { useOthers } from './use-others.ts';
import { usePageEditor } from './use-page-editor.ts';
import { useSaving } from './use-saving.ts';
import type { SharedText } from './use-shared-text.ts';
import { type ZonePlace, zonePlaces } from './zone-place.ts';
import '#src/blocks/page.css';

type Props = {
  page: Page;
  shared: SharedText;
  /** The person who types. */
  name: string;
  context: LookContext;
  link: PageLink;
  scan: { pageId: string; version: string; size: { width: number; height: number } | null; label: string };
  settingBar: ReactNode;
  /** Comments of the page, and how they are shown in the margin. */
  notes: readonly PageNote[];
  comments: (notes: PageNotes) => ReactNode;
  links: (isDirty: boolean) => ReactNode;
  addressOf: (pageId: string) => string;
};

export function EditedPage({ page, shared, name, context, link, scan, settingBar, links, addressOf, ...slots }: Props) {
  const editor = usePageEditor({ shared, context, name, label: 'Page text' });
  const saving = useSaving(editor, page, shared);
  const others = useOthers(shared.provider);
  const walk = useDoubtWalk(editor, link.showOnScan);
  const [note, setNote] = useState('');
  const [isKeysOpen, setKeysOpen] = useState(false);
  const [live, setLive] = useState<PrintedNumber | string | null>(null);
  const [areNumbersOpen, setNumbersOpen] = useState(false);
  const [places, setPlaces] = useState<readonly ZonePlace[] | null>(null);
  const { boxes, shown, doubtCount } = usePlaces(editor);
  const textNow = (): DocNode => editor.getJSON() as DocNode;
  const notes = usePageNotes({ ...{ notes: slots.notes, text: shown, link }, textNow });
  const goTo = useGoTo(editor, link, notes.openAt);
  useCaretLight(editor, link.setActive);
  const save = async (): Promise<void> => {
    if (!saving.isDirty) toast('Nothing has changed since the last revision.');
    else if (await saving.save(note)) setNote('');
  };
  const deeds: Record<DeedName, () => void> = {
    next: () => walk.goBeside(1),
    previous: () => walk.goBeside(-1),
    settle: walk.settle,
    live: () => setLive(printedNumber(editor)),
    readAgain: () => setPlaces(zonePlaces(editor)),
    comment: notes.begin,
    save: () => void save(),
    help: () => setKeysOpen(true),
  };
  useKeys(deeds);
  const all = useMemo(() => [...notes.boxes, ...boxes], [notes.boxes, boxes]);
  const onScan = { boxes: all, active: link.active, onHover: link.setActive, focusBox: link.focusBox };
  const ticks = ticksOf(all, (key, kind) => (kind === 'note' ? notes.labelAt(key) : wordsAt(shown, key)));
  return (
    <div className="desk">
      <PageTitle page={page} doubts={doubtCount} addressOf={addressOf}>
        {links(saving.isDirty)}
      </PageTitle>
      {settingBar}
      <PageNotices standing={shared.standing} />
      <TwoLeaves
        keepsMargin={notes.draft !== null || notes.opened !== null}
        scan={<ScanViewer {...scan} {...onScan} onPick={(key) => goTo(key, 'text')} onMark={notes.beginAt} />}
        spine={
          <Spine
            ticks={ticks}
            height={page.height}
            active={link.active}
            onGo={(key) => goTo(key, 'both')}
            onHover={link.setActive}
          />
        }
        page={
          <>
            <SaveBar {...saving} others={others} note={note} onNote={setNote} onSave={deeds.save} />
            <Toolbar
              editor={editor}
              onMakeLive={deeds.live}
              onNumbers={() => setNumbersOpen(true)}
              onReadAgain={deeds.readAgain}
              onComment={notes.begin}
            />
            <h2 className="sr-only">Page text</h2>
            <div ref={link.leaf} className="leaf-scroll" onPointerOver={link.onTextHover}>
              <EditorContent editor={editor} className="page-sheet" />
            </div>
          </>
        }
        margin={
          <>
            {live === null ? null : (
              <MakeLivePanel {...{ editor, page }} key={keyOf(live)} found={live} onClose={() => setLive(null)} />
            )}
            {areNumbersOpen ? <PageNumbersPanel {...{ editor, page }} onClose={() => setNumbersOpen(false)} /> : null}
            {places === null ? null : (
              <ReadAgainPanel {...{ editor, page, places }} key={keyOfPlaces(places)} onClose={() => setPlaces(null)} />
            )}
            <DoubtStrip editor={editor} walk={walk} onKeys={deeds.help} />
            <PartStrip editor={editor} />
            {slots.comments(notes)}
          </>
        }
      />
      <KeysDialog isOpen={isKeysOpen} onOpenChange={setKeysOpen} />
    </div>
  );
}

const keyOfPlaces = (places: readonly ZonePlace[]): string => places.map(({ zone }) => zone.join()).join(';');
const keyOf = (live: PrintedNumber | string): string => (typeof live === 'string' ? live : String(live.from));

/** To the text of a zone, with the caret in it, and if wished to its place on the scan. */
function useGoTo(
  editor: Editor,
  { showOnScan, showInText }: PageLink,
  openNote: (key: string) => void,
): (key: string, side: 'both' | 'text') => void {
  return (key, side) => {
    if (side === 'both') showOnScan(key);
    showInText(key);
    const position = positionOfZone(editor.state.doc, key);
    if (position !== undefined)
      editor.chain().focus(undefined, { scrollIntoView: false }).setTextSelection(position).run();
    // Last: a comment that begins there takes the focus.
    openNote(key);
  };
}

/** What stands where, a little behind the typing: the boxes over the scan and the ticks of the spine. */
function usePlaces(editor: Editor): { boxes: ScanBox[]; shown: DocNode; doubtCount: number } {
  const doc = useEditorState({ editor, selector: ({ editor: now }) => now.state.doc, equalityFn: (a, b) => a === b });
  const later = useDeferredValue(doc);
  return useMemo(() => {
    const shown = later.toJSON() as DocNode;
    return { shown, boxes: boxesOf(shown), doubtCount: doubtsOf(later).length };
  }, [later]);
}

/** Moving the caret moves the light on the scan. */
function useCaretLight(editor: Editor, light: (key: string | null) => void): void {
  useEffect(() => {
    const follow = (): void => {
      if (editor.isFocused) light(zoneAtCaret(editor));
    };
    editor.on('selectionUpdate', follow);
    return () => {
      editor.off('selectionUpdate', follow);
    };
  }, [editor, light]);
}

function useKeys(deeds: Record<DeedName, () => void>): void {
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent): void => {
      const deed = deedOf(event);
      if (deed === null || event.defaultPrevented) return;
      event.preventDefault();
      deeds[deed]();
    };
    // Before the editor sees them, so that Alt Enter does not also break a line.
    window.addEventListener('keydown', onKeyDown, { capture: true });
    return () => window.removeEventListener('keydown', onKeyDown, { capture: true });
  });
}
