import { useRef, useState } from 'react';
import { startUpload, UploadCancelled, uploadTrouble, type RunningUpload, type UploadTarget } from '../lib/upload.ts';

export interface PendingFile {
  id: string;
  name: string;
  share: number;
  state: 'sending' | 'stored' | 'failed';
  trouble: string | null;
}

/** Files on their way to one place: progress, cancel, and trying again under the same id. */
export function useUploads(target: UploadTarget) {
  const [files, setFiles] = useState<PendingFile[]>([]);
  const running = useRef(new Map<string, { file: File; upload: RunningUpload }>());

  const patch = (id: string, change: Partial<PendingFile>): void =>
    setFiles((all) => all.map((one) => (one.id === id ? { ...one, ...change } : one)));
  const send = (id: string, file: File): void => {
    const upload = startUpload(target, id, file, (share) => patch(id, { share }));
    running.current.set(id, { file, upload });
    upload.done.then(
      () => patch(id, { state: 'stored', share: 1, trouble: null }),
      (error: unknown) => {
        if (!(error instanceof UploadCancelled)) patch(id, { state: 'failed', trouble: uploadTrouble(error) });
      },
    );
  };
  const add = (list: readonly File[]): void => {
    for (const file of list) {
      const id = crypto.randomUUID();
      setFiles((all) => [...all, { id, name: file.name, share: 0, state: 'sending', trouble: null }]);
      send(id, file);
    }
  };
  const again = (id: string): void => {
    const one = running.current.get(id);
    if (!one) return;
    patch(id, { state: 'sending', share: 0, trouble: null });
    send(id, one.file);
  };
  const drop = (id: string): void => {
    running.current.get(id)?.upload.cancel();
    running.current.delete(id);
    setFiles((all) => all.filter((one) => one.id !== id));
  };
  /** Lets go of files that are where they were meant to go. */
  const forget = (ids: readonly string[]): void => {
    for (const id of ids) running.current.delete(id);
    setFiles((all) => all.filter((one) => !ids.includes(one.id)));
  };
  return { files, add, again, drop, forget };
}
