import { randomBytes } from 'node:crypto';
import type { Readable } from 'node:stream';

/** First and last byte of a part, both counted in, as in an HTTP range. */
export interface ByteSpan {
  readonly start: number;
  readonly end: number;
}

/** Where the bytes of a new object come from; a file is read and stays where it is. */
export type ObjectSource =
  { readonly filePath: string } | { readonly stream: Readable } | { readonly bytes: Uint8Array };

export interface PutOptions {
  readonly mediaType: string;
  /** Bytes that must arrive; anything else is refused with `ObjectSizeWrong` and leaves nothing behind. */
  readonly byteSize?: number;
}

export interface StoredObject {
  readonly byteSize: number;
}

/** An open part of an object; `byteSize` is what the stream gives, not what the object holds. */
export interface OpenObject {
  readonly stream: Readable;
  readonly byteSize: number;
}

/** Bytes under made-up names. An object appears whole or not at all, and writing it again replaces it whole. */
export interface ObjectStorage {
  /** @throws ObjectKeyInvalid, ObjectSizeWrong, or whatever the source throws; then nothing is stored. */
  put(source: ObjectSource, key: string, options: PutOptions): Promise<StoredObject>;
  /** @throws ObjectMissing where there is none, ObjectSpanInvalid for a part that is not inside it. */
  openRead(key: string, span?: ByteSpan): Promise<OpenObject>;
  stat(key: string): Promise<StoredObject | null>;
  exists(key: string): Promise<boolean>;
  /** Removing what is not there is no error. */
  remove(key: string): Promise<void>;
}

export class ObjectMissing extends Error {}
export class ObjectKeyInvalid extends Error {}
export class ObjectSpanInvalid extends Error {}
export class ObjectSizeWrong extends Error {}
export class StorageMisconfigured extends Error {}

const KEY = /^[0-9a-f]{32}$/;

/** A new name: 128 random bits, so that it tells nothing and cannot be guessed. */
export const newObjectKey = (): string => randomBytes(16).toString('hex');

/** Names come from `newObjectKey` alone; checking them again keeps paths out of every adapter. */
export function assertObjectKey(key: string): void {
  if (!KEY.test(key)) throw new ObjectKeyInvalid('An object key is 32 hexadecimal digits.');
}

/** @throws ObjectSpanInvalid unless the span lies inside an object of `byteSize` bytes. */
export function assertSpan({ start, end }: ByteSpan, byteSize: number): void {
  const whole = Number.isSafeInteger(start) && Number.isSafeInteger(end);
  if (!whole || start < 0 || end < start || end >= byteSize)
    throw new ObjectSpanInvalid(`Bytes ${start} to ${end} are not inside an object of ${byteSize} bytes.`);
}
