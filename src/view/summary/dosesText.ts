import type { DoseMark } from "../../core/analysis/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { summaryDetailWords as words } from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { scheduleBrief } from "./orderSchedule.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryDoses } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Single doses printed; of a longer history the latest, with the number of earlier ones. */
const MOST_DOSES = 60;

/** The given lane: its lines, and every dose with what it counts for. */
export function dosesText(input: SummaryInput, print: SummaryPrint): SummaryDoses {
  const { case: value, analysis } = input;
  const { given } = analysis;
  const shown = given.slice(-MOST_DOSES);
  const earlier = given.length - shown.length;
  const first = given[0];
  return {
    lines: value.given.map((line) =>
      words.line(
        productOf(value.medicine, line.product).name,
        print.exact(line.amount),
        scheduleBrief(line),
        print.at(instantMs(line.start), "full"),
      ),
    ),
    doses: shown.map((mark) => doseWords(mark, print)),
    remark:
      given.length === 0
        ? words.noDoses
        : earlier > 0 && first
          ? words.earlier(earlier, print.at(print.ms(first.atH), "full"))
          : "",
  };
}

function doseWords(mark: DoseMark, print: SummaryPrint): string {
  return words.dose(print.at(print.ms(mark.atH), "dayClock"), print.exact(mark.amount), words.status[mark.status]);
}
