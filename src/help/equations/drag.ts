import type { Equation } from "./equation";

export const DRAG: Readonly<Record<string, readonly Equation[]>> = {
  FRICTION_DRAG: [{ words: "Friction drag of one side", tex: "c_d = \\frac{1}{c}\\int c_f \\left(\\frac{u_e}{U}\\right)^2 dx" }],
  WAKE_DRAG: [
    { words: "Constant density (Squire and Young)", tex: "c_d = \\frac{2\\theta}{c}\\left(\\frac{u_e}{U}\\right)^{(H + 5)/2}" },
    { words: "With a Mach number", tex: "c_d = \\frac{2\\theta}{c}\\,\\frac{\\rho_e}{\\rho_\\infty}\\left(\\frac{u_e}{U}\\right)^{(H + 1 + 0.4 M_\\infty^2)/2 + 2}" },
  ],
  RAKE_DRAG: [
    { words: "Jones, g being the total-pressure coefficient", tex: "c_d = \\frac{2}{c}\\int \\sqrt{g - c_p}\\,\\left(1 - \\sqrt{g}\\right) dy" },
    { words: "Betz", tex: "c_d = \\frac{1}{c}\\int (1 - g)\\,dy + \\frac{1}{c}\\int \\left(\\sqrt{1 - c_p} - \\sqrt{g - c_p}\\right)\\left(\\sqrt{1 - c_p} + \\sqrt{g - c_p} - 2\\right) dy" },
  ],
};
