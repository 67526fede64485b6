/**
 * What a user or a file can get wrong is answered with a `Result`, never thrown.
 * An issue carries a code, the path of the offending part and the data a sentence needs; never text.
 * The sentence for a code stands in core/messages.
 */
export interface Issue {
  readonly code: string;
  /** Where in the input the fault lies, for example ["patient", "age", "value"]. Empty for the whole. */
  readonly path: readonly (string | number)[];
  readonly data: Readonly<Record<string, unknown>>;
}

export type Result<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly issues: readonly Issue[] };

export function issue(
  code: string,
  data: Readonly<Record<string, unknown>> = {},
  path: readonly (string | number)[] = [],
): Issue {
  return { code, path, data };
}

export function succeed<T>(value: T): Result<T> {
  return { ok: true, value };
}

export function fail<T = never>(...issues: readonly Issue[]): Result<T> {
  return { ok: false, issues };
}
