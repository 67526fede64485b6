import { expect, test } from "vitest";
import { axeFaults } from "./axeFaults.ts";

test("a field without a label is found", async () => {
  const page = document.createElement("main");
  page.innerHTML = '<input type="text">';
  document.body.append(page);
  expect(await axeFaults(page)).toEqual(["label: input"]);
  page.remove();
});
