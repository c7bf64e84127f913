import { useEffect, useRef, useState } from 'react';

const holdsFiles = ({ dataTransfer }: DragEvent): boolean => dataTransfer?.types.includes('Files') === true;

/** Files dropped anywhere on the window. Tells whether some are being held over it. */
export function useDroppedFiles(onFiles: (files: File[]) => void): boolean {
  const [isOver, setOver] = useState(false);
  const latest = useRef(onFiles);
  useEffect(() => {
    latest.current = onFiles;
  });
  useEffect(() => {
    // Enter and leave are told for every element passed over: the window is left when all entered ones are.
    let depth = 0;
    const end = (): void => {
      depth = 0;
      setOver(false);
    };
    const enter = (event: DragEvent): void => {
      if (!holdsFiles(event)) return;
      depth += 1;
      setOver(true);
    };
    const leave = (event: DragEvent): void => {
      if (!holdsFiles(event)) return;
      depth -= 1;
      if (depth <= 0) end();
    };
    const over = (event: DragEvent): void => {
      if (holdsFiles(event)) event.preventDefault();
    };
    const drop = (event: DragEvent): void => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      end();
      const files = [...(event.dataTransfer?.files ?? [])];
      if (files.length > 0) latest.current(files);
    };
    const handlers = { dragenter: enter, dragleave: leave, dragover: over, drop } as const;
    for (const [name, handler] of Object.entries(handlers))
      window.addEventListener(name as keyof typeof handlers, handler);
    return () => {
      for (const [name, handler] of Object.entries(handlers))
        window.removeEventListener(name as keyof typeof handlers, handler);
    };
  }, []);
  return isOver;
}
