/** Shape factors between which the relation is fitted: sink flow and separating similar layer (3.9 just short of it). */
export const ENERGY_SHAPE_RANGE = { least: 2.07, most: 3.9 } as const;

/**
 * Energy shape factor H32 = δ3∕θ of a laminar layer with shape factor H = δ*∕θ.
 *
 * A cubic in 1∕H fitted here to 27 Falkner–Skan layers from sink flow (H = 2.07) to almost separating (H = 3.90), solved by collocation
 * to 1e-9; largest difference 0.013 %. Layers that are not similar leave the relation by up to 2 % close to separation.
 *
 * Source: Falkner & Skan 1931 (the layers); the fit is our own.
 */
export function energyShape(shape: number): number {
  const s = 1 / shape;
  return 1.75252937 + s * (-2.18844979 + s * (5.84204536 - s * 3.57655937));
}
