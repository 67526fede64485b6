import {
  SUMMARY_COLUMNS as columns,
  summaryHeadWords,
  summaryPatientWords,
  SUMMARY_TITLES as titles,
} from "../../core/messages/index.ts";
import { GravityMark } from "../ui/GravityMark.tsx";
import { SummaryBlock } from "./SummaryBlock.tsx";
import { SummaryPaper } from "./SummaryPaper.tsx";
import { SummaryRows } from "./SummaryRows.tsx";
import { SummaryTable } from "./SummaryTable.tsx";
import type { SummaryDetails, SummaryModel } from "./summaryModel.ts";

/** What the first sheet rests on: concerns in full, figures with formula and source, doses, elements, sources. */
export function SummaryDetailsSheet({ model }: { readonly model: SummaryModel }) {
  const { details } = model;
  return (
    <SummaryPaper model={model} heading={summaryHeadWords.details(model.heading)} isDetails>
      <Concerns concerns={details.concerns} />
      <Individual individual={details.individual} />
      <Figures figures={details.figures} remark={details.figuresRemark} />
      <Doses doses={details.doses} />
      <SummaryBlock title={titles.elements}>
        <div className="summary-elements">
          <SummaryRows rows={details.elements} />
        </div>
      </SummaryBlock>
      {details.notes !== "" && (
        <SummaryBlock title={titles.notes}>
          <p className="summary-notes">{details.notes}</p>
        </SummaryBlock>
      )}
      <SummaryBlock title={titles.sources}>
        <ol className="summary-two summary-sources">
          {details.sources.map((source) => (
            <li key={source}>{source}</li>
          ))}
        </ol>
      </SummaryBlock>
      <p className="summary-recompute">
        {details.recompute} <span className="summary-fingerprint">{details.fingerprint}</span>
      </p>
    </SummaryPaper>
  );
}

function Concerns({ concerns }: Pick<SummaryDetails, "concerns">) {
  if (concerns.length === 0) return null;
  return (
    <SummaryBlock title={titles.concerns}>
      <ul className="summary-concerns">
        {concerns.map((concern) => (
          <li key={`${concern.title} ${concern.text}`}>
            <GravityMark gravity={concern.gravity} />
            <p>
              {concern.word}: <strong>{concern.title}.</strong> {concern.text}
            </p>
          </li>
        ))}
      </ul>
    </SummaryBlock>
  );
}

function Individual({ individual }: Pick<SummaryDetails, "individual">) {
  if (individual === null) return null;
  return (
    <>
      <SummaryBlock title={individual.title}>
        <SummaryTable grid={individual.parameters} first={summaryPatientWords.parameter} />
        <p className="summary-remark">{[...individual.sentences, individual.method].join(" ")}</p>
      </SummaryBlock>
      {individual.levels.length > 0 && (
        <SummaryBlock title={titles.levelsSay}>
          <div className="summary-says">
            <SummaryRows rows={individual.levels} />
          </div>
        </SummaryBlock>
      )}
    </>
  );
}

function Figures({ figures, remark }: { readonly figures: SummaryDetails["figures"]; readonly remark: string }) {
  return (
    <SummaryBlock title={titles.figures} {...(remark === "" ? {} : { beside: remark })}>
      <table className="summary-table summary-figures">
        <thead>
          <tr>
            <th scope="col">{columns.figure}</th>
            <th scope="col">{columns.value}</th>
            <th scope="col">{columns.formula}</th>
            <th scope="col">{columns.source}</th>
          </tr>
        </thead>
        <tbody>
          {figures.map((figure) => (
            <tr key={figure.name}>
              <th scope="row">{figure.name}</th>
              <td>{figure.value}</td>
              <td>{[figure.formula, figure.inputs].filter((part) => part !== "").join("; ")}</td>
              <td>{figure.source}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </SummaryBlock>
  );
}

function Doses({ doses }: Pick<SummaryDetails, "doses">) {
  return (
    <SummaryBlock title={titles.doses}>
      {doses.lines.map((line) => (
        <p key={line}>{line}</p>
      ))}
      {doses.doses.length > 0 && (
        <ul className="summary-doses">
          {doses.doses.map((dose, index) => (
            <li key={index}>{dose}</li>
          ))}
        </ul>
      )}
      {doses.remark !== "" && <p className="summary-remark">{doses.remark}</p>}
    </SummaryBlock>
  );
}
