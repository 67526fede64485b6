/** A name as it stands at the beginning of a line. */
export function capitalised(name: string): string {
  return name.charAt(0).toUpperCase() + name.slice(1);
}
