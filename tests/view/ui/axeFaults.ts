import axe from "axe-core";

/** Rules jsdom can't judge: it has no layout and no colours. The browser tests hold those. */
const BLIND = ["color-contrast", "target-size"];

/** What axe finds against WCAG 2.2 A and AA, as "rule: target" lines. */
export async function axeFaults(container: Element): Promise<string[]> {
  const found = await axe.run(container, {
    runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"],
    rules: Object.fromEntries([...BLIND, "region"].map((id) => [id, { enabled: false }])),
  });
  return found.violations.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.target.join(" ")}`));
}
