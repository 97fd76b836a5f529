/** What an option's value may be. */
export type OptionKind =
  | { kind: "number"; positive?: boolean; notNegative?: boolean }
  | { kind: "fraction" }
  | { kind: "choice"; choices: readonly string[] }
  | { kind: "number or choice"; choices: readonly string[]; positive?: boolean }
  | { kind: "columns" };

/** The one list of option labels (design.md §3); a function accepts the labels it names. */
export const OPTION_VOCABULARY = {
  "start momentum loss": { kind: "number", notNegative: true },
  "start shape": { kind: "number or choice", choices: ["after onset"], positive: true },
  "start Re theta": { kind: "number", positive: true },
  "start entrainment": { kind: "number or choice", choices: ["equilibrium"] },
  onset: { kind: "number or choice", choices: ["free", "from start", "none"] },
  "onset criterion": { kind: "choice", choices: ["Michel"] },
  "trip momentum loss": { kind: "number", notNegative: true },
  "transition zone": { kind: "choice", choices: ["none", "Dhawan-Narasimha"] },
  "turbulence level": { kind: "fraction" },
  "critical amplification": { kind: "number", positive: true },
  "laminar method": { kind: "choice", choices: ["Thwaites", "energy", "field"] },
  "turbulent method": { kind: "choice", choices: ["entrainment", "lag", "field"] },
  "reference speed": { kind: "number", positive: true },
  "reference Mach": { kind: "number", notNegative: true },
  gamma: { kind: "number", positive: true },
  "edge fit": { kind: "choice", choices: ["spline", "monotone", "smooth"] },
  noise: { kind: "number or choice", choices: ["found"] },
  "after separation": { kind: "choice", choices: ["stop", "continue"] },
  // A field march has a grid where the integral methods have none: how fine, and whether to extrapolate from two of them.
  "grid refinement": { kind: "number", positive: true },
  Richardson: { kind: "choice", choices: ["no", "yes"] },
  "near wall": { kind: "choice", choices: ["fitted", "no-slip", "none"] },
  columns: { kind: "columns" },
} as const satisfies Record<string, OptionKind>;

export type OptionLabel = keyof typeof OPTION_VOCABULARY;
