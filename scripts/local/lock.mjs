import { createHash } from "node:crypto";
import { createServer } from "node:net";
import { root } from "./folders.mjs";
import { pause } from "./processes.mjs";

/**
 * Does one thing at a time in this checkout, whoever asks: two test runs that start together must not both make the
 * database. The lock is an abstract socket of the kernel: it ends with its holder, so none is ever left behind.
 */
export async function oneAtATime(name, act, { patience_ms = 900_000 } = {}) {
  const path = `\0holdground-${createHash("sha256").update(`${root} ${name}`).digest("hex").slice(0, 24)}`;
  const begun = Date.now();
  let held = await claim(path);
  while (!held) {
    if (Date.now() - begun > patience_ms)
      throw new Error(`Another run in this folder has been busy with "${name}" for too long; end it first.`);
    await pause(80);
    held = await claim(path);
  }
  try {
    return await act();
  } finally {
    await new Promise((closed) => held.close(closed));
  }
}

function claim(path) {
  return new Promise((answer, refuse) => {
    const socket = createServer((visitor) => visitor.destroy());
    socket.once("error", (error) => (error.code === "EADDRINUSE" ? answer(undefined) : refuse(error)));
    socket.listen({ path }, () => answer(socket));
  });
}
