const fs = require("node:fs");
const path = require("node:path");
const CopyWebpackPlugin = require("copy-webpack-plugin");
const CustomFunctionsMetadataPlugin = require("custom-functions-metadata-plugin");
const HtmlWebpackPlugin = require("html-webpack-plugin");

// The comment reader is TypeScript like the rest; tsx lets this file use it.
const { require: requireTypeScript } = require("tsx/cjs/api");
const { cellFunctionFiles } = requireTypeScript("./src/record/cell-function-files.ts", __filename);
const { helpPage } = requireTypeScript("./src/help/help-page.ts", __filename);
const { functionPage } = requireTypeScript("./src/help/function-page.ts", __filename);
const { catalogue } = requireTypeScript("./src/cells/generated/catalogue.ts", __filename);
const benchPages = require("./.config/bench-pages.cjs");

/** Where the add-in is served from; the manifest, its icons and its help addresses follow it. */
const DEVELOPMENT_ORIGIN = "https://localhost:3000";
const origin = process.env.WALLSHEET_ORIGIN ?? DEVELOPMENT_ORIGIN;
const OFFICE_SCRIPT = "https://appsforoffice.microsoft.com/lib/1/hosted/office.js";

const functionFiles = cellFunctionFiles(__dirname).map((file) => "./" + file.path);

/** Adds to functions.json what its generator does not write. Must stand after the generator's plugin. */
class CompleteMetadata {
  apply(compiler) {
    // In `compilation`, not in processAssets: html-webpack-plugin's child compilation gets the asset too, and the two must not differ.
    compiler.hooks.compilation.tap("CompleteMetadata", (compilation) => {
      const asset = compilation.getAsset("functions.json");
      if (!asset) return; // the generator has reported its errors already
      const made = JSON.parse(asset.source.source().toString());
      for (const f of made.functions) f.helpUrl = `${origin}/help/${f.name}.html`;
      const complete = { allowErrorForDataTypeAny: true, ...made };
      compilation.updateAsset("functions.json", new compiler.webpack.sources.RawSource(JSON.stringify(complete, null, 2)));
    });
  }
}

/** Emits text made at build time. */
class EmitText {
  constructor(name, make) {
    Object.assign(this, { name, make });
  }
  apply(compiler) {
    compiler.hooks.thisCompilation.tap("EmitText", (compilation) => {
      const stage = compiler.webpack.Compilation.PROCESS_ASSETS_STAGE_ADDITIONAL;
      compilation.hooks.processAssets.tapPromise({ name: "EmitText", stage }, async () => {
        compilation.emitAsset(this.name, new compiler.webpack.sources.RawSource(await this.make()));
      });
    });
  }
}

const common = (name) => ({
  name,
  mode: "production",
  devtool: "source-map",
  output: { path: path.resolve(__dirname, "dist") },
  resolve: { extensions: [".ts", ".mts", ".js", ".mjs"] },
  module: { rules: [{ test: /\.m?ts$/, loader: "ts-loader", exclude: /node_modules/, options: { transpileOnly: true, compilerOptions: { noEmit: false } } }] },
  performance: { hints: false },
  stats: "errors-warnings",
});

const excel = {
  ...common("excel"),
  entry: { functions: ["./src/excel/show-sentences.ts", ...functionFiles], taskpane: "./src/excel/taskpane.ts" },
  plugins: [
    new CustomFunctionsMetadataPlugin({ output: "functions.json", input: functionFiles }),
    new CompleteMetadata(),
    new HtmlWebpackPlugin({
      filename: "taskpane.html",
      template: "./src/excel/taskpane.html",
      chunks: ["functions", "taskpane"],
      scriptLoading: "blocking",
      inject: "body",
      officeScript: OFFICE_SCRIPT,
    }),
    new EmitText("help.html", () => helpPage(catalogue)),
    ...catalogue.map((entry) => new EmitText(`help/${entry.name}.html`, () => functionPage(entry, catalogue))),
    new EmitText("manifest.xml", () => fs.readFileSync("manifest.xml", "utf8").replaceAll(DEVELOPMENT_ORIGIN, origin)),
    new CopyWebpackPlugin({ patterns: [{ from: "src/excel/icons/*.png", to: "icons/[name][ext]" }, "LICENSE"] }),
  ],
};

const bench = {
  ...common("bench"),
  entry: benchPages.entry,
  plugins: [
    ...benchPages.pages.map((page) => new HtmlWebpackPlugin({ scriptLoading: "blocking", inject: "body", ...page })),
    ...benchPages.texts.map(({ name, make }) => new EmitText(name, make)),
    new CopyWebpackPlugin({ patterns: benchPages.copies }),
  ],
};

const node = {
  ...common("node"),
  target: "node20",
  entry: { wallsheet: "./src/runner/main.ts", ...benchPages.nodeEntry },
  plugins: [new (require("webpack").BannerPlugin)({ banner: "#!/usr/bin/env node", raw: true, include: /^wallsheet\.js$/ })],
};

module.exports = [excel, bench, node];
