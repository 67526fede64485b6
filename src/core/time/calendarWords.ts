/** English names, from our own table: the program's words do not depend on the machine's locale. Index 0 is January, Monday. */
export const MONTHS = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
] as const;

export const WEEKDAYS = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday", "Sunday"] as const;

const startOf = (names: readonly string[], word: string): number => {
  const lower = word.toLowerCase().replace(/\.$/, "");
  if (lower.length < 3) return 0;
  const index = names.findIndex((name) => {
    const full = name.toLowerCase();
    return full === lower || full.slice(0, 3) === lower || (lower.length === 4 && full.startsWith(lower));
  });
  return index + 1;
};

/** 1 to 12 for "March", "Mar", "Sept"; 0 when the word is no month. */
export function monthNumber(word: string): number {
  return startOf(MONTHS, word);
}

/** 1 (Monday) to 7 for "Wednesday", "Wed", "Thur"; 0 when the word is no weekday. */
export function weekdayNumber(word: string): number {
  return startOf(WEEKDAYS, word);
}

export const twoDigits = (value: number): string => String(value).padStart(2, "0");
