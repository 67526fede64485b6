import { z } from "zod";

const HEAD = z.object({ label: z.string(), medicine: z.object({ name: z.string() }), notes: z.string() });

export interface CaseHead {
  readonly label: string;
  /** Name of the medicine. */
  readonly medicine: string;
  readonly notes: string;
}

/** What a list shows of something that claims to be a case; null where that is not there. Whether the rest is sound is for `caseValidate`, which takes much longer. */
export function caseHeadRead(value: unknown): CaseHead | null {
  const { success, data } = HEAD.safeParse(value);
  return success ? { label: data.label, medicine: data.medicine.name, notes: data.notes } : null;
}
