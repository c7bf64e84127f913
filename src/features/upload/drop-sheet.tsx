import { useDroppedFiles } from './use-dropped-files.ts';

/** While files are held over the window: the whole of it takes them. */
export function DropSheet({ says, onFiles }: { says: string; onFiles: (files: File[]) => void }) {
  const isOver = useDroppedFiles(onFiles);
  if (!isOver) return null;
  return (
    <div className="pointer-events-none fixed inset-3 z-[60] flex items-center justify-center border-2 border-dashed border-signal bg-leaf/95">
      <p role="status" className="px-6 text-center font-serif text-title">
        {says}
      </p>
    </div>
  );
}
