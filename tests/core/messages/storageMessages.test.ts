import { expect, test } from "vitest";
import { storageMessages } from "../../../src/core/messages/storageMessages.ts";

const full = {
  id: "a",
  label: "bed 12",
  detail: "QuotaExceededError",
  cases: 2,
  readable: true,
  table: "windows",
  name: "x",
  reason: "the browser's storage is full",
};
/** A case without a label, nothing technical to add. */
const bare = { ...full, label: "", detail: "", cases: 1, readable: false, table: "medicines" };

test.each(Object.entries(storageMessages))("%s is one clear sentence", (code, message) => {
  for (const sentence of [message(full), message(bare)]) {
    expect(sentence).toMatch(code === "import-not-stored" ? /^[A-Z]/ : /^[A-Z“1-9].*\.$/);
    expect(sentence).not.toMatch(/undefined|null|NaN|\(\)|“”/);
    expect(sentence).not.toMatch(/\. [A-Z]/);
  }
});

test.each(["save-quota", "save-closed", "save-failed", "save-newer", "save-overtaken", "leave-unsaved"])(
  "%s says to export",
  (code) => {
    expect(storageMessages[code]!(full)).toMatch(/export/);
  },
);
