import type { ReactNode } from "react";
import { fitWords } from "../../core/messages/index.ts";
import "./ProfileKey.css";

/** What thick, thin, filled and bracketed mean on the profile. */
export function ProfileKey() {
  return (
    <section className="profile-key" aria-label={fitWords.keyHead}>
      <KeyEntry height={10} words={fitWords.keyIndividual}>
        <line className="profile-key-thick" x1="1" x2="25" y1="5" y2="5" />
      </KeyEntry>
      <KeyEntry height={10} words={fitWords.keyTypical}>
        <line className="profile-key-thin" x1="1" x2="25" y1="5" y2="5" />
      </KeyEntry>
      <KeyEntry height={14} words={fitWords.keyBand}>
        <rect className="profile-key-wide" x="1" width="24" y="1" height="12" />
        <rect className="profile-key-narrow" x="1" width="24" y="4" height="6" />
      </KeyEntry>
      <KeyEntry height={14} words={fitWords.keyForecast}>
        <path className="profile-key-forecast" d="M10 1.5h6m-3 0v11m-3 0h6" />
      </KeyEntry>
    </section>
  );
}

interface KeyEntryProps {
  readonly height: number;
  readonly words: string;
  readonly children: ReactNode;
}

function KeyEntry({ height, words, children }: KeyEntryProps) {
  return (
    <p>
      <svg viewBox={`0 0 26 ${height}`} aria-hidden="true">
        {children}
      </svg>
      {words}
    </p>
  );
}
