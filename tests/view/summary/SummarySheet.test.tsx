import { render, screen, within } from "@testing-library/react";
import axe from "axe-core";
import { describe, expect, it } from "vitest";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { SummarySheet } from "../../../src/view/summary/SummarySheet.tsx";
import type { SummaryInput } from "../../../src/view/summary/summaryInput.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { caseOrdering, summaryCase, summaryInputOf } from "./summaryFixture.ts";

function show(input: SummaryInput) {
  const model = buildSummary(input);
  return { model, ...render(<SummarySheet model={model} chart={<svg role="img" aria-label={model.chart.title} />} />) };
}

const text = (node: Element) => (node.textContent ?? "").replace(/\s+/g, " ");

describe("SummarySheet", () => {
  it("prints the order, the readings, the levels and the lines to sign", () => {
    const { container } = show(summaryInputOf(summaryCase()));
    const order = screen.getByRole("region", { name: "Option A" });
    expect(text(order)).toContain(
      "Theophylline 300 mg 12-hour modified-release tablet1 tablet by mouth every 12 hours, at 08:00 and 20:00",
    );
    const levels = within(screen.getByRole("region", { name: "Levels" })).getAllByRole("row");
    expect(levels).toHaveLength(3);
    expect(text(container)).toContain("prepared by, date, time");
    expect(text(container)).toContain("independently checked by, date, time");
    expect(text(container)).toContain(
      "Supports, and does not replace, a licensed professional's judgement and local policy.",
    );
  });

  it("leaves no string of the model unprinted", () => {
    const given = [{ ...orderedLine({ id: "g" }), start: "2026-03-01T08:00:00+00:00" }];
    const value = summaryCase({ demo: true, notes: "A note.", given });
    const { model, container } = show(summaryInputOf(value));
    const printed = text(container);
    const { chart, pageSize: _, running: _margin, marks: _none, ...body } = model;
    const missing = leaves(body).filter((each) => !printed.includes(each.replace(/\s+/g, " ")));
    expect(missing).toEqual([]);
    expect(screen.getByRole("img", { name: chart.title })).toBeInTheDocument();
  });

  it("carries patient, printed time and time of saving on every sheet, and the watermark when it is a demonstration", () => {
    const { container } = show(summaryInputOf(summaryCase({ demo: true })));
    const heads = [...container.querySelectorAll(".summary-head")].map(text);
    expect(heads).toHaveLength(2);
    for (const head of heads) {
      expect(head).toContain("Harbour ward 3, bed 12 · woman, 64 years, 58 kg, 162 cm");
      expect(head).toContain("Wednesday 4 March 2026, 12:05");
      expect(head).toContain("saved Wed 4 March 2026 12:03");
      expect(head).toContain("demo — invented patient");
    }
    expect(container.querySelectorAll(".summary-paper > .summary-watermark")).toHaveLength(2);
  });

  it("has no watermark on a case that is not a demonstration", () => {
    const { container } = show(summaryInputOf(summaryCase()));
    expect(container.querySelector(".summary-watermark, .summary-demo")).toBeNull();
  });

  it("prints no order and says why across every sheet when no option is chosen", () => {
    const { container } = show(summaryInputOf(summaryCase({ options: [] })));
    expect(container.querySelector(".summary-order")).toBeNull();
    expect(text(container.querySelector(".summary-banner-stop")!)).toContain("Not for use. No option is chosen");
    expect([...container.querySelectorAll(".summary-marks")].map(text)).toEqual(["Not for use", "Not for use"]);
  });

  it("has the name of the preparer above its line when the settings know it", () => {
    show(
      summaryInputOf(summaryCase(), {
        settings: { pageSize: "Letter", microgram: "mcg", preparedBy: " A. Preparer " },
      }),
    );
    expect(screen.getByText("A. Preparer")).toBeInTheDocument();
  });

  it.each([
    ["one line", summaryInputOf(summaryCase({ demo: true }))],
    [
      "two lines, one not makeable, stale",
      summaryInputOf(caseOrdering([orderedLine(), orderedLine({ id: "b", amount: { value: 130, unit: "mg" } })]), {
        revision: 15,
      }),
    ],
    [
      "nothing",
      summaryInputOf(summaryCase({ options: [], levels: [], given: [], patient: { observations: [], factors: [] } })),
    ],
  ])("has no axe violation: %s", async (_, input) => {
    const { container } = show(input);
    // jsdom paints nothing, so contrast is left to the browser tests.
    const { violations } = await axe.run(container, { rules: { "color-contrast": { enabled: false } } });
    expect(violations.map(({ id, nodes }) => [id, nodes.map(({ html }) => html)])).toEqual([]);
  });
});

function leaves(value: unknown): readonly string[] {
  if (typeof value === "string") return GRAVITIES.includes(value) ? [] : [value];
  if (Array.isArray(value)) return value.flatMap(leaves);
  return value !== null && typeof value === "object" ? Object.values(value).flatMap(leaves) : [];
}

/** Told by the shape of the mark. */
const GRAVITIES = ["stop", "check", "note"];
