import { page, type TextStyle } from "./page-style";
import { type Align, Pen, type Text } from "./pen";

export type StructureType =
  | "Document"
  | "Sect"
  | "H1"
  | "H2"
  | "H3"
  | "P"
  | "L"
  | "LI"
  | "Lbl"
  | "LBody"
  | "Link"
  | "Figure"
  | "Table"
  | "TR"
  | "TH"
  | "TD"
  | "Note";

export interface ElementOptions {
  readonly alt?: string;
  readonly scope?: "Column" | "Row";
  readonly bbox?: readonly [number, number, number, number];
  readonly placement?: "Block" | "Inline";
}

/**
 * One tagged A4 document that flows from top to bottom. `y` is where the next thing goes; `element` opens a part of
 * the structure that a screen reader walks; everything drawn belongs to a part or is marked as decoration.
 */
export class Pdf {
  readonly pen: Pen;
  y: number = page.top;
  x: number = page.left;
  width: number = page.width - page.left - page.right;
  private readonly open: PDFKit.PDFStructureElement[] = [];

  constructor(readonly doc: PDFKit.PDFDocument) {
    this.pen = new Pen(doc);
    const root = doc.struct("Document");
    doc.addStructure(root);
    this.open.push(root);
  }

  /** The lowest point that content may reach. */
  get floor(): number {
    return page.height - page.bottom;
  }

  private get current(): PDFKit.PDFStructureElement {
    const element = this.open.at(-1);
    if (!element) throw new Error("The document is already closed");
    return element;
  }

  /** Everything that `fill` draws or opens becomes the content of this element. */
  element(type: StructureType, fill: () => void, options: ElementOptions = {}): void {
    const element = this.doc.struct(type, { ...options } as PDFKit.Mixins.StructureElementOptions);
    this.current.add(element);
    this.open.push(element);
    fill();
    this.open.pop();
    element.end();
  }

  /** Draws a piece of content inside the open element. Never breaks the page inside. */
  mark(draw: () => void): void {
    this.current.add(draw);
  }

  /** Starts a new page unless this much room is left. */
  need(points: number): void {
    if (this.y + points > this.floor) this.newPage();
  }

  newPage(): void {
    this.doc.addPage();
    this.y = page.top;
  }

  space(points: number): void {
    this.y += points;
  }

  /** Flows text down the column inside the open element, over as many pages as it takes. */
  flow(text: Text, style: TextStyle, options: { bold?: boolean; align?: Align } = {}): void {
    for (const line of this.pen.lines(text, style, this.width, options.bold)) {
      this.need(style.leading);
      this.mark(() => this.pen.line(line, style, this.x, this.y, this.width, options.align));
      this.y += style.leading;
    }
  }

  /** Lays content in a column of its own, then gives the flow back as it was. Returns where the column ended. */
  column(x: number, width: number, fill: () => void): number {
    const before = { x: this.x, width: this.width, y: this.y };
    this.x = x;
    this.width = width;
    fill();
    const end = this.y;
    Object.assign(this, before);
    return end;
  }
}
