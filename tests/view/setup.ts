import "@testing-library/jest-dom/vitest";
import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

// Without vitest's globals Testing Library does not clean up by itself, and one test's page leaks into the next.
afterEach(cleanup);

// jsdom lays nothing out: every element is as wide as a desktop's clock column.
if (typeof HTMLElement !== "undefined")
  Object.defineProperty(HTMLElement.prototype, "clientWidth", { configurable: true, get: () => 900 });
