import { record0001 } from "../../medicine/index.ts";

type Fields = Readonly<Record<string, unknown>>;

/** A case from version 1 to version 2: the medicine record inside it goes along; nothing else has changed. Frozen. */
export function case0001(value: Fields): Fields {
  const { medicine } = value;
  const isRecord = typeof medicine === "object" && medicine !== null && !Array.isArray(medicine);
  const isFirst = isRecord && (medicine as Fields).version === 1;
  return { ...value, version: 2, ...(isFirst && { medicine: record0001(medicine as Fields) }) };
}
