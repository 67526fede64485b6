import { type Fault, type Files, lineAt } from "./sourceFiles.ts";
import { isIdentifier, isNode, literalText, parseSource, type SyntaxNode, visitNodes } from "./syntaxTree.ts";

/** Codes are words joined by dashes; that tells them from the other words beside them. */
const CODE = /^[a-z0-9]+(-[a-z0-9]+)+$/;

export interface UsedCode extends Omit<Fault, "rule"> {
  readonly code: string;
}

/**
 * Every code an issue is made of: the first argument of `issue(…)`, a `code:` beside `data:` or `params:`, what is compared with `.code`;
 * and, in a file that hands `issue` something computed, every dashed word given first to any call.
 */
export function issueCodes(files: Files): UsedCode[] {
  return Object.entries(files).flatMap(([file, text]) => {
    const tree = parseSource(file, text);
    const makesComputed = hasComputedIssue(tree);
    return collect(file, text, tree, (node) => {
      if (node.type === "CallExpression" || node.type === "NewExpression") {
        const [first] = node.arguments as unknown[];
        return isIdentifier(node.callee, "issue") || (makesComputed && !isConcern(node)) ? choices(first) : [];
      }
      if (node.type === "ObjectExpression") return objectCodes(node);
      if (node.type === "BinaryExpression" && isCodeMember(node.left)) return choices(node.right);
      return [];
    });
  });
}

/** Every code of a concern: the first argument of `concern(…)`. */
export function concernCodes(files: Files): UsedCode[] {
  return Object.entries(files).flatMap(([file, text]) =>
    collect(file, text, parseSource(file, text), (node) =>
      isConcern(node) ? choices((node.arguments as unknown[])[0]) : [],
    ),
  );
}

/** Every dashed word in quotes, wherever it stands. */
export function dashedWords(files: Files): ReadonlySet<string> {
  const words = new Set<string>();
  for (const [file, text] of Object.entries(files)) {
    visitNodes(parseSource(file, text), (node) => {
      const word = literalText(node);
      if (word !== null && CODE.test(word)) words.add(word);
    });
  }
  return words;
}

function collect(file: string, text: string, tree: SyntaxNode, read: (node: SyntaxNode) => string[]): UsedCode[] {
  const found: UsedCode[] = [];
  visitNodes(tree, (node) => {
    for (const code of read(node)) if (CODE.test(code)) found.push({ file, line: lineAt(text, node.start), code });
  });
  return found;
}

function hasComputedIssue(tree: SyntaxNode): boolean {
  let found = false;
  visitNodes(tree, (node) => {
    const isIssue = node.type === "CallExpression" && isIdentifier(node.callee, "issue");
    if (isIssue && choices((node.arguments as unknown[])[0]).length === 0) found = true;
  });
  return found;
}

function isConcern(node: SyntaxNode): boolean {
  return node.type === "CallExpression" && isIdentifier(node.callee, "concern");
}

function objectCodes(node: SyntaxNode): string[] {
  const properties = (node.properties as SyntaxNode[]).filter((each) => each.type === "Property");
  const named = (name: string) => properties.find((each) => isIdentifier(each.key, name));
  return named("code") && named("data") && !named("gravity") ? choices(named("code")?.value) : [];
}

function isCodeMember(node: unknown): boolean {
  if (!isNode(node)) return false;
  const member = node.type === "ChainExpression" ? node.expression : node;
  return isNode(member) && member.type === "MemberExpression" && isIdentifier(member.property, "code");
}

/** The literals an expression may come to: itself, or either side of a choice. */
function choices(node: unknown): string[] {
  if (!isNode(node)) return [];
  if (node.type === "ConditionalExpression") return [...choices(node.consequent), ...choices(node.alternate)];
  if (node.type === "LogicalExpression") return [...choices(node.left), ...choices(node.right)];
  const text = literalText(node);
  return text === null ? [] : [text];
}
