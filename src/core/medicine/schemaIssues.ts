import type { z } from "zod";
import { type Issue, issue } from "../result/index.ts";

type SchemaFault = z.core.$ZodIssue;
type Path = readonly (string | number)[];

/** A path as a person reads it: `patient.observations[2].quantity.unit`; "the file itself" is the empty string. */
export function pathText(path: Path): string {
  return path.map((part, i) => (typeof part === "number" ? `[${part}]` : i === 0 ? part : `.${part}`)).join("");
}

/**
 * Every fault the schema found, as issues: one a fault, each with its path, what was found there and what is allowed.
 * `input` is what was parsed; the found value is looked up in it.
 */
export function schemaIssues(error: z.ZodError, input: unknown): Issue[] {
  const issues = error.issues.flatMap((fault) => faultIssues(fault, input, []));
  // A text that has the wrong form can fail a second check of its form: one fault all the same.
  return issues.filter((each, i) => !issues.slice(0, i).some((earlier) => isSameFault(earlier, each)));
}

function isSameFault(a: Issue, b: Issue): boolean {
  return a.code === b.code && a.path.length === b.path.length && a.path.every((part, i) => part === b.path[i]);
}

function faultIssues(fault: SchemaFault, input: unknown, base: Path): Issue[] {
  const path = [...base, ...(fault.path as Path)];
  const found = valueAt(input, path);
  const one = (code: string, data: Readonly<Record<string, unknown>>) => [
    issue(code, { path: pathText(path), key: keyOf(path), found: foundText(found), ...data }, path),
  ];
  switch (fault.code) {
    case "unrecognized_keys":
      return fault.keys.map((key) => issue("field-unknown", { path: pathText([...path, key]) }, [...path, key]));
    case "custom":
      return one(String(fault.params?.code ?? "value-malformed"), fault.params ?? {});
    case "invalid_union":
      if (fault.errors.length > 0)
        return likeliestBranch(fault.errors).flatMap((each) => faultIssues(each, input, path));
      return found === undefined ? one("field-missing", {}) : one("value-not-listed", { allowed: optionsOf(fault) });
    case "invalid_type":
      return found === undefined ? one("field-missing", {}) : one("value-wrong-kind", { allowed: fault.expected });
    case "invalid_value":
      return found === undefined ? one("field-missing", {}) : one("value-not-listed", { allowed: fault.values });
    case "too_small":
      return one("value-too-small", { minimum: Number(fault.minimum), of: fault.origin });
    case "too_big":
      return one("value-too-big", { maximum: Number(fault.maximum), of: fault.origin });
    case "invalid_format":
      return one("value-malformed", {});
    default:
      return one("value-malformed", {});
  }
}

/** Of the ways a value may be written, the one it came closest to: the fewest faults. */
function likeliestBranch(branches: readonly (readonly SchemaFault[])[]): readonly SchemaFault[] {
  return branches.reduce((best, each) => (each.length < best.length ? each : best));
}

function optionsOf(fault: SchemaFault): readonly unknown[] {
  return "options" in fault && Array.isArray(fault.options) ? fault.options : [];
}

function valueAt(input: unknown, path: Path): unknown {
  let value = input;
  for (const part of path) {
    if (typeof value !== "object" || value === null || !Object.hasOwn(value, part)) return undefined;
    value = (value as Record<string | number, unknown>)[part];
  }
  return value;
}

/** The field a fault lies in, whichever entry of a list it is. */
function keyOf(path: Path): string {
  return String(path.findLast((part) => typeof part === "string") ?? "");
}

const FOUND_LENGTH = 60;

function foundText(value: unknown): string {
  if (typeof value === "number") return String(value);
  const text = (value === undefined ? undefined : JSON.stringify(value)) ?? "nothing";
  return text.length <= FOUND_LENGTH ? text : `${text.slice(0, FOUND_LENGTH)} …`;
}
