import { parseAst } from "vite";

/** A node of the syntax tree, as far as these tests look into it. */
export interface SyntaxNode {
  readonly type: string;
  readonly start: number;
  readonly [key: string]: unknown;
}

export function parseSource(file: string, text: string): SyntaxNode {
  return parseAst(text, { lang: file.endsWith(".tsx") ? "tsx" : "ts" }) as unknown as SyntaxNode;
}

export function isNode(value: unknown): value is SyntaxNode {
  return typeof value === "object" && value !== null && typeof (value as SyntaxNode).type === "string";
}

/** Visits every node, parents first, with the key under which the parent holds it. */
export function visitNodes(
  node: SyntaxNode,
  visit: (node: SyntaxNode, parent: SyntaxNode | null, key: string) => void,
): void {
  const walk = (current: SyntaxNode, parent: SyntaxNode | null, key: string) => {
    visit(current, parent, key);
    for (const [name, value] of Object.entries(current)) {
      const children = Array.isArray(value) ? value : [value];
      for (const child of children) if (isNode(child)) walk(child, current, name);
    }
  };
  walk(node, null, "");
}

/** The text of a string literal or of a template without holes. */
export function literalText(node: unknown): string | null {
  if (!isNode(node)) return null;
  if (node.type === "Literal" && typeof node.value === "string") return node.value;
  if (node.type === "TSLiteralType") return literalText(node.literal);
  if (node.type === "TemplateLiteral" && (node.expressions as unknown[]).length === 0) {
    const [only] = node.quasis as { value: { cooked: string } }[];
    return only?.value.cooked ?? null;
  }
  return null;
}

export function isIdentifier(node: unknown, name: string): boolean {
  return isNode(node) && node.type === "Identifier" && node.name === name;
}
