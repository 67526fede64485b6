import { fail, issue, type Result, succeed } from "./result.ts";

/** Ours: a case with years of doses stays below a tenth of it. */
export const FILE_BYTES_MOST = 5 * 1024 * 1024;
/** Ours: a case needs 8; the limit keeps a hostile file from exhausting the stack. */
export const FILE_DEPTH_MOST = 32;

/** Names that reach an object's own machinery instead of a field. */
const REFUSED_KEYS: ReadonlySet<string> = new Set(["__proto__", "constructor", "prototype"]);

/** RFC 8259: no leading zero, no plus, digits on both sides of the point. */
const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
/** A run of characters that stand for themselves in a string. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: RFC 8259 wants them escaped in a string, so bare ones are refused.
const PLAIN = /[^"\\\u0000-\u001f\ufffd]*/y;
const SPACE = /[ \t\n\r]*/y;
/** What may follow the digits when a number is cut off. */
const HALF_NUMBER = /^(?:\.|[eE][+-]?)$/;
const HEX = /[0-9a-fA-F]{4}/y;

const ESCAPES: Readonly<Record<string, string>> = {
  '"': '"',
  "\\": "\\",
  "/": "/",
  b: "\b",
  f: "\f",
  n: "\n",
  r: "\r",
  t: "\t",
};

class Fault extends Error {
  constructor(
    readonly code: string,
    readonly at: number,
    readonly data: Readonly<Record<string, unknown>> = {},
  ) {
    super(code);
  }
}

/**
 * Reads JSON (RFC 8259) more strictly than the built-in parser: a field given twice, a field that would reach an object's prototype,
 * a number too large to hold, a character that was lost in decoding, a file too large or nested too deeply are refused.
 * Issues: file-empty, file-too-large, file-truncated (it ends in the middle), file-corrupt (with line and column), file-too-deep,
 * file-field-twice, file-field-refused, file-number-too-large, file-lost-character.
 */
export function jsonRead(text: string): Result<unknown> {
  const bytes = byteCount(text, FILE_BYTES_MOST);
  if (bytes > FILE_BYTES_MOST) return fail(issue("file-too-large", { mostMiB: FILE_BYTES_MOST / 1024 / 1024 }));
  // A byte order mark is allowed before the first value and means nothing (RFC 8259 section 8.1).
  const body = text.startsWith("\ufeff") ? text.slice(1) : text;
  if (body.trim() === "") return fail(issue("file-empty"));
  try {
    return succeed(new Reader(body).whole());
  } catch (fault) {
    if (fault instanceof Fault) return fail(issue(fault.code, { ...place(body, fault.at), ...fault.data }));
    throw fault;
  }
}

class Reader {
  private at = 0;
  private depth = 0;

  constructor(private readonly text: string) {}

  whole(): unknown {
    const value = this.value();
    this.match(SPACE);
    if (this.at < this.text.length) throw this.unexpected();
    return value;
  }

  private value(): unknown {
    this.match(SPACE);
    switch (this.text[this.at]) {
      case "{":
        return this.nested(() => this.object());
      case "[":
        return this.nested(() => this.array());
      case '"':
        return this.string();
      case "t":
        return this.word("true", true);
      case "f":
        return this.word("false", false);
      case "n":
        return this.word("null", null);
      default:
        return this.number();
    }
  }

  private nested<T>(read: () => T): T {
    this.depth++;
    if (this.depth > FILE_DEPTH_MOST) throw new Fault("file-too-deep", this.at, { most: FILE_DEPTH_MOST });
    this.at++;
    const value = read();
    this.depth--;
    return value;
  }

  private object(): Record<string, unknown> {
    const value: Record<string, unknown> = {};
    if (this.closes("}")) return value;
    do {
      this.match(SPACE);
      const start = this.at;
      const key = this.string();
      if (REFUSED_KEYS.has(key)) throw new Fault("file-field-refused", start, { key });
      if (Object.hasOwn(value, key)) throw new Fault("file-field-twice", start, { key });
      this.match(SPACE);
      this.expect(":");
      value[key] = this.value();
    } while (this.continues("}"));
    return value;
  }

  private array(): unknown[] {
    const value: unknown[] = [];
    if (this.closes("]")) return value;
    do value.push(this.value());
    while (this.continues("]"));
    return value;
  }

  private closes(bracket: string): boolean {
    this.match(SPACE);
    if (this.text[this.at] !== bracket) return false;
    this.at++;
    return true;
  }

  /** After an entry: true for a comma, false for the closing bracket. */
  private continues(bracket: string): boolean {
    if (this.closes(bracket)) return false;
    this.expect(",");
    return true;
  }

  private string(): string {
    this.expect('"');
    let value = "";
    for (;;) {
      value += this.match(PLAIN);
      const next = this.text[this.at];
      if (next === '"') {
        this.at++;
        return value;
      }
      if (next === "\ufffd") throw new Fault("file-lost-character", this.at);
      if (next !== "\\") throw this.unexpected();
      this.at++;
      value += this.escape();
    }
  }

  private escape(): string {
    const letter = this.text[this.at];
    if (letter === "u") {
      this.at++;
      const hex = this.match(HEX);
      if (hex === "")
        throw this.text.length - this.at < 4 ? new Fault("file-truncated", this.text.length) : this.unexpected();
      return String.fromCharCode(Number.parseInt(hex, 16));
    }
    const escaped = letter !== undefined && Object.hasOwn(ESCAPES, letter) ? ESCAPES[letter] : undefined;
    if (escaped === undefined) throw this.unexpected();
    this.at++;
    return escaped;
  }

  private number(): number {
    const start = this.at;
    const digits = this.match(NUMBER);
    if (digits === "") {
      if (this.text[this.at] === "-" && this.at === this.text.length - 1)
        throw new Fault("file-truncated", this.text.length);
      throw this.unexpected();
    }
    if (HALF_NUMBER.test(this.text.slice(this.at, this.at + 3)) && this.text.length - this.at < 3) {
      throw new Fault("file-truncated", this.text.length);
    }
    const value = Number(digits);
    if (!Number.isFinite(value)) throw new Fault("file-number-too-large", start, { found: digits.slice(0, 20) });
    return value;
  }

  private word<T>(word: string, value: T): T {
    if (this.text.startsWith(word, this.at)) {
      this.at += word.length;
      return value;
    }
    const rest = this.text.slice(this.at);
    throw word.startsWith(rest) ? new Fault("file-truncated", this.text.length) : this.unexpected();
  }

  private expect(character: string): void {
    if (this.text[this.at] !== character) throw this.unexpected();
    this.at++;
  }

  private match(pattern: RegExp): string {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text)?.[0] ?? "";
    this.at += found.length;
    return found;
  }

  private unexpected(): Fault {
    const found = this.text[this.at];
    if (found === undefined) return new Fault("file-truncated", this.at);
    return new Fault(found === "\ufffd" ? "file-lost-character" : "file-corrupt", this.at, { found });
  }
}

function place(text: string, at: number): { line: number; column: number } {
  const before = text.slice(0, at).split("\n");
  return { line: before.length, column: (before.at(-1)?.length ?? 0) + 1 };
}

/** Bytes of the text in UTF-8, counted no further than just past `most`. */
function byteCount(text: string, most: number): number {
  if (text.length > most) return text.length;
  let bytes = 0;
  for (const character of text) {
    const code = character.codePointAt(0) as number;
    bytes += code < 0x80 ? 1 : code < 0x800 ? 2 : code < 0x10000 ? 3 : 4;
    if (bytes > most) break;
  }
  return bytes;
}
