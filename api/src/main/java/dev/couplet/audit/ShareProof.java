package dev.couplet.audit;

/**
 * What is known of a share of a penalty, over all patterns of its bits with the auxiliary ones at
 * their best: {@code kept} wherever its parts are kept, {@code kept + least} or more under every
 * other plan, and {@code kept + lowest} or more everywhere.
 *
 * @param least above 0; infinite if every plan keeps the parts
 * @param lowest at most 0; below it only where a code that is no plain one is broken
 * @param how it is known, in words
 */
record ShareProof(double kept, double least, double lowest, String how) {}
