import { Readable } from 'node:stream';
import {
  AbortMultipartUploadCommand, CompleteMultipartUploadCommand, CreateMultipartUploadCommand, DeleteObjectCommand, GetObjectCommand,
  HeadBucketCommand, HeadObjectCommand, ListMultipartUploadsCommand, ListObjectsV2Command, ListPartsCommand, S3Client, UploadPartCommand,
  type ListMultipartUploadsCommandOutput,
} from '@aws-sdk/client-s3';
import { Upload } from '@aws-sdk/lib-storage';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';

export interface StoredPart { number: number; etag: string; bytes: number }
/** `since`: when it was written or begun. */
export interface StoredObject { key: string; since: Date }

interface StorageOptions {
  endpoint: string; publicUrl: string; bucket: string; region: string; accessKeyId: string; secretAccessKey: string;
  partLifetimeSeconds: number;
}

/** Storage that says nothing for so long has failed; without a limit a request or a reading thread would wait for good. */
const patience = { connectionTimeout: 3000, socketTimeout: 10_000 };
/** Somebody waits for this call, with all its tries. */
const startWithin = 8000;

export type Storage = ReturnType<typeof createStorage>;

/** Files in an S3-compatible bucket. Part addresses are signed for the URL at which browsers reach storage. */
export function createStorage(options: StorageOptions) {
  const { bucket, region, accessKeyId, secretAccessKey, partLifetimeSeconds } = options;
  const clientAt = (endpoint: string) => new S3Client({
    requestHandler: patience, endpoint, region, forcePathStyle: true, credentials: { accessKeyId, secretAccessKey },
    requestChecksumCalculation: 'WHEN_REQUIRED', responseChecksumValidation: 'WHEN_REQUIRED',
  });
  const client = clientAt(options.endpoint);
  const publicClient = clientAt(options.publicUrl);

  return {
    async startMultipart(key: string): Promise<string> {
      const answer = await client.send(new CreateMultipartUploadCommand({ Bucket: bucket, Key: key }), { abortSignal: AbortSignal.timeout(startWithin) });
      if (!answer.UploadId) throw new Error(`Storage gave no upload id for ${key}.`);
      return answer.UploadId;
    },

    async signPart(key: string, multipartId: string, number: number): Promise<string> {
      const command = new UploadPartCommand({ Bucket: bucket, Key: key, UploadId: multipartId, PartNumber: number });
      return getSignedUrl(publicClient, command, { expiresIn: partLifetimeSeconds });
    },

    partLifetimeSeconds,

    /** Parts stored so far, null where the upload was completed or given up. */
    async findParts(key: string, multipartId: string): Promise<StoredPart[] | null> {
      try {
        const answer = await client.send(new ListPartsCommand({ Bucket: bucket, Key: key, UploadId: multipartId, MaxParts: 1000 }));
        return (answer.Parts ?? []).map((part) => ({ number: part.PartNumber ?? 0, etag: part.ETag ?? '', bytes: part.Size ?? 0 }));
      } catch (error) {
        if (error instanceof Error && error.name === 'NoSuchUpload') return null;
        throw error;
      }
    },

    async completeMultipart(key: string, multipartId: string, parts: { number: number; etag: string }[]): Promise<void> {
      const sorted = [...parts].sort((a, b) => a.number - b.number).map((part) => ({ PartNumber: part.number, ETag: part.etag }));
      await client.send(new CompleteMultipartUploadCommand({ Bucket: bucket, Key: key, UploadId: multipartId, MultipartUpload: { Parts: sorted } }));
    },

    /** Frees the parts; one that is already gone is as wanted. */
    async abortMultipart(key: string, multipartId: string): Promise<void> {
      try {
        await client.send(new AbortMultipartUploadCommand({ Bucket: bucket, Key: key, UploadId: multipartId }));
      } catch (error) {
        if (!(error instanceof Error && error.name === 'NoSuchUpload')) throw error;
      }
    },

    /** Objects under a prefix, page by page. */
    async *listObjects(prefix: string): AsyncGenerator<StoredObject> {
      let after: string | undefined;
      do {
        const answer = await client.send(new ListObjectsV2Command({ Bucket: bucket, Prefix: prefix, ContinuationToken: after }));
        for (const { Key, LastModified } of answer.Contents ?? []) if (Key && LastModified) yield { key: Key, since: LastModified };
        after = answer.IsTruncated ? answer.NextContinuationToken : undefined;
      } while (after !== undefined);
    },

    /** Uploads in parts under a prefix that are neither completed nor given up, page by page. */
    async *listMultiparts(prefix: string): AsyncGenerator<StoredObject & { multipartId: string }> {
      let after: { KeyMarker?: string; UploadIdMarker?: string } | undefined = {};
      while (after) {
        const answer: ListMultipartUploadsCommandOutput = await client.send(new ListMultipartUploadsCommand({ Bucket: bucket, Prefix: prefix, ...after }));
        for (const { Key, UploadId, Initiated } of answer.Uploads ?? []) if (Key && UploadId && Initiated) yield { key: Key, multipartId: UploadId, since: Initiated };
        after = answer.IsTruncated ? { KeyMarker: answer.NextKeyMarker, UploadIdMarker: answer.NextUploadIdMarker } : undefined;
      }
    },

    /** Streams a body in parts of 8 MiB, or of more where it is known to be so long that a thousand would not do. */
    async put(key: string, body: Readable, bytes = 0): Promise<void> {
      const partSize = Math.max(8 * 1024 * 1024, Math.ceil(bytes / 1000));
      await new Upload({ client, params: { Bucket: bucket, Key: key, Body: body }, partSize, queueSize: 2 }).done();
    },

    /** Size in bytes, or null where there is no such object. */
    async sizeOf(key: string): Promise<number | null> {
      try {
        const answer = await client.send(new HeadObjectCommand({ Bucket: bucket, Key: key }));
        return answer.ContentLength ?? null;
      } catch (error) {
        if (error instanceof Error && (error.name === 'NotFound' || error.name === 'NoSuchKey')) return null;
        throw error;
      }
    },

    async read(key: string, signal?: AbortSignal): Promise<Readable> {
      const answer = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key }), { abortSignal: signal });
      if (!(answer.Body instanceof Readable)) throw new Error(`Storage gave no body for ${key}.`);
      return answer.Body;
    },

    async remove(key: string): Promise<void> {
      await client.send(new DeleteObjectCommand({ Bucket: bucket, Key: key }));
    },

    async isReachable(): Promise<boolean> {
      try {
        await client.send(new HeadBucketCommand({ Bucket: bucket }));
        return true;
      } catch {
        return false;
      }
    },
  };
}
