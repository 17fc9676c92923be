// How long lines take, alone and with their derivatives: every fit is made of these calls. Systems of n distinct protons, 1 to 8 ppm
// at 500 MHz, each coupled to the next three, as many groups as protons. Prints size, n of runs, minimum, mean ± deviation, bytes.
import { createRandomStream } from '@spinassay/numerics';
import {
  compileSpinTopology,
  computeTransitionsInto,
  computeTransitionsWithDerivativesInto,
  createTransitionDerivatives,
  createTransitionTable,
  createTransitionWorkspace,
} from '@spinassay/spin-dynamics';

const PROTON_COUNTS = [4, 5, 6, 8, 10];
/** Calls of the first 0.3 s are left out: the compiler is still at work. */
const WARM_UP_MS = 300;
const MEASURE_MS = 1_500;
const RUNS_MIN = 3;
/** Short calls are timed in bundles of about this length, so that the clock's own cost does not show. */
const BUNDLE_MS = 2;

console.log(
  'protons  parameters  lines  what              runs   minimum      mean ± deviation (us)      buffers (bytes)',
);
for (const protonCount of PROTON_COUNTS) {
  const system = drawSystem(protonCount);
  const workspace = createTransitionWorkspace(system.compiled);
  const table = createTransitionTable(system.compiled);
  const derivatives = createTransitionDerivatives(system.compiled);
  const { compiled, shiftsHz, couplingsHz } = system;
  report(system, table, 'lines', workspace, () =>
    computeTransitionsInto(compiled, shiftsHz, couplingsHz, workspace, table),
  );
  report(system, derivatives, 'with derivatives', workspace, () =>
    computeTransitionsWithDerivativesInto(compiled, shiftsHz, couplingsHz, workspace, derivatives),
  );
}

function drawSystem(protonCount) {
  const random = createRandomStream({ seed: 1n, purpose: 'transitions bench', member: protonCount });
  const spins = Array.from({ length: protonCount }, (_, s) => ({ protonCount: 1, groupIndex: s, shiftIndex: s }));
  const couplings = spins.flatMap((_, spinA) =>
    [1, 2, 3].flatMap((distance) =>
      spinA + distance < protonCount ? [{ spinA, spinB: spinA + distance, distance }] : [],
    ),
  );
  const compiled = compileSpinTopology({
    spins,
    groupCount: protonCount,
    shiftCount: protonCount,
    couplingCount: couplings.length,
    couplings: couplings.map(({ spinA, spinB }, couplingIndex) => ({ spinA, spinB, couplingIndex })),
  });
  const shiftsHz = Float64Array.from(spins, () => 500 * (1 + 7 * random.nextUniform()));
  // Vicinal first, smaller over more bonds: 2 to 12, -2 to 2, -1 to 1 Hz.
  const couplingsHz = Float64Array.from(couplings, ({ distance }) =>
    distance === 1 ? 2 + 10 * random.nextUniform() : (4 * random.nextUniform() - 2) / (distance - 1),
  );
  return { protonCount, compiled, shiftsHz, couplingsHz };
}

function report({ protonCount, compiled }, out, what, workspace, call) {
  const durations = timed(call);
  const mean = durations.reduce((sum, value) => sum + value, 0) / durations.length;
  const square = durations.reduce((sum, value) => sum + (value - mean) ** 2, 0) / Math.max(1, durations.length - 1);
  const bytes = bytesOf(workspace) + bytesOf(out);
  console.log(
    [
      String(protonCount).padStart(7),
      String(compiled.parameterCount).padStart(11),
      String(out.lineCount).padStart(6),
      ` ${what.padEnd(16)}`,
      String(durations.length).padStart(5),
      inMicroseconds(Math.min(...durations)).padStart(9),
      `${inMicroseconds(mean).padStart(9)} ± ${inMicroseconds(Math.sqrt(square))}`.padEnd(26),
      String(bytes).padStart(10),
    ].join(' '),
  );
}

/** Milliseconds a call, one value a bundle of calls. */
function timed(call) {
  const warmFrom = performance.now();
  let warmCount = 0;
  do {
    call();
    warmCount += 1;
  } while (performance.now() - warmFrom < WARM_UP_MS);
  const bundle = Math.max(1, Math.round((BUNDLE_MS * warmCount) / (performance.now() - warmFrom)));
  const durations = [];
  const from = performance.now();
  while (durations.length < RUNS_MIN || performance.now() - from < MEASURE_MS) {
    const startedAt = performance.now();
    for (let k = 0; k < bundle; k += 1) call();
    durations.push((performance.now() - startedAt) / bundle);
  }
  return durations;
}

function inMicroseconds(milliseconds) {
  return (1000 * milliseconds).toFixed(milliseconds < 0.1 ? 1 : 0);
}

function bytesOf(holder) {
  return Object.values(holder).reduce((sum, value) => {
    if (value instanceof Float64Array) return sum + value.byteLength;
    return typeof value === 'object' && value !== null ? sum + bytesOf(value) : sum;
  }, 0);
}
