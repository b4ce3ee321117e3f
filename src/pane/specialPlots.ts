/** Plots of the functions that stand for no single point on the response of one mass. */
import type { Explanation } from "./explain";
import type { Numbers } from "./numbers";
import type { Picture } from "./responsePlot";

export function specialPicture(_explanation: Explanation, _numbers: Numbers): Picture | null {
  return null;
}
