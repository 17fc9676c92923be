/** The ordinates of the small file below, written here by hand and nowhere computed. */
export const smallFid = {
  real: [1, 2, 3, 3, 2, 1, 0, -1, -2, -3, 40, -500, 0, 0, 7, 7],
  imaginary: [9, 8, 7, 6, 5, 4, 3, 2, 1, 0, -1, -2, -3, -4, -5, -6],
} as const;

/** A file of 16 points at 0.5 ms in plain numbers, in the layout that the standard gives for a FID. */
const smallFile = `##TITLE= small file
##JCAMP-DX= 6.0
##DATA TYPE= NMR FID
##DATA CLASS= NTUPLES
##.OBSERVE FREQUENCY= 500.13
##.OBSERVE NUCLEUS= ^1H
##.ACQUISITION MODE= SIMULTANEOUS
##NTUPLES= NMR FID
##VAR_NAME= TIME, FID/REAL, FID/IMAG, PAGE NUMBER
##SYMBOL= X, R, I, N
##VAR_TYPE= INDEPENDENT, DEPENDENT, DEPENDENT, PAGE
##VAR_FORM= AFFN, ASDF, ASDF, AFFN
##VAR_DIM= 16, 16, 16, 2
##UNITS= SECONDS, ARBITRARY UNITS, ARBITRARY UNITS,
##FIRST= 0, 1, 9, 1
##LAST= 0.0075, 7, -6, 2
##MIN= 0, -500, -6, 1
##MAX= 0.0075, 40, 9, 2
##FACTOR= 0.0005, 1, 1, 1
##PAGE= N=1
##DATA TABLE= (X++(R..R)), XYDATA
0 1 2 3 3 2 1 0 -1
8 -2 -3 40 -500 0 0 7 7
##PAGE= N=2
##DATA TABLE= (X++(I..I)), XYDATA
0 9 8 7 6 5 4 3 2
8 1 0 -1 -2 -3 -4 -5 -6
##END NTUPLES= NMR FID
##END=
`;

/** A piece of the small file, and what stands in its place. */
export type Replacement = readonly [piece: string, by: string];

/**
 * The small file with some of its text replaced, one exact piece after the other.
 *
 * @throws Error when a piece to be replaced is not in the file, so that no test passes by missing its place
 */
export function fidFile(...replacements: Replacement[]): string {
  return replacements.reduce((text, [piece, by]) => {
    if (!text.includes(piece)) throw new Error(`the small file does not hold "${piece}"`);
    return text.replace(piece, () => by);
  }, smallFile);
}
