import type { Issue } from "../result/index.ts";
import { quantityPrint } from "../units/index.ts";
import {
  type ConcernData,
  type ConcernWords,
  concentration,
  concentrationWords,
  dataNumber as number,
  dataText as text,
  when,
} from "./concernFigures.ts";
import { issueMessage } from "./issueMessage.ts";

/** The concern about a level of phenytoin beside a low albumin. */
export const albuminConcernMessages: Readonly<Record<string, (data: ConcernData) => ConcernWords>> = {
  "phenytoin-albumin": (data) => ({
    title: `The level of ${when(data)}, corrected for albumin, is ${concentration(data, "corrected")}`,
    text: [
      `Measured ${concentration(data, "measured")} at albumin ${quantityPrint({ value: number(data, "albuminGPerDl"), unit: "g/dL" }, { style: "print", significant: 3 })}; with a normal albumin it would be ${concentration(data, "corrected")} (${FORM_WORDS[text(data, "form")]}: ${text(data, "formula")}; ${sentence(text(data, "source"))}; ${text(data, "basis")}).`,
      ...windowWords(data),
      ...toxicWords(data),
      "The formula underpredicts the free level (in one study by 12.4 %, bias −2.7 mg per L) and is poor in kidney failure and beside displacing medicines such as valproate; it is in no fit and no prediction.",
      ...remarkWords(data),
      "Ask for the free level where it can be had.",
    ].join(" "),
  }),
};

const FORM_WORDS: Readonly<Record<string, string>> = {
  usual: "usual form",
  "kidney-failure": "form for kidney failure",
};
const SIDE_WORDS = { below: "below", inside: "inside", above: "above" } as const;
type Side = keyof typeof SIDE_WORDS;

const sentence = (words: string): string => words.replace(/\.$/, "");

/** Both figures beside the window, and what follows where they differ. */
function windowWords(data: ConcernData): readonly string[] {
  const { window } = data as {
    readonly window: { low: number; high: number; measuredSide: Side; correctedSide: Side } | null;
  };
  if (!window) return [];
  const { low, high, measuredSide, correctedSide } = window;
  const range = `the target window, ${concentrationWords(data, low)} to ${concentrationWords(data, high)}`;
  if (measuredSide === correctedSide) {
    return [`Measured and corrected both lie ${SIDE_WORDS[measuredSide]} ${range}.`];
  }
  return [
    `Measured lies ${SIDE_WORDS[measuredSide]}, corrected ${SIDE_WORDS[correctedSide]} ${range}: don't raise the dose on the measured figure.`,
  ];
}

/** What the figure's own remarks add to the bias, which is said of every such figure. */
function remarkWords(data: ConcernData): readonly string[] {
  return (data.remarks as readonly Issue[]).flatMap((remark) => {
    if (remark.code === "phenytoin-albumin-displaced") return [issueMessage(remark)];
    return remark.code === "phenytoin-albumin-kidney-unknown"
      ? ["Kidney function is not known: below 20 mL per min another form would apply."]
      : [];
  });
}

function toxicWords(data: ConcernData): readonly string[] {
  return data.toxicMgPerL === null
    ? []
    : [`Corrected it reaches the record's toxic limit, ${concentration(data, "toxicMgPerL")}.`];
}
