import { Button } from './ui/button.tsx';
import { ProgressBar } from './ui/progress-bar.tsx';
import type { useUploads } from '../hooks/use-uploads.ts';

/** Files on their way: how far each is, and what to do with one that did not arrive. */
export function PendingFiles({
  uploads,
}: {
  uploads: Pick<ReturnType<typeof useUploads>, 'files' | 'again' | 'drop'>;
}) {
  if (uploads.files.length === 0) return null;
  return (
    <ul className="grid gap-2" aria-label="Files on their way">
      {uploads.files.map((file) => (
        <li key={file.id} className="grid gap-1 rounded border border-hairline p-2">
          <ProgressBar
            label={file.name}
            done={file.share}
            total={1}
            state={file.state === 'stored' ? 'done' : file.state === 'failed' ? 'failed' : 'under-way'}
          />
          {file.trouble && <p className="text-note text-oxide">{file.trouble}</p>}
          <div className="flex gap-2">
            {file.state === 'failed' && (
              <Button variant="outline" aria-label={`Try ${file.name} again`} onClick={() => uploads.again(file.id)}>
                Try again
              </Button>
            )}
            <Button
              variant="quiet"
              aria-label={`${file.state === 'sending' ? 'Cancel' : 'Leave out'} ${file.name}`}
              onClick={() => uploads.drop(file.id)}
            >
              {file.state === 'sending' ? 'Cancel' : 'Leave out'}
            </Button>
          </div>
        </li>
      ))}
    </ul>
  );
}
