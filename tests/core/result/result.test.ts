import { expect, it } from "vitest";
import { fail, issue, succeed } from "../../../src/core/result/index.ts";

it("a result is a value, or issues with code, path and data", () => {
  expect(succeed(3)).toEqual({ ok: true, value: 3 });
  expect(issue("number-empty")).toEqual({ code: "number-empty", path: [], data: {} });
  const first = issue("number-comma", { text: "1,5" }, ["patient", "age"]);
  const second = issue("number-empty");
  expect(fail(first, second)).toEqual({ ok: false, issues: [first, second] });
});
