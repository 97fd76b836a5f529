import { turbulentComparison } from "./generated/turbulent-comparison";

/** Help on the choice between the turbulent marches: when to take which, and their differences from measured and computed layers. */
export function turbulentSection(): string {
  const rows = turbulentComparison
    .map((r) => `<tr><td>${r.flow}</td><td><a href="#${r.method}">${r.method}</a></td><td>${signed(r.momentumLoss)}</td><td>${signed(r.shape)}</td><td>${signed(r.friction)}</td></tr>`)
    .join("");
  return `<section id="turbulent-methods">
<h2>Which turbulent march?</h2>
<table><thead><tr><th scope="col">march</th><th scope="col">take it for</th><th scope="col">needs</th><th scope="col">leaves out</th></tr></thead><tbody>
<tr><td>LAYER_MARCH</td><td>the whole wall, laminar to the end, in one call</td><td>x, ue, nu; onset as an option</td><td>what its parts leave out</td></tr>
<tr><td>LAG_MARCH</td><td>daily work; changing gradients, high Reynolds numbers, subsonic Mach numbers</td><td>x, ue, nu, start θ (and H)</td><td>curvature, convergence, stream turbulence</td></tr>
<tr><td>ENTRAINMENT_MARCH</td><td>a second opinion, hand checks, mild gradients</td><td>x, ue, nu, start θ (and H)</td><td>history of the layer; friction law poor above Re θ 50 000</td></tr>
<tr><td>FIELD_MARCH with an onset</td><td>the referee, from the layer's beginning; some tenths of a second a call</td><td>x, ue, nu, onset</td><td>density, a start from a turbulent profile</td></tr>
<tr><td>SEPARATION_MARGIN</td><td>a pressure column alone, before any layer is marched</td><td>x, cp, reference speed, nu</td><td>everything but separation</td></tr>
</tbody></table>
<h3>Largest differences from measured and computed layers, per cent</h3>
<p>Plate: Wieghardt &amp; Tillmann (NACA TM 1314), 1.4 to 5 m, each march started with the measured θ and H. Rising adverse gradient: Samuel &amp; Joubert (J. Fluid Mech. 66, 1974)
to 3.04 m, wall friction by Clauser plots and floating element. Bubbles: computed without a model by Coleman, Rumsey &amp; Spalart (J. Fluid Mech. 847, 2018), case A to 1.7 and case C
to about 3 lengths of its computation box ahead of separation. FIELD_MARCH cannot start from a turbulent profile: a plate of the length that gives the same θ stands ahead of the flow.
Started with its own H, LAG_MARCH keeps cf of the plate within 2.5 %. None of the marches separates in the bubbles, whose given edge speed already holds the bubble's relief: friction at the
computed separation is still 0.0008 (LAG_MARCH) to 0.0015 (ENTRAINMENT_MARCH). The table is written by the tests.</p>
<table><thead><tr><th scope="col">flow</th><th scope="col">march</th><th scope="col">θ</th><th scope="col">H</th><th scope="col">cf</th></tr></thead><tbody>${rows}</tbody></table>
</section>`;
}

function signed(value: number): string {
  return value < 0 ? `−${-value}` : `+${value}`;
}
