import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case, Observation } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { concernMessage } from "../../../src/core/messages/index.ts";
import { phenytoinCase } from "./phenytoinCase.ts";

const concerns = (value: Case) => derive(value).concerns;
const one = (value: Case, code: string) => concerns(value).find((each) => each.code === code);
const codes = (value: Case) => concerns(value).map(({ code }) => code);
/** Without the spaces that don't break. */
function words(value: Case): { readonly title: string; readonly text: string } {
  const { title, text } = concernMessage(one(value, "phenytoin-albumin")!);
  return { title, text: text.replaceAll("\u00a0", " ") };
}

describe("phenytoin beside a low albumin", () => {
  it("8.4 mg/L at 3.1 g/dL lies below the window, corrected inside it: said as such, and not as too low", () => {
    const value = phenytoinCase(8.4, 3.1);
    // 8.4 / (0.2 · 3.1 + 0.1) = 8.4 / 0.72 = 11.67
    expect(one(value, "phenytoin-albumin")).toMatchObject({ gravity: "check", about: { kind: "level", id: "l" } });
    const { title, text } = words(value);
    expect(title).toBe("The level of Wed 4 March, 07:30, corrected for albumin, is 11.7 mg per L");
    expect(text).toContain(
      "Measured 8.4 mg per L at albumin 3.1 g per dL; with a normal albumin it would be 11.7 mg per L",
    );
    expect(text).toContain(
      "(usual form: corrected = measured ÷ (0.2 × albumin in g per dL + 0.1); Sheiner LB, Tozer TN",
    );
    expect(text).toContain(
      "Measured lies below, corrected inside the target window, 10 mg per L to 20 mg per L: don't raise the dose on the measured figure.",
    );
    expect(text).toContain("underpredicts the free level (in one study by 12.4 %, bias −2.7 mg per L)");
    expect(text).toMatch(/Ask for the free level where it can be had\.$/);
    expect(codes(value)).not.toContain("level-below-window");
  });

  it("corrected above the window is not called too low either; the toxic limit is named", () => {
    // 9 / (0.2 · 1.6 + 0.1) = 21.4; 13 / 0.42 = 31.0, above the record's 30.1.
    const value = phenytoinCase(9, 1.6);
    expect(words(value).text).toContain("Measured lies below, corrected above the target window");
    expect(words(value).text).not.toContain("toxic limit");
    expect(codes(value)).not.toContain("level-below-window");
    expect(words(phenytoinCase(13, 1.6)).text).toContain(
      "Corrected it reaches the record's toxic limit, 30.1 mg per L.",
    );
  });

  it("where both lie outside on the same side both are said", () => {
    // 5 / 0.72 = 6.9; 21 / 0.72 = 29.2
    expect(words(phenytoinCase(5, 3.1)).text).toContain("Measured and corrected both lie below the target window");
    expect(codes(phenytoinCase(5, 3.1))).toContain("level-below-window");
    expect(words(phenytoinCase(21, 3.1)).text).toContain("Measured and corrected both lie above the target window");
    expect(codes(phenytoinCase(21, 3.1))).toContain("level-above-window");
  });

  it("an albumin that is usual but below 4.4 g/dL is told only where the correction changes the side of the window", () => {
    // 8 / (0.2 · 4.1 + 0.1) = 8.7; 9.5 / 0.92 = 10.3
    expect(codes(phenytoinCase(8, 4.1))).not.toContain("phenytoin-albumin");
    expect(codes(phenytoinCase(8, 4.1))).toContain("level-below-window");
    expect(words(phenytoinCase(9.5, 4.1)).text).toContain("Measured lies below, corrected inside the target window");
    expect(codes(phenytoinCase(9.5, 4.1))).not.toContain("level-below-window");
    expect(codes(phenytoinCase(7, 3.5))).not.toContain("phenytoin-albumin");
    expect(codes(phenytoinCase(7, 3.4))).toContain("phenytoin-albumin");
  });

  it("a normal albumin or none leaves the window's own concern as it is", () => {
    for (const value of [phenytoinCase(8.4, 4.4), phenytoinCase(8.4, null)]) {
      expect(codes(value)).toContain("level-below-window");
      expect(codes(value)).not.toContain("phenytoin-albumin");
    }
  });

  it("a level that is not drawn when the window is meant is corrected and not held against it", () => {
    const text = words(phenytoinCase(8.4, 3.1, { at: "2026-03-03T16:00:00+00:00" })).text;
    expect(text).toContain("11.7 mg per L");
    expect(text).not.toContain("target window");
  });

  it("the form for kidney failure, an unknown kidney function and a displacing medicine are said", () => {
    const failing: Observation = {
      id: "c",
      at: "2026-03-01T08:00:00+00:00",
      kind: "serumCreatinine",
      quantity: { value: 6, unit: "mg/dL" },
    };
    const value = phenytoinCase(8.4, 3.1);
    const [weight, , albumin] = value.patient.observations;
    const inFailure = (one: Case): Case => {
      const [own, , ownAlbumin] = one.patient.observations;
      return { ...one, patient: { ...one.patient, observations: [own!, failing, ownAlbumin!] } };
    };
    const failed = inFailure(value);
    // 8.4 / (0.1 · 3.1 + 0.1) = 20.5
    expect(words(failed).text).toMatch(/20\.5 mg per L \(form for kidney failure: .*; memory\)/);
    // 4 / (0.1 · 4 + 0.1) = 8: twice the measured, said though albumin is usual and both lie below.
    expect(words(inFailure(phenytoinCase(4, 4))).text).toContain("it would be 8 mg per L");
    expect(codes(phenytoinCase(4, 4))).not.toContain("phenytoin-albumin");
    const unknown = { ...value, patient: { ...value.patient, observations: [weight!, albumin!] } };
    expect(words(unknown).text).toContain(
      "Kidney function is not known: below 20 mL per min another form would apply.",
    );
    const displaced: Case["patient"]["factors"][number] = {
      kind: "interacting-medicine",
      from: "2026-03-01T08:00:00+00:00",
      detail: "valproate",
    };
    expect(words({ ...value, patient: { ...value.patient, factors: [displaced] } }).text).toContain(
      "A displacing medicine is recorded (valproate): the correction does not hold.",
    );
  });

  it("is about phenytoin only", () => {
    const { id, name } = recordById("theophylline")!;
    const value = phenytoinCase(8.4, 3.1);
    expect(codes({ ...value, medicine: { ...value.medicine, id, name } })).not.toContain("phenytoin-albumin");
  });
});
