import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { arePackagesCurrent, ensureBrowserTools, findBrowser, findProgram } from "../../.ci/install.mjs";

let folder = "";
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "ebbline-install-"));
  vi.spyOn(console, "error").mockImplementation(() => undefined);
});
afterEach(() => {
  vi.restoreAllMocks();
  vi.unstubAllEnvs();
  rmSync(folder, { recursive: true, force: true });
});

function program(name: string, script = ""): void {
  writeFileSync(join(folder, name), `#!/bin/sh\n${script}\n`, { mode: 0o755 });
}

describe("browser tools", () => {
  beforeEach(() => vi.stubEnv("PATH", folder));

  test("a browser is found on the PATH under any of its names, an unexecutable file is not one", () => {
    writeFileSync(join(folder, "chromium"), "", { mode: 0o644 });
    expect(findBrowser()).toBeUndefined();
    program("google-chrome");
    expect(findBrowser()).toBe(join(folder, "google-chrome"));
    program("chromium-browser");
    expect(findBrowser()).toBe(join(folder, "chromium-browser"));
    expect(findProgram(["none"])).toBeUndefined();
  });

  test("what is missing is named with the words that install it, when it cannot be installed here", () => {
    vi.spyOn(process, "getuid").mockReturnValue(1000);
    program("apt-get", `echo "$@" >> ${folder}/called`);
    expect(() => ensureBrowserTools()).toThrow(
      /need chromium and poppler-utils\. .*sudo apt-get install chromium poppler-utils\./,
    );
    program("chromium");
    expect(() => ensureBrowserTools()).toThrow(/need poppler-utils\. .*sudo apt-get install poppler-utils\./);
    program("pdftotext");
    expect(() => ensureBrowserTools()).toThrow(/need poppler-utils\./);
    program("pdftoppm");
    ensureBrowserTools();
    expect(findProgram(["called"])).toBeUndefined();
    expect(() => readFileSync(join(folder, "called"))).toThrow(/ENOENT/);
  });

  test("root on Debian installs what is missing and only that", () => {
    vi.spyOn(process, "getuid").mockReturnValue(0);
    program("chromium");
    const fake =
      'for name in pdftotext pdftoppm; do printf "#!/bin/sh\\n" > "$D/$name"; /bin/chmod +x "$D/$name"; done';
    program("apt-get", `D=${folder}\necho "$@" >> $D/called\n[ "$2" = install ] && { ${fake}; }\nexit 0`);
    ensureBrowserTools();
    expect(readFileSync(join(folder, "called"), "utf8")).toBe(
      "-q update\n-q install -y --no-install-recommends poppler-utils\n",
    );
  });

  test("an installation that fails, or leaves something missing, is not taken for one", () => {
    vi.spyOn(process, "getuid").mockReturnValue(0);
    program("apt-get", "exit 100");
    expect(() => ensureBrowserTools()).toThrow(/apt-get update failed/);
    program("apt-get", "exit 0");
    expect(() => ensureBrowserTools()).toThrow(/need chromium and poppler-utils/);
  });
});

describe("npm packages are current", () => {
  const entry = (version: string, more = {}) => ({ version, ...more });
  const present = (
    wanted: Record<string, object>,
    installed: Record<string, object> | null,
    folders = Object.keys(installed ?? {}),
  ) => {
    writeFileSync(join(folder, "package-lock.json"), JSON.stringify({ packages: { "": {}, ...wanted } }));
    for (const each of ["node_modules", ...folders]) mkdirSync(join(folder, each), { recursive: true });
    if (installed)
      writeFileSync(join(folder, "node_modules", ".package-lock.json"), JSON.stringify({ packages: installed }));
    return arePackagesCurrent(folder);
  };
  const a = "node_modules/a";
  const b = "node_modules/b";

  test.each([
    ["the same", true, { [a]: entry("1.0.0") }, { [a]: entry("1.0.0") }, undefined],
    ["none yet", false, { [a]: entry("1.0.0") }, null, undefined],
    ["another version", false, { [a]: entry("1.0.1") }, { [a]: entry("1.0.0") }, undefined],
    ["one missing", false, { [a]: entry("1.0.0"), [b]: entry("1.0.0") }, { [a]: entry("1.0.0") }, undefined],
    [
      "one for another platform missing",
      true,
      { [a]: entry("1.0.0"), [b]: entry("1.0.0", { optional: true }) },
      { [a]: entry("1.0.0") },
      undefined,
    ],
    ["one no longer wanted", false, { [a]: entry("1.0.0") }, { [a]: entry("1.0.0"), [b]: entry("1.0.0") }, undefined],
    ["listed, but its folder is gone", false, { [a]: entry("1.0.0") }, { [a]: entry("1.0.0") }, []],
  ] as const)("%s: %s", (_, isCurrent, wanted, installed, folders) => {
    expect(present(wanted, installed, folders && [...folders])).toBe(isCurrent);
  });
});
