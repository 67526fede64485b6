import { type Fault, type Files, lineAt } from "./sourceFiles.ts";
import { isIdentifier, isNode, parseSource, type SyntaxNode, visitNodes } from "./syntaxTree.ts";

/** What src/core may not ask for beside what its tsconfig already hides: the time now, chance, the machine's locale and zone, storage. */

const GLOBALS = [
  "localStorage",
  "sessionStorage",
  "indexedDB",
  "navigator",
  "performance",
  "crypto",
  "globalThis",
  "setTimeout",
  "setInterval",
  "fetch",
];

/** Methods whose answer depends on the machine's locale. */
const LOCALE_METHODS = [
  "toLocaleString",
  "toLocaleDateString",
  "toLocaleTimeString",
  "toLocaleUpperCase",
  "toLocaleLowerCase",
  "localeCompare",
];

export function purityFaults(files: Files): Fault[] {
  return Object.entries(files).flatMap(([file, text]) => {
    const faults: Fault[] = [];
    visitNodes(parseSource(file, text), (node, parent, key) => {
      const word = impureWord(node, parent, key, file.startsWith("src/core/time/"));
      if (word)
        faults.push({
          file,
          line: lineAt(text, node.start),
          rule: `${word}: core asks for no clock, chance, locale or storage`,
        });
    });
    return faults;
  });
}

function impureWord(node: SyntaxNode, parent: SyntaxNode | null, key: string, isTimeFolder: boolean): string | null {
  if (node.type === "MemberExpression") {
    const { object, property } = node;
    if (isIdentifier(object, "Date") && isIdentifier(property, "now")) return "Date.now";
    if (isIdentifier(object, "Math") && isIdentifier(property, "random")) return "Math.random";
    if (isIdentifier(object, "Temporal") && isIdentifier(property, "Now")) return "Temporal.Now";
    return LOCALE_METHODS.find((name) => isIdentifier(property, name)) ?? null;
  }
  if (node.type === "NewExpression" && isIdentifier(node.callee, "Date")) return "new Date";
  if (node.type === "CallExpression" && isIdentifier(node.callee, "Date")) return "Date()";
  if (!isReference(node, parent, key)) return null;
  if (isIdentifier(node, "Intl") && !isTimeFolder) return "Intl";
  return GLOBALS.find((name) => isIdentifier(node, name)) ?? null;
}

/** A name that stands for a value, not the name of a field. */
function isReference(node: SyntaxNode, parent: SyntaxNode | null, key: string): boolean {
  if (node.type !== "Identifier" || !isNode(parent)) return false;
  const isFieldName = (key === "property" || key === "key") && parent.computed !== true;
  return !isFieldName;
}
