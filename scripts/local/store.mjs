import { existsSync, mkdirSync } from "node:fs";
import { join } from "node:path";
import { secret, stateFolder } from "./folders.mjs";
import { end, forget, freePort, running, startDetached, until } from "./processes.mjs";

const python = "/usr/bin/python3";
export const region = "us-east-1";

/** Whether Debian's python3-swift is there. Debian's own Python runs it; another one first in PATH lacks it. */
export function storeIsInstalled() {
  return existsSync(python) && existsSync("/usr/lib/python3/dist-packages/swift/__init__.py");
}

/**
 * Starts the stand-in for an S3 service if it is down, or if pages of another origin must be let in, and makes the
 * bucket. One process and one data folder for each `name`.
 */
export async function ensureStore({ name, bucket, origin }) {
  if (!storeIsInstalled())
    throw new Error("The store is not installed; run `npm start` as root, or: apt-get install python3-swift");
  const keys = { accessKey: "holdground:app", secretKey: secret(name) };
  const before = running(name);
  const origins = before?.origins ?? [];
  const admitted = origins.includes(origin);
  const there = before && admitted && (await answers(before.port));
  // Pages of another address (npm run dev beside npm start) are let in as well; the last few are remembered.
  const wanted = admitted ? origins : [origin, ...origins].slice(0, 4);
  const record = there ? before : await startStore(name, keys, wanted);
  const store = { endpoint: `http://127.0.0.1:${record.port}`, region, bucket, ...keys };
  await ensureBucket(store);
  return { ...store, started: !there };
}

async function startStore(name, keys, origins) {
  await end(name);
  const folder = join(stateFolder(), name);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const port = await freePort(49_320, 4);
  const env = {
    PATH: "/usr/bin:/bin",
    LANG: "C.UTF-8",
    HOLDGROUND_S3_FOLDER: folder,
    HOLDGROUND_S3_PORT: String(port),
    HOLDGROUND_S3_ACCESS_KEY: keys.accessKey,
    HOLDGROUND_S3_SECRET_KEY: keys.secretKey,
    HOLDGROUND_S3_ORIGINS: origins.join(","),
  };
  const script = join(import.meta.dirname, "s3.py");
  const started = startDetached(name, python, ["-I", script], { env, facts: { port, origins } });
  try {
    await until(() => answers(port), {
      ended: started.ended,
      complaint: `The store did not start; see .local/log/${name}.log.`,
    });
  } catch (error) {
    forget(name);
    throw error;
  }
  return { port };
}

async function answers(port) {
  try {
    const response = await fetch(`http://127.0.0.1:${port}/healthcheck`, {
      signal: AbortSignal.timeout(3_000),
    });
    return response.ok;
  } catch {
    return false;
  }
}

/** A client of another make than the application's: what it sees, the store really holds. */
export async function minioClient(store) {
  const { Client } = await import("minio");
  const at = new URL(store.endpoint);
  return new Client({
    endPoint: at.hostname,
    port: at.port ? Number(at.port) : undefined,
    useSSL: at.protocol === "https:",
    region: store.region,
    accessKey: store.accessKey,
    secretKey: store.secretKey,
    pathStyle: true,
  });
}

/** Makes the bucket unless it is there. Says whether it was made. */
export async function ensureBucket(store) {
  const client = await minioClient(store);
  if (await client.bucketExists(store.bucket)) return false;
  try {
    await client.makeBucket(store.bucket, store.region);
    return true;
  } catch (error) {
    if (error.code === "BucketAlreadyOwnedByYou") return false;
    throw error;
  }
}

/** Removes every object of the bucket; answers with how many there were. */
export async function emptyBucket(store) {
  const client = await minioClient(store);
  if (!(await client.bucketExists(store.bucket))) return 0;
  const names = [];
  for await (const found of client.listObjectsV2(store.bucket, "", true)) names.push(found.name);
  // One by one: stores differ in how they want a list of names signed.
  for (const name of names) await client.removeObject(store.bucket, name);
  return names.length;
}
