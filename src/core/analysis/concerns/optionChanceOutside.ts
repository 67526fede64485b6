import { type ConcernContext, type ConcernRule, concern } from "../concernRule.ts";
import type { WindowChance } from "../fitTypes.ts";
import { windowDrawH } from "../windowTiming.ts";

/** Chance of this patient lying outside the window from which it is pointed out: of the chosen option; and of any other, where it is likelier than not. Our own rule, no published limit. */
export const CHANCE_CHOSEN = 0.25;
export const CHANCE_OTHER = 0.5;

/**
 * An option may lie outside the window in this patient: at steady state where there is one, else over the span. Above it, likelier
 * than not, in the chosen option is grave: too much is harder to take back than too little.
 */
export const optionChanceOutside: ConcernRule = ({ case: value, options }) => {
  const { window } = value;
  const chosen = value.options.find((option) => option.chosen)?.id;
  if (!window) return [];
  const afterDoseH = windowDrawH(value);
  return options.flatMap((option) => {
    const found = chanceOf(option);
    if (!found) return [];
    const { chance, isSteady } = found;
    const isChosen = option.id === chosen;
    const from = isChosen || chosen === undefined ? CHANCE_CHOSEN : CHANCE_OTHER;
    const about = { kind: "option", id: option.id } as const;
    const data = {
      option: option.id,
      quantity: window.quantity,
      afterDoseH,
      isSteady,
      above: chance.above,
      below: chance.below,
    };
    const gravity = isChosen && chance.above > CHANCE_OTHER ? "stop" : "check";
    return [
      ...(chance.above >= from ? [concern("option-chance-above", gravity, about, data)] : []),
      ...(chance.below >= from ? [concern("option-chance-below", "check", about, data)] : []),
    ];
  });
};

function chanceOf(option: ConcernContext["options"][number]): { chance: WindowChance; isSteady: boolean } | null {
  const { steadyChance, span } = option.individual ?? {};
  // Over a span the level of today counts as much as the option: it is judged by that only where it settles into nothing.
  if (steadyChance) return { chance: steadyChance, isSteady: true };
  const isRepeating =
    option.typical?.noSteadyState !== "no-repeat" && option.typical?.noSteadyState !== "no-common-period";
  return span?.chance && !isRepeating ? { chance: span.chance, isSteady: false } : null;
}
