import type { Concern } from "../../core/analysis/index.ts";
import { benchWords, concernMessage, GRAVITY_WORDS } from "../../core/messages/index.ts";
import { GravityMark } from "../ui/GravityMark.tsx";
import "./ConcernList.css";

/** What a human has to look at, gravest first; gravity is a word and a shape. */
export function ConcernList({ concerns }: { readonly concerns: readonly Concern[] }) {
  return (
    <section className="concerns" aria-labelledby="concerns-head">
      <h2 className="concerns-head" id="concerns-head">
        {benchWords.concerns}
      </h2>
      {concerns.length === 0 && <p className="concern-text">{benchWords.noConcerns}</p>}
      <ul className="concerns-list">
        {concerns.map((concern) => {
          const words = concernMessage(concern);
          return (
            <li key={concern.id} className={`concern concern-${concern.gravity}`} data-concern={concern.id}>
              <p className="concern-gravity">
                <GravityMark gravity={concern.gravity} /> {GRAVITY_WORDS[concern.gravity]}
              </p>
              <h3 className="concern-title">{words.title}</h3>
              <p className="concern-text">{words.text}</p>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
