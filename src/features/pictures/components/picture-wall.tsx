import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { FilePlace, FilePurpose } from '../../../../shared/contracts/vocabulary.ts';
import { PendingFiles } from '../../../components/pending-files.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { FilePicker } from '../../../components/ui/file-picker.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { useUploads } from '../../../hooks/use-uploads.ts';
import { fileAddress } from '../../../lib/files.ts';
import { keys } from '../../../lib/query-keys.ts';
import { fileQueries } from '../../../lib/queries/threads.ts';
import { shortInstant } from '../../../lib/today.ts';

const PURPOSE_WORDS: Readonly<Record<FilePurpose, string>> = {
  message: 'With a message',
  before: 'Before',
  after: 'After',
  cover: 'Cover',
  brief: 'Brief',
  condition: 'Condition',
};

export interface PictureWallProps {
  commissionId: string;
  place: FilePlace;
  placeId: string;
  title: string;
  /** What the reader may add here; none, and the wall is for looking. */
  purposes: readonly FilePurpose[];
}

/** Adds photographs of one purpose: picked, taken by the phone, or dropped. */
function AddPictures({
  commissionId,
  place,
  placeId,
  purpose,
}: {
  commissionId: string;
  place: FilePlace;
  placeId: string;
  purpose: FilePurpose;
}) {
  const queryClient = useQueryClient();
  const uploads = useUploads({ commissionId, place, placeId, purpose });
  const storedCount = uploads.files.filter((file) => file.state === 'stored').length;
  useEffect(() => {
    if (storedCount > 0)
      void queryClient.invalidateQueries({ queryKey: keys.files.list(commissionId, place, placeId) });
  }, [storedCount, queryClient, commissionId, place, placeId]);
  return (
    <div
      className="grid gap-2"
      onDragOver={(event) => event.preventDefault()}
      onDrop={(event) => {
        event.preventDefault();
        uploads.add([...event.dataTransfer.files]);
      }}
    >
      <div className="flex flex-wrap gap-2">
        <FilePicker accept="image/jpeg,image/png,image/webp,image/avif" multiple onFiles={uploads.add}>
          Add pictures: {PURPOSE_WORDS[purpose].toLowerCase()}
        </FilePicker>
        <FilePicker accept="image/*" capture="environment" variant="quiet" onFiles={uploads.add}>
          Take one now
        </FilePicker>
      </div>
      <PendingFiles uploads={{ ...uploads, files: uploads.files.filter((file) => file.state !== 'stored') }} />
    </div>
  );
}

/** Pictures of one place, each with its purpose, who added it and when. */
export function PictureWall({ commissionId, place, placeId, title, purposes }: PictureWallProps) {
  const { data: files } = useSuspenseQuery(fileQueries.list(commissionId, place, placeId));
  return (
    <Sheet title={title}>
      {files.length === 0 && (
        <EmptyState title="No pictures yet">
          {purposes.length > 0
            ? 'Photographs say sooner what words take long for.'
            : 'They will be here when someone adds one.'}
        </EmptyState>
      )}
      <ul className="grid grid-cols-2 gap-3 sm:grid-cols-3">
        {files.map((file) => (
          <li key={file.id}>
            {file.width !== null && file.height !== null ? (
              <a href={fileAddress(commissionId, file.id, 'full')} target="_blank" rel="noreferrer">
                <img
                  src={fileAddress(commissionId, file.id, 'thumb')}
                  alt={file.caption || file.name}
                  loading="lazy"
                  className="aspect-4/3 w-full rounded border border-hairline object-cover"
                />
              </a>
            ) : (
              <a href={fileAddress(commissionId, file.id)} download className="underline">
                {file.name}
              </a>
            )}
            <p className="text-note text-lead-grey">
              {PURPOSE_WORDS[file.purpose]}, {file.addedBy}, {shortInstant(file.addedAt)}
            </p>
          </li>
        ))}
      </ul>
      {purposes.length > 0 && (
        <div className="grid gap-3 pt-4">
          {purposes.map((purpose) => (
            <AddPictures key={purpose} commissionId={commissionId} place={place} placeId={placeId} purpose={purpose} />
          ))}
        </div>
      )}
    </Sheet>
  );
}
