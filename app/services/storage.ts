import { createHash } from "node:crypto";
import {
  GetObjectCommand,
  HeadBucketCommand,
  PutObjectCommand,
  S3Client,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { type Config, config } from "../config";

export interface Storage {
  /** Writes an object and reads it back; throws unless what lies there is what was sent. */
  put(key: string, bytes: Uint8Array, type: string): Promise<void>;
  /** An address that shows the object for some seconds. */
  presign(key: string, seconds: number): Promise<string>;
  check(): Promise<void>;
}

function client(settings: Config["s3"], endpoint: string): S3Client {
  return new S3Client({
    endpoint,
    region: settings.region,
    forcePathStyle: true,
    credentials: {
      accessKeyId: settings.accessKeyId,
      secretAccessKey: settings.secretAccessKey,
    },
    // Streamed checksums are stored as part of the object by some S3-compatible stores.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
    maxAttempts: 2,
  });
}

const digest = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");

/** Shorter than a phone waits for a photo: a store that hangs is answered for, not waited out. */
const DEADLINE_MS = 20_000;

/** An S3-compatible object store. What it has not done within the deadline counts as failed. */
export function openStorage(settings: Config["s3"], deadlineMs = DEADLINE_MS): Storage {
  const inside = client(settings, settings.endpoint);
  const outside = client(settings, settings.publicEndpoint);
  const Bucket = settings.bucket;
  return {
    async put(Key, bytes, type) {
      const within = { abortSignal: AbortSignal.timeout(deadlineMs) };
      const sent = new PutObjectCommand({ Bucket, Key, Body: bytes, ContentType: type });
      await inside.send(sent, within);
      const back = await inside.send(new GetObjectCommand({ Bucket, Key }), within);
      const stored = await back.Body?.transformToByteArray();
      if (!stored || digest(stored) !== digest(bytes)) throw new Error("object not stored whole");
    },
    presign: (Key, seconds) =>
      getSignedUrl(outside, new GetObjectCommand({ Bucket, Key }), { expiresIn: seconds }),
    async check() {
      const within = { abortSignal: AbortSignal.timeout(deadlineMs) };
      await inside.send(new HeadBucketCommand({ Bucket }), within);
    },
  };
}

let opened: Storage | null = null;

/** The process's object store, opened on first use. */
export function storage(): Storage {
  opened ??= openStorage(config().s3);
  return opened;
}
