/** Small pieces of HTML. */

/** Text as it may stand between tags and in quoted attributes. */
export function escape(text: string): string {
  return text.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");
}

/** The comments' plain ASCII as print would have it: `m/s2` as m/s², `sqrt 2` as √2, `zeta` as ζ. Escaped. */
export function printed(text: string): string {
  return escape(text)
    .replace(/\bN\.s\b/g, "N·s")
    .replace(/\blbf\.s\b/g, "lbf·s")
    .replace(/\b(s|gn|unit)2(?=\W|$)/g, "$1²")
    .replace(/\bsqrt\s?(?=[\d(])/g, "√")
    .replace(/\^2\b/g, "²")
    .replace(/\^3\b/g, "³")
    .replace(/\bzeta\b/g, "ζ")
    .replace(/\bkappa\b/g, "κ")
    .replace(/(\d?) ?\bpi\b ?(?=\w)/g, "$1π")
    .replace(/\bpi\b/g, "π")
    .replace(/ - /g, " − ");
}

/** A long name that may break before its capitals. */
export function breakable(name: string): string {
  return escape(name).replace(/[A-Z]/g, "<wbr />$&");
}

/** A table whose rows stack where the page is narrow: each cell repeats its column's heading. */
export function table(caption: string, headings: string[], rows: string[][]): string {
  const cell = (content: string, i: number) =>
    i === 0
      ? `<th scope="row" role="rowheader">${content}</th>`
      : `<td role="cell" data-heading="${escape(headings[i])}">${content === "" ? "–" : content}</td>`;
  return `<table role="table">
<caption>${caption}</caption>
<thead role="rowgroup"><tr role="row">${headings.map((heading) => `<th scope="col" role="columnheader">${heading}</th>`).join("")}</tr></thead>
<tbody role="rowgroup">
${rows.map((row) => `<tr role="row">${row.map(cell).join("")}</tr>`).join("\n")}
</tbody>
</table>`;
}
