/** Longest line of a data table (JCAMP-DX 4.24, section on lines). */
const LINE_LENGTH_MAX = 80;

const squeezed = { positive: '@ABCDEFGHI', negative: '@abcdefghi' };
const difference = { positive: '%JKLMNOPQR', negative: '%jklmnopqr' };
const repeat = ' STUVWXYZs';

type Digits = { readonly positive: string; readonly negative: string };

/**
 * Lines of an (X++(Y..Y)) table in DIF form with DUP counts. Each line begins with its abscissa (the index of
 * its first ordinate) and that ordinate; every line but the first repeats the last of the line above (Y-check),
 * and so does a line of its own at the end.
 *
 * @param ordinates whole numbers whose differences are exact
 * @source McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151
 */
export function writeDifdupLines(ordinates: Float64Array): string[] {
  const lines: string[] = [];
  const lastIndex = ordinates.length - 1;
  let index = 0;
  while (index < lastIndex) {
    const { line, nextIndex } = writeLine(ordinates, index);
    lines.push(line);
    index = nextIndex;
  }
  lines.push(lineStart(ordinates, lastIndex));
  return lines;
}

/** One line from the ordinate at `start`, which is written out, to the one at `nextIndex`. */
function writeLine(ordinates: Float64Array, start: number): { readonly line: string; readonly nextIndex: number } {
  let line = lineStart(ordinates, start);
  let index = start;
  while (index + 1 < ordinates.length) {
    const step = stepAfter(ordinates, index);
    let count = 1;
    while (index + count + 1 < ordinates.length && stepAfter(ordinates, index + count) === step) count += 1;
    const written = writeSteps(step, count);
    if (index > start && line.length + written.length > LINE_LENGTH_MAX) break;
    line += written;
    index += count;
  }
  return { line, nextIndex: index };
}

/** A step that occurs `count` times: spelled out, or with a repeat count where that is shorter. */
function writeSteps(step: number, count: number): string {
  const once = writeDigits(step, difference);
  const repeated = once + writeRepeat(count);
  return once.length * count <= repeated.length ? once.repeat(count) : repeated;
}

function lineStart(ordinates: Float64Array, index: number): string {
  return `${index}${writeDigits(ordinates[index] ?? 0, squeezed)}`;
}

function stepAfter(ordinates: Float64Array, index: number): number {
  return (ordinates[index + 1] ?? 0) - (ordinates[index] ?? 0);
}

/** The first digit and the sign are one letter, the other digits are plain. */
function writeDigits(value: number, { positive, negative }: Digits): string {
  const digits = String(Math.abs(value));
  const letters = value < 0 ? negative : positive;
  return letters.charAt(Number(digits.charAt(0))) + digits.slice(1);
}

function writeRepeat(count: number): string {
  const digits = String(count);
  return repeat.charAt(Number(digits.charAt(0))) + digits.slice(1);
}
