import { type ConcernRule, concern } from "../concernRule.ts";

/** Improbable values that were asked about and confirmed stay visible. */
export const valuesConfirmed: ConcernRule = ({ case: value }) => [
  ...value.patient.observations
    .filter((observation) => observation.confirmed)
    .map((observation) =>
      concern(
        "value-confirmed",
        "check",
        { kind: "patient", id: observation.id },
        {
          kind: observation.kind,
          quantity: observation.quantity,
        },
      ),
    ),
  ...value.levels
    .filter((level) => level.confirmed)
    .map((level) =>
      concern("value-confirmed", "check", { kind: "level", id: level.id }, { kind: "level", quantity: level.quantity }),
    ),
  ...(value.window?.confirmed
    ? [
        concern(
          "value-confirmed",
          "check",
          { kind: "case", id: "window" },
          { kind: "window", quantity: value.window.high },
        ),
      ]
    : []),
];
