import { createRequire } from "node:module";
import PDFDocument from "pdfkit";

const font = createRequire(import.meta.url).resolve(
  "@expo-google-fonts/roboto/400Regular/Roboto_400Regular.ttf",
);
const bold = createRequire(import.meta.url).resolve("@expo-google-fonts/roboto/700Bold/Roboto_700Bold.ttf");

export type Page = { heading: string; lines: string[] };

/** A small real PDF: selectable text, a title, numbered pages. */
export function pdf(
  facts: { reference: string; title: string; code: string; author: string },
  pages: Page[],
): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const document = new PDFDocument({
      size: "A4",
      margin: 64,
      autoFirstPage: false,
      info: {
        Title: `${facts.reference} ${facts.title}`,
        Author: facts.author,
        CreationDate: new Date("2025-03-31T12:00:00Z"),
      },
    });
    const parts: Buffer[] = [];
    document.on("data", (part: Buffer) => parts.push(part));
    document.on("end", () => resolve(Buffer.concat(parts)));
    document.on("error", reject);
    pages.forEach((page, at) => {
      document.addPage();
      document.font(font).fontSize(9).fillColor("#56615F");
      document.text(`${facts.reference} ${facts.code} · ${facts.title}`, { align: "left" });
      document.moveDown(1.2).font(bold).fontSize(15).fillColor("#1B2326").text(page.heading);
      document.moveDown(0.6).font(font).fontSize(10.5);
      for (const line of page.lines) document.text(line, { lineGap: 2 }).moveDown(0.55);
      document.fontSize(8.5).fillColor("#56615F");
      document.text(
        `Invented demonstration document. ${facts.author}. Page ${at + 1} of ${pages.length}`,
        64,
        document.page.height - 58,
        { lineBreak: false },
      );
    });
    document.end();
  });
}
