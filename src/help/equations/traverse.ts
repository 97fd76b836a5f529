import type { Equation } from "./equation";

const DEFECT: Equation = { words: "Defect thickness", tex: "\\delta^* = \\int_0^\\delta \\left(1 - \\frac{\\rho u}{\\rho_e u_e}\\right) dy" };
const LOSS: Equation = { words: "Momentum loss", tex: "\\theta = \\int_0^\\delta \\frac{\\rho u}{\\rho_e u_e}\\left(1 - \\frac{u}{u_e}\\right) dy" };
const ENERGY: Equation = { words: "Energy loss", tex: "\\delta_3 = \\int_0^\\delta \\frac{\\rho u}{\\rho_e u_e}\\left(1 - \\frac{u^2}{u_e^2}\\right) dy" };
const MASS: Equation = { words: "Mass defect", tex: "m = \\int_0^\\delta (\\rho_e u_e - \\rho u)\\, dy" };

/** Edge, traverse and displacement. */
export const TRAVERSE: Readonly<Record<string, readonly Equation[]>> = {
  EDGE_SPEED: [{ words: "Constant density", tex: "u_e = U\\sqrt{1 - c_p}" }],
  DEFECT_THICKNESS: [DEFECT],
  MOMENTUM_LOSS: [LOSS],
  ENERGY_LOSS: [ENERGY],
  MASS_DEFECT: [MASS],
  SHAPE_FACTOR: [{ words: "Shape factors", tex: "H = \\frac{\\delta^*}{\\theta}, \\qquad H_{32} = \\frac{\\delta_3}{\\theta}, \\qquad H_1 = \\frac{\\delta - \\delta^*}{\\theta}" }],
  TRAVERSE_TABLE: [DEFECT, LOSS, ENERGY],
  WALL_BLOW_VELOCITY: [{ words: "Normal speed for the inviscid calculation", tex: "v_n = \\frac{dm}{dx} = \\frac{d(u_e \\delta^*)}{dx}" }],
};
