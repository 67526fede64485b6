import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, utf8ToBytes } from "@noble/hashes/utils.js";
import type { DoseLine } from "../regimen/index.ts";
import { instantMs } from "../time/index.ts";
import type { Case } from "./caseSchema.ts";

/**
 * SHA-256, in hex, over the canonical JSON of the inputs that matter and the engine that turns them into figures.
 * Left out because no figure and no concern depends on them: id, label, notes, demo, labels of options, ids of lines, levels and
 * observations, the reason for which a level is left out (that it is left out counts), the stated basis of the target window.
 * Instants count as instants: the same moment written with another offset gives the same fingerprint.
 */
export function caseFingerprint(value: Case, engine: string): string {
  return bytesToHex(sha256(utf8ToBytes(canonicalJson({ engine, inputs: inputsThatMatter(value) }))));
}

function inputsThatMatter(value: Case): unknown {
  const { format, version, timeZone, now, patient, medicine, window, given, levels, options, fit } = value;
  return {
    format,
    version,
    timeZone,
    now: instantMs(now),
    patient: {
      ...patient,
      observations: patient.observations.map(({ id: _, ...rest }) => ({ ...rest, at: instantMs(rest.at) })),
      factors: patient.factors.map((each) => ({
        ...each,
        from: instantMs(each.from),
        ...(each.to !== undefined && { to: instantMs(each.to) }),
      })),
    },
    medicine,
    ...(window && { window: { quantity: window.quantity, low: window.low, high: window.high } }),
    given: given.map(lineInputs),
    levels: levels.map(({ id: _, excluded, ...rest }) => ({
      ...rest,
      at: instantMs(rest.at),
      excluded: excluded !== undefined,
    })),
    options: options.map(({ id, lines, chosen }) => ({ id, chosen, lines: lines.map(lineInputs) })),
    fit,
  };
}

function lineInputs({ id: _, ...line }: DoseLine): unknown {
  const except = line.except?.map((each) => ({ ...each, ...(each.at !== undefined && { at: instantMs(each.at) }) }));
  return { ...line, start: instantMs(line.start), ...(except && { except }) };
}

/**
 * JSON with one way to write it (RFC 8785): no space, keys sorted by UTF-16 code units, numbers and strings as ECMAScript prints them.
 * A field that is undefined is not there.
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(",")}]`;
  if (typeof value !== "object" || value === null) return scalarJson(value);
  const fields = Object.entries(value)
    .filter(([, each]) => each !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, each]) => `${JSON.stringify(key)}:${canonicalJson(each)}`);
  return `{${fields.join(",")}}`;
}

function scalarJson(value: unknown): string {
  if (typeof value === "number" && !Number.isFinite(value)) throw new RangeError(`value: ${value} has no JSON`);
  const text = JSON.stringify(value);
  if (text === undefined) throw new RangeError(`value: a ${typeof value} has no JSON`);
  return text;
}
