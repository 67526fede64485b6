/** What `open` finds. Fits the store's port of the same name. */
export type StorageState =
  | { readonly kind: "ready" }
  | {
      readonly kind: "lost";
      /** "some": the database is the one expected but cases are missing from it, or stand at an earlier save. */
      readonly extent: "all" | "some";
      /** How many cases are concerned; null when nothing was noted outside the database. */
      readonly cases: number | null;
      readonly lastSavedAt: number | null;
      /** How many of them have a second copy which `acceptLoss` puts back. */
      readonly recoverable: number;
      readonly detail: string;
    }
  | {
      readonly kind: "newer";
      readonly found: number;
      readonly known: number /** false: not even readable by this version. */;
      readonly readable: boolean;
    }
  | { readonly kind: "blocked" }
  | { readonly kind: "unavailable"; readonly detail: string };

export type LostState = Extract<StorageState, { kind: "lost" }>;
