import type { ReactNode } from "react";
import { SUMMARY_COLUMNS as columns, summaryHeadWords, SUMMARY_TITLES as titles } from "../../core/messages/index.ts";
import { GravityMark } from "../ui/GravityMark.tsx";
import { SummaryBlock } from "./SummaryBlock.tsx";
import { SummaryDetailsSheet } from "./SummaryDetailsSheet.tsx";
import { SummaryPaper } from "./SummaryPaper.tsx";
import { SummaryRows } from "./SummaryRows.tsx";
import { SummaryTable } from "./SummaryTable.tsx";
import type { SummaryModel } from "./summaryModel.ts";
import "./paper.css";
import "./individual.css";
import "./print.css";

interface SummarySheetProps {
  readonly model: SummaryModel;
  /** The painted profile. */
  readonly chart: ReactNode;
}

/** The summary as paper: the order and what it rests on, then the details. */
export function SummarySheet({ model, chart }: SummarySheetProps) {
  return (
    <div
      className={model.levels.isIndividual ? "summary-sheets summary-dense" : "summary-sheets"}
      data-theme="paper"
      data-size={model.pageSize}
    >
      <SummaryPaper model={model} heading={model.heading}>
        <Banners banners={model.banners} />
        {model.order && <Order order={model.order} />}
        <div className="summary-signatures">
          <p>
            <span className="summary-signed">{model.preparedBy}</span>
            {summaryHeadWords.preparedBy}
          </p>
          <p>
            <span className="summary-signed" />
            {summaryHeadWords.checkedBy}
          </p>
        </div>
        <div className="summary-foot">
          <p>{model.statement}</p>
          <p>{model.footer}</p>
        </div>
        <figure className="summary-chart">
          {chart}
          {model.chart.key !== "" && <figcaption className="summary-remark">{model.chart.key}</figcaption>}
        </figure>
        <div className="summary-columns">
          <div>
            {model.expected && (
              <SummaryBlock title={model.expected.title}>
                <SummaryRows rows={model.expected.rows} />
                <p className="summary-remark">{model.expected.remark}</p>
              </SummaryBlock>
            )}
            {model.levels.isIndividual ? <NextLevel nextLevel={model.nextLevel} /> : <Levels levels={model.levels} />}
          </div>
          <div>
            {!model.levels.isIndividual && <NextLevel nextLevel={model.nextLevel} />}
            {model.hours && (
              <SummaryBlock title={model.hours.title}>
                {model.hours.columns.length === 0 ? (
                  <SummaryRows
                    rows={model.hours.rows.map(({ label, cells }) => ({ label, value: cells.join(", ") }))}
                    isBeside
                  />
                ) : (
                  <SummaryTable grid={model.hours} first="" />
                )}
                <p className="summary-remark">{model.hours.span}</p>
              </SummaryBlock>
            )}
            <SummaryBlock title={model.kinetics.title}>
              {model.kinetics.rows.length > 0 && (
                <SummaryRows rows={model.kinetics.rows} isBeside={!model.levels.isIndividual} />
              )}
              {model.kinetics.sentences.map((sentence) => (
                <p key={sentence} className="summary-remark">
                  {sentence}
                </p>
              ))}
            </SummaryBlock>
          </div>
        </div>
        {model.levels.isIndividual && <Levels levels={model.levels} />}
        <SummaryBlock title={titles.cautions} beside={model.cautionsRemark}>
          <ul className="summary-two summary-fine">
            {model.concerns.map((concern) => (
              <li key={`${concern.title} ${concern.text}`}>
                <strong>{concern.title}.</strong>
              </li>
            ))}
            {model.cautions.map((text) => (
              <li key={text}>{text}</li>
            ))}
          </ul>
        </SummaryBlock>
        <SummaryBlock title={titles.assumes}>
          <ul className="summary-two summary-fine">
            {model.assumes.map((text) => (
              <li key={text}>{text}</li>
            ))}
          </ul>
        </SummaryBlock>
      </SummaryPaper>
      <SummaryDetailsSheet model={model} />
    </div>
  );
}

/** Everything grave in one frame, then what is unchecked. */
function Banners({ banners }: Pick<SummaryModel, "banners">) {
  return (["stop", "check"] as const).map((gravity) => {
    const own = banners.filter((banner) => banner.gravity === gravity);
    return own.length === 0 ? null : (
      <div key={gravity} className={`summary-banner summary-banner-${gravity}`}>
        {own.map((banner) => (
          <p key={`${banner.title} ${banner.text}`}>
            <GravityMark gravity={gravity} /> <strong>{banner.title}.</strong> {banner.text}
          </p>
        ))}
      </div>
    );
  });
}

function Order({ order }: { readonly order: NonNullable<SummaryModel["order"]> }) {
  return (
    <section className="summary-order" aria-label={order.option}>
      {order.lines.map((line, index) => (
        <div key={index} className="summary-order-line">
          <p className="summary-order-main">
            {line.products.map((product) => (
              <span key={product}>{product}</span>
            ))}
            <span>{line.instruction}</span>
          </p>
          {order.lines.length > 1 && <p>{line.sentences.join(" ")}</p>}
        </div>
      ))}
      <p>{[...(order.lines.length === 1 ? (order.lines[0]?.sentences ?? []) : []), ...order.sentences].join(" ")}</p>
      <p className="summary-order-option">{order.option}</p>
    </section>
  );
}

function NextLevel({ nextLevel }: Pick<SummaryModel, "nextLevel">) {
  return (
    <SummaryBlock title={nextLevel.title}>
      <p>{nextLevel.sentences.join(" ")}</p>
    </SummaryBlock>
  );
}

function Levels({ levels }: Pick<SummaryModel, "levels">) {
  const { isIndividual } = levels;
  const heads = isIndividual
    ? ["drawn", "afterDose", "measured", "predictedOwn", "difference", "residual", "forecast"]
    : ["drawn", "afterDose", "measured", "predicted", "difference"];
  return (
    <SummaryBlock title={levels.title} beside={levels.remark}>
      {levels.rows.length > 0 && (
        <table className={`summary-table summary-levels${isIndividual ? " summary-levels-wide" : ""}`}>
          <thead>
            <tr>
              {heads.map((head) => (
                <th key={head} scope="col">
                  {columns[head as keyof typeof columns]}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {levels.rows.map((row, index) => (
              <tr key={index}>
                <th scope="row">
                  {isIndividual && <LevelSign isLeftOut={row.isLeftOut} />}
                  {row.drawn}
                  {row.remark !== "" && <span className="summary-left-out">{row.remark}</span>}
                </th>
                <td>{row.afterDose}</td>
                <td>{row.measured}</td>
                <td>{row.predicted}</td>
                <td>{row.difference}</td>
                {isIndividual && <td>{row.residual}</td>}
                {isIndividual && <td>{row.forecast}</td>}
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </SummaryBlock>
  );
}

/** The mark the level has on the profile. */
function LevelSign({ isLeftOut }: { readonly isLeftOut: boolean }) {
  return (
    <svg className="summary-level-sign" viewBox="-7 -7 14 14" aria-hidden="true" focusable="false">
      {isLeftOut ? <circle r="5.5" /> : <path d="M-6 0h12M0 -6v12" />}
    </svg>
  );
}
