import { UNIT_CODES, type UnitCode, unitSpoken } from "../units/index.ts";
import type { MessageFunction } from "./messageFunction.ts";

const said = (value: unknown): string => `"${String(value)}"`;
const KNOWN: ReadonlySet<string> = new Set(UNIT_CODES);
const isUnit = (code: unknown): code is UnitCode => typeof code === "string" && KNOWN.has(code);

/** "kg or lb", from a list of unit codes. */
function unitList(codes: unknown): string {
  const words = Array.isArray(codes) ? codes.filter(isUnit).map((code) => unitSpoken(code, "screen") || "no unit") : [];
  const last = words.at(-1) ?? "";
  return words.length < 2 ? last : `${words.slice(0, -1).join(", ")} or ${last}`;
}

export const numberMessages: Readonly<Record<string, MessageFunction>> = {
  "number-empty": () => "Write a number.",
  "number-comma": ({ text, suggestion }) => `${said(text)} has a comma: write ${String(suggestion)} with a point.`,
  "number-thousands": ({ text, suggestion }) =>
    `The comma in ${said(text)} can be read two ways: write ${String(suggestion)} without it, or a point for a decimal.`,
  "number-digits": ({ text }) => `${said(text)} has digits other than 0 to 9: write it with 0 to 9.`,
  "number-space": ({ text }) => `${said(text)} has a hidden or wide space in it: delete it and write the number again.`,
  "number-minus": ({ text }) => `${said(text)} has a dash that is not the minus of the keyboard: write - for minus.`,
  "number-exponent": ({ text }) => `${said(text)} is written with an exponent: write the number in full.`,
  "number-leading-point": ({ text, suggestion }) =>
    `${said(text)} has no digit before the point: write ${String(suggestion)}.`,
  "number-trailing-point": ({ text, suggestion }) =>
    `${said(text)} has no digit after the point: write ${String(suggestion)}.`,
  "number-leading-zero": ({ text }) =>
    `${said(text)} begins with a zero that could hide a lost point: write it without the zero, or with the point.`,
  "number-format": ({ text }) => `${said(text)} is not a number: write digits, with a point for decimals, such as 1.5.`,
  "number-too-long": ({ text, most }) => `${said(text)} has more than ${String(most)} digits: write fewer.`,
  "quantity-no-unit": ({ text, units }) => `${said(text)} has no unit: add ${unitList(units)}.`,
  "quantity-unknown-unit": ({ unit, units }) => `${said(unit)} is not a unit known here: write ${unitList(units)}.`,
  "quantity-unit-refused": ({ unit, units }) => `The unit ${said(unit)} does not fit here: write ${unitList(units)}.`,
};
