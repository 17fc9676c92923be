import type { FieldDrift } from './faults/field-drift.ts';
import type { RadiationDamping } from './faults/radiation-damping.ts';
import type { ReceiverOffset } from './faults/receiver-offset.ts';
import type { ShimCopy } from './faults/shim.ts';
import type { UnknownLine } from './faults/unknown-line.ts';

/** What goes wrong in a measurement; each fault has its file in `faults/`. Absent: it does not happen. */
export interface SignalFaults {
  readonly unknownLines?: readonly UnknownLine[];
  readonly radiationDamping?: RadiationDamping;
  readonly shim?: readonly ShimCopy[];
  readonly fieldDrift?: FieldDrift;
  /** Shares of the rms signal by which the first samples are off. */
  readonly firstSampleErrors?: readonly number[];
  readonly receiverOffset?: ReceiverOffset;
  /** Full scale of the converter, counts; then all samples are whole numbers of the signal's unit. */
  readonly fullScaleCounts?: number;
}
