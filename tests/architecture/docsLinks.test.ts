import { expect, test } from "vitest";
import { linkFaults } from "./docsLinks.ts";
import { faultText, listFiles, readFiles } from "./sourceFiles.ts";

test("every relative link in Markdown leads somewhere", () => {
  const pages = readFiles(".", /\.md$/);
  expect(Object.keys(pages).length).toBeGreaterThan(0);
  expect(linkFaults(pages, new Set(listFiles(".", /./))).map(faultText)).toEqual([]);
});

test("a planted dead link is named, a live one is not", () => {
  const pages = {
    "docs/a.md":
      "# Top\n[dead](b.md) [live](../src/c.ts) [folder](../src) [web](https://example.org/x.md)\n![picture](d.png)\n[ref]: e.md\n`[code](f.md)`",
    "docs/g.md": "# One two, three\n[good](#one-two-three) [bad](#one-two) [other](a.md#top) [wrong](a.md#bottom)",
  };
  expect(linkFaults(pages, new Set([...Object.keys(pages), "src/c.ts"])).map(faultText)).toEqual([
    "docs/a.md:2 b.md: no such file",
    "docs/a.md:3 d.png: no such file",
    "docs/a.md:4 e.md: no such file",
    "docs/g.md:2 #one-two: no such heading",
    "docs/g.md:2 a.md#bottom: no such heading",
  ]);
});
