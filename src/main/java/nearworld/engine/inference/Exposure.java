package nearworld.engine.inference;

import java.util.Map;

/**
 * The survival factor exp(−R/E[R]·∫λ) of an observed window: R is a product over variables, so it is carried along while
 * states are run through, and only the exponential of it couples them.
 *
 * @param byFrailty ∫λ/E[R]·z^κ for each bin of the frailty
 * @param rates by variable: the factor of R for each of its states
 */
public record Exposure(double[] byFrailty, Map<Integer, double[]> rates) {}
