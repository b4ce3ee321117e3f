/** A line chart for an example workbook; its categories are the values of the horizontal axis. */
import { quoteSheet } from "../trial/dialect";
import type { ExampleChart } from "../trial/examples/cells";
import { encode } from "../trial/xml";

const chart = "http://schemas.openxmlformats.org/drawingml/2006/chart";
const drawing = "http://schemas.openxmlformats.org/drawingml/2006/main";
const relation = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const colours = ["9C4221", "35596B", "4B6B2F"];

export function chartXml({ title, horizontal, vertical, along, series }: ExampleChart, sheet: string): string {
  const at = (cells: string): string => encode(`${quoteSheet(sheet)}!${cells}`);
  const lines = series.map(
    ({ name, values }, i) =>
      `<c:ser><c:idx val="${i}"/><c:order val="${i}"/><c:tx><c:strRef><c:f>${at(name)}</c:f></c:strRef></c:tx>` +
      `<c:spPr><a:ln w="22225"><a:solidFill><a:srgbClr val="${colours[i % colours.length]}"/></a:solidFill></a:ln></c:spPr>` +
      `<c:marker><c:symbol val="none"/></c:marker><c:cat><c:numRef><c:f>${at(along)}</c:f></c:numRef></c:cat>` +
      `<c:val><c:numRef><c:f>${at(values)}</c:f></c:numRef></c:val><c:smooth val="0"/></c:ser>`,
  );
  const axis = (kind: string, id: number, other: number, position: string, words: string): string =>
    `<c:${kind}><c:axId val="${id}"/><c:scaling><c:orientation val="minMax"/></c:scaling><c:delete val="0"/>` +
    `<c:axPos val="${position}"/>${position === "l" ? "<c:majorGridlines/>" : ""}${titleXml(words)}` +
    `<c:numFmt formatCode="General" sourceLinked="0"/><c:majorTickMark val="out"/><c:minorTickMark val="none"/>` +
    `<c:tickLblPos val="nextTo"/><c:crossAx val="${other}"/><c:crosses val="autoZero"/></c:${kind}>`;
  return (
    `<c:chartSpace xmlns:c="${chart}" xmlns:a="${drawing}" xmlns:r="${relation}"><c:chart>${titleXml(title)}` +
    `<c:autoTitleDeleted val="0"/><c:plotArea><c:layout/><c:lineChart><c:grouping val="standard"/>` +
    `<c:varyColors val="0"/>${lines.join("")}<c:axId val="1"/><c:axId val="2"/></c:lineChart>` +
    `${axis("catAx", 1, 2, "b", horizontal)}${axis("valAx", 2, 1, "l", vertical)}</c:plotArea>` +
    `<c:legend><c:legendPos val="t"/><c:overlay val="0"/></c:legend><c:plotVisOnly val="1"/></c:chart></c:chartSpace>`
  );
}

const titleXml = (words: string): string =>
  `<c:title><c:tx><c:rich><a:bodyPr/><a:p><a:r><a:t>${encode(words)}</a:t></a:r></a:p></c:rich></c:tx><c:overlay val="0"/></c:title>`;

export function drawingXml({ from, to }: ExampleChart): string {
  const sheetDrawing = "http://schemas.openxmlformats.org/drawingml/2006/spreadsheetDrawing";
  const corner = ({ row, column }: ExampleChart["from"]): string =>
    `<xdr:col>${column}</xdr:col><xdr:colOff>0</xdr:colOff><xdr:row>${row}</xdr:row><xdr:rowOff>0</xdr:rowOff>`;
  return (
    `<xdr:wsDr xmlns:xdr="${sheetDrawing}" xmlns:a="${drawing}"><xdr:twoCellAnchor><xdr:from>${corner(from)}</xdr:from>` +
    `<xdr:to>${corner(to)}</xdr:to><xdr:graphicFrame macro=""><xdr:nvGraphicFramePr><xdr:cNvPr id="2" name="Chart 1"/>` +
    `<xdr:cNvGraphicFramePr/></xdr:nvGraphicFramePr><xdr:xfrm><a:off x="0" y="0"/><a:ext cx="0" cy="0"/></xdr:xfrm>` +
    `<a:graphic><a:graphicData uri="${chart}"><c:chart xmlns:c="${chart}" xmlns:r="${relation}" r:id="rId1"/>` +
    `</a:graphicData></a:graphic></xdr:graphicFrame><xdr:clientData/></xdr:twoCellAnchor></xdr:wsDr>`
  );
}
