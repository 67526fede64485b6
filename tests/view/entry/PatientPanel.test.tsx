import { screen, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { recordById } from "../../../src/core/medicine/index.ts";
import { askWords, issueMessage, patientWords } from "../../../src/core/messages/index.ts";
import { weightQuestion } from "../../../src/core/patient/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { PatientPanel } from "../../../src/view/entry/PatientPanel.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { asText } from "../ui/asText.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const show = () => renderWorkbench(<PatientPanel onDone={vi.fn()} />, { open: caseFixture() });
const box = (name: string) => screen.getByRole<HTMLInputElement>("textbox", { name });

describe("PatientPanel", () => {
  test("has no accessibility fault axe can see", async () => {
    const { container } = await show();
    expect(await axeFaults(container)).toEqual([]);
  });

  test("a weight that looks like pounds is asked about; the answer pounds keeps the unit it was measured in", async () => {
    const { user, value } = await show();
    await user.type(box(patientWords.weight), "180{Enter}");
    const doubt = weightQuestion({ weightKg: 180, heightCm: 162, sex: "female", ageYears: 64 });
    expect(screen.getByText(asText(issueMessage(doubt!.issue)))).toBeVisible();
    expect(value().patient.observations).toHaveLength(2);
    await user.click(screen.getByRole("button", { name: askWords.itIsUse("180\u00a0lb", "81.65\u00a0kg") }));
    expect(value().patient.observations.at(-1)).toMatchObject({
      kind: "weight",
      at: value().now,
      quantity: { value: 180, unit: "[lb_av]" },
    });
    expect(value().patient.observations.at(-1)).not.toHaveProperty("confirmed");
    expect(box(patientWords.weight)).toHaveValue("");
  });

  test("the answer that it is kilograms is recorded", async () => {
    const { user, value } = await show();
    await user.type(box(patientWords.weight), "180{Enter}");
    await user.click(screen.getByRole("button", { name: askWords.itIs("180\u00a0kg") }));
    expect(value().patient.observations.at(-1)).toMatchObject({
      quantity: { value: 180, unit: "kg" },
      confirmed: true,
    });
  });

  test("an impossible weight is refused and kept in the field", async () => {
    const { user, value } = await show();
    await user.type(box(patientWords.weight), "900{Enter}");
    expect(box(patientWords.weight)).toHaveAccessibleDescription(
      issueMessage(weightQuestion({ weightKg: 900 })!.issue),
    );
    expect(box(patientWords.weight)).toHaveValue("900");
    expect(value().patient.observations).toHaveLength(2);
  });

  test("1,5 as a creatinine is refused with the sentence and kept", async () => {
    const { user, value } = await show();
    await user.type(box(patientWords.creatinine), "1,5{Enter}");
    expect(box(patientWords.creatinine)).toHaveAccessibleDescription(
      issueMessage(issue("number-comma", { text: "1,5", suggestion: "1.5" })),
    );
    expect(box(patientWords.creatinine)).toHaveValue("1,5");
    expect(value().patient.observations).toHaveLength(2);
  });

  test("a creatinine in the wrong unit by the look of it is asked about", async () => {
    const { user, value } = await show();
    await user.type(box(patientWords.creatinine), "83{Enter}");
    await user.click(screen.getByRole("button", { name: askWords.itIs("83\u00a0micromol/L") }));
    expect(value().patient.observations.at(-1)).toMatchObject({ quantity: { value: 83, unit: "umol/L" } });
  });

  test("a measurement after the now line is refused with a sentence", async () => {
    const { user, value } = await show();
    await user.clear(screen.getByRole("textbox", { name: patientWords.measuredAt }));
    await user.type(screen.getByRole("textbox", { name: patientWords.measuredAt }), "2026-03-05 08:00");
    await user.type(box(patientWords.weight), "60{Enter}");
    expect(screen.getByRole("textbox", { name: patientWords.measuredAt })).toBeInvalid();
    expect(value().patient.observations).toHaveLength(2);
  });

  test("age, height and sex count on Enter and choice; a birth year is refused", async () => {
    const { user, value } = await show();
    await user.clear(box(patientWords.age));
    await user.type(box(patientWords.age), "1962{Enter}");
    expect(box(patientWords.age)).toBeInvalid();
    await user.clear(box(patientWords.age));
    await user.type(box(patientWords.age), "70{Enter}");
    expect(value().patient.age).toEqual({ value: 70, unit: "a" });
    await user.clear(box(patientWords.height));
    await user.type(box(patientWords.height), "1.70 m{Enter}");
    expect(value().patient.height).toEqual({ value: 1.7, unit: "m" });
    await user.click(screen.getByRole("radio", { name: patientWords.male }));
    expect(value().patient.sex).toBe("male");
  });

  test("shows creatinine clearance with its numbers and source", async () => {
    await show();
    const figures = screen.getByRole("region", { name: patientWords.figures });
    // (140 - 64) * 54.1929 / (72 * 0.94) * 0.85 = 51.73 mL/min, by hand with the ideal weight 45.5 + 2.3 * (162 / 2.54 - 60).
    expect(within(figures).getByText("51.7 mL/min")).toBeVisible();
    expect(within(figures).getByText(/^CrCl = .*age = 64 years, weight \(ideal\) = 54.1929 kg/)).toBeVisible();
    expect(within(figures).getByText(/Cockcroft DW, Gault MH/)).toBeVisible();
  });

  test("shows the other kidney estimate per 1.73 m², de-indexed, and that no formula uses it", async () => {
    await show();
    const figures = screen.getByRole("region", { name: patientWords.figures });
    // 142 * (0.94 / 0.7)^-1.2 * 0.9938^64 * 1.012 = 67.77, times 1.6155 m² / 1.73 = 63.29, by hand.
    expect(within(figures).getByText(asText("67.8 mL/min/1.73 m²"))).toBeVisible();
    expect(within(figures).getByText("63.3 mL/min")).toBeVisible();
    expect(within(figures).getByText(asText(issueMessage(issue("kidney-per-surface"))))).toBeVisible();
    expect(within(figures).getByText(issueMessage(issue("kidney-for-comparison")))).toBeVisible();
  });

  test("shows size: lean weight, both surfaces, with the basis of each", async () => {
    await show();
    const figures = screen.getByRole("region", { name: patientWords.figures });
    for (const name of [patientWords.leanWeight, patientWords.bodySurface, patientWords.bodySurfaceDuBois])
      expect(within(figures).getByText(name)).toBeVisible();
    expect(within(figures).getByText(/Du Bois D, Du Bois EF.*\(memory\)/)).toBeVisible();
  });

  test("an albumin in the wrong unit by the look of it is asked about; the answer is kept", async () => {
    const { user, value } = await show();
    await user.type(box(patientWords.albumin), "3.1{Enter}");
    await user.click(screen.getByRole("button", { name: askWords.itIs("3.1\u00a0g/dL") }));
    expect(value().patient.observations.at(-1)).toMatchObject({
      kind: "albumin",
      quantity: { value: 3.1, unit: "g/dL" },
    });
    expect(value().patient.observations.at(-1)).not.toHaveProperty("confirmed");
  });

  test("phenytoin with a level and an albumin shows the corrected level with its warning", async () => {
    const base = caseFixture();
    const open = {
      ...base,
      medicine: recordById("phenytoin")!,
      given: [],
      options: [],
      levels: [
        {
          id: "l",
          at: "2026-03-04T07:30:00+00:00",
          quantity: { value: 8, unit: "mg/L" as const },
          kind: "measured" as const,
        },
      ],
    };
    const { user } = await renderWorkbench(<PatientPanel onDone={vi.fn()} />, { open });
    expect(screen.queryByText(/Sheiner–Tozer/)).toBeNull();
    await user.type(box(patientWords.albumin), "25{Enter}");
    const figures = screen.getByRole("region", { name: patientWords.figures });
    // R08: 8 / (0.2 · 2.5 + 0.1) = 13.33 mg/L.
    expect(await within(figures).findByText("13.3 mg/L")).toBeVisible();
    expect(within(figures).getByText(asText(issueMessage(issue("phenytoin-albumin-warning"))))).toBeVisible();
  });
});
