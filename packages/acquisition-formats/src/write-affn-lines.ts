import { writeNumber } from './write-number.ts';

/** Longest line of a data table (JCAMP-DX 4.24, section on lines). */
const LINE_LENGTH_MAX = 80;

/** Lines of an (X++(Y..Y)) table in AFFN: the index of the first ordinate, then ordinates between blanks. */
export function writeAffnLines(ordinates: Float64Array): string[] {
  const lines: string[] = [];
  let line = '';
  for (const [index, ordinate] of ordinates.entries()) {
    const written = writeNumber(ordinate);
    if (line !== '' && line.length + 1 + written.length > LINE_LENGTH_MAX) {
      lines.push(line);
      line = '';
    }
    line += line === '' ? `${index} ${written}` : ` ${written}`;
  }
  if (line !== '') lines.push(line);
  return lines;
}
