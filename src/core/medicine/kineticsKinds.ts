import { z } from "zod";
import { type Formula, formulaSchema } from "./figureSchema.ts";

/** The kinds of kinetics a record can have: which formulas each states, in which unit, and what they are called. A new kind is its entry here and one line in `KINDS`. */

interface FormulaSpec {
  readonly symbol: string;
  readonly words: string;
  readonly unit: Formula["unit"];
}

function kindOf<K extends string, N extends string>(kind: K, formulas: Readonly<Record<N, FormulaSpec>>) {
  const names = Object.keys(formulas) as N[];
  const shape = Object.fromEntries(names.map((name) => [name, formulaSchema])) as Record<N, typeof formulaSchema>;
  return {
    kind,
    formulas,
    schema: z.strictObject({
      kind: z.literal(kind),
      ...shape,
      /** true: the figures are per bioavailability (CL/F, V/F and so on), so bioavailability is already inside them and products state 1. */
      apparent: z.boolean(),
    }),
  };
}

const CLEARANCE: FormulaSpec = { symbol: "CL", words: "Clearance", unit: "L/h" };
const VOLUME: FormulaSpec = { symbol: "V", words: "Volume of distribution", unit: "L" };

const oneCompartmentOral = kindOf("one-compartment-oral", { clearance: CLEARANCE, volume: VOLUME });

const twoCompartmentOral = kindOf("two-compartment-oral", {
  clearance: CLEARANCE,
  volume: { symbol: "V1", words: "Volume of the central compartment", unit: "L" },
  exchange: { symbol: "Q", words: "Exchange between the compartments", unit: "L/h" },
  peripheralVolume: { symbol: "V2", words: "Volume of the second compartment", unit: "L" },
});

const saturableOral = kindOf("saturable-oral", {
  maximumRate: { symbol: "Vmax", words: "Highest rate of elimination", unit: "mg/h" },
  halfMaximum: { symbol: "Km", words: "Concentration at half the highest rate", unit: "mg/L" },
  volume: VOLUME,
});

const KINDS = [oneCompartmentOral, twoCompartmentOral, saturableOral] as const;

type Kind = (typeof KINDS)[number];
type NameOf<K> = K extends { readonly formulas: Readonly<Record<infer N, FormulaSpec>> } ? N : never;
type SchemasOf<T extends readonly { readonly schema: unknown }[]> = { -readonly [I in keyof T]: T[I]["schema"] };
/** Every name a formula of a record's kinetics can have. */
export type KineticsFormulaName = NameOf<Kind>;

export const kineticsSchema = z.discriminatedUnion(
  "kind",
  KINDS.map(({ schema }) => schema) as unknown as SchemasOf<typeof KINDS>,
);
export type Kinetics = z.infer<typeof kineticsSchema>;

/** A formula of a record with what it is called and the unit its kind wants it in. */
export interface KineticsFormula extends FormulaSpec {
  readonly name: KineticsFormulaName;
  readonly formula: Formula;
}

/** The formulas of a record's kinetics, in the order of its kind. */
export function kineticsFormulas({ kinetics }: { readonly kinetics: Kinetics }): readonly KineticsFormula[] {
  const { formulas } = KINDS.find((each) => each.kind === kinetics.kind) as Kind;
  const stated = kinetics as unknown as Readonly<Record<string, Formula>>;
  return Object.entries<FormulaSpec>(formulas).map(([name, spec]) => ({
    name: name as KineticsFormulaName,
    ...spec,
    formula: stated[name] as Formula,
  }));
}
