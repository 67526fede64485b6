import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { dirname, join } from "node:path";
import { expect, test } from "vitest";
import {
  DEVELOPMENT_POLICY,
  HEADER_POLICY,
  META_POLICY,
  SECURITY_HEADERS,
} from "../../../src/shell/offline/contentSecurityPolicy.ts";

const fromAria = createRequire(createRequire(import.meta.url).resolve("react-aria-components"));
const REACT_ARIA = dirname(fromAria.resolve("react-aria/package.json"));

/** The text a hook of react-aria puts into its <style>, read from the installed source with its one constant filled in. */
function styleText(file: string): string {
  const source = readFileSync(join(REACT_ARIA, "dist", "private", file), "utf8");
  const text = /style\.textContent = `([^`]*)`/.exec(source)?.[1];
  const attribute = /PRESSABLE_ATTRIBUTE = '([^']+)'/.exec(source)?.[1] ?? "";
  if (text === undefined) throw new Error(`no <style> text in ${file}`);
  return text.replace(/\$\{[^}]*PRESSABLE_ATTRIBUTE\}/g, attribute).trim();
}

test.each(["interactions/usePress.mjs", "overlays/usePreventScroll.mjs"])(
  "allows the <style> of the installed %s by its digest",
  (file) => {
    const digest = createHash("sha256").update(styleText(file)).digest("base64");
    expect(META_POLICY).toContain(`'sha256-${digest}'`);
  },
);

test("allows nothing else inline, no code from text and no other origin", () => {
  for (const policy of [HEADER_POLICY, META_POLICY]) {
    expect(policy).toMatch(/^default-src 'none'; /);
    expect(policy).not.toMatch(/https?:|wss?:|\*|unsafe/);
    expect(policy.match(/sha256-/g)).toHaveLength(2);
  }
});

test("forbids framing where a browser heeds it, in the header", () => {
  expect(HEADER_POLICY).toContain("frame-ancestors 'none'");
  expect(META_POLICY).not.toContain("frame-ancestors");
  expect(SECURITY_HEADERS["Content-Security-Policy"]).toBe(HEADER_POLICY);
});

test("names no other origin in development either", () => {
  expect(DEVELOPMENT_POLICY).not.toMatch(/https?:|\*|unsafe-eval/);
});
