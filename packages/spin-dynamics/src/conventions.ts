/**
 * Conventions of this room, stated once.
 *
 * - H / h = sum nu_i I_iz + sum J_ij I_i.I_j, all in Hz; isotropic liquid, high-temperature limit.
 * - The signal of group g is S_g(t) = Tr[I_g+(t) F-] = sum_l w_lg exp(2 pi i f_l t): a larger shift is a positive frequency.
 * - Line l joins states a (lower m) and b (upper m): f_l = E_b - E_a, w_lg = <a|I_g-|b><a|F-|b>, which may be negative.
 * - Weights are divided by 2^(N-1), N the protons of the component, so that a group's weights add up to its protons.
 * - F- is the lowering operator of the component; over the rest of the molecule it gives a factor that the division takes out.
 */

/** Most protons in one connected component that the exact engine takes (DESIGN section 4; larger ones come with clusters). */
export const PROTON_COUNT_MAX = 10;

/** Lines all of whose group weights are below this share of one proton are dropped: at most 3e-7 is lost (NUMERICS section 2). */
export const LINE_WEIGHT_MIN = 1e-6;
