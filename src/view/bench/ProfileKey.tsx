import { fitWords } from "../../core/messages/index.ts";
import "./ProfileKey.css";

/** What thick, thin, filled and bracketed mean on the profile. */
export function ProfileKey() {
  return (
    <section className="profile-key" aria-label={fitWords.keyHead}>
      <p>
        <svg viewBox="0 0 26 10" aria-hidden="true">
          <line className="profile-key-thick" x1="1" x2="25" y1="5" y2="5" />
        </svg>
        {fitWords.keyIndividual}
      </p>
      <p>
        <svg viewBox="0 0 26 10" aria-hidden="true">
          <line className="profile-key-thin" x1="1" x2="25" y1="5" y2="5" />
        </svg>
        {fitWords.keyTypical}
      </p>
      <p>
        <svg viewBox="0 0 26 14" aria-hidden="true">
          <rect className="profile-key-wide" x="1" width="24" y="1" height="12" />
          <rect className="profile-key-narrow" x="1" width="24" y="4" height="6" />
        </svg>
        {fitWords.keyBand}
      </p>
      <p>
        <svg viewBox="0 0 26 14" aria-hidden="true">
          <path className="profile-key-forecast" d="M10 1.5h6m-3 0v11m-3 0h6" />
        </svg>
        {fitWords.keyForecast}
      </p>
    </section>
  );
}
