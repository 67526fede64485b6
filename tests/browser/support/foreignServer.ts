import { createServer } from "node:http";
import type { AddressInfo } from "node:net";

export interface ForeignServer {
  readonly url: string;
  /** How many requests or connections have come. */
  readonly hits: () => number;
  readonly close: () => Promise<void>;
}

/** Another origin that would answer anyone, and counts who came. */
export async function startForeignServer(html = "foreign"): Promise<ForeignServer> {
  let hits = 0;
  const server = createServer((_, response) => {
    response.writeHead(200, { "Access-Control-Allow-Origin": "*", "Content-Type": "text/html" });
    response.end(html);
  });
  server.on("connection", () => {
    hits += 1;
  });
  await new Promise<void>((done) => server.listen(0, "127.0.0.1", done));
  const { port } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${port}/`,
    hits: () => hits,
    close: () =>
      new Promise((done) => {
        server.close(() => done());
        server.closeAllConnections();
      }),
  };
}
