import { z } from "zod";
import { medicineRecordSchema } from "../medicine/index.ts";
import { caseSchema } from "./caseSchema.ts";

/** The published descriptions of both file formats (docs/*.schema.json), made from the validators that read them. `.ci/schema.mjs` writes them. */
export const FILE_SCHEMAS: readonly { readonly file: string; readonly make: () => unknown }[] = [
  { file: "docs/case-file.schema.json", make: () => described("Ebbline case file, version 2", caseSchema) },
  {
    file: "docs/medicine-record.schema.json",
    make: () => described("Ebbline medicine record, version 2", medicineRecordSchema),
  },
];

const COMMENT =
  "Shape only. What must hold across fields (units, ranges, unique ids, products that exist) is listed in docs/case-file.md and docs/medicine-record.md.";

function described(title: string, schema: z.ZodType): unknown {
  const { $schema, ...rest } = z.toJSONSchema(schema, { io: "input" });
  return { $schema, title, $comment: COMMENT, ...rest };
}

export function fileSchemaPrint(schema: unknown): string {
  return `${JSON.stringify(schema, null, 2)}\n`;
}
