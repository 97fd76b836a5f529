import { MOMENTUM, type Equation } from "./equation";

const SIMILAR: Equation = { words: "Similar layers (Falkner and Skan)", tex: "f''' + f f'' + \\beta\\,(1 - f'^2) = 0, \\qquad \\beta = \\frac{2m}{m + 1}" };
const PRANDTL: Equation = { words: "Layer equations", tex: "u\\frac{\\partial u}{\\partial x} + v\\frac{\\partial u}{\\partial y} = u_e\\frac{du_e}{dx} + \\nu\\frac{\\partial^2 u}{\\partial y^2}, \\qquad \\frac{\\partial u}{\\partial x} + \\frac{\\partial v}{\\partial y} = 0" };

export const LAMINAR: Readonly<Record<string, readonly Equation[]>> = {
  SIMILAR_LAYER: [SIMILAR],
  SIMILAR_PROFILE: [SIMILAR],
  THWAITES_MARCH: [
    { words: "Growth of the momentum loss", tex: "\\theta^2 = \\frac{0.45\\,\\nu}{u_e^6}\\int_0^x u_e^5\\,dx" },
    { words: "Gradient, on which H and the wall shear hang; separation at −0.09", tex: "\\lambda = \\frac{\\theta^2}{\\nu}\\frac{du_e}{dx}" },
  ],
  ENERGY_MARCH: [
    MOMENTUM,
    { words: "Kinetic energy, D being the dissipation", tex: "\\frac{1}{u_e^3}\\frac{d(u_e^3 \\delta_3)}{dx} = \\frac{2D}{\\rho u_e^3}" },
  ],
  FIELD_MARCH: [PRANDTL, { words: "Turbulent part: eddy viscosity of the inner and the outer layer", tex: "\\nu_t = \\left[0.40\\,y\\,(1 - e^{-y/A})\\right]^2\\left|\\frac{\\partial u}{\\partial y}\\right|, \\qquad \\nu_t = \\alpha\\,u_e\\,\\delta^*" }],
  FIELD_PROFILE: [PRANDTL],
};
