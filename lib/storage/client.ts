import {
  CopyObjectCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  PutObjectCommand,
  S3Client,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { env } from "@/lib/env";
import { Unavailable } from "@/lib/services/errors";

const kept = globalThis as { holdgroundStore?: { of: string; client: S3Client } };

function store(): S3Client {
  const { S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY, S3_SECRET_KEY } = env();
  const of = [S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY, S3_SECRET_KEY].join("\n");
  if (kept.holdgroundStore?.of !== of) {
    const client = new S3Client({
      endpoint: S3_ENDPOINT,
      region: S3_REGION,
      forcePathStyle: true,
      credentials: { accessKeyId: S3_ACCESS_KEY, secretAccessKey: S3_SECRET_KEY },
      // Otherwise a presigned PUT carries the checksum of an empty body, and some stores refuse the file for it.
      requestChecksumCalculation: "WHEN_REQUIRED",
      responseChecksumValidation: "WHEN_REQUIRED",
      maxAttempts: 2,
      requestHandler: { connectionTimeout: 3_000, requestTimeout: 600_000 },
    });
    kept.holdgroundStore = { of, client };
  }
  return kept.holdgroundStore.client;
}

/** Away is a refusal with a sentence; a missing object is null; the rest is a bug. */
async function asked<Result>(act: () => Promise<Result>): Promise<Result | null> {
  try {
    return await act();
  } catch (error) {
    const { name, $metadata } = error as { name?: string; $metadata?: { httpStatusCode?: number } };
    const status = $metadata?.httpStatusCode;
    if (name === "NotFound" || name === "NoSuchKey" || status === 404) return null;
    if (status === undefined || status >= 500)
      throw new Unavailable(
        "The file store does not answer just now. Nothing was recorded; please try again.",
      );
    throw error;
  }
}

const UPLOAD_SECONDS = 3600;
const DOWNLOAD_SECONDS = 120;

/** A presigned PUT for exactly this key, type and size. */
export async function presignUpload(object: {
  key: string;
  mediaType: string;
  size_bytes: number;
}): Promise<string> {
  const put = new PutObjectCommand({
    Bucket: env().S3_BUCKET,
    Key: object.key,
    ContentType: object.mediaType,
    ContentLength: object.size_bytes,
  });
  return getSignedUrl(store(), put, {
    expiresIn: UPLOAD_SECONDS,
    signableHeaders: new Set(["host", "content-type", "content-length"]),
  });
}

/** A short-lived GET as an attachment under the file's own name (RFC 6266), never shown inside our pages. */
export async function presignDownload(object: {
  key: string;
  fileName: string;
  mediaType: string;
}): Promise<string> {
  const plain = object.fileName.replace(/[^\x20-\x7e]|["\\%]/g, "_");
  const get = new GetObjectCommand({
    Bucket: env().S3_BUCKET,
    Key: object.key,
    ResponseContentDisposition: `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(object.fileName).replace(/['()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`)}`,
    ResponseContentType: object.mediaType,
  });
  return getSignedUrl(store(), get, { expiresIn: DOWNLOAD_SECONDS });
}

/** Size and entity tag of an object; null when there is none. */
export async function head(key: string): Promise<{ size_bytes: number; etag: string } | null> {
  const found = await asked(() => store().send(new HeadObjectCommand({ Bucket: env().S3_BUCKET, Key: key })));
  return found ? { size_bytes: found.ContentLength ?? 0, etag: found.ETag ?? "" } : null;
}

/** The object's bytes as they come, with the entity tag that they belong to; null when there is none. */
export async function open(key: string): Promise<{ bytes: AsyncIterable<Uint8Array>; etag: string } | null> {
  const found = await asked(() => store().send(new GetObjectCommand({ Bucket: env().S3_BUCKET, Key: key })));
  return found ? { bytes: found.Body as AsyncIterable<Uint8Array>, etag: found.ETag ?? "" } : null;
}

/** Copies inside the store; answers the copy's entity tag, null when the source is gone. */
export async function copy(from: string, to: string): Promise<string | null> {
  const done = await asked(() =>
    store().send(
      new CopyObjectCommand({
        Bucket: env().S3_BUCKET,
        Key: to,
        CopySource: `${env().S3_BUCKET}/${from.split("/").map(encodeURIComponent).join("/")}`,
      }),
    ),
  );
  return done ? (done.CopyObjectResult?.ETag ?? "") : null;
}

/** Takes an object away; one that is not there is no fault. */
export async function remove(key: string): Promise<void> {
  await asked(() => store().send(new DeleteObjectCommand({ Bucket: env().S3_BUCKET, Key: key })));
}

/** Puts bytes that the application itself has made (demo documents, reports). */
export async function put(key: string, bytes: Uint8Array, mediaType: string): Promise<void> {
  await asked(() =>
    store().send(
      new PutObjectCommand({ Bucket: env().S3_BUCKET, Key: key, Body: bytes, ContentType: mediaType }),
    ),
  );
}
