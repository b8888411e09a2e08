package dev.couplet.solve;

/** What is proved about an answer: a fact of its own, apart from why the run ended. */
public enum Proof {
  /** Nothing beyond the bound. */
  NONE,
  /** The plan is feasible, and no feasible plan is better. */
  OPTIMAL,
  /** No plan keeps all required rules. */
  INFEASIBLE
}
