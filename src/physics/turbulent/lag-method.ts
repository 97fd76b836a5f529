import type { TurbulentLayer, TurbulentMethod } from "./turbulent-method";

/** Least Reθ of the friction law: it has its pole at 10.5. */
const LEAST_REYNOLDS = 20;
/** Range of H̄: the fit of H1 is used from filled profiles to far beyond separation (H̄ about 3). */
const LEAST_SHAPE = 1.02;
const MOST_SHAPE = 8;
/** Temperature recovery factor of a turbulent layer of air, Pr^⅓. */
const RECOVERY = 0.89;
/** The relations hold γ = 1.4: 0.2 stands for (γ − 1)∕2 in them as printed. */
const HALF_GAMMA = 0.2;

/** cf on a plate at the same Reθ, and H̄ there. */
interface Plate {
  friction: number;
  shape: number;
}

const plate: Plate = { friction: 0, shape: 0 };

/**
 * The lag-entrainment method: momentum, entrainment and a rate equation for the entrainment coefficient, which remembers the shear stress
 * of the layer upstream; adiabatic wall; no secondary influences (curvature, convergence, turbulence of the stream).
 *
 * Source: J. E. Green, D. J. Weeks & J. W. F. Brooman, ARC R&M 3791 (1973), section 3 (equations from memory; held against measurements,
 * DNS and their own limits in the tests).
 */
export const lagMethod: TurbulentMethod = {
  name: "lag",
  unknowns: 3,
  layerAt(place, y, out) {
    const theta = y[0];
    const shape = y[1];
    const entrainment = y[2];
    const m2 = place.machSquare;
    const momentumReynolds = (place.speed * theta) / place.nu;
    if (!(theta > 0 && shape > LEAST_SHAPE && shape < MOST_SHAPE && momentumReynolds > LEAST_REYNOLDS && entrainment > LEAST_ENTRAINMENT)) return false;
    plateLayer(momentumReynolds, m2, plate);
    const above = shape / plate.shape - 0.4;
    if (!(above > 0)) return false;
    const ratio = 0.9 / above - 0.5;
    out.theta = theta;
    out.momentumReynolds = momentumReynolds;
    out.marchedShape = shape;
    out.shape = (shape + 1) * (1 + HALF_GAMMA * RECOVERY * m2) - 1;
    out.entrainShape = 3.15 + 1.72 / (shape - 1) - 0.01 * (shape - 1) ** 2;
    out.entrainSlope = -1.72 / (shape - 1) ** 2 - 0.02 * (shape - 1);
    out.friction = plate.friction * ratio;
    out.entrainment = entrainment;
    out.plateFriction = plate.friction;
    out.margin = ratio;
    return true;
  },
  entrainmentRate(place, layer) {
    const m2 = place.machSquare;
    const { theta, entrainment: ce, shape, entrainShape } = layer;
    const { plateFriction } = layer;
    const steady = equilibriumGradient(layer, m2);
    const equilibrium = entrainShape * (layer.friction / 2 - (shape + 1) * steady);
    const gradient = (theta * place.speedSlope) / place.speed;
    const gradientFactor = 1 + (0.075 * m2 * (1 + 0.2 * m2)) / (1 + 0.1 * m2);
    const factor = (0.02 * ce + ce * ce + (0.8 * plateFriction) / 3) / (0.01 + ce);
    const rootStress = rootOfStress(equilibrium, plateFriction, m2) - rootOfStress(ce, plateFriction, m2);
    return (factor / theta) * ((2.8 / (shape + entrainShape)) * rootStress + steady - gradient * gradientFactor);
  },
  // dM²∕dx of the isentropic edge is 2 M² (1 + 0.2 M²) (due∕dx)∕ue.
  shapeRate(place, layer, marchedRate) {
    const m2 = place.machSquare;
    const warm = HALF_GAMMA * RECOVERY;
    return (1 + warm * m2) * marchedRate + ((layer.marchedShape + 1) * warm * 2 * m2 * (1 + HALF_GAMMA * m2) * place.speedSlope) / place.speed;
  },
  marchedShape: (shape, m2) => (shape + 1) / (1 + HALF_GAMMA * RECOVERY * m2) - 1,
  plateShape(momentumReynolds, m2) {
    plateLayer(momentumReynolds, m2, plate);
    return (plate.shape + 1) * (1 + HALF_GAMMA * RECOVERY * m2) - 1;
  },
  equilibriumEntrainment: (place, layer) => layer.entrainShape * (layer.friction / 2 - (layer.shape + 1) * equilibriumGradient(layer, place.machSquare)),
};

/** √Cτ: the root of the largest shear stress over ρ ue². */
function rootOfStress(entrainment: number, plateFriction: number, m2: number): number {
  return Math.sqrt(Math.max((0.024 * entrainment + 1.2 * entrainment * entrainment + 0.32 * plateFriction) * (1 + 0.1 * m2), 0));
}

/** CE may fall below 0 in strong acceleration; at −0.01 the relations for the shear stress and the rate have their end. */
const LEAST_ENTRAINMENT = -0.009;

/** (θ∕ue)(due∕dx) at which a layer of this shape would stay as it is. */
function equilibriumGradient(layer: TurbulentLayer, m2: number): number {
  const { friction, marchedShape } = layer;
  return (1.25 / layer.shape) * (friction / 2 - ((marchedShape - 1) / (6.432 * marchedShape)) ** 2 / (1 + 0.04 * m2));
}

function plateLayer(momentumReynolds: number, m2: number, out: Plate): void {
  const fc = Math.sqrt(1 + HALF_GAMMA * m2);
  const fr = 1 + 0.056 * m2;
  out.friction = (0.01013 / (Math.log(fr * momentumReynolds) * Math.LOG10E - 1.02) - 0.00075) / fc;
  out.shape = 1 / (1 - 6.55 * Math.sqrt((out.friction / 2) * (1 + 0.04 * m2)));
}

