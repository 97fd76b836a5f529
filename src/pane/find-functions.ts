import type { CatalogueEntry } from "../cells/catalogue-entry";

/** Symbols as they are typed on a keyboard without Greek letters. */
const SYMBOL_WORDS: Readonly<Record<string, string>> = {
  α: "alpha",
  β: "beta",
  γ: "gamma",
  δ: "delta",
  ε: "epsilon",
  η: "eta",
  θ: "theta",
  κ: "kappa",
  λ: "lambda",
  μ: "mu",
  ν: "nu",
  π: "pi",
  ρ: "rho",
  σ: "sigma",
  τ: "tau",
  φ: "phi",
  ψ: "psi",
  ω: "omega",
};

/** Where a word was found, best place first; the number is the place's weight. */
const WEIGHTS = { nameStart: 32, name: 16, words: 8, purpose: 6, family: 5, parameters: 3, gives: 3, sources: 2, limits: 1 } as const;

/**
 * The functions in which every word of the query occurs (name, purpose, further words, arguments, symbols, sources, limits), best
 * first; all of them, in the catalogue's order, for an empty query.
 */
export function findFunctions(catalogue: readonly CatalogueEntry[], query: string): readonly CatalogueEntry[] {
  const words = folded(query).split(/\s+/).filter((word) => word !== "");
  if (words.length === 0) return catalogue;
  const found: { entry: CatalogueEntry; weight: number }[] = [];
  for (const entry of catalogue) {
    const places = placesOf(entry);
    const weights = words.map((word) => weightOf(word, places));
    if (weights.every((weight) => weight > 0)) found.push({ entry, weight: weights.reduce((sum, weight) => sum + weight, 0) });
  }
  return found.sort((a, b) => b.weight - a.weight).map((f) => f.entry);
}

type Places = Readonly<Record<Exclude<keyof typeof WEIGHTS, "nameStart">, string>>;

function placesOf(entry: CatalogueEntry): Places {
  return {
    name: folded(entry.name),
    words: folded(entry.words.join(" ")),
    purpose: folded(entry.purpose),
    family: folded(entry.family),
    parameters: folded(entry.parameters.map((p) => `${p.name} ${p.description} ${p.unit}`).join(" ")),
    gives: folded(`${entry.gives} ${entry.resultUnit}`),
    sources: folded(entry.sources.join(" ")),
    limits: folded(entry.limits.join(" ")),
  };
}

function weightOf(word: string, places: Places): number {
  if (places.name.startsWith(word)) return WEIGHTS.nameStart;
  let weight = 0;
  for (const place of Object.keys(places) as (keyof Places)[]) if (places[place].includes(word)) weight = Math.max(weight, WEIGHTS[place]);
  return weight;
}

/** Lower case, accents off, Greek letters as words, `WALL.` and `=` off, underscores and brackets as spaces. */
function folded(text: string): string {
  return text
    .normalize("NFD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .replace(/[α-ω]/g, (letter) => SYMBOL_WORDS[letter === "ς" ? "σ" : letter] ?? letter)
    .replace(/^\s*=?\s*wall\./, "")
    .replace(/[_()=,;]/g, " ");
}
