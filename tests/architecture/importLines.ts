import { lineAt } from "./sourceFiles.ts";
import { isIdentifier, isNode, literalText, parseSource, type SyntaxNode, visitNodes } from "./syntaxTree.ts";

export interface ImportLine {
  /** As written, without a ?query; null when it is computed and cannot be read. */
  readonly specifier: string | null;
  readonly line: number;
  readonly isTypeOnly: boolean;
}

/** Every way one file names another: import, re-export, dynamic import, type import, require, new URL(…, import.meta.url), @import. */
export function importLines(file: string, text: string): ImportLine[] {
  if (file.endsWith(".css")) return cssImports(text);
  const lines: ImportLine[] = [];
  visitNodes(parseSource(file, text), (node) => {
    const found = readImport(node);
    if (!found) return;
    const specifier = literalText(found.source)?.replace(/\?.*$/, "") ?? null;
    lines.push({ specifier, line: lineAt(text, node.start), isTypeOnly: found.isTypeOnly });
  });
  return lines;
}

function readImport(node: SyntaxNode): { source: unknown; isTypeOnly: boolean } | null {
  switch (node.type) {
    case "ImportDeclaration":
      return {
        source: node.source,
        isTypeOnly: node.importKind === "type" || onlyTypes(node.specifiers, "importKind"),
      };
    case "ExportAllDeclaration":
      return { source: node.source, isTypeOnly: node.exportKind === "type" };
    case "ExportNamedDeclaration":
      return node.source
        ? { source: node.source, isTypeOnly: node.exportKind === "type" || onlyTypes(node.specifiers, "exportKind") }
        : null;
    case "ImportExpression":
      return { source: node.source, isTypeOnly: false };
    case "TSImportType":
      return { source: node.source ?? node.argument, isTypeOnly: true };
    case "TSExternalModuleReference":
      return { source: node.expression, isTypeOnly: false };
    case "CallExpression":
      return isIdentifier(node.callee, "require") || isGlob(node.callee)
        ? { source: (node.arguments as unknown[])[0], isTypeOnly: false }
        : null;
    case "NewExpression":
      return isIdentifier(node.callee, "URL") && isMetaMember((node.arguments as unknown[])[1], "url")
        ? { source: (node.arguments as unknown[])[0], isTypeOnly: false }
        : null;
    default:
      return null;
  }
}

function onlyTypes(specifiers: unknown, kind: string): boolean {
  const all = specifiers as SyntaxNode[];
  return all.length > 0 && all.every((each) => each[kind] === "type");
}

function isGlob(node: unknown): boolean {
  return isMetaMember(node, "glob");
}

function isMetaMember(node: unknown, name: string): boolean {
  return (
    isNode(node) &&
    node.type === "MemberExpression" &&
    isNode(node.object) &&
    node.object.type === "MetaProperty" &&
    isIdentifier(node.property, name)
  );
}

function cssImports(text: string): ImportLine[] {
  return [...text.matchAll(/@import\s+(?:url\()?["']([^"']+)["']/g)].map((match) => ({
    specifier: match[1] ?? null,
    line: lineAt(text, match.index),
    isTypeOnly: false,
  }));
}
