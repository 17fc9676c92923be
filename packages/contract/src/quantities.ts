import { z } from 'zod';

/** Proton chemical shift in ppm. The bounds hold every diamagnetic proton and most paramagnetic ones. */
export const shiftPpmSchema = z.number().min(-50).max(50).describe('Chemical shift, ppm.');

/** Scalar coupling in Hz, with its sign. */
export const couplingHzSchema = z.number().min(-500).max(500).describe('Scalar coupling, Hz, with its sign.');

/** A share between 0 and 1. */
export const fractionSchema = z.number().min(0).max(1);

/** A standard deviation or standard uncertainty: zero is a claim nobody can make. */
export const positiveSchema = z.number().positive();

/** Text that a person reads; never interpreted. */
export const labelSchema = z.string().min(1).max(200);

/** One citation or remark of where a value comes from. */
export const sourceSchema = z.string().min(1).max(1_000).describe('Where the value comes from.');

/** The scales of 0 ppm that are told apart. */
export const shiftScaleSchema = z
  .enum(['DSS', 'TSP', 'TMS'])
  .meta({ id: 'ShiftScale', description: 'The substance whose main singlet defines 0 ppm.' });
