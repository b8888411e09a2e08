package dev.couplet.lower;

/**
 * How heavy a rule weighs in the form, and why that suffices.
 *
 * @param rule the rule's name, or words that name a choice's code
 * @param form how the rule became a penalty
 * @param value what its penalty is multiplied by; 0 if it needs no penalty
 * @param reason why this is enough, in words
 */
public record Weight(String rule, String form, double value, String reason) {}
