import { createServer } from "node:net";

function listens(port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once("error", () => resolve(null));
    server.listen(port, "127.0.0.1", () => {
      const taken = server.address().port;
      server.close(() => resolve(taken));
    });
  });
}

/** A free loopback port: the wanted one, the next free after it, or any when none is wanted. */
export async function freePort(wanted = 0) {
  for (let port = wanted; port < wanted + 50; port += 1) {
    const free = await listens(port);
    if (free !== null) return free;
  }
  throw new Error(`no free port from ${wanted} on`);
}
