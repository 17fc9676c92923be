import { type CompiledSector, compileSector } from './compiled-block.ts';
import { LINE_WEIGHT_MIN, PROTON_COUNT_MAX } from './conventions.ts';
import { checkTopology, connectedComponents, type SpinTopology, SystemTooLargeError } from './spin-topology.ts';

/** One connected component, ready to be evaluated at any shifts and couplings. */
export interface CompiledComponent {
  readonly protonCount: number;
  /** Shift parameter of each spin. */
  readonly shiftOfSpin: Int32Array;
  /** Coupling parameter and spins of each coupling term. */
  readonly couplingOfTerm: Int32Array;
  readonly spinAOfTerm: Int32Array;
  readonly spinBOfTerm: Int32Array;
  /** Groups of the topology that have spins here; operators are kept per place in this list. */
  readonly groups: Int32Array;
  /** Parameters (shifts first, then shiftCount + coupling) that move this component. */
  readonly parameters: Int32Array;
  readonly sectors: readonly CompiledSector[];
  readonly sizeMax: number;
}

export interface CompiledSpinTopology {
  readonly topology: SpinTopology;
  readonly components: readonly CompiledComponent[];
  readonly sizeMax: number;
  /** shiftCount + couplingCount. */
  readonly parameterCount: number;
  readonly lineWeightMin: number;
}

/**
 * Split a topology into components, sectors and blocks of total Iz.
 *
 * @param options lineWeightMin: lines below this share of one proton in every group are dropped
 * @throws SystemTooLargeError beyond 10 protons in one component; DimensionError, DomainError for a topology that makes no system
 * @source composite spins: Corio, Structure of High-Resolution NMR Spectra (1966) ch. 6 (from memory)
 */
export function compileSpinTopology(
  topology: SpinTopology,
  options: { readonly lineWeightMin?: number } = {},
): CompiledSpinTopology {
  checkTopology(topology);
  const components = connectedComponents(topology).map((spins) => compileComponent(topology, spins));
  return {
    topology,
    components,
    sizeMax: Math.max(...components.map((component) => component.sizeMax)),
    parameterCount: topology.shiftCount + topology.couplingCount,
    lineWeightMin: options.lineWeightMin ?? LINE_WEIGHT_MIN,
  };
}

function compileComponent(topology: SpinTopology, members: readonly number[]): CompiledComponent {
  const protonCount = members.reduce((sum, spin) => sum + topology.spins[spin].protonCount, 0);
  if (protonCount > PROTON_COUNT_MAX) throw new SystemTooLargeError(protonCount, PROTON_COUNT_MAX);
  const terms = topology.couplings.filter(({ spinA }) => members.includes(spinA));
  const groups = [...new Set(members.map((spin) => topology.spins[spin].groupIndex))];
  const shifts = members.map((spin) => topology.spins[spin].shiftIndex);
  const couplings = terms.map((term) => topology.shiftCount + term.couplingIndex);
  const spins = {
    groups: members.map((spin) => groups.indexOf(topology.spins[spin].groupIndex)),
    couplings: terms.map(({ spinA, spinB }, term) => ({ a: members.indexOf(spinA), b: members.indexOf(spinB), term })),
  };
  const sectors = sectorsOf(members.map((spin) => topology.spins[spin].protonCount)).map(
    ({ totalSpins, multiplicity }) => compileSector({ ...spins, totalSpins }, multiplicity),
  );
  return {
    protonCount,
    shiftOfSpin: Int32Array.from(shifts),
    couplingOfTerm: Int32Array.from(terms, (term) => term.couplingIndex),
    spinAOfTerm: Int32Array.from(spins.couplings, (term) => term.a),
    spinBOfTerm: Int32Array.from(spins.couplings, (term) => term.b),
    groups: Int32Array.from(groups),
    parameters: Int32Array.from([...new Set([...shifts, ...couplings])].sort((a, b) => a - b)),
    sectors,
    sizeMax: Math.max(...sectors.flatMap((sector) => sector.blocks.map((block) => block.size))),
  };
}

/** All combinations of total spins of the composite spins; S = n/2 - k occurs C(n, k) - C(n, k - 1) times. */
function sectorsOf(protonCounts: readonly number[]): { totalSpins: number[]; multiplicity: number }[] {
  let sectors: { totalSpins: number[]; multiplicity: number }[] = [{ totalSpins: [], multiplicity: 1 }];
  for (const count of protonCounts) {
    sectors = sectors.flatMap((sector) =>
      Array.from({ length: Math.floor(count / 2) + 1 }, (_, k) => ({
        totalSpins: [...sector.totalSpins, count / 2 - k],
        multiplicity: sector.multiplicity * (binomial(count, k) - binomial(count, k - 1)),
      })),
    );
  }
  return sectors;
}

function binomial(n: number, k: number): number {
  let value = k < 0 ? 0 : 1;
  for (let i = 1; i <= k; i += 1) value = (value * (n - k + i)) / i;
  return Math.round(value);
}
