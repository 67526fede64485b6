import "@testing-library/jest-dom/vitest";
import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

// Without vitest's globals Testing Library does not clean up by itself, and one test's page leaks into the next.
afterEach(cleanup);
