/** Outcomes that carry their faults, and the strict reader of JSON texts that every stored or imported file goes through. */
export { FILE_BYTES_MOST, FILE_DEPTH_MOST, jsonRead } from "./jsonRead.ts";
export { fail, type Issue, issue, type Result, succeed } from "./result.ts";
