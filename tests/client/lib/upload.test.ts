import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { startUpload, UploadCancelled, uploadTrouble, type UploadTarget } from '../../../src/lib/upload.ts';
import { isProblem } from '../../../src/lib/api.ts';
import { PROBLEMS, problemType } from '../../../shared/problems/problems.ts';

/** Stands in for the browser's request, which jsdom would send over a network that is not there. */
class FakeRequest {
  static last: FakeRequest;
  readonly upload: { onprogress: ((event: object) => void) | null } = { onprogress: null };
  readonly headers: Record<string, string> = {};
  onload: (() => void) | null = null;
  onerror: (() => void) | null = null;
  onabort: (() => void) | null = null;
  method = '';
  address = '';
  sent = new FormData();
  status = 0;
  responseText = '';
  constructor() {
    FakeRequest.last = this;
  }
  open(method: string, address: string): void {
    this.method = method;
    this.address = address;
  }
  setRequestHeader(name: string, value: string): void {
    this.headers[name] = value;
  }
  send(form: FormData): void {
    this.sent = form;
  }
  abort(): void {
    this.onabort?.();
  }
  answer(status: number, text: string): void {
    this.status = status;
    this.responseText = text;
    this.onload?.();
  }
}

const target: UploadTarget = {
  commissionId: '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a0001',
  place: 'commission',
  placeId: '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a0001',
  purpose: 'cover',
};
const ID = '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a00aa';
const start = (onProgress: (share: number) => void = () => {}) =>
  startUpload(target, ID, new File(['jpeg'], 'pommel.jpg', { type: 'image/jpeg' }), onProgress);

beforeEach(() => void vi.stubGlobal('XMLHttpRequest', FakeRequest));
afterEach(() => void vi.unstubAllGlobals());

describe('an upload', () => {
  it('sends its texts before its bytes, under the id of its sender', () => {
    start();
    expect([...FakeRequest.last.sent.keys()]).toEqual(['id', 'place', 'placeId', 'purpose', 'caption', 'file']);
    expect(FakeRequest.last.sent.get('id')).toBe(ID);
    expect(FakeRequest.last.headers['x-ferrule']).toBe('1');
    const firstAddress = FakeRequest.last.address;
    start();
    expect(FakeRequest.last.sent.get('id')).toBe(ID);
    expect(FakeRequest.last.address).toBe(firstAddress);
  });

  it('tells the share that has gone', () => {
    const shares: number[] = [];
    start((share) => shares.push(share));
    FakeRequest.last.upload.onprogress?.({ lengthComputable: true, loaded: 30, total: 120 });
    FakeRequest.last.upload.onprogress?.({ lengthComputable: false, loaded: 60, total: 0 });
    expect(shares).toEqual([0.25, 0]);
  });

  it('fails in the server’s words where it was refused', async () => {
    const { done } = start();
    const code = 'file-refused';
    FakeRequest.last.answer(
      422,
      JSON.stringify({
        type: problemType(code),
        ...PROBLEMS[code],
        code,
        instance: 'urn:test',
        detail: 'This is a page and not a picture.',
      }),
    );
    const error = await done.catch((thrown: unknown) => thrown);
    expect(isProblem(error, code)).toBe(true);
    expect(uploadTrouble(error)).toBe('This is a page and not a picture.');
  });

  it.each([
    ['a lost network', () => FakeRequest.last.onerror?.()],
    ['a proxy’s page', () => FakeRequest.last.answer(502, '<html>')],
  ])('says that nothing is lost after %s', async (_what, happen) => {
    const { done } = start();
    happen();
    const error = await done.catch((thrown: unknown) => thrown);
    expect(isProblem(error, 'upstream-unavailable')).toBe(true);
    expect(uploadTrouble(error)).toContain('kept');
  });

  it('that its sender cancels is no failure', async () => {
    const running = start();
    running.cancel();
    await expect(running.done).rejects.toBeInstanceOf(UploadCancelled);
  });
});
