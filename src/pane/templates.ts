import type { HostValue } from "./sheet-host";

/** A small sheet to begin with: rows of values, and formulas by their place in it (row, column from 0). */
export interface Template {
  readonly name: string;
  readonly words: string;
  readonly rows: readonly (readonly HostValue[])[];
  /** Formulas with references written relative to the template's first cell as {row,column}. */
  readonly formulas: readonly { readonly row: number; readonly column: number; readonly formula: string }[];
}

const line = (n: number, of: (i: number) => readonly HostValue[]) => Array.from({ length: n }, (_, i) => of(i));

/** Invented numbers throughout: they make the formulas compute at once and are there to be replaced. */
export const TEMPLATES: readonly Template[] = [
  {
    name: "Layer from an edge-speed column",
    words: "stations, edge speed and viscosity to the whole layer: onset, separation, wall friction",
    rows: [
      ["Invented numbers: put your own in their place"],
      ["kinematic viscosity ν [m²/s]", 0.000015],
      ["onset", "free"],
      ["turbulent method", "lag"],
      [],
      ["station x [m]", "edge speed ue [m/s]"],
      ...line(12, (i) => [Number((i * 0.1).toFixed(2)), Number((32 - 6 * (i / 11) ** 2).toFixed(2))]),
    ],
    formulas: [{ row: 5, column: 3, formula: "=WALL.LAYER_MARCH({6,0}:{17,0},{6,1}:{17,1},{1,1},{2,0}:{3,1})" }],
  },
  {
    name: "Traverse to thicknesses",
    words: "heights and speeds of a measured profile to δ*, θ, δ3, H and what the near-wall rule added",
    rows: [
      ["Invented numbers: put your own in their place"],
      ["kinematic viscosity ν [m²/s]", 0.000015],
      [],
      ["height y [m]", "speed u [m/s]"],
      ...line(14, (i) => {
        const y = [0.0005, 0.001, 0.0015, 0.002, 0.003, 0.004, 0.006, 0.008, 0.011, 0.014, 0.018, 0.022, 0.026, 0.03][i]!;
        return [y, Number((25 * Math.min(1, (y / 0.024) ** (1 / 7))).toFixed(2))];
      }),
    ],
    formulas: [{ row: 3, column: 3, formula: "=WALL.TRAVERSE_TABLE({4,0}:{17,0},{4,1}:{17,1},{1,1})" }],
  },
  {
    name: "Drag from a wake rake",
    words: "speeds across a wake to the profile drag by Jones and Betz, with its uncertainty",
    rows: [
      ["Invented numbers: put your own in their place"],
      ["chord [m]", 0.6],
      ["uncertainty of a reading", 0.005],
      ["uncertainty of a place [m]", 0.0002],
      [],
      ["place y [m]", "speed over stream speed"],
      ...line(17, (i) => [Number(((i - 8) * 0.005).toFixed(3)), Number((1 - 0.22 * Math.exp(-(((i - 8) / 2.2) ** 2))).toFixed(4))]),
    ],
    formulas: [{ row: 5, column: 3, formula: '=WALL.RAKE_DRAG({6,0}:{22,0},{6,1}:{22,1},"speed",,{1,1},{2,1},{3,1})' }],
  },
];
