import net from "node:net";

/** The wanted port of the loopback address if it is free, else any free one. */
export async function freePort(wanted = 0) {
  return (await tryPort(wanted)) ?? (await tryPort(0));
}

export const isPortFree = async (port) => (await tryPort(port)) !== null;

function tryPort(port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once("error", () => resolve(null));
    server.listen(port, "127.0.0.1", () => {
      const { port: given } = server.address();
      server.close(() => resolve(given));
    });
  });
}
