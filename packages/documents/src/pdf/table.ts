import type { Line } from "./break-lines";
import { ink, page, type TextStyle, textStyles } from "./page-style";
import type { Pdf } from "./pdf";
import type { Align, Text } from "./pen";

export interface Column {
  readonly head: string;
  /** Share of the table's width; shares are relative to each other. */
  readonly share: number;
  readonly align?: Align;
}

export interface Row {
  readonly cells: readonly Text[];
  /** A total stands under a single rule and over a double one. */
  readonly kind?: "total" | "subtotal";
}

interface TableOptions {
  readonly columns: readonly Column[];
  readonly rows: readonly Row[];
  readonly style?: TextStyle;
  /** Whether the first cell of a row names the row. */
  readonly rowHeads?: boolean;
}

const gap = 8;
const pad = 3.5;

interface Placed {
  readonly x: number;
  readonly width: number;
  readonly align: Align;
}

function place(columns: readonly Column[], left: number, width: number): Placed[] {
  const shares = columns.reduce((sum, column) => sum + column.share, 0);
  const room = width - gap * (columns.length - 1);
  let x = left;
  return columns.map((column) => {
    const at = { x, width: (room * column.share) / shares, align: column.align ?? "left" };
    x += at.width + gap;
    return at;
  });
}

/** A table that may run over pages; a row stays whole unless it is taller than a page, and heads are repeated. */
export function table(pdf: Pdf, options: TableOptions): void {
  const style = options.style ?? textStyles.table;
  const at = place(options.columns, pdf.x, pdf.width);
  const headStyle = { ...style, color: ink.soft, size: style.size - 1 };
  const heads = options.columns.map((column, i) =>
    pdf.pen.lines(column.head, headStyle, at[i]?.width ?? 0, true),
  );
  const headHeight = Math.max(...heads.map((lines) => lines.length)) * headStyle.leading + pad * 2;

  const drawHead = (index: number) => drawCell(pdf, heads[index] ?? [], headStyle, at[index]);
  const endHead = () => {
    pdf.y += headHeight;
    pdf.pen.rule(pdf.y, { x: pdf.x, width: pdf.width });
  };
  const repeatHead = () => {
    pdf.pen.decoration(() => {
      for (const index of options.columns.keys()) drawHead(index);
    }, "Pagination");
    endHead();
  };

  pdf.element("Table", () => {
    pdf.need(headHeight + style.leading * 2);
    pdf.element("TR", () => {
      for (const index of options.columns.keys()) {
        pdf.element("TH", () => pdf.mark(() => drawHead(index)), { scope: "Column" });
      }
    });
    endHead();
    for (const row of options.rows)
      drawRow(pdf, row, { style, at, repeatHead, headHeight, rowHeads: options.rowHeads ?? false });
  });
  pdf.space(6);
}

interface RowLayout {
  readonly style: TextStyle;
  readonly at: readonly Placed[];
  readonly repeatHead: () => void;
  readonly headHeight: number;
  readonly rowHeads: boolean;
}

function drawRow(pdf: Pdf, row: Row, { style, at, repeatHead, headHeight, rowHeads }: RowLayout): void {
  const bold = row.kind !== undefined;
  const cells = at.map((place, i) => pdf.pen.lines(row.cells[i] ?? "", style, place.width, bold));
  const tallest = Math.max(1, ...cells.map((lines) => lines.length));
  const linesOnAPage = Math.floor((pdf.floor - page.top - headHeight - pad * 2) / style.leading);
  const first = Math.min(tallest, linesOnAPage);
  if (pdf.y + first * style.leading + pad * 2 > pdf.floor) {
    pdf.newPage();
    repeatHead();
  }
  if (row.kind === "total") pdf.pen.rule(pdf.y, { x: pdf.x, width: pdf.width });
  const starts = Array.from({ length: Math.ceil(tallest / linesOnAPage) }, (_, i) => i * linesOnAPage);
  for (const [part, start] of starts.entries()) {
    if (part > 0) {
      pdf.newPage();
      repeatHead();
    }
    pdf.element("TR", () => {
      for (const [i, lines] of cells.entries()) {
        const isHead = rowHeads && i === 0;
        const draw = () => drawCell(pdf, lines.slice(start, start + linesOnAPage), style, at[i]);
        pdf.element(isHead ? "TH" : "TD", () => pdf.mark(draw), isHead ? { scope: "Row" } : {});
      }
    });
    pdf.y += Math.min(tallest - start, linesOnAPage) * style.leading + pad * 2;
  }
  if (row.kind === "total") pdf.pen.rule(pdf.y, { x: pdf.x, width: pdf.width, double: true });
  else pdf.pen.rule(pdf.y, { x: pdf.x, width: pdf.width, color: ink.hair, weight: 0.5 });
}

function drawCell(pdf: Pdf, lines: readonly Line[], style: TextStyle, place: Placed | undefined): void {
  if (!place) return;
  for (const [row, line] of lines.entries()) {
    pdf.pen.line(line, style, place.x, pdf.y + pad + row * style.leading, place.width, place.align);
  }
}
