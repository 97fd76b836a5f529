import tseslint from "typescript-eslint";

// Rooms that must not know a host: no page, no Office, no clock, no chance, no process.
const hostGlobals = ["window", "document", "navigator", "localStorage", "fetch", "Office", "Excel", "CustomFunctions", "process", "require", "Date", "performance", "setTimeout"];

export default tseslint.config(
  { ignores: ["dist/", "node_modules/", ".cache/", "test/output/", "test/references/", "**/*.cjs", "webpack.config.js"] },
  ...tseslint.configs.recommended,
  {
    rules: {
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/consistent-type-imports": "error",
      eqeqeq: "error",
      "no-eval": "error",
      "no-implied-eval": "error",
      "no-new-func": "error",
      "no-restricted-syntax": ["error", { selector: "CatchClause > BlockStatement[body.length=0]", message: "An error is never swallowed." }],
    },
  },
  {
    files: ["src/numerics/**/*.ts", "src/physics/**/*.ts", "src/cells/**/*.ts"],
    rules: {
      "no-restricted-globals": ["error", ...hostGlobals],
      "no-restricted-properties": ["error", { object: "Math", property: "random", message: "Results must repeat." }],
    },
  },
  {
    // Cell functions are declared with `any` so that our own reader, not the host, judges what arrives.
    files: ["src/cells/**/*.ts"],
    rules: { "@typescript-eslint/no-explicit-any": "off" },
  },
);
