import { formatNumber } from "../writing/format-number";

/** The words by which a layer's note tells its onset; LAYER_SUMMARY finds the station in them again. */
export function onsetWords(how: string, x: number, momentumReynolds: number): string {
  const thickness = momentumReynolds > 0 ? `, Re θ = ${formatNumber(momentumReynolds)}` : "";
  return `onset (${how}) at x = ${formatNumber(x)}${thickness}`;
}

const ONSET = /onset \(([^)]*)\) at x = (-?[\d.eE+-]+\d)/;
const SEPARATION = /(laminar|turbulent) separation at x = (-?[\d.eE+-]+\d)/g;
const REATTACHMENT = /reattaches at x = (-?[\d.eE+-]+\d)/;

/** Onset, separations and reattachment told in a note. */
export function readOnsetWords(note: string): { onset?: { how: string; x: number }; separation: { kind: string; x: number }[]; reattachment?: number } {
  const onset = ONSET.exec(note);
  const reattached = REATTACHMENT.exec(note);
  return {
    onset: onset === null ? undefined : { how: onset[1]!, x: Number(onset[2]) },
    separation: Array.from(note.matchAll(SEPARATION), (m) => ({ kind: m[1]!, x: Number(m[2]) })),
    reattachment: reattached === null ? undefined : Number(reattached[1]),
  };
}
