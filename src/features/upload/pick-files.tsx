import { useRef } from 'react';
import { Button, type ButtonLook } from '#src/ui/button.tsx';

/** What the server can take in; it goes by the bytes, this only helps the file picker. */
const takenKinds = '.pdf,.tif,.tiff,.png,.jpg,.jpeg,.webp,application/pdf,image/tiff,image/png,image/jpeg,image/webp';
export const takenInWords = 'PDF, TIFF (also of many pages), PNG, JPEG or WebP';

type Props = { onFiles: (files: File[]) => void; children: string; look?: ButtonLook };

export function PickFiles({ onFiles, children, look = 'plain' }: Props) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <Button look={look} onClick={() => input.current?.click()}>
        {children}
      </Button>
      <input
        ref={input}
        type="file"
        multiple
        accept={takenKinds}
        aria-label={children}
        tabIndex={-1}
        className="sr-only"
        onChange={({ currentTarget }) => {
          const files = [...(currentTarget.files ?? [])];
          currentTarget.value = '';
          if (files.length > 0) onFiles(files);
        }}
      />
    </>
  );
}
