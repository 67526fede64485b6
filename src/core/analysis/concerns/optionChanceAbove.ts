import { type ConcernRule, concern } from "../concernRule.ts";

/** Chances of the chosen option lying above its window from which it is pointed out, and from which it is likelier than not. Our own rule, no published limit. */
export const CHANCE_CHECK = 0.25;
export const CHANCE_STOP = 0.5;

/** The chosen option (every one, while none is chosen) may lie above the window in this patient: at steady state where there is one. */
export const optionChanceAbove: ConcernRule = ({ case: value, options }) => {
  const chosen = value.options.find((option) => option.chosen)?.id;
  return options.flatMap((option) => {
    if (!value.window || !option.individual || (chosen !== undefined && option.id !== chosen)) return [];
    const { steadyState, span } = option.individual;
    const found = steadyState ? steadyState.chance : span.chance;
    if (!found || found.above < CHANCE_CHECK) return [];
    return [
      concern(
        "option-chance-above",
        found.above > CHANCE_STOP ? "stop" : "check",
        { kind: "option", id: option.id },
        {
          option: option.id,
          chance: found.above,
          below: found.below,
          quantity: value.window.quantity,
          isSteady: steadyState !== null,
        },
      ),
    ];
  });
};
