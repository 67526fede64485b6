/** The zone the machine says it is in. */
export function timeZoneHere(): string {
  return Intl.DateTimeFormat().resolvedOptions().timeZone || "UTC";
}

/** Every named zone the browser knows, `also` among them even when the browser has another name for it. */
export function timeZoneNames(also: string): readonly string[] {
  return [...new Set([also, "UTC", ...Intl.supportedValuesOf("timeZone")])].sort();
}
