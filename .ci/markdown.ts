/** Text that may stand in Markdown and in a cell of its tables as it is read: no sign in it makes emphasis, a link, a tag or a new cell. */
export function markdownText(text: string): string {
  return text.replace(/[\\*_|<>`[\]]/g, "\\$&");
}

/** A table; cells are Markdown. A column that is empty in every row is left out; none at all without rows. */
export function markdownTable(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const kept = head.map((_, column) => rows.some((row) => (row[column] ?? "") !== ""));
  if (!kept.includes(true)) return "";
  const line = (cells: readonly string[]) => `| ${cells.filter((_, column) => kept[column]).join(" | ")} |`;
  return [line(head), line(head.map(() => "---")), ...rows.map(line)].join("\n");
}

/** Paragraphs, headings, lists and tables one below the other; empty ones left out. */
export function markdownPage(parts: readonly string[]): string {
  return `${parts.filter((part) => part !== "").join("\n\n")}\n`;
}

/** A heading with what stands under it, or nothing where there is nothing. */
export function markdownSection(title: string, ...parts: readonly string[]): string {
  const body = parts.filter((part) => part !== "");
  return body.length === 0 ? "" : [`## ${title}`, ...body].join("\n\n");
}
