/** What `npm run calibrate` writes: tests/calibration/results.json. Shares are 0 to 1, errors % of the truth. */
export interface CalibrationResults {
  readonly date: string;
  readonly machine: string;
  readonly engine: string;
  /** Processor time. */
  readonly seconds: number;
  readonly rankDraws: number;
  readonly models: readonly ModelCalibration[];
  readonly planted: PlantedFault;
}

export interface ModelCalibration {
  readonly id: string;
  readonly name: string;
  readonly record: string;
  readonly recordVersion: number;
  readonly typical: Readonly<Record<string, number>>;
  readonly random: readonly { readonly symbol: string; readonly omega: number }[];
  readonly residual: { readonly additive: number; readonly proportional: number };
  readonly limit: number;
  readonly draws: { readonly posterior: number; readonly carried: number };
  readonly patients: number;
  /** The seed of patient n is this + n; it is the seed of the draws too. */
  readonly firstSeed: number;
  /** One a patient. */
  readonly fits: {
    readonly notConverged: number;
    readonly withheld: number;
    readonly chain: number;
    readonly levels: number;
    readonly belowLimit: number;
  };
  readonly ranks: readonly RankedQuantity[];
  readonly coverage: {
    readonly patients: number;
    readonly trough50: number;
    readonly trough90: number;
    /** Share of the next interval's times, mean over the patients, and its standard error. */
    readonly band50: MeanWithError;
    readonly band90: MeanWithError;
  };
  readonly forecasts: readonly ForecastRow[];
}

export interface MeanWithError {
  readonly mean: number;
  readonly standardError: number;
}

export interface RankedQuantity {
  readonly quantity: string;
  /** How often each rank came, 0 to rankDraws. */
  readonly counts: readonly number[];
  readonly chiSquare: number;
  readonly p: number;
}

/** The next trough forecast from so many levels, by the patients who had as many; 0: the typical patient, the interval from the prior, for all. */
export interface ForecastRow {
  readonly levels: number;
  readonly patients: number;
  readonly meanError: MeanWithError;
  readonly rootMeanSquare: number;
  readonly medianAbsolute: number;
  readonly cover90: number;
}

/** A fault put in on purpose: the ranks must show it. */
export interface PlantedFault {
  readonly fault: string;
  readonly model: string;
  readonly patients: number;
  readonly quantity: string;
  readonly chiSquare: number;
  readonly p: number;
}
