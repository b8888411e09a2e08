package dev.couplet.anneal;

/**
 * What every draw by replica exchange does.
 *
 * @param inverse the inverse temperatures of the rungs, the coldest first
 * @param ladders how many ladders a draw has: two if clusters are traded between them
 * @param sweeps how many sweeps each draw makes
 * @param finish how it ends
 */
@SuppressWarnings("ArrayRecordComponent") // Passed from one step to the next, never written to.
record LadderPlan(double[] inverse, int ladders, Sweeps sweeps, Finish finish) {}
