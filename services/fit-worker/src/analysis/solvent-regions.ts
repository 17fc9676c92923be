import type { Conditions } from '@spinassay/contract';
import type { PpmRange } from '@spinassay/spectrum-inference';
import { celsius, waterShift } from '@spinassay/units';

/**
 * Places of residual solvent signals, by the solvent's usual short name; everything else is the method's to exclude.
 *
 * Water in D2O or H2O follows the temperature; the other places are common knowledge, from memory, with 0.05 to 0.1 ppm of room.
 */
export function solventRegions(conditions: Conditions): PpmRange[] {
  switch (conditions.solvent?.trim().toUpperCase()) {
    case 'D2O':
    case 'H2O':
    case 'H2O+D2O': {
      const water = waterShift(celsius(conditions.temperatureCelsius ?? 25));
      return [{ lowPpm: water - WATER_ROOM_PPM, highPpm: water + WATER_ROOM_PPM }];
    }
    case 'CDCL3':
      return [{ lowPpm: 7.16, highPpm: 7.36 }];
    case 'DMSO':
    case 'DMSO-D6':
      return [
        { lowPpm: 2.4, highPpm: 2.6 },
        { lowPpm: 3.2, highPpm: 3.5 },
      ];
    default:
      return [];
  }
}

/** Salt, pH and the scale move water by less than this. */
const WATER_ROOM_PPM = 0.15;
