import { type ConcernRule, concern } from "../concernRule.ts";
import { eventInteractions } from "../eventInteractions.ts";
import { sourceText } from "../typicalModel.ts";

/** Equal but for the rounding of a percentage typed. */
const SAME = 1e-9;

/** A recorded event names a medicine of the record's interactions: the record's factor is in the model, another figure is, or none is. */
export const interactionKnown: ConcernRule = ({ case: value }) =>
  value.patient.factors.flatMap((factor, index) =>
    eventInteractions(value, factor).map((interaction) => {
      const { effect } = factor;
      const used = effect ? ((interaction.parameter === "clearance" ? effect.clearance : effect.volume) ?? 1) : null;
      const isRecords =
        effect?.source !== undefined && used !== null && Math.abs(used - interaction.factor.value) <= SAME;
      const code =
        used === null ? "interaction-not-applied" : isRecords ? "interaction-applied" : "interaction-own-figure";
      return concern(
        code,
        code === "interaction-applied" ? "note" : "check",
        { kind: "patient", id: `factor-${index}/${interaction.id}` },
        {
          detail: factor.detail,
          medicine: interaction.medicine,
          parameter: interaction.parameter,
          factor: interaction.factor.value,
          onsetDays: interaction.onset?.value ?? null,
          used,
          text: interaction.text,
          source: sourceText(value.medicine, interaction.factor.source),
          basis: interaction.factor.basis,
        },
      );
    }),
  );
