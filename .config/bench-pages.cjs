// What the bench's page needs in dist, besides its own scripts. The two LGPL libraries (@odoo/owl, @odoo/o-spreadsheet) are copied
// as they are, each with its licence text, never bundled: whoever receives dist may put another version in their place.
const { execFile } = require("node:child_process");
const path = require("node:path");

const top = path.resolve(__dirname, "..");
const modules = path.join(top, "node_modules");

/** Keeps the minimiser away: the file reaches dist byte for byte. */
const unmodified = { minimized: true };
const copy = (from, to) => ({ from: path.join(modules, from), to: path.posix.join("engine", to), info: unmodified });

const copies = [
  copy("@odoo/owl/dist/owl.iife.min.js", "owl.iife.min.js"),
  copy("@odoo/owl/LICENSE", "LICENSE.owl.txt"),
  copy("@odoo/o-spreadsheet/dist/o_spreadsheet.min.iife.js", "o_spreadsheet.min.iife.js"),
  copy("@odoo/o-spreadsheet/dist/o_spreadsheet.css", "o_spreadsheet.css"),
  copy("@odoo/o-spreadsheet/LICENSE", "LICENSE.o-spreadsheet.txt"),
  copy("chart.js/dist/chart.umd.min.js", "chart.umd.min.js"),
  copy("chart.js/LICENSE.md", "LICENSE.chart.txt"),
  copy("luxon/build/global/luxon.min.js", "luxon.min.js"),
  copy("luxon/LICENSE.md", "LICENSE.luxon.txt"),
  copy("chartjs-adapter-luxon/dist/chartjs-adapter-luxon.umd.min.js", "chartjs-adapter-luxon.umd.min.js"),
  copy("chartjs-adapter-luxon/LICENSE.md", "LICENSE.chartjs-adapter-luxon.txt"),
  copy("bootstrap/dist/css/bootstrap.min.css", "bootstrap.min.css"),
  copy("bootstrap/LICENSE", "LICENSE.bootstrap.txt"),
  copy("font-awesome/css/font-awesome.min.css", "font-awesome/css/font-awesome.min.css"),
  copy("font-awesome/fonts/fontawesome-webfont.woff2", "font-awesome/fonts/fontawesome-webfont.woff2"),
  copy("font-awesome/README.md", "font-awesome/README.md"), // states its licences: OFL 1.1 (font), MIT (style sheet)
  { from: path.join(top, "src/bench/bench.css"), to: "bench.css" },
  { from: path.join(top, "src/pane/pane.css"), to: "pane.css" },
  { from: path.join(top, "src/chart/chart.css"), to: "chart.css" },
];

/** The compiled templates as text; made in a process of its own because their compiler changes globals. */
function engineTemplates() {
  return new Promise((resolve, reject) => {
    execFile(process.execPath, [path.join(__dirname, "engine-templates.mjs")], { maxBuffer: 64 * 1024 * 1024 }, (error, stdout) => (error ? reject(error) : resolve(stdout)));
  });
}

module.exports = {
  /** Scripts for the page. */
  entry: { bench: "./src/bench/main.ts" },
  /** Scripts for Node. */
  nodeEntry: { "bench-server": "./src/bench/server/main.ts" },
  /** Options for html-webpack-plugin. */
  pages: [{ filename: "index.html", template: "./src/bench/index.html", chunks: ["bench"] }],
  /** Files made at build time. */
  texts: [{ name: "engine/templates.js", make: engineTemplates }],
  copies,
};
