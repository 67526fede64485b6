import { issueMessage } from "../../core/messages/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import type { RichUnit } from "./richFigures.ts";

/** The sentence of an issue with its levels in the unit shown; `factor` from mg/L. */
export function richMessage({ code, data, path }: Issue, unit: RichUnit, factor: number): string {
  return issueMessage(issue(code, { ...data, shownIn: { unit, factor } }, path));
}
