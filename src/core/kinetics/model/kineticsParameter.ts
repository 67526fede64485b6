/**
 * What of a history an individual can differ in. `ka` is the speed of all absorption together: every first-order rate of every product,
 * the slow part of a mixed one included, and the duration of a zero-order input the other way round; lags stay. `bioavailability` is that
 * of every product together, and may come to more than 1 times the typical.
 */
export type KineticsParameter =
  | "clearance"
  | "volume"
  | "exchange"
  | "peripheralVolume"
  | "vmax"
  | "km"
  | "ka"
  | "bioavailability";
