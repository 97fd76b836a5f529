import { brentRoot } from "../../numerics/brent-root";
import type { HeadShape } from "./head-shape";
import { HEAD_SHAPE, headEntrainment, headShape, ludwiegTillmann } from "./head-shape";
import type { TurbulentMethod } from "./turbulent-method";

/** Head's range of H at separation is 1.8 to 2.4 (ARC R&M 3152); the march ends at the upper end, where the relations still hold. */
export const HEAD_SEPARATION = 2.4;
/** The lower end, from which a layer is said to be near separation. */
export const HEAD_NEAR_SEPARATION = 1.8;
/** Plate layers have H between these at any Reθ from 20 to 1e9. */
const PLATE_LEAST = 1.1201;
const PLATE_MOST = 2.3;

const pair: HeadShape = { entrainShape: 0, slope: 0 };

/**
 * Head's entrainment method with the friction law of Ludwieg and Tillmann: constant density, no memory.
 *
 * Source: M. R. Head, ARC R&M 3152 (1958); relations: head-shape.ts.
 */
export const entrainmentMethod: TurbulentMethod = {
  name: "entrainment",
  unknowns: 2,
  layerAt(place, y, out) {
    const theta = y[0];
    const shape = y[1];
    if (!(theta > 0 && shape > HEAD_SHAPE.least && shape < HEAD_SHAPE.most && place.speed > 0)) return false;
    headShape(shape, pair);
    out.theta = theta;
    out.momentumReynolds = (place.speed * theta) / place.nu;
    out.shape = shape;
    out.marchedShape = shape;
    out.entrainShape = pair.entrainShape;
    out.entrainSlope = pair.slope;
    out.friction = ludwiegTillmann(shape, out.momentumReynolds);
    out.entrainment = headEntrainment(pair.entrainShape);
    out.margin = HEAD_SEPARATION - shape;
    return true;
  },
  entrainmentRate: () => 0,
  shapeRate: (_place, _layer, marchedRate) => marchedRate,
  marchedShape: (shape) => shape,
  // A plate layer of slowly changing H takes in as much as its growth asks: CE = H1 cf∕2.
  plateShape(momentumReynolds) {
    const found = brentRoot(
      (shape) => {
        headShape(shape, pair);
        return headEntrainment(pair.entrainShape) - (pair.entrainShape * ludwiegTillmann(shape, momentumReynolds)) / 2;
      },
      PLATE_LEAST,
      PLATE_MOST,
      1e-10,
    );
    return found.ok ? found.x : NaN;
  },
  equilibriumEntrainment: (_place, layer) => layer.entrainment,
};
