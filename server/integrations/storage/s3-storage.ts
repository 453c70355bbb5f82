import type { S3Client } from '@aws-sdk/client-s3';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import {
  assertObjectKey,
  assertSpan,
  ObjectMissing,
  ObjectSpanInvalid,
  type ByteSpan,
  type ObjectSource,
  type ObjectStorage,
  type OpenObject,
  type PutOptions,
  type StoredObject,
} from './object-storage.ts';
import { CountedBytes, openSource } from './object-source.ts';

export interface S3StorageOptions {
  readonly endpoint: string;
  readonly bucket: string;
  readonly region: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
}

const statusOf = (error: unknown): number | undefined =>
  (error as { $metadata?: { httpStatusCode?: number } } | null)?.$metadata?.httpStatusCode;

/**
 * Objects in a bucket that speaks S3. The SDK is loaded at the first use: it is large and warns about the Node version,
 * which those who keep files on their own disk should neither wait for nor read.
 */
export class S3Storage implements ObjectStorage {
  readonly #options: S3StorageOptions;
  #client: Promise<S3Client> | undefined;

  constructor(options: S3StorageOptions) {
    this.#options = options;
  }

  async put(source: ObjectSource, key: string, { mediaType, byteSize }: PutOptions): Promise<StoredObject> {
    assertObjectKey(key);
    const [client, { Upload }] = await Promise.all([this.#connect(), import('@aws-sdk/lib-storage')]);
    const counted = new CountedBytes(byteSize);
    const upload = new Upload({
      client,
      params: { Bucket: this.#options.bucket, Key: key, Body: counted, ContentType: mediaType },
      queueSize: 2,
      leavePartsOnError: false,
    });
    const fed = pipeline(openSource(source), counted);
    // The upload reads what the pipeline feeds, so both run at once; the source's own error says more than the upload's.
    const [feeding, sending] = await Promise.allSettled([
      fed,
      upload.done().catch((error: unknown) => {
        counted.destroy(error instanceof Error ? error : undefined);
        throw error;
      }),
    ]);
    if (feeding.status === 'rejected') throw feeding.reason;
    if (sending.status === 'rejected') throw sending.reason;
    return { byteSize: counted.byteSize };
  }

  async openRead(key: string, span?: ByteSpan): Promise<OpenObject> {
    assertObjectKey(key);
    if (span) assertSpan(span, Number.MAX_SAFE_INTEGER);
    const [client, { GetObjectCommand }] = await Promise.all([this.#connect(), import('@aws-sdk/client-s3')]);
    const range = span ? { Range: `bytes=${span.start}-${span.end}` } : {};
    try {
      const answer = await client.send(new GetObjectCommand({ Bucket: this.#options.bucket, Key: key, ...range }));
      const stream = answer.Body;
      if (!(stream instanceof Readable) || answer.ContentLength === undefined)
        throw new Error('The storage answered without a body or its length.');
      // A store clips a range at the object's end; the caller asked for bytes that are not there.
      if (span && answer.ContentLength !== span.end - span.start + 1) {
        stream.destroy();
        throw new ObjectSpanInvalid(`Bytes ${span.start} to ${span.end} are not inside the object.`);
      }
      return { stream, byteSize: answer.ContentLength };
    } catch (error) {
      if (statusOf(error) === 404) throw new ObjectMissing(`There is no object ${key}.`);
      if (statusOf(error) === 416) throw new ObjectSpanInvalid('The part asked for is not inside the object.');
      throw error;
    }
  }

  async stat(key: string): Promise<StoredObject | null> {
    assertObjectKey(key);
    const [client, { HeadObjectCommand }] = await Promise.all([this.#connect(), import('@aws-sdk/client-s3')]);
    try {
      const answer = await client.send(new HeadObjectCommand({ Bucket: this.#options.bucket, Key: key }));
      return { byteSize: answer.ContentLength ?? 0 };
    } catch (error) {
      if (statusOf(error) === 404) return null;
      throw error;
    }
  }

  async exists(key: string): Promise<boolean> {
    return (await this.stat(key)) !== null;
  }

  async remove(key: string): Promise<void> {
    assertObjectKey(key);
    const [client, { DeleteObjectCommand }] = await Promise.all([this.#connect(), import('@aws-sdk/client-s3')]);
    await client.send(new DeleteObjectCommand({ Bucket: this.#options.bucket, Key: key }));
  }

  #connect(): Promise<S3Client> {
    const { endpoint, region, accessKeyId, secretAccessKey } = this.#options;
    this.#client ??= import('@aws-sdk/client-s3').then(
      ({ S3Client }) =>
        new S3Client({
          endpoint,
          region,
          credentials: { accessKeyId, secretAccessKey },
          forcePathStyle: true,
          // Stores other than the first one refuse the checksum trailers that newer SDKs add unasked.
          requestChecksumCalculation: 'WHEN_REQUIRED',
          responseChecksumValidation: 'WHEN_REQUIRED',
        }),
    );
    return this.#client;
  }
}
