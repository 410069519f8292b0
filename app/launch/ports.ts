import { connect, createServer } from "node:net";
import { setTimeout as pause } from "node:timers/promises";

/** Why nothing can listen there ("EADDRINUSE", …); null where it can. */
export function obstacle(host: string, port: number): Promise<string | null> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", (error: NodeJS.ErrnoException) => resolve(error.code ?? error.message));
    probe.listen(port, host, () => probe.close(() => resolve(null)));
  });
}

/** A port of loopback that is free now. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      if (address === null || typeof address === "string") return reject(new Error("No port was given"));
      probe.close(() => resolve(address.port));
    });
  });
}

/** Resolves once something accepts connections there. */
export async function untilListening(host: string, port: number, signal: AbortSignal): Promise<void> {
  while (!(await accepts(host, port))) await pause(25, undefined, { signal });
}

function accepts(host: string, port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const socket = connect({ host, port });
    socket.once("connect", () => {
      socket.destroy();
      resolve(true);
    });
    socket.once("error", () => resolve(false));
  });
}
