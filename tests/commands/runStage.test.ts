import { expect, test } from "vitest";
import { runStage } from "../../.ci/runStage.mjs";

const node = (script: string, limitMinutes = 1) =>
  runStage([process.execPath, "-e", script], { cwd: process.cwd(), limitMinutes });

test("a stage that ends well has no fault", async () => {
  expect(await node("0")).toBeUndefined();
});

test("a failed, a killed and an unknown program are told apart", async () => {
  expect(await node("process.exit(3)")).toBe("ended with exit code 3");
  expect(await node('process.kill(process.pid, "SIGTERM")')).toBe("ended by SIGTERM");
  expect(await runStage(["no-such-program-here"], { cwd: process.cwd(), limitMinutes: 1 })).toMatch(
    /could not be started/,
  );
});

test("a stage that never ends is stopped", async () => {
  expect(await node("for (;;);", 0.01)).toBe("stopped after 0.01 minutes");
});
