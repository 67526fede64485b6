import type { ReactNode } from "react";
import "./ScreenHead.css";

export interface ScreenHeadProps {
  readonly places: readonly {
    readonly id: string;
    readonly word: string;
    readonly isCurrent: boolean;
    readonly onGo: () => void;
  }[];
  readonly children?: ReactNode;
}

/** The strip on top of every screen but the bench and the summary: the mark and where else one can go. */
export function ScreenHead({ places, children }: ScreenHeadProps) {
  return (
    <header className="screen-head">
      <p className="screen-head-brand">
        <svg className="screen-head-mark" viewBox="0 0 28 20" aria-hidden="true" focusable="false">
          <path d="M1.5 14.5c4 0 4.5-11 8.5-11s4.5 9 8.5 9 4-6.5 8-6.5" />
          <path className="screen-head-shore" d="M1.5 18.8h25" />
        </svg>
        Ebbline
      </p>
      <nav className="screen-head-places" aria-label="Screens">
        {places.map((place) => (
          <button
            key={place.id}
            type="button"
            className="screen-head-place"
            aria-current={place.isCurrent ? "page" : undefined}
            onClick={place.onGo}
          >
            {place.word}
          </button>
        ))}
      </nav>
      {children}
    </header>
  );
}
