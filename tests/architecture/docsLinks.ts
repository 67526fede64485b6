import { posix } from "node:path";
import { type Fault, type Files, lineAt } from "./sourceFiles.ts";

/** Relative links in Markdown that lead to no file, or to no heading of a Markdown file. `known`: every file of the project. */
export function linkFaults(pages: Files, known: ReadonlySet<string>): Fault[] {
  return Object.entries(pages).flatMap(([file, text]) =>
    [...withoutCode(text).matchAll(/\]\(<?([^)\s>]+)>?(?:\s+"[^"]*")?\)|^\[[^\]]+\]:\s*(\S+)/gm)].flatMap((match) => {
      const link = match[1] ?? match[2] ?? "";
      const rule = linkFault(file, link, pages, known);
      return rule ? [{ file, line: lineAt(text, match.index), rule }] : [];
    }),
  );
}

function linkFault(file: string, link: string, pages: Files, known: ReadonlySet<string>): string | null {
  if (/^[a-z][a-z+.-]*:/i.test(link)) return null;
  const [path = "", anchor] = decodeURI(link).split("#");
  const target = path === "" ? file : posix.join(posix.dirname(file), path);
  const page = pages[target];
  const isFolder = [...known].some((each) => each.startsWith(`${target.replace(/\/$/, "")}/`));
  if (!known.has(target) && !isFolder) return `${link}: no such file`;
  if (anchor && page !== undefined && !headingAnchors(page).has(anchor)) return `${link}: no such heading`;
  return null;
}

/** Code keeps its length but holds no links. */
function withoutCode(text: string): string {
  return text.replace(/^```[\s\S]*?^```|`[^`\n]*`/gm, (code) => code.replace(/[^\n]/g, " "));
}

/** Anchors as the common Markdown hosts make them: lower case, punctuation dropped, spaces to dashes. */
function headingAnchors(page: string): ReadonlySet<string> {
  return new Set(
    [...page.matchAll(/^#{1,6}\s+(.+?)\s*#*$/gm)].map((match) =>
      (match[1] ?? "")
        .toLowerCase()
        .replace(/[^\p{L}\p{N}\s_-]/gu, "")
        .replace(/\s/g, "-"),
    ),
  );
}
