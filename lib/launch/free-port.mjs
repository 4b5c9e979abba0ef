import { createServer } from "node:net";

/** Whether a loopback port can be bound; port 0 lets the system choose. Resolves to the port or null. */
function tryPort(port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once("error", () => resolve(null));
    server.listen({ port, host: "127.0.0.1" }, () => {
      const taken = server.address().port;
      server.close(() => resolve(taken));
    });
  });
}

export const isFree = async (port) => (await tryPort(port)) !== null;

/** The preferred port when it is free, else one the system chooses. */
export async function freePort(preferred = 0) {
  return (preferred ? await tryPort(preferred) : null) ?? (await tryPort(0));
}

/** The first free port from the given one on. */
export async function nextFreePort(from) {
  for (let port = from; port < Math.min(from + 100, 65_536); port++) {
    if (await isFree(port)) return port;
  }
  return freePort();
}
