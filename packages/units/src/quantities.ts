/** A number that carries its unit in its type: swapped arguments do not compile. */
type Branded<Unit extends string> = number & { readonly unit: Unit };

export type Hertz = Branded<'Hz'>;
export type Megahertz = Branded<'MHz'>;
export type Seconds = Branded<'s'>;
export type PartsPerMillion = Branded<'ppm'>;
export type PerSecond = Branded<'1/s'>;
export type Radians = Branded<'rad'>;
export type Tesla = Branded<'T'>;
export type Celsius = Branded<'Cel'>;
export type MillimolesPerLitre = Branded<'mmol/L'>;

/** A value that no quantity can have. */
export class UnitError extends Error {
  override readonly name = 'UnitError';
}

function finite(value: number, what: string): number {
  if (!Number.isFinite(value)) throw new UnitError(`expected a finite number of ${what}, got ${value}`);
  return value;
}

/** A frequency or a coupling, Hz. Throws UnitError unless finite, like all of these. */
export function hertz(value: number): Hertz {
  return finite(value, 'hertz') as Hertz;
}

/** A spectrometer frequency, MHz; equally Hz per ppm. */
export function megahertz(value: number): Megahertz {
  return finite(value, 'megahertz') as Megahertz;
}

export function seconds(value: number): Seconds {
  return finite(value, 'seconds') as Seconds;
}

/** A chemical shift, ppm. */
export function partsPerMillion(value: number): PartsPerMillion {
  return finite(value, 'ppm') as PartsPerMillion;
}

/** A decay rate, 1/s. */
export function perSecond(value: number): PerSecond {
  return finite(value, '1/s') as PerSecond;
}

export function celsius(value: number): Celsius {
  return finite(value, 'degrees Celsius') as Celsius;
}

/** A phase or an angle, radians; never wrapped. */
export function radians(value: number): Radians {
  return finite(value, 'radians') as Radians;
}

/** A magnetic flux density, tesla. */
export function tesla(value: number): Tesla {
  return finite(value, 'tesla') as Tesla;
}

/** An amount concentration, mmol/L. An estimate may be negative, so none is refused for its sign. */
export function millimolesPerLitre(value: number): MillimolesPerLitre {
  return finite(value, 'mmol/L') as MillimolesPerLitre;
}
