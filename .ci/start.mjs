import { spawnSync } from "node:child_process";
import { join } from "node:path";
import { checkNode, ensurePackages, PROJECT, runCommand, SetupFault } from "./install.mjs";
import { startServer } from "./serve.mjs";

/** `npm start`: installs what is missing, builds, serves. The address is the last line printed. */

const PORT = 4173;

await runCommand(async () => {
  checkNode();
  ensurePackages();
  build();
  const server = await startServer({
    folder: join(PROJECT, "dist"),
    port: PORT,
    seekPort: true,
    onTaken: (port) => console.log(`Port ${port} is taken; trying ${port + 1}.`),
  });
  for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM"])) {
    process.once(signal, () => void server.close());
  }
  if (server.port !== PORT) {
    console.log(
      `A browser keeps cases by address: those entered on port ${PORT} are not shown on port ${server.port}.`,
    );
  }
  console.log("Ebbline is ready. Ctrl+C ends the server; a browser that has opened the page once needs it no longer.");
  console.log(server.url.replace(/\/$/, ""));
});

function build() {
  console.log("Building Ebbline ...");
  const vite = join(PROJECT, "node_modules", "vite", "bin", "vite.js");
  const { status } = spawnSync(process.execPath, [vite, "build", "--logLevel", "warn"], {
    cwd: PROJECT,
    stdio: ["ignore", "inherit", "inherit"],
  });
  if (status !== 0) throw new SetupFault("The build failed, see above.");
}
