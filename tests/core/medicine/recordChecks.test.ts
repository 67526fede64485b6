import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { type Change, changed, faults, issuesOf, partOf, put, take } from "./recordChange.ts";

describe("across fields", () => {
  it.each<[string, Change, string[]]>([
    ["a source that is not listed", put("molarMass.source", "nowhere"), ["record-source-unknown molarMass.source"]],
    [
      "a name every object has is no source",
      put("molarMass.source", "toString"),
      ["record-source-unknown molarMass.source"],
    ],
    [
      "an invented basis in a real record",
      put("toxicFrom.basis", "invented"),
      ["record-basis-invented toxicFrom.basis"],
    ],
    ["an unknown basis", put("toxicFrom.basis", "guessed"), ["value-not-listed toxicFrom.basis"]],
    ["a product twice", put("products.1.id", "tablet-12h"), ["record-duplicate products.1"]],
    ["a window twice", put("windows.1.id", "10-20"), ["record-duplicate windows.1"]],
    ["a strength twice", put("products.0.strengths.1.value", 100), ["record-duplicate products.0.strengths.1"]],
    ["a tablet without strengths", put("products.0.strengths", []), ["record-product-content products.0"]],
    [
      "a tablet with a concentration",
      (r) => put("products.0.concentration", r.products[2]?.concentration)(r),
      ["record-product-content products.0"],
    ],
    ["a liquid without concentration", take("products.2.concentration"), ["record-product-content products.2"]],
    [
      "a liquid with strengths",
      (r) => put("products.2.strengths", r.products[1]?.strengths)(r),
      ["record-product-content products.2"],
    ],
    ["no product", put("products", []), ["value-too-small products"]],
    ["ka of 0", put("products.0.absorptionRate.value", 0), ["record-range products.0.absorptionRate.value"]],
    [
      "ka per hour in another unit",
      put("products.0.absorptionRate.unit", "h"),
      ["record-unit products.0.absorptionRate.unit"],
    ],
    ["F of 0", put("products.0.bioavailability.value", 0), ["record-range products.0.bioavailability.value"]],
    ["F above 1", put("products.0.bioavailability.value", 1.01), ["record-range products.0.bioavailability.value"]],
    ["F in percent", put("products.0.bioavailability.unit", "%"), ["record-unit products.0.bioavailability.unit"]],
    ["a negative lag", put("products.0.lag.value", -0.1), ["record-range products.0.lag.value"]],
    ["a strength of 0", put("products.0.strengths.0.value", 0), ["record-range products.0.strengths.0.value"]],
    ["a strength in grams", put("products.0.strengths.0.unit", "g"), ["record-unit products.0.strengths.0.unit"]],
    ["a molar mass of 0", put("molarMass.value", 0), ["record-range molarMass.value"]],
    ["clearance in L", put("kinetics.clearance.unit", "L"), ["record-unit kinetics.clearance.unit"]],
    ["volume in L/h", put("kinetics.volume.unit", "L/h"), ["record-unit kinetics.volume.unit"]],
    [
      "an unknown covariate",
      put("kinetics.volume.formula", "0.5 L/kg * mass"),
      ["formula-name kinetics.volume.formula"],
    ],
    [
      "a formula that does more than arithmetic",
      put("kinetics.volume.formula", "weight = 2"),
      ["formula-character kinetics.volume.formula"],
    ],
    ["a window upside down", put("windows.0.low.value", 20), ["window-order windows.0"]],
    ["a window below 0", put("windows.0.low.value", -1), ["window-order windows.0"]],
    [
      "an exposure window in mg/L",
      put("windows.0.quantity", "auc24"),
      ["window-unit windows.0.low.unit", "window-unit windows.0.high.unit"],
    ],
    [
      "a window in two units",
      put("windows.0.high", { value: 111, unit: "umol/L" }),
      ["window-units-differ windows.0.high.unit"],
    ],
    ["ages upside down", put("population.ranges.0.high", 2), ["record-population-range population.ranges.0"]],
    ["a range without an end", take("population.ranges.0.low"), ["record-population-range population.ranges.0"]],
    ["a negative age", put("population.ranges.0.low", -1), ["record-population-range population.ranges.0"]],
    ["an age in months", put("population.ranges.0.unit", "mo"), ["record-unit population.ranges.0.unit"]],
    [
      "a range twice",
      (r) => r.population.ranges.push(r.population.ranges[0]!),
      ["record-duplicate population.ranges.1"],
    ],
    [
      "a covariate that is none",
      put("population.ranges.0.covariate", "mood"),
      ["value-not-listed population.ranges.0.covariate"],
    ],
    ["a hidden mark in a name", put("products.0.name", "tablet\u202e"), ["record-name-turns products.0.name"]],
    ["a variability of 0", put("variability.clearance.value", 0), ["record-range variability.clearance.value"]],
    ["a field that is not known", put("products.0.colour", "white"), ["field-unknown products.0.colour"]],
    ["a field that is missing", take("matrix"), ["field-missing matrix"]],
    ["a number as text", put("toxicFrom.value", "25.1"), ["value-wrong-kind toxicFrom.value"]],
    ["another format", put("format", "else"), ["record-format format"]],
    ["another version", put("version", 3), ["record-newer version"]],
    ["another kind of kinetics", put("kinetics.kind", "else"), ["value-not-listed kinetics.kind"]],
    [
      "two faults at once",
      (r) =>
        [take("matrix"), take("name")].forEach((each) => {
          each(r);
        }),
      ["field-missing name", "field-missing matrix"],
    ],
  ])("%s", (_, change, expected) => {
    expect(faults("theophylline", change)).toEqual(expected);
  });

  const figure = (value: number, unit: string) => ({ value, unit, source: "invented", basis: "invented" });
  const correlation = (between: string[], value: number) => ({ between, ...figure(value, "1") });
  const C = "variability.correlations";

  it.each<[string, Change, string[]]>([
    ["a unit concentrations can be shown in", put("displayUnit", "mmol/L"), []],
    ["a unit no concentration is shown in", put("displayUnit", "g/L"), ["value-not-listed displayUnit"]],
    [
      "a concentration shown in millionths",
      (r) => {
        put("displayUnit", "mmol/L")(r);
        put("windows", [])(r);
        put("toxicFrom.value", 0.001)(r);
      },
      ["record-display-unit displayUnit"],
    ],
    ["a toxic limit in a molar unit", put("toxicFrom", figure(60, "umol/L")), []],
    ["a toxic limit in an amount", put("toxicFrom", figure(60, "mg")), ["record-unit toxicFrom.unit"]],
    ["a correlation of 1", put(C, [correlation(["clearance", "volume"], 1)]), [`record-range ${C}.0.value`]],
    ["a correlation of -1", put(C, [correlation(["clearance", "volume"], -1)]), [`record-range ${C}.0.value`]],
    [
      "a correlation with itself",
      put(C, [correlation(["volume", "volume"], 0.3)]),
      [`record-correlation-between ${C}.0.between`],
    ],
    [
      "a correlation with what does not vary",
      put(C, [correlation(["clearance", "bioavailability"], 0.3)]),
      [`record-correlation-between ${C}.0.between`],
    ],
    [
      "a correlation twice, the other way round",
      put(C, [correlation(["clearance", "volume"], 0.3), correlation(["volume", "clearance"], 0.2)]),
      [`record-duplicate ${C}.1`],
    ],
    [
      // 0.9, 0.9 and -0.9 between three: the determinant is 1 - 3 · 0.81 - 2 · 0.729, below 0.
      "correlations that are not possible together",
      put(C, [
        correlation(["clearance", "volume"], 0.9),
        correlation(["clearance", "absorptionRate"], 0.9),
        correlation(["volume", "absorptionRate"], -0.9),
      ]),
      [`record-correlations ${C}`],
    ],
    [
      "correlations that are",
      put(C, [
        correlation(["clearance", "volume"], 0.9),
        correlation(["clearance", "absorptionRate"], 0.9),
        correlation(["volume", "absorptionRate"], 0.7),
      ]),
      [],
    ],
    [
      "a variability of Km of a linear medicine",
      put("variability.halfMaximum", figure(30, "%")),
      ["record-variability variability.halfMaximum"],
    ],
    ["a single dose above the daily one", put("limits.maximumSingleDose", figure(700, "mg")), ["record-limits limits"]],
    [
      "a limit of 0",
      put("limits.maximumDailyDose.value", 0),
      ["record-range limits.maximumDailyDose.value", "record-limits limits"],
    ],
    ["a limit in grams", put("limits.maximumDailyDose", figure(2, "g")), ["record-unit limits.maximumDailyDose.unit"]],
    ["a factor of 0.04", put("interactions.0.factor.value", 0.04), ["record-range interactions.0.factor.value"]],
    ["a factor of 21", put("interactions.0.factor.value", 21), ["record-range interactions.0.factor.value"]],
    ["a factor of 20", put("interactions.0.factor.value", 20), []],
    [
      "a factor of 6 on the volume",
      (r) => {
        put("interactions.0.parameter", "volume")(r);
        put("interactions.0.factor.value", 6)(r);
      },
      ["record-range interactions.0.factor.value"],
    ],
    ["an onset of 0", put("interactions.0.onset.value", 0), ["record-range interactions.0.onset.value"]],
    ["an interaction twice", (r) => r.interactions.push(r.interactions[0]!), ["record-duplicate interactions.1"]],
    ["a steady state after 0 d", put("steadyStateAfter.value", 0), ["record-range steadyStateAfter.value"]],
    ["a steady state after 40 h", put("steadyStateAfter", figure(40, "h")), []],
    ["a steady state after 2 months", put("steadyStateAfter", figure(2, "mo")), ["record-unit steadyStateAfter.unit"]],
    ["no patients", put("population.number.value", 0), ["record-range population.number.value"]],
    [
      "autoinduction that never settles",
      put("autoinduction", { text: "x", source: "invented", basis: "invented", settledAfter: figure(400, "d") }),
      ["record-range autoinduction.settledAfter.value"],
    ],
    [
      "hours of drawing upside down",
      (r) => {
        put("windows.0.drawFrom", figure(8, "h"))(r);
        put("windows.0.drawTo", figure(6, "h"))(r);
      },
      ["window-draw-order windows.0"],
    ],
    [
      "an hour of drawing before the dose",
      put("windows.0.drawFrom", figure(-1, "h")),
      ["record-range windows.0.drawFrom.value"],
    ],
    ["a copy of nothing", put("copyOf", { id: "", recordVersion: 1 }), ["value-too-small copyOf.id"]],
    ["estimates from elsewhere", put("estimates.from", "guess"), ["value-not-listed estimates.from"]],
    [
      "a formula in another unit",
      put("kinetics.clearance.formula", "0.6 L/h/kg"),
      ["formula-dimension kinetics.clearance.formula"],
    ],
  ])("%s", (_, change, expected) => {
    expect(faults("demoxiline", change)).toEqual(expected);
  });

  it("a salt factor names its salt", () => {
    expect(faults("phenytoin", take("products.0.salt"))).toEqual(["record-salt products.0.salt"]);
  });

  it.each([
    ["limits.maximumDailyDose", "highest daily dose"],
    ["interactions.0.factor", "factor of the interaction"],
    ["interactions.0.onset", "onset of the interaction"],
    ["steadyStateAfter", "time to steady state"],
    ["population.ranges.0", "range in the population"],
    ["population.number", "number of patients"],
    ["variability.correlations.0", "correlation"],
    ["estimates", "statement on the estimates"],
  ])("%s without a source is named", (place, name) => {
    const [found] = issuesOf(changed("demoxiline", take(`${place}.source`)));
    expect(found?.code).toBe("record-figure-without-source");
    expect(issueMessage(found!)).toContain(`The ${name} in the record of`);
  });

  it("an invented medicine says so in its name", () => {
    expect(faults("demoxiline", put("name", "demoxiline"))).toEqual(["record-invented-name name"]);
  });

  it("apparent figures hold the bioavailability already", () => {
    expect(faults("lamotrigine", put("products.0.bioavailability.value", 0.98))).toEqual([
      "record-range products.0.bioavailability.value",
    ]);
  });

  const INPUT = "products.3.input";
  const provenance = { source: "invented", basis: "invented" };
  it.each<[string, string, Change, string[]]>([
    [
      "a two-phase product without a rate of its fast part",
      "demoxiline",
      take("products.3.absorptionRate"),
      ["record-absorption-rate products.3"],
    ],
    [
      "a plain product without an absorption rate",
      "demoxiline",
      take("products.0.absorptionRate"),
      ["record-absorption-rate products.0"],
    ],
    [
      "a rate beside a zero-order input, which has none",
      "demoxiline",
      put(INPUT, { kind: "zero-order", duration: { value: 4, unit: "h", ...provenance } }),
      ["record-absorption-rate products.3"],
    ],
    [
      "a duration of 0",
      "demoxiline",
      (r) =>
        [
          put(INPUT, { kind: "zero-order", duration: { value: 0, unit: "h", ...provenance } }),
          take("products.3.absorptionRate"),
        ].forEach((each) => {
          each(r);
        }),
      [`record-range ${INPUT}.duration.value`],
    ],
    [
      "a fast part above 1",
      "demoxiline",
      put(`${INPUT}.fastFraction.value`, 1.1),
      [`record-range ${INPUT}.fastFraction.value`],
    ],
    [
      "a fast part below 0",
      "demoxiline",
      put(`${INPUT}.fastFraction.value`, -0.1),
      [`record-range ${INPUT}.fastFraction.value`],
    ],
    [
      "a fast part in percent",
      "demoxiline",
      put(`${INPUT}.fastFraction.unit`, "%"),
      [`record-unit ${INPUT}.fastFraction.unit`],
    ],
    [
      "a slow part over 0 h",
      "demoxiline",
      put(`${INPUT}.slowDuration.value`, 0),
      [`record-range ${INPUT}.slowDuration.value`],
    ],
    [
      "a slow part before its time",
      "demoxiline",
      put(`${INPUT}.slowLag.value`, -1),
      [`record-range ${INPUT}.slowLag.value`],
    ],
    ["a slow part without a way", "demoxiline", take(`${INPUT}.slowDuration`), [`record-slow-part ${INPUT}`]],
    [
      "a slow part in two ways",
      "demoxiline",
      put(`${INPUT}.slowRate`, { value: 0.1, unit: "/h", ...provenance }),
      [`record-slow-part ${INPUT}`],
    ],
    [
      "a slow rate of 0",
      "demoxiline",
      (r) =>
        [take(`${INPUT}.slowDuration`), put(`${INPUT}.slowRate`, { value: 0, unit: "/h", ...provenance })].forEach(
          (each) => {
            each(r);
          },
        ),
      [`record-range ${INPUT}.slowRate.value`],
    ],
    [
      "a salt factor of 0",
      "phenytoin",
      put("products.0.saltFactor.value", 0),
      ["record-range products.0.saltFactor.value"],
    ],
    [
      "a salt factor above 1",
      "phenytoin",
      put("products.0.saltFactor.value", 1.09),
      ["record-range products.0.saltFactor.value"],
    ],
    [
      "a salt factor in percent",
      "phenytoin",
      put("products.0.saltFactor.unit", "%"),
      ["record-unit products.0.saltFactor.unit"],
    ],
    ["Vmax in L/h", "phenytoin", put("kinetics.maximumRate.unit", "L/h"), ["record-unit kinetics.maximumRate.unit"]],
    ["Km in L", "phenytoin", put("kinetics.halfMaximum.unit", "L"), ["record-unit kinetics.halfMaximum.unit"]],
    ["V in L/h", "phenytoin", put("kinetics.volume.unit", "L/h"), ["record-unit kinetics.volume.unit"]],
    ["no Km", "phenytoin", take("kinetics.halfMaximum"), ["field-missing kinetics.halfMaximum"]],
    [
      "a variability of Km of 0",
      "phenytoin",
      put("variability.halfMaximum.value", 0),
      ["record-range variability.halfMaximum.value"],
    ],
    [
      "a variability of Vmax in mg/h",
      "phenytoin",
      put("variability.maximumRate.unit", "mg/h"),
      ["record-unit variability.maximumRate.unit"],
    ],
    ["exchange in L", "digoxin", put("kinetics.exchange.unit", "L"), ["record-unit kinetics.exchange.unit"]],
    [
      "a second volume in L/h",
      "digoxin",
      put("kinetics.peripheralVolume.unit", "L/h"),
      ["record-unit kinetics.peripheralVolume.unit"],
    ],
    [
      "an unknown covariate",
      "digoxin",
      put("kinetics.exchange.formula", "mass"),
      ["formula-name kinetics.exchange.formula"],
    ],
    [
      "a clearance of a saturable medicine",
      "phenytoin",
      (r) => put("kinetics.clearance", partOf(r, "kinetics.volume"))(r),
      ["field-unknown kinetics.clearance"],
    ],
  ])("%s (%s)", (_, id, change, expected) => {
    expect(faults(id, change)).toEqual(expected);
  });
});
