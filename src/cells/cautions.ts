/** The cautions every host shows (design.md §7). */
export const CAUTIONS: readonly string[] = [
  "Results are preliminary-design estimates: check them against test or a higher-order method.",
  "Airworthiness, pressure equipment, ventilation safety and class rules are for licensed practice and local codes.",
];
