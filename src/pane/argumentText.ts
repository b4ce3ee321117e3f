import type { ParameterDoc } from "./catalogue";

/** What was typed as an argument: option words get their quotes, a decimal comma its point. */
export function argumentText(parameter: ParameterDoc, typed: string): string {
  const text = typed.trim().replace(/^=/, "");
  if (text === "") return "";
  const textual = parameter.giving === "words" || parameter.giving === "text";
  if (textual && !/^".*"$/.test(text) && !/^(?:'[^']+'!|\w+!)?\$?[A-Z]{1,3}\$?\d+$/i.test(text)) {
    return `"${text.replaceAll('"', '""')}"`;
  }
  return /^[-+]?\d+,\d+(?:[eE][-+]?\d+)?$/.test(text) ? text.replace(",", ".") : text;
}
