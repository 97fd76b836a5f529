const path = require("node:path");

/** @type {import('jest').Config} */
module.exports = {
  rootDir: path.resolve(__dirname, ".."),
  testEnvironment: "node",
  roots: ["<rootDir>/test"],
  testMatch: ["**/*.test.ts"],
  testPathIgnorePatterns: ["/node_modules/", "/test/browser/"],
  transform: {
    "^.+\\.(ts|m?js)$": ["@swc/jest", { jsc: { target: "es2022", parser: { syntax: "typescript" } }, module: { type: "commonjs" } }],
  },
  // Packages that ship ES modules only are compiled like our own files.
  transformIgnorePatterns: ["/node_modules/(?!(d3-[a-z-]+|internmap|@borgar/fx|@formulajs/formulajs)/)"],
  cacheDirectory: "<rootDir>/.cache/jest",
  maxWorkers: 2,
};
