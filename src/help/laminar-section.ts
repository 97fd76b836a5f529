import { laminarComparison } from "./generated/laminar-comparison";

/** Help on the choice between the laminar marches: when to take which, and their errors on four reference flows. */
export function laminarSection(): string {
  const rows = laminarComparison
    .map((r) => `<tr><td>${r.flow}</td><td><a href="#${r.method}">${r.method}</a></td><td>${r.momentumLoss}</td><td>${r.shape}</td><td>${r.friction}</td><td>${signed(r.separation)}</td></tr>`)
    .join("");
  return `<section id="laminar-methods">
<h2>Which laminar march?</h2>
<table><thead><tr><th scope="col">march</th><th scope="col">take it for</th><th scope="col">needs</th><th scope="col">leaves out</th></tr></thead><tbody>
<tr><td>THWAITES_MARCH</td><td>first look, long columns, hand checks</td><td>x, ue, nu</td><td>flow through the wall; wall friction near separation is poor</td></tr>
<tr><td>ENERGY_MARCH</td><td>daily work; suction and blowing</td><td>x, ue, nu, perhaps wall velocity</td><td>H within 2.5 %, cf within 6 %</td></tr>
<tr><td>FIELD_MARCH</td><td>the referee, profiles (FIELD_PROFILE), strong suction or blowing</td><td>x, ue, nu, perhaps wall velocity</td><td>nothing within the boundary-layer equations</td></tr>
</tbody></table>
<h3>Errors against full solutions, per cent</h3>
<p>Largest error of θ, H and cf up to nine tenths of the way to separation, and the error of the separation station. Reference: independent solutions of the
boundary-layer equations (finite differences, extrapolated). The table is written by the tests.</p>
<table><thead><tr><th scope="col">flow</th><th scope="col">march</th><th scope="col">θ</th><th scope="col">H</th><th scope="col">cf</th><th scope="col">separation station</th></tr></thead><tbody>${rows}</tbody></table>
</section>`;
}

function signed(value: number): string {
  return value < 0 ? `−${-value}` : `+${value}`;
}
