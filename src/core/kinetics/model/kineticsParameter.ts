/** What of a history an individual can differ in. `ka` is every first-order absorption rate of every product together. */
export type KineticsParameter =
  | "clearance"
  | "volume"
  | "exchange"
  | "peripheralVolume"
  | "vmax"
  | "km"
  | "ka"
  | "bioavailability";
