/** One equation of a help page. */
export interface Equation {
  /** What it says, in words. */
  readonly words: string;
  /** In TeX; made into MathML when the page is built. */
  readonly tex: string;
}

/** Momentum integral of a plane layer, constant density; von Kármán 1921. */
export const MOMENTUM: Equation = { words: "Momentum", tex: "\\frac{d\\theta}{dx} = \\frac{c_f}{2} - (H + 2)\\,\\frac{\\theta}{u_e}\\frac{du_e}{dx}" };
