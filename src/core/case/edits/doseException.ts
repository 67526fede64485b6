import type { DoseException, DoseLine } from "../../regimen/index.ts";

export function exceptionOf(line: DoseLine, index: number): DoseException | undefined {
  return line.except?.find((each) => each.index === index);
}

/** The line with its exception for one dose replaced (or taken away: null), in order of index; no empty list is kept. */
export function lineWithException(
  line: DoseLine,
  index: number,
  exception: Omit<DoseException, "index"> | null,
): DoseLine {
  const others = (line.except ?? []).filter((each) => each.index !== index);
  const except = exception ? [...others, { index, ...exception }].sort((a, b) => a.index - b.index) : others;
  const { except: _, ...rest } = line;
  return except.length > 0 ? { ...rest, except } : rest;
}
