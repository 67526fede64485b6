import { recordShapeSchema } from "./medicineRecord.ts";
import { recordChecks } from "./recordChecks.ts";

/** What a stored or imported record must be: the right shape, and sane across fields. Its custom faults carry their code in `params`; schemaIssues reads it. */
export const medicineRecordSchema = recordShapeSchema.superRefine((record, context) => {
  for (const { code, path, data } of recordChecks(record)) {
    context.addIssue({ code: "custom", path: [...path], params: { ...data, code }, message: code });
  }
});
