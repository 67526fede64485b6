import { Temporal } from "temporal-polyfill";
import { z } from "zod";

function isKnownZone(zone: string): boolean {
  try {
    Temporal.Instant.fromEpochMilliseconds(0).toZonedDateTimeISO(zone);
    return true;
  } catch {
    return false;
  }
}

/** A named zone of the IANA data base, such as "Europe/Lisbon". A bare offset is refused: it knows nothing of daylight saving. */
export const timeZoneSchema = z
  .string()
  .regex(/^[A-Za-z][A-Za-z0-9_+-]*(\/[A-Za-z0-9_+-]+)*$/)
  .refine(isKnownZone);
