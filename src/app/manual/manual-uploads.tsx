import { DropSheet } from '#src/features/upload/drop-sheet.tsx';
import { UploadList } from '#src/features/upload/upload-list.tsx';
import { useUploads } from '#src/features/upload/uploads.tsx';

/** Files for this manual: dropped anywhere on its screen, and what becomes of each. */
export function ManualUploads({ manualId, title }: { manualId: string; title: string }) {
  const { uploads, line } = useUploads(manualId);
  return (
    <>
      <DropSheet says={`Drop scans here to add them to “${title}”`} onFiles={(files) => line.add(manualId, files)} />
      <UploadList
        uploads={uploads}
        onStop={(id) => line.stop(id)}
        onTryAgain={(id) => line.tryAgain(id)}
        onPutAway={() => line.putAway(manualId)}
      />
    </>
  );
}
