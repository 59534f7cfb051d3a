import type { UploadTicket } from "@/lib/contracts/documents";
import { fetchJson } from "./fetch-json";

/** Why a file did not arrive, in a sentence for the person. */
export class NotSent extends Error {}

/**
 * Sends one file straight to the store: asks for a presigned request, then PUTs the bytes with progress. `fetch` tells
 * no progress, so the old request object does. Aborting gives the upload up on the server too.
 */
export async function putFile(
  projectId: string,
  file: File,
  options: { onProgress: (sent_bytes: number) => void; signal: AbortSignal },
): Promise<UploadTicket> {
  const uploads = `/api/projects/${projectId}/documents/uploads`;
  const ticket = await fetchJson<UploadTicket>(uploads, {
    method: "POST",
    body: { fileName: file.name, size_bytes: file.size },
    signal: options.signal,
  });
  try {
    await send(ticket, file, options);
  } catch (error) {
    void fetchJson(`${uploads}/${ticket.uploadId}/cancel`, { method: "POST", body: {} }).catch(() => {});
    throw error;
  }
  return ticket;
}

function send(
  ticket: UploadTicket,
  file: File,
  { onProgress, signal }: { onProgress: (sent_bytes: number) => void; signal: AbortSignal },
): Promise<void> {
  return new Promise((done, failed) => {
    const request = new XMLHttpRequest();
    request.open("PUT", ticket.url);
    request.setRequestHeader("content-type", ticket.mediaType);
    request.upload.onprogress = (event) => onProgress(event.loaded);
    request.onload = () =>
      request.status >= 200 && request.status < 300
        ? done()
        : failed(new NotSent(`The store refused the file (${request.status}). Nothing was recorded.`));
    request.onerror = () =>
      failed(new NotSent("The connection to the store was lost. Nothing was recorded; please try again."));
    request.onabort = () => failed(new NotSent("Cancelled. Nothing was recorded."));
    signal.addEventListener("abort", () => request.abort(), { once: true });
    request.send(file);
  });
}
