import { describe, expect, it } from "vitest";
import { concentrationAt, derive } from "../../../src/core/analysis/index.ts";
import { profile, steadyState } from "../../../src/core/kinetics/index.ts";
import { caseFixture } from "./caseFixture.ts";

const relative = (found: number, wanted: number) => Math.abs(found / wanted - 1);

describe("derive", () => {
  const value = caseFixture();
  const analysis = derive(value);
  const model = analysis.typical!;
  const product = model.products.find((candidate) => candidate.product === "tablet-12h")!;
  const kinetics = {
    ka: product.absorptionRate!.value,
    ke: model.eliminationRate!.value,
    volume: model.volume.value,
    bioavailability: product.bioavailability.value,
    lag: product.lag.value,
  };

  it("is deterministic: same case, same bits", () => {
    expect(derive(value)).toEqual(analysis);
  });

  it("can be sent to and from a worker unchanged", () => {
    expect(structuredClone(analysis)).toEqual(analysis);
  });

  it("puts the patient's numbers into the record's formulas", () => {
    // 0.053 L/h/kg on the lesser of actual 58 kg and ideal 45.5 + 2.3·(162/2.54 − 60) kg.
    const ideal = 45.5 + 2.3 * (162 / 2.54 - 60);
    expect(relative(model.clearance!.value, 0.053 * Math.min(58, ideal))).toBeLessThan(1e-14);
    expect(relative(model.volume.value, 0.484 * 58)).toBeLessThan(1e-14);
    expect(relative(model.halfLife!.value, (Math.LN2 * model.volume.value) / model.clearance!.value)).toBeLessThan(
      1e-14,
    );
  });

  it("begins the clock at local midnight of the first dose and puts the now line on it", () => {
    expect(analysis.clock.originMs).toBe(Date.parse("2026-03-01T00:00:00Z"));
    expect(analysis.clock.nowH).toBe(84);
    expect(analysis.clock.midnightsH.slice(0, 5)).toEqual([0, 24, 48, 72, 96]);
  });

  it("draws the same curve as the kinetics core", () => {
    const doses = analysis.given.map((mark) => ({ time: mark.atH, amount: mark.countedMg }));
    const curve = analysis.givenCurve!;
    expect([...curve.values]).toEqual([...profile(kinetics, doses, curve.timesH)]);
    expect(curve.timesH.at(-1)).toBe(84);
  });

  it("the option goes on from what the doses given have left", () => {
    const option = analysis.options[0]!;
    expect(option.curve!.timesH[0]).toBe(84);
    expect(relative(option.curve!.values[0]!, analysis.givenCurve!.values.at(-1)!)).toBeLessThan(1e-14);
  });

  it("steady state of a plain repeat equals the single-regimen solution", () => {
    const settled = analysis.options[0]!.typical!.steadyState!;
    const wanted = steadyState(kinetics, 300, 12);
    expect(relative(settled.peak, wanted.peak)).toBeLessThan(5e-15);
    expect(relative(settled.lowest, wanted.trough)).toBeLessThan(5e-15);
    expect(relative(settled.average, wanted.average)).toBeLessThan(5e-15);
    expect(relative(settled.auc24, (300 * kinetics.bioavailability * 2) / model.clearance!.value)).toBeLessThan(1e-14);
    expect(relative(settled.accumulation, wanted.accumulation)).toBeLessThan(5e-15);
    // timeOfPeak is counted from the administration, as is this.
    expect(Math.abs(settled.peakAfterDoseH - wanted.timeOfPeak)).toBeLessThan(1e-9);
    expect(analysis.options[0]!.typical!.dailyDoseMg).toBe(600);
  });

  it("hours below, within and above add up to the span", () => {
    const span = analysis.options[0]!.typical!.span;
    const sum = span.hoursBelow! + span.hoursWithin! + span.hoursAbove!;
    expect(Math.abs(sum - (span.toH - span.fromH))).toBeLessThan(1e-9);
  });

  it("the readings don't move when the drawing grid does: a value asked for is swept, not interpolated", () => {
    const [atNow] = concentrationAt(analysis, "A", [84])!;
    expect(atNow).toBe(analysis.givenCurve!.values.at(-1));
    const [asked] = concentrationAt(analysis, "A", [100.123456])!;
    const doses = [...analysis.given, ...analysis.options[0]!.doses].filter((mark) => mark.countedMg > 0);
    const [swept] = profile(
      kinetics,
      doses.map((mark) => ({ time: mark.atH, amount: mark.countedMg })),
      [100.123456],
    );
    expect(asked).toBe(swept);
  });

  it("a level is predicted from the doses given alone", () => {
    const withLevel = derive(
      caseFixture({
        levels: [
          { id: "l", at: "2026-03-04T07:30:00+00:00", quantity: { value: 36, unit: "umol/L" }, kind: "measured" },
        ],
      }),
    );
    const level = withLevel.levels[0]!;
    expect(relative(level.measured, (36 * 180.17) / 1000)).toBeLessThan(1e-14);
    const doses = withLevel.given.map((mark) => ({ time: mark.atH, amount: mark.countedMg }));
    expect(level.predicted).toBe(profile(kinetics, doses, [level.atH])[0]);
    expect(level.difference).toBe(level.measured - level.predicted!);
    expect(Math.abs(level.afterDoseH! - 11.5)).toBeLessThan(1e-9);
  });

  it("doses beyond the now line are shown and not counted", () => {
    const later = derive(caseFixture({ now: "2026-03-02T12:00:00+00:00", options: [] }));
    expect(later.given.filter((mark) => mark.countedMg > 0)).toHaveLength(3);
    expect(later.given.filter((mark) => mark.status === "after-now").length).toBe(4);
    expect(later.concerns.map((concern) => concern.code)).toContain("given-after-now");
  });

  it("without a weight there is no prediction, and it says why", () => {
    const value = caseFixture();
    const bare = derive({ ...value, patient: { ...value.patient, observations: [] } });
    expect(bare.typical).toBeNull();
    expect(bare.options[0]!.typical).toBeNull();
    expect(bare.concerns[0]!.code).toBe("model-incomplete");
    expect(bare.concerns[0]!.gravity).toBe("stop");
  });

  it("a patient size outside the formulas' range gives no figure, not an exception", () => {
    const value = caseFixture();
    const tiny = derive({ ...value, patient: { ...value.patient, height: { value: 100, unit: "cm" } } });
    expect(tiny.patient.idealWeight).toBeNull();
  });

  it("labels and notes don't change the fingerprint; a dose does", () => {
    expect(derive(caseFixture({ label: "Other", notes: "x" })).fingerprint).toBe(analysis.fingerprint);
    expect(derive(caseFixture({ given: [] })).fingerprint).not.toBe(analysis.fingerprint);
    expect(analysis.fingerprint).toMatch(/^[0-9a-f]{64}$/);
  });
});
