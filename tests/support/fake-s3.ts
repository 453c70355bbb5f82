import { createHash, randomUUID } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import express, { type Request, type Response } from 'express';

interface KeptObject {
  bytes: Buffer;
  mediaType: string;
}

export interface FakeS3 {
  readonly endpoint: string;
  readonly bucket: string;
  readonly region: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
  readonly objects: Map<string, KeptObject>;
  /** Uploads in parts that are neither complete nor given up. */
  readonly openUploads: Map<string, Map<number, Buffer>>;
  /** Each request as `METHOD path`, in order. */
  readonly requests: string[];
  close(): Promise<void>;
}

const BUCKET = 'ferrule-test';
const REGION = 'us-east-1';
const ACCESS_KEY_ID = 'TESTKEYID';

const refuse = (res: Response, status: number, code: string): void =>
  void res.status(status).type('application/xml').send(`<?xml version="1.0"?><Error><Code>${code}</Code></Error>`);

const etag = (bytes: Buffer): string => `"${createHash('md5').update(bytes).digest('hex')}"`;

/** The part of a `Range: bytes=a-b` header that an object has; null when it has none. */
function spanOf(header: string, byteSize: number): { start: number; end: number } | null {
  const [, first, last] = /^bytes=(\d+)-(\d*)$/.exec(header) ?? [];
  if (first === undefined) return null;
  const start = Number(first);
  return start < byteSize ? { start, end: Math.min(last ? Number(last) : byteSize - 1, byteSize - 1) } : null;
}

/**
 * Enough of the S3 REST interface for the adapter's contract: put, put in parts, get with a range, head, delete. A
 * request without a Signature Version 4 header of the known key, or whose body is not the one that was signed, is refused.
 */
export async function startFakeS3(): Promise<FakeS3> {
  const objects = new Map<string, KeptObject>();
  const openUploads = new Map<string, Map<number, Buffer>>();
  const mediaTypes = new Map<string, string>();
  const requests: string[] = [];
  const app = express();
  app.use(express.raw({ type: () => true, limit: '64mb' }));
  const bodyOf = (req: Request): Buffer => (Buffer.isBuffer(req.body) ? req.body : Buffer.alloc(0));

  app.use((req, res, next) => {
    requests.push(`${req.method} ${req.originalUrl}`);
    const scope = new RegExp(
      `^AWS4-HMAC-SHA256 Credential=${ACCESS_KEY_ID}/\\d{8}/${REGION}/s3/aws4_request, SignedHeaders=[a-z0-9;-]*host[a-z0-9;-]*, Signature=[0-9a-f]{64}$`,
    );
    if (!scope.test(req.get('authorization') ?? '')) return refuse(res, 403, 'SignatureDoesNotMatch');
    const signedHash = req.get('x-amz-content-sha256') ?? '';
    const hash = createHash('sha256').update(bodyOf(req)).digest('hex');
    if (signedHash !== 'UNSIGNED-PAYLOAD' && signedHash !== hash) return refuse(res, 400, 'XAmzContentSHA256Mismatch');
    next();
  });

  const path = `/${BUCKET}/:key`;
  app.put(path, (req, res) => {
    const { partNumber, uploadId } = req.query;
    const bytes = bodyOf(req);
    res.setHeader('ETag', etag(bytes));
    if (typeof uploadId !== 'string') {
      objects.set(req.params.key, { bytes, mediaType: req.get('content-type') ?? '' });
      return void res.end();
    }
    const parts = openUploads.get(uploadId);
    if (!parts) return refuse(res, 404, 'NoSuchUpload');
    parts.set(Number(partNumber), bytes);
    res.end();
  });

  app.post(path, (req, res) => {
    const { key } = req.params;
    if ('uploads' in req.query) {
      const uploadId = randomUUID();
      openUploads.set(uploadId, new Map());
      mediaTypes.set(uploadId, req.get('content-type') ?? '');
      return void res
        .type('application/xml')
        .send(
          `<InitiateMultipartUploadResult><Bucket>${BUCKET}</Bucket><Key>${key}</Key><UploadId>${uploadId}</UploadId></InitiateMultipartUploadResult>`,
        );
    }
    const { uploadId } = req.query;
    const parts = typeof uploadId === 'string' ? openUploads.get(uploadId) : undefined;
    if (typeof uploadId !== 'string' || !parts) return refuse(res, 404, 'NoSuchUpload');
    const inOrder = [...parts].sort(([one], [other]) => one - other).map(([, bytes]) => bytes);
    const bytes = Buffer.concat(inOrder);
    objects.set(key, { bytes, mediaType: mediaTypes.get(uploadId) ?? '' });
    openUploads.delete(uploadId);
    res
      .type('application/xml')
      .send(
        `<CompleteMultipartUploadResult><Bucket>${BUCKET}</Bucket><Key>${key}</Key><ETag>${etag(bytes)}</ETag></CompleteMultipartUploadResult>`,
      );
  });

  app.get(path, (req, res) => {
    const kept = objects.get(req.params.key);
    if (!kept) return refuse(res, 404, 'NoSuchKey');
    res.setHeader('ETag', etag(kept.bytes));
    res.setHeader('Content-Type', kept.mediaType);
    const range = req.get('range');
    const span = range === undefined ? undefined : spanOf(range, kept.bytes.length);
    if (span === null) return refuse(res, 416, 'InvalidRange');
    const part = span ? kept.bytes.subarray(span.start, span.end + 1) : kept.bytes;
    if (span) res.status(206).setHeader('Content-Range', `bytes ${span.start}-${span.end}/${kept.bytes.length}`);
    res.setHeader('Content-Length', part.length);
    res.end(req.method === 'HEAD' ? undefined : part);
  });

  app.delete(path, (req, res) => {
    const { uploadId } = req.query;
    if (typeof uploadId === 'string') openUploads.delete(uploadId);
    else objects.delete(req.params.key);
    res.status(204).end();
  });

  const server = app.listen(0, '127.0.0.1');
  await new Promise<void>((resolve, reject) => server.once('listening', resolve).once('error', reject));
  return {
    endpoint: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    bucket: BUCKET,
    region: REGION,
    accessKeyId: ACCESS_KEY_ID,
    secretAccessKey: 'a secret for tests alone',
    objects,
    openUploads,
    requests,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
