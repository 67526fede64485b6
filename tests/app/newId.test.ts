import { expect, test } from "vitest";
import { newId } from "../../src/app/newId.ts";

test("is a UUID of version 4, another each time", () => {
  const ids = Array.from({ length: 1_000 }, newId);
  for (const id of ids) expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  expect(new Set(ids).size).toBe(ids.length);
});
