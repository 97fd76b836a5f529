import { MOMENTUM, type Equation } from "./equation";

const ENTRAINMENT: Equation = { words: "Entrainment", tex: "\\frac{1}{u_e}\\frac{d(u_e\\,\\theta H_1)}{dx} = C_E" };

export const TURBULENT: Readonly<Record<string, readonly Equation[]>> = {
  ENTRAINMENT_MARCH: [
    MOMENTUM,
    ENTRAINMENT,
    { words: "Head's curve", tex: "C_E = 0.0306\\,(H_1 - 3)^{-0.6169}" },
    { words: "Wall friction (Ludwieg and Tillmann)", tex: "c_f = 0.246 \\cdot 10^{-0.678 H}\\,Re_\\theta^{-0.268}" },
  ],
  LAG_MARCH: [
    { words: "Momentum", tex: "\\frac{d\\theta}{dx} = \\frac{c_f}{2} - (H + 2 - M_e^2)\\,\\frac{\\theta}{u_e}\\frac{du_e}{dx}" },
    { words: "Shape, marched without density", tex: "\\theta\\frac{d\\bar{H}}{dx} = \\frac{d\\bar{H}}{dH_1}\\left[C_E - H_1\\left(\\frac{c_f}{2} - (H + 1)\\frac{\\theta}{u_e}\\frac{du_e}{dx}\\right)\\right]" },
    { words: "Rate of the entrainment coefficient (constant density)", tex: "\\theta\\frac{dC_E}{dx} = F\\left[\\frac{2.8}{H + H_1}\\left(\\sqrt{C_{\\tau,EQ}} - \\sqrt{C_\\tau}\\right) + \\left(\\frac{\\theta}{u_e}\\frac{du_e}{dx}\\right)_{EQ} - \\frac{\\theta}{u_e}\\frac{du_e}{dx}\\right]" },
    { words: "Wall friction of a plate layer, and of this one", tex: "c_{f0} = \\frac{0.01013}{\\log_{10} Re_\\theta - 1.02} - 0.00075, \\qquad \\left(\\frac{c_f}{c_{f0}} + 0.5\\right)\\left(\\frac{\\bar{H}}{\\bar{H}_0} - 0.4\\right) = 0.9" },
  ],
  LAYER_MARCH: [
    MOMENTUM,
    { words: "Onset by Michel", tex: "Re_\\theta = 2.9\\,Re_x^{0.4}" },
    { words: "Intermittency of a transition zone (Dhawan and Narasimha)", tex: "\\gamma = 1 - e^{-0.412\\,\\xi^2}, \\qquad \\xi = \\frac{x - x_t}{\\ell}, \\qquad \\frac{u_e \\ell}{\\nu} = 5\\,Re_{x_t}^{0.8}" },
    { words: "Bubble (Horton): length of the laminar part, and reattachment", tex: "\\frac{u_e \\ell_1}{\\nu} = 4\\cdot 10^4, \\qquad \\left(\\frac{\\theta}{u_e}\\frac{du_e}{dx}\\right)_R = -0.0082" },
  ],
  SEPARATION_MARGIN: [
    { words: "Canonical pressure", tex: "\\bar{C}_p = \\frac{c_p - c_{p,min}}{1 - c_{p,min}}" },
    { words: "Laminar separation", tex: "\\bar{x}^2\\,\\bar{C}_p\\left(\\frac{d\\bar{C}_p}{dx}\\right)^2 = 0.0104" },
    { words: "Turbulent separation; 0.35 where the pressure curves downward", tex: "\\bar{C}_p\\left(\\bar{x}\\frac{d\\bar{C}_p}{dx}\\right)^{1/2} = 0.39\\,(10^{-6} Re)^{1/10}" },
  ],
};
