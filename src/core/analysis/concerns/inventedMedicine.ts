import { type ConcernRule, concern } from "../concernRule.ts";

export const inventedMedicine: ConcernRule = ({ case: { medicine } }) =>
  medicine.invented ? [concern("medicine-invented", "stop", { kind: "medicine" }, { name: medicine.name })] : [];
