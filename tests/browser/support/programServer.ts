import { join } from "node:path";
import { PROJECT } from "../../../.ci/install.mjs";
import { startServer } from "../../../.ci/serve.mjs";

export const BUILT_PROGRAM = join(PROJECT, "dist");

export interface ProgramServer {
  /** With a closing slash; the same through stop and start, as storage and service worker belong to it. */
  readonly url: string;
  readonly port: number;
  /** Ends the server and every open connection: requests are refused until `start`. */
  stop(): Promise<void>;
  /** Serves another folder at the same address, or the built program again. */
  start(folder?: string): Promise<void>;
}

export async function startProgramServer(folder: string = BUILT_PROGRAM): Promise<ProgramServer> {
  let running: Awaited<ReturnType<typeof startServer>> | null = await startServer({ folder, port: 0 });
  const { url, port } = running;
  const stop = async () => {
    await running?.close();
    running = null;
  };
  return {
    url,
    port,
    stop,
    async start(next = BUILT_PROGRAM) {
      await stop();
      running = await startServer({ folder: next, port });
    },
  };
}
