import type { CalibrationResults, ModelCalibration, RankedQuantity } from "./calibrationResults.ts";
import { rankBins } from "./rankUniformity.ts";

/** px */
const CELL = { width: 170, height: 104, gapX: 26, gapY: 62 };
const MARGIN = { left: 40, top: 62, right: 20, bottom: 60 };
/** Standard normal quantiles of the ranges drawn: 99 % a bin, 95 % along a coverage line. */
const Z99 = 2.576;
const Z95 = 1.96;
/** Half the height of a coverage panel, as a share. */
const COVERAGE_REACH = 0.12;
const INK = { text: "#1f2933", soft: "#52606d", bar: "#5b7c99", range: "#dfe6ec", line: "#9aa5b1" };
/** Told apart by dash as well as by colour. */
const LINES = [
  { stroke: "#1f4e79", dash: "" },
  { stroke: "#a23b2a", dash: "6 3" },
  { stroke: "#3d7a3a", dash: "2 2" },
  { stroke: "#6b4a9e", dash: "8 3 2 3" },
];

/** A row a model: rank histograms with the range even ranks keep to, and how far the coverage of central intervals is off. SVG. */
export function calibrationPicture({ models, rankDraws, date }: CalibrationResults): string {
  const columns = Math.max(...models.map(({ ranks }) => ranks.length)) + 1;
  const width = MARGIN.left + columns * CELL.width + (columns - 1) * CELL.gapX + MARGIN.right;
  const height = MARGIN.top + models.length * (CELL.height + CELL.gapY) + MARGIN.bottom - CELL.gapY;
  const left = (column: number) => MARGIN.left + column * (CELL.width + CELL.gapX);
  const rows = models.flatMap((model, row) => {
    const top = MARGIN.top + row * (CELL.height + CELL.gapY);
    return [
      text(MARGIN.left, top - 26, `${model.id}: ${model.coverage.patients} patients`, `font-weight="bold"`),
      ...model.ranks.flatMap((ranked, column) => histogram(ranked, left(column), top)),
      ...coverage(model, left(columns - 1), top),
    ];
  });
  return `${[
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" font-family="sans-serif" font-size="11" fill="${INK.text}">`,
    `<title>Simulation-based calibration, run of ${date}</title>`,
    `<rect width="${width}" height="${height}" fill="#ffffff"/>`,
    text(
      MARGIN.left,
      20,
      `Ranks of the truth among ${rankDraws} draws; shaded: 99 % of bins where ranks are even.`,
      "",
    ),
    ...rows,
    text(
      MARGIN.left,
      height - 12,
      "Right: coverage of central intervals less their nominal size, in points of %; shaded: 95 % where ranks are even.",
      `fill="${INK.soft}"`,
    ),
    "</svg>",
  ].join("\n")}\n`;
}

function histogram({ quantity, counts, p }: RankedQuantity, left: number, top: number): string[] {
  const bins = rankBins(counts);
  const total = bins.reduce((sum, each) => sum + each, 0);
  const part = 1 / bins.length;
  const spread = Z99 * Math.sqrt(total * part * (1 - part));
  const most = Math.max(...bins, total * part + spread) * 1.05;
  const y = (count: number) => top + CELL.height * (1 - count / most);
  const wide = CELL.width / bins.length;
  const [high, low] = [y(total * part + spread), y(Math.max(0, total * part - spread))];
  return [
    text(left, top - 8, `${quantity}, p ${p < 0.001 ? p.toExponential(0) : p.toFixed(3)}`, ""),
    rect(left, high, CELL.width, low - high, INK.range),
    ...bins.map((count, i) => rect(left + i * wide + 0.5, y(count), wide - 1, top + CELL.height - y(count), INK.bar)),
    line(left, y(total * part), left + CELL.width, y(total * part), INK.text, "3 2"),
    ...[high, low].map((edge) => line(left, edge, left + CELL.width, edge, INK.line, "")),
    line(left, top + CELL.height, left + CELL.width, top + CELL.height, INK.line, ""),
    text(left, top + CELL.height + 13, "0", `fill="${INK.soft}"`),
    text(left + CELL.width, top + CELL.height + 13, String(counts.length - 1), `fill="${INK.soft}" text-anchor="end"`),
  ];
}

function coverage(model: ModelCalibration, left: number, top: number): string[] {
  const half = CELL.height / 2;
  const x = (nominal: number) => left + CELL.width * nominal;
  const y = (off: number) =>
    top + half - (half * Math.max(-COVERAGE_REACH, Math.min(COVERAGE_REACH, off))) / COVERAGE_REACH;
  const { patients } = model.coverage;
  const edge = (sign: number) =>
    Array.from({ length: 41 }, (_, i) => i / 40).map((nominal) => {
      const off = sign * Z95 * Math.sqrt((nominal * (1 - nominal)) / patients);
      return `${place(x(nominal))},${place(y(off))}`;
    });
  return [
    text(left, top - 8, "coverage − nominal", ""),
    `<polygon points="${[...edge(1), ...edge(-1).reverse()].join(" ")}" fill="${INK.range}"/>`,
    line(left, top + half, left + CELL.width, top + half, INK.line, ""),
    ...[-0.1, 0, 0.1].map((off) =>
      text(
        left - 4,
        y(off) + 4,
        `${off > 0 ? "+" : ""}${Math.round(off * 100)}`.replace("-", "−"),
        `fill="${INK.soft}" text-anchor="end"`,
      ),
    ),
    ...model.ranks.map(({ counts }, q) => {
      const points = coverageLine(counts).map(
        ({ nominal, found }) => `${place(x(nominal))},${place(y(found - nominal))}`,
      );
      const { stroke, dash } = LINES[q]!;
      return `<polyline points="${points.join(" ")}" fill="none" stroke="${stroke}" stroke-width="1.5"${dash ? ` stroke-dasharray="${dash}"` : ""}/>`;
    }),
    ...model.ranks.flatMap(({ quantity }, q) => {
      const at = left + [0, 44, 80, 110][q]!;
      const { stroke, dash } = LINES[q]!;
      return [
        line(at, top + CELL.height + 24, at + 14, top + CELL.height + 24, stroke, dash),
        text(at + 16, top + CELL.height + 28, quantity === "next trough" ? "trough" : quantity, `font-size="9"`),
      ];
    }),
    text(left, top + CELL.height + 13, "0", `fill="${INK.soft}"`),
    text(left + CELL.width, top + CELL.height + 13, "100 %", `fill="${INK.soft}" text-anchor="end"`),
  ];
}

/**
 * The share of patients inside each central interval that the ranks allow: ranks j to L − j of L + 1 are (L + 1 − 2j)/(L + 1) of them,
 * exactly, where ranks are even.
 */
export function coverageLine(counts: readonly number[]): { nominal: number; found: number }[] {
  const total = counts.reduce((sum, each) => sum + each, 0);
  const points = [];
  for (let j = Math.floor(counts.length / 2); j >= 0; j--) {
    const inside = counts.slice(j, counts.length - j).reduce((sum, each) => sum + each, 0);
    points.push({ nominal: (counts.length - 2 * j) / counts.length, found: inside / total });
  }
  return points;
}

/** Two places: the file stays small, and the same everywhere. */
const place = (value: number) => String(Math.round(value * 100) / 100);

function text(x: number, y: number, words: string, attributes: string): string {
  const safe = words.replace(/[&<>]/g, (sign) => `&#${sign.charCodeAt(0)};`);
  return `<text x="${place(x)}" y="${place(y)}"${attributes ? ` ${attributes}` : ""}>${safe}</text>`;
}

function rect(x: number, y: number, width: number, height: number, fill: string): string {
  return `<rect x="${place(x)}" y="${place(y)}" width="${place(width)}" height="${place(height)}" fill="${fill}"/>`;
}

function line(x1: number, y1: number, x2: number, y2: number, stroke: string, dash: string): string {
  const dashed = dash ? ` stroke-dasharray="${dash}"` : "";
  return `<line x1="${place(x1)}" y1="${place(y1)}" x2="${place(x2)}" y2="${place(y2)}" stroke="${stroke}"${dashed}/>`;
}
