import { CreateBucketCommand, DeleteObjectCommand, GetObjectCommand, HeadBucketCommand, NoSuchKey, PutObjectCommand, S3Client, S3ServiceException } from '@aws-sdk/client-s3';
import { isConnectionFault } from '#server/http/problem.ts';
import { AppError } from '#server/http/app-error.ts';

export interface StorageSettings {
  readonly endpoint: URL;
  readonly region: string;
  readonly bucket: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
}

export interface StoredObject {
  readonly bytes: Buffer;
  readonly contentType: string;
}

/** Where uploaded files are kept. Keys are ours; a person's file name is never one. */
export interface ObjectStore {
  /** Makes the bucket when it is missing. */
  prepare(): Promise<void>;
  putObject(key: string, bytes: Buffer, contentType: string): Promise<void>;
  /** undefined when there is no such object. */
  getObject(key: string): Promise<StoredObject | undefined>;
  /** Also succeeds when there was no such object. */
  deleteObject(key: string): Promise<void>;
}

/** Opens the bucket of an S3-speaking storage. Every call throws AppError `unavailable` when it does not answer. */
export function createObjectStore(settings: StorageSettings): ObjectStore {
  const client = new S3Client({
    endpoint: settings.endpoint.href,
    region: settings.region,
    forcePathStyle: true,
    credentials: { accessKeyId: settings.accessKeyId, secretAccessKey: settings.secretAccessKey },
    maxAttempts: 3,
    // The newer checksums are not understood by every storage that speaks S3.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  const Bucket = settings.bucket;
  return {
    async prepare() {
      const isThere = await client.send(new HeadBucketCommand({ Bucket })).then(() => true, (error: unknown) => (statusOf(error) === 404 ? false : unavailable(error)));
      if (!isThere) await client.send(new CreateBucketCommand({ Bucket })).catch((error: unknown) => (statusOf(error) === 409 ? undefined : unavailable(error)));
    },
    async putObject(key, bytes, contentType) {
      await client.send(new PutObjectCommand({ Bucket, Key: key, Body: bytes, ContentType: contentType, ContentLength: bytes.length })).catch(unavailable);
    },
    async getObject(key) {
      const answer = await client.send(new GetObjectCommand({ Bucket, Key: key })).catch((error: unknown) => (error instanceof NoSuchKey ? undefined : unavailable(error)));
      if (!answer?.Body) return undefined;
      return { bytes: Buffer.from(await answer.Body.transformToByteArray()), contentType: answer.ContentType ?? 'application/octet-stream' };
    },
    async deleteObject(key) {
      await client.send(new DeleteObjectCommand({ Bucket, Key: key })).catch(unavailable);
    },
  };
}

function statusOf(error: unknown): number | undefined {
  return error instanceof S3ServiceException ? error.$metadata.httpStatusCode : undefined;
}

/** A storage that is away or full is not a fault of ours; anything else is thrown on. */
function unavailable(error: unknown): never {
  const status = statusOf(error);
  if (isConnectionFault(error) || (status !== undefined && status >= 500)) {
    throw new AppError('unavailable', { message: 'The storage for files does not answer. Try again in a minute.' });
  }
  throw error;
}
