import { type Issue, issue } from "../../result/index.ts";

const ONCE_A_DAY = "daily at 08:00";
const TWICE_A_DAY = "at 08:00 and 20:00";
const THREE_A_DAY = "at 08:00, 14:00 and 22:00";
const FOUR_A_DAY = "at 08:00, 12:00, 18:00 and 22:00";
const AT_NIGHT = "daily at 22:00";

/** Abbreviations that are misread, with what to write in full. */
const ABBREVIATIONS: Readonly<Record<string, string>> = {
  qd: ONCE_A_DAY,
  od: ONCE_A_DAY,
  q1d: ONCE_A_DAY,
  mane: ONCE_A_DAY,
  om: ONCE_A_DAY,
  bd: TWICE_A_DAY,
  bid: TWICE_A_DAY,
  bds: TWICE_A_DAY,
  tds: THREE_A_DAY,
  tid: THREE_A_DAY,
  qds: FOUR_A_DAY,
  qid: FOUR_A_DAY,
  qod: "every 48 h",
  qhs: AT_NIGHT,
  hs: AT_NIGHT,
  qn: AT_NIGHT,
  nocte: AT_NIGHT,
  stat: "once",
  q: "every 12 h",
};
/** Words that stand for a time of day the reader would have to guess. */
const VAGUE =
  /^(morning|mornings|noon|midday|afternoon|evening|evenings|night|nightly|midnight|bedtime|breakfast|lunch|dinner|supper)$/;

const BEFORE_VAGUE = /^(in|with|before|after|during|at|the|every|each)$/;

/** Words that are understood but not taken: an error-prone abbreviation, or a vague time of day such as "in the morning". */
export function refusedWord(words: readonly string[], from: number): Issue | null {
  const word = words[from] ?? "";
  const plain = word.toLowerCase().replace(/\./g, "");
  const expected = Object.hasOwn(ABBREVIATIONS, plain) ? ABBREVIATIONS[plain] : undefined;
  if (expected !== undefined) return issue("dose-text-abbreviation", { part: word, expected });
  const hours = /^q(\d+)(h|hr|hrs|hourly)$/.exec(plain);
  if (hours) return issue("dose-text-abbreviation", { part: word, expected: `every ${hours[1]} h` });
  if (/^(prn|needed)$/.test(plain)) return issue("dose-text-as-needed", { part: word });
  let end = from;
  while (end < from + 2 && BEFORE_VAGUE.test(words[end]?.toLowerCase() ?? "")) end += 1;
  if (!VAGUE.test(words[end]?.toLowerCase() ?? "")) return null;
  return issue("dose-text-vague-time", { part: words.slice(from, end + 1).join(" "), expected: "at 08:00" });
}
