import { join } from "node:path";

const here = import.meta.dirname;
const dist = join(here, "dist");

const typescript = {
  test: /\.ts$/,
  loader: "swc-loader",
  options: { jsc: { parser: { syntax: "typescript" }, target: "es2022" } },
};

/** Style sheets as text: the pane adopts them, so that its page needs no inline style and no second request. */
const styles = { test: /\.css$/, type: "asset/source" };

const common = {
  mode: "production",
  target: ["web", "es2022"],
  devtool: false,
  resolve: { extensions: [".ts", ".js"] },
  performance: { hints: false },
  stats: "errors-warnings",
};

/** functions.js is a classic script: the same file for Excel and the trial sheet. */
const functions = {
  ...common,
  name: "functions",
  entry: join(here, "src/office/functions.ts"),
  output: { path: dist, filename: "functions.js", chunkFilename: "functions-[name].js", publicPath: "auto" },
  module: { rules: [typescript] },
};

/** The task pane in Excel; its page also loads functions.js, since functions and pane share one runtime. */
const taskpane = {
  ...common,
  name: "taskpane",
  entry: join(here, "src/office/taskpane.ts"),
  output: { path: dist, filename: "taskpane.js", chunkFilename: "taskpane-[name].js", publicPath: "auto" },
  module: { rules: [typescript, styles] },
};

/** The trial page. The spreadsheet library and what it needs stay files of their own: src/build/trialPage.ts. */
const trial = {
  ...common,
  name: "trial",
  entry: join(here, "src/trial/page.ts"),
  output: { path: join(dist, "trial"), filename: "page.js", chunkFilename: "page-[name].js", publicPath: "auto" },
  externals: { "@odoo/o-spreadsheet": "o_spreadsheet", "@odoo/owl": "owl", "chart.js/auto": "Chart" },
  module: { rules: [typescript, styles] },
};

export default [functions, taskpane, trial];
