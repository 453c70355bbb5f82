import { uploadFile, type StoredFileView } from '../../shared/contracts/files.ts';
import type { FilePlace, FilePurpose } from '../../shared/contracts/vocabulary.ts';
import { addressOf, ApiProblem, problemOf } from './api.ts';

export interface UploadTarget {
  commissionId: string;
  place: FilePlace;
  placeId: string;
  purpose: FilePurpose;
}

export interface RunningUpload {
  done: Promise<StoredFileView>;
  cancel: () => void;
}

export class UploadCancelled extends Error {}

/**
 * Sends one file with progress. The id is the sender's: sending again after a lost answer stores nothing twice.
 * @param onProgress share sent, 0 to 1
 */
export function startUpload(
  target: UploadTarget,
  id: string,
  file: File,
  onProgress: (share: number) => void,
): RunningUpload {
  const { commissionId, place, placeId, purpose } = target;
  const request = new XMLHttpRequest();
  const form = new FormData();
  // Text fields first: the server checks the right to add before it reads the file.
  for (const [name, value] of Object.entries({ id, place, placeId, purpose, caption: '' })) form.append(name, value);
  form.append('file', file, file.name);
  const done = new Promise<StoredFileView>((resolve, reject) => {
    request.upload.onprogress = (event) => onProgress(event.lengthComputable ? event.loaded / event.total : 0);
    request.onload = () => {
      const json = (): Promise<unknown> => Promise.resolve().then(() => JSON.parse(request.responseText) as unknown);
      if (request.status >= 200 && request.status < 300)
        json()
          .then((body) => uploadFile.response.parse(body))
          .then(resolve, reject);
      else problemOf({ json }).then(reject, reject);
    };
    request.onerror = () => problemOf({ json: () => Promise.resolve(null) }).then(reject, reject);
    request.onabort = () => reject(new UploadCancelled('The upload was cancelled'));
  });
  request.open('POST', addressOf(uploadFile, { params: { commissionId }, body: { id, place, placeId, purpose } }));
  request.setRequestHeader('x-ferrule', '1');
  request.send(form);
  return { done, cancel: () => request.abort() };
}

export const uploadTrouble = (error: unknown): string =>
  error instanceof ApiProblem ? error.message : 'The file did not arrive. It is still here; try again.';
