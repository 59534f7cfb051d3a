import { randomBytes } from "node:crypto";
import { sql } from "drizzle-orm";
import { Client } from "minio";
import { beforeAll, describe, expect, it } from "vitest";
import * as t from "@/db/schema";
import { env } from "@/lib/env";
import type { Context } from "@/lib/services/context";
import { beginUpload } from "@/lib/services/documents/begin-upload";
import { cancelUpload } from "@/lib/services/documents/cancel-upload";
import { downloadDocument } from "@/lib/services/documents/download";
import { finishUpload } from "@/lib/services/documents/finish-upload";
import { listDocuments } from "@/lib/services/documents/list-documents";
import { readDocument } from "@/lib/services/documents/read-document";
import { freshDatabase } from "@/tests/support/database";
import { buildWorld, countOf, inside, type World } from "../values/register-world";

let world: World;
let neighbour: World;

beforeAll(async () => {
  await freshDatabase();
  world = await buildWorld("DOCS");
  neighbour = await buildWorld("NEXT-DOOR");
});

const pdf = (words: string) => Buffer.from(`%PDF-1.4\n${words}\n%%EOF\n`);
let made = 0;
const facts = (over: Record<string, unknown> = {}) => {
  made += 1;
  return {
    reference: `R-${made}`,
    title: "Factual report",
    kind: "factual report",
    code: "P01",
    status: "S2",
    receivedOn: "2026-02-03",
    ...over,
  };
};

async function sent(context: Context, fileName: string, bytes: Buffer, announced = bytes.length) {
  const ticket = await beginUpload(context, { fileName, size_bytes: announced });
  const answer = await fetch(ticket.url, {
    method: "PUT",
    headers: { "content-type": ticket.mediaType },
    body: new Uint8Array(bytes),
  });
  return { ...ticket, stored: answer.ok };
}
const fileOf = ({ documentId, documentRevisionId }: { documentId: string; documentRevisionId: string }) => ({
  documentId,
  documentRevisionId,
});
const auditCount = () => countOf(world, "audit_event");

/** The store as an independent second client sees it. */
const secondReader = () => {
  const url = new URL(env().S3_ENDPOINT);
  return new Client({
    endPoint: url.hostname,
    port: Number(url.port),
    useSSL: false,
    accessKey: env().S3_ACCESS_KEY,
    secretKey: env().S3_SECRET_KEY,
    region: env().S3_REGION,
  });
};
async function objectKeys(prefix: string): Promise<string[]> {
  const keys: string[] = [];
  for await (const item of secondReader().listObjectsV2(env().S3_BUCKET, prefix, true))
    if (item.name) keys.push(item.name);
  return keys;
}

describe("a file that is uploaded", () => {
  it("is verified, moved to a key nobody was handed, and kept byte for byte", async () => {
    const bytes = pdf(randomBytes(20_000).toString("hex"));
    const before = await auditCount();
    const { uploadId, stored } = await sent(world.preparer, "Bericht Überblick.pdf", bytes);
    expect(stored).toBe(true);
    const kept = await finishUpload(world.preparer, { uploadId, ...facts() });
    expect(await auditCount()).toBe(before + 2);

    const [row] = await inside(world, (tx) =>
      tx.select().from(t.documentRevision).where(sql`id = ${kept.documentRevisionId}`),
    );
    expect(row?.objectKey).toMatch(/^documents\//);
    const stream = await secondReader().getObject(env().S3_BUCKET, row?.objectKey ?? "");
    const parts: Buffer[] = [];
    for await (const part of stream) parts.push(part as Buffer);
    expect(Buffer.concat(parts).equals(bytes)).toBe(true);
    expect(await objectKeys(`incoming/${world.projectId}/${uploadId}`)).toEqual([]);

    const { url } = await downloadDocument(world.reader, fileOf(kept));
    const answer = await fetch(url);
    expect(answer.headers.get("content-disposition")).toContain("attachment");
    expect(answer.headers.get("content-disposition")).toContain("Bericht%20%C3%9Cberblick.pdf");
    expect(Buffer.from(await answer.arrayBuffer()).equals(bytes)).toBe(true);
  });

  it("goes with a request that names its type and size and carries no checksum of its own", async () => {
    const { url } = await beginUpload(world.preparer, { fileName: "a.pdf", size_bytes: 10 });
    expect(url).not.toContain("x-amz-checksum");
    const tooLong = await fetch(url, {
      method: "PUT",
      headers: { "content-type": "application/pdf" },
      body: new Uint8Array(Buffer.alloc(11)),
    });
    expect(tooLong.ok).toBe(false);
    const otherType = await fetch(url, {
      method: "PUT",
      headers: { "content-type": "text/html" },
      body: new Uint8Array(Buffer.alloc(10)),
    });
    expect(otherType.ok).toBe(false);
  });

  it("supersedes the last revision of its document", async () => {
    const first = await sent(world.preparer, "gir.pdf", pdf("first issue"));
    const { documentId } = await finishUpload(world.preparer, { uploadId: first.uploadId, ...facts() });
    const second = await sent(world.preparer, "gir.pdf", pdf("second issue"));
    const { code, status, receivedOn } = facts({ code: "P02" });
    await finishUpload(world.preparer, { uploadId: second.uploadId, documentId, code, status, receivedOn });
    const page = await readDocument(world.reader, { documentId });
    expect(page.revisionRows.map(({ code: of, current }) => [of, current])).toEqual([
      ["P02", true],
      ["P01", false],
    ]);
  });

  it("is told to be here already when the very same bytes are, unless it is meant", async () => {
    const bytes = pdf("the same again");
    const first = await sent(world.preparer, "a.pdf", bytes);
    await finishUpload(world.preparer, { uploadId: first.uploadId, ...facts() });
    const again = await sent(world.preparer, "b.pdf", bytes);
    const wanted = facts();
    await expect(finishUpload(world.preparer, { uploadId: again.uploadId, ...wanted })).rejects.toMatchObject(
      {
        status: 409,
      },
    );
    const kept = await finishUpload(world.preparer, {
      uploadId: again.uploadId,
      ...wanted,
      evenIfHere: true,
    });
    expect(kept.reference).toBe(wanted.reference);
  });
});

describe("a file that is not what it says", () => {
  const html = Buffer.from("<!doctype html><script>alert(1)</script>");
  it.each([
    ["a web page named .pdf", "x.pdf", html],
    ["a web page named .txt", "x.txt", html],
    ["binary data named .csv", "x.csv", Buffer.from([0, 1, 2, 3, 255, 254, 0, 7])],
    ["a PDF without its end", "x.pdf", Buffer.from("%PDF-1.7 cut off")],
    ["a picture named .ags", "x.ags", Buffer.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0])],
    ["plain words named .ags", "x.ags", Buffer.from("hello there\n")],
    ["a zip that is no workbook", "x.xlsx", Buffer.from("PK\u0003\u0004 nothing of the kind")],
  ])("%s is refused, with no row and no object left", async (_name, fileName, bytes) => {
    const before = await countOf(world, "document_revision");
    const { uploadId } = await sent(world.preparer, fileName, bytes);
    await expect(finishUpload(world.preparer, { uploadId, ...facts() })).rejects.toMatchObject({
      status: 400,
    });
    expect(await countOf(world, "document_revision")).toBe(before);
    expect(await objectKeys(`incoming/${world.projectId}/${uploadId}`)).toEqual([]);
    await expect(finishUpload(world.preparer, { uploadId, ...facts() })).rejects.toMatchObject({
      status: 409,
    });
  });

  it("is refused when its hash is not the one that the browser worked out", async () => {
    const { uploadId } = await sent(world.preparer, "x.pdf", pdf("changed on its way"));
    await expect(
      finishUpload(world.preparer, { uploadId, ...facts(), sha256: "0".repeat(64) }),
    ).rejects.toMatchObject({ status: 400 });
  });

  it.each(["x.exe", "x.svg", "x.html", "x", "x.pdf.zip"])("%s is not taken at all", async (fileName) => {
    await expect(beginUpload(world.preparer, { fileName, size_bytes: 10 })).rejects.toMatchObject({
      fields: { fileName: expect.any(String) },
    });
  });

  it.each([0, -1, 1.5, 2 * 1024 ** 3 + 1])("a size of %s bytes is refused", async (size_bytes) => {
    await expect(beginUpload(world.preparer, { fileName: "x.pdf", size_bytes })).rejects.toMatchObject({
      fields: { size_bytes: expect.any(String) },
    });
  });
});

describe("who may upload, and whose upload it is", () => {
  it("is no reader", async () => {
    await expect(beginUpload(world.reader, { fileName: "x.pdf", size_bytes: 9 })).rejects.toMatchObject({
      status: 403,
    });
  });

  it("is its own: neither a colleague nor a neighbour can finish or cancel it", async () => {
    const { uploadId } = await sent(world.preparer, "mine.pdf", pdf("mine"));
    for (const other of [world.structural, neighbour.preparer]) {
      await expect(finishUpload(other, { uploadId, ...facts() })).rejects.toMatchObject({ status: 404 });
      await expect(cancelUpload(other, { uploadId })).rejects.toMatchObject({ status: 404 });
    }
    await cancelUpload(world.preparer, { uploadId });
    await expect(finishUpload(world.preparer, { uploadId, ...facts() })).rejects.toMatchObject({
      status: 409,
    });
  });

  it("shows a neighbour's document to nobody", async () => {
    const { uploadId } = await sent(neighbour.preparer, "theirs.pdf", pdf("theirs"));
    const kept = await finishUpload(neighbour.preparer, { uploadId, ...facts() });
    await expect(readDocument(world.lead, { documentId: kept.documentId })).rejects.toMatchObject({
      status: 404,
    });
    await expect(downloadDocument(world.lead, fileOf(kept))).rejects.toMatchObject({ status: 404 });
    const { documents } = await listDocuments(world.lead);
    expect(documents.some(({ id }) => id === kept.documentId)).toBe(false);
    const theirs = await listDocuments(neighbour.lead);
    expect(theirs.documents.some(({ id }) => id === kept.documentId)).toBe(true);
  });
});

it("a store that is away is a sentence, and nothing is recorded", async () => {
  const { uploadId } = await sent(world.preparer, "x.pdf", pdf("store away"));
  const before = await countOf(world, "document_revision");
  const endpoint = process.env.S3_ENDPOINT;
  process.env.S3_ENDPOINT = "http://127.0.0.1:9";
  try {
    await expect(finishUpload(world.preparer, { uploadId, ...facts() })).rejects.toMatchObject({
      status: 503,
    });
  } finally {
    process.env.S3_ENDPOINT = endpoint;
  }
  expect(await countOf(world, "document_revision")).toBe(before);
  await finishUpload(world.preparer, { uploadId, ...facts() });
});
