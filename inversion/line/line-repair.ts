import { minimise, type LeastSquaresProblem } from '../fit/levenberg-marquardt';
import { tiedSlope, tiedValues, tieResiduals } from './lateral-ties';
import type { LineProblem, LineState } from './line-problem';

/** A neighbour whose model differs nowhere by more than this, in ln, has no other valley to offer. */
const OTHER_VALLEY = 0.3;
/** A model from a neighbour must lower the misfit of its sounding and ties by this share, and by this much, to be taken. */
const GAIN_SHARE = 0.01;
const GAIN = 0.1;
const STEPS = 30;

/** The fit of one node while its neighbours stand still: its own rows and those of its ties. */
function nodeProblem({ nodes, ties, layers }: LineProblem, state: LineState, s: number): LeastSquaresProblem {
  const { problem: own, expand, held } = nodes[s]!;
  const rows = 2 * layers - 1;
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const sides = [s - 1, s + 1].flatMap((o) =>
    nodes[o] ? [{ tie: ties[Math.min(o, s)]!, values: tiedValues(nodes[o].expand(state[o]!), layers) }] : [],
  );
  const addTies = (values: Float64Array, residual: Float64Array): number =>
    sides.reduce((sum, side, k) => {
      const at = own.residuals + k * rows;
      return sum + tieResiduals(side.values, values, layers, side.tie, residual.subarray(at, at + rows));
    }, 0);
  return {
    residuals: own.residuals + sides.length * rows,
    low: own.low,
    high: own.high,
    evaluate: (parameters, residual) =>
      own.evaluate(parameters, residual) + addTies(tiedValues(expand(parameters), layers), residual),
    linearise: (parameters, residual, jacobian) => {
      const chi2 = own.linearise(parameters, residual, jacobian);
      const earth = expand(parameters);
      const values = tiedValues(earth, layers);
      const slope = tiedSlope(earth, values, layers);
      sides.forEach(({ tie }, k) => {
        for (let i = 0; i < rows; i++) {
          const at = (own.residuals + k * rows + i) * free.length;
          const per = i < layers ? tie.perResistivity : tie.perDepth;
          free.forEach((j, column) => (jacobian[at + column] = j < rows ? per * slope(i, j) : 0));
        }
      });
      return chi2 + addTies(values, residual);
    },
  };
}

/**
 * Tries at each sounding the models of its neighbours, from first to last, and keeps those that lower the objective: a
 * sounding left in a valley of its own is drawn out of it. Null when none was kept.
 */
export function repairLine(line: LineProblem, state: LineState): LineState | null {
  const repaired = [...state];
  let kept = false;
  line.nodes.forEach((node, s) => {
    const earth = node.expand(repaired[s]!);
    const others = [s - 1, s + 1].flatMap((o) => (line.nodes[o] ? [line.nodes[o].expand(repaired[o]!)] : []));
    for (const other of others) {
      const far = earth
        .subarray(0, 2 * line.layers - 1)
        .some((value, j) => Math.abs(value - other[j]!) > OTHER_VALLEY);
      if (!far) continue;
      const local = nodeProblem(line, repaired, s);
      const before = local.evaluate(repaired[s]!, new Float64Array(local.residuals));
      const start = node.startFrom(other.subarray(0, 2 * line.layers - 1));
      const { parameters, chi2 } = minimise(local, start, { iterations: STEPS });
      if (!(chi2 < before - Math.max(GAIN, GAIN_SHARE * before))) continue;
      repaired[s] = parameters;
      kept = true;
    }
  });
  return kept ? repaired : null;
}
