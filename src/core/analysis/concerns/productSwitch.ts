import { type Product, productOf } from "../../medicine/index.ts";
import type { DoseMark } from "../analysisTypes.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { labelledDose } from "../labelledDose.ts";

const DAY_H = 24;
/** Two daily amounts within this share of each other are the same mg. */
const SAME = 0.01;

/**
 * An option gives another product mg for mg, although its salt, its release or its bioavailability differs;
 * or another salt in another amount, where the labelled mg before and after do not say how much more or less it is.
 */
export const productSwitch: ConcernRule = ({ case: { medicine }, given, options }) => {
  const before = lastDay(given);
  return options.flatMap((option) => {
    const after = firstDay(option.doses);
    const [mgBefore, mgAfter] = [before, after].map((marks) =>
      marks.reduce((sum, mark) => sum + labelledDose(medicine, mark), 0),
    ) as [number, number];
    if (mgBefore === 0 || mgAfter === 0) return [];
    const isSame = Math.abs(mgAfter - mgBefore) <= SAME * mgBefore;
    const [activeBefore, activeAfter] = [before, after].map((marks) =>
      marks.reduce((sum, mark) => sum + mark.countedMg, 0),
    ) as [number, number];
    const stays = new Set(after.map((mark) => mark.product));
    const went = [...new Set(before.map((mark) => mark.product))].filter((id) => !stays.has(id));
    const came = [...stays].filter((id) => before.every((mark) => mark.product !== id));
    return went.flatMap((fromId) =>
      came.flatMap((toId) => {
        const from = productOf(medicine, fromId);
        const to = productOf(medicine, toId);
        const differs = differences(from, to);
        if (isSame ? differs.length === 0 : saltShare(from) === saltShare(to)) return [];
        const share = (product: Product) => saltShare(product) * product.bioavailability.value;
        return [
          concern(
            isSame ? "product-switch" : "salt-switch",
            isSame ? "check" : "note",
            { kind: "option", id: `${option.id}/${fromId}/${toId}` },
            {
              option: option.id,
              from: from.name,
              to: to.name,
              mg: mgAfter,
              mgBefore,
              activeBefore,
              activeAfter,
              differs: isSame ? differs : ["salt"],
              // What reaches the circulation of one labelled mg, after as a share of before.
              ratio: share(to) / share(from),
              fromSalt: from.salt ?? null,
              toSalt: to.salt ?? null,
              fromRelease: from.release,
              toRelease: to.release,
            },
          ),
        ];
      }),
    );
  });
};

/** mg of the active moiety in one labelled mg. */
const saltShare = ({ saltFactor }: Product): number => saltFactor?.value ?? 1;

function differences(from: Product, to: Product): readonly ("salt" | "release" | "bioavailability")[] {
  return [
    ...(saltShare(from) !== saltShare(to) || from.salt !== to.salt ? (["salt"] as const) : []),
    ...(from.release !== to.release ? (["release"] as const) : []),
    ...(from.bioavailability.value !== to.bioavailability.value ? (["bioavailability"] as const) : []),
  ];
}

/** The counted doses of the 24 hours that end with the last one; the dose a day earlier belongs to the day before. */
function lastDay(marks: readonly DoseMark[]): readonly DoseMark[] {
  const counted = marks.filter((mark) => mark.countedMg > 0);
  const endH = counted.at(-1)?.atH ?? 0;
  return counted.filter((mark) => mark.atH > endH - DAY_H + CLOCK_SLACK_H);
}

function firstDay(marks: readonly DoseMark[]): readonly DoseMark[] {
  const counted = marks.filter((mark) => mark.countedMg > 0);
  const startH = counted[0]?.atH ?? 0;
  return counted.filter((mark) => mark.atH < startH + DAY_H - CLOCK_SLACK_H);
}

/** A day with a change of the clocks has 23 or 25 hours. */
const CLOCK_SLACK_H = 1.5;
