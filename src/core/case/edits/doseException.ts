import type { DoseException, DoseLine } from "../../regimen/index.ts";

export function exceptionOf(line: DoseLine, index: number): DoseException | undefined {
  return line.except?.find((each) => each.index === index);
}

/** The line with its exception for one dose replaced, or taken away (null). */
export function lineWithException(
  line: DoseLine,
  index: number,
  exception: Omit<DoseException, "index"> | null,
): DoseLine {
  const others = (line.except ?? []).filter((each) => each.index !== index);
  return lineWithExceptions(line, exception ? [...others, { index, ...exception }] : others);
}

/** The line with these exceptions, in order of index; no empty list is kept. */
export function lineWithExceptions(line: DoseLine, exceptions: readonly DoseException[]): DoseLine {
  const { except: _, ...rest } = line;
  return exceptions.length === 0 ? rest : { ...rest, except: [...exceptions].sort((a, b) => a.index - b.index) };
}
