/** Everything the printed summary says, ready to be set: strings only, no figure left to format. */

export interface SummaryRow {
  readonly label: string;
  readonly value: string;
}

/** A state that must not be overlooked: printed across the full width of every sheet. */
export interface SummaryBanner {
  readonly gravity: "stop" | "check";
  readonly title: string;
  readonly text: string;
}

/** One dose line of the chosen option. */
export interface SummaryOrderLine {
  /** One line a strength: "Theophylline 300 mg 12-hour modified-release tablet". */
  readonly products: readonly string[];
  /** "1 tablet by mouth every 12 hours, at 08:00 and 20:00" */
  readonly instruction: string;
  /** First and last dose, doses that differ, how to take it. */
  readonly sentences: readonly string[];
}

export interface SummaryOrder {
  /** "Option A, more in the evening" */
  readonly option: string;
  readonly lines: readonly SummaryOrderLine[];
  /** What it replaces and the totals. */
  readonly sentences: readonly string[];
}

export interface SummaryLevel {
  readonly drawn: string;
  readonly afterDose: string;
  readonly measured: string;
  /** Of this patient with the 90 % interval. */
  readonly predicted: string;
  readonly difference: string;
  /** Measured − predicted in residual standard deviations; "" beside the typical patient. */
  readonly residual: string;
  /** Made before the level was known, and whether it held; "" beside the typical patient. */
  readonly forecast: string;
  /** "" or why it was left out. */
  readonly remark: string;
  /** Drawn hollow, as on the profile. */
  readonly isLeftOut: boolean;
}

/** A small table: what a row is about, then its cells. */
export interface SummaryGrid {
  readonly columns: readonly string[];
  readonly rows: readonly { readonly label: string; readonly cells: readonly string[] }[];
}

export interface SummaryConcern {
  readonly gravity: "stop" | "check" | "note";
  /** "Stop", "Check", "Note": the word that stands beside the shape. */
  readonly word: string;
  readonly title: string;
  readonly text: string;
}

export interface SummaryFigure {
  readonly name: string;
  readonly value: string;
  readonly formula: string;
  readonly inputs: string;
  /** Source and basis. */
  readonly source: string;
}

export interface SummaryDoses {
  readonly lines: readonly string[];
  readonly doses: readonly string[];
  readonly remark: string;
}

/** Every parameter before and with the levels, and what each level says. */
export interface SummaryIndividual {
  readonly title: string;
  readonly parameters: SummaryGrid;
  readonly sentences: readonly string[];
  readonly levels: readonly SummaryRow[];
  /** Where the method is written down. */
  readonly method: string;
}

export interface SummaryDetails {
  /** How this patient was found; null beside the typical patient. */
  readonly individual: SummaryIndividual | null;
  readonly figures: readonly SummaryFigure[];
  readonly figuresRemark: string;
  readonly doses: SummaryDoses;
  readonly concerns: readonly SummaryConcern[];
  /** What a pharmacokinetic note contains; "not recorded" where the case does not say. */
  readonly elements: readonly SummaryRow[];
  readonly sources: readonly string[];
  readonly notes: string;
  /** All 64 digits. */
  readonly fingerprint: string;
  readonly recompute: string;
}

export interface SummaryModel {
  readonly pageSize: "A4" | "Letter";
  readonly heading: string;
  readonly label: string;
  /** "woman, 64 years, 58 kg, 162 cm" */
  readonly person: string;
  readonly printed: string;
  /** "saved Wed 4 March 2026 12:03, read-only copy" */
  readonly saved: string;
  /** In the margin of every sheet. */
  readonly running: string;
  /** null unless the case is a demonstration. */
  readonly watermark: string | null;
  /** Titles of the gravest banners, on every sheet; "" when there is none. */
  readonly marks: string;
  readonly banners: readonly SummaryBanner[];
  /** null: there is no order to print; a banner says why. */
  readonly order: SummaryOrder | null;
  readonly chart: SummaryChart;
  readonly expected: { readonly title: string; readonly rows: readonly SummaryRow[]; readonly remark: string } | null;
  /** Without columns: hours alone, side by side. */
  readonly hours: (SummaryGrid & { readonly title: string; readonly span: string }) | null;
  readonly kinetics: {
    readonly title: string;
    readonly rows: readonly SummaryRow[];
    readonly sentences: readonly string[];
  };
  readonly levels: {
    readonly title: string;
    readonly rows: readonly SummaryLevel[];
    readonly remark: string;
    /** Also the residual and the forecast before it: takes the whole width. */
    readonly isIndividual: boolean;
  };
  readonly nextLevel: { readonly title: string; readonly sentences: readonly string[] };
  /** Concerns of gravity "check"; those of gravity "stop" are banners. */
  readonly concerns: readonly SummaryConcern[];
  readonly cautions: readonly string[];
  readonly cautionsRemark: string;
  readonly assumes: readonly string[];
  readonly preparedBy: string;
  readonly statement: string;
  readonly footer: string;
  readonly details: SummaryDetails;
}

/** Words of the profile; its geometry comes from view/chart. */
export interface SummaryChart {
  /** What the picture says, for those who can't see it. */
  readonly title: string;
  readonly unit: string;
  /** What the lines and bands are; "" where there is only one curve. */
  readonly key: string;
  readonly before: string;
  readonly after: string;
  /** Names of the days, at their midnights. */
  readonly days: readonly { readonly atH: number; readonly text: string }[];
  /** What stands beside each level's mark. */
  readonly levels: readonly { readonly id: string; readonly text: string }[];
}
