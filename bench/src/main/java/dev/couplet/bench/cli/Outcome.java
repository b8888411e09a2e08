package dev.couplet.bench.cli;

import java.util.List;
import java.util.OptionalDouble;

/** What one method came to on one instance, as a row of a table. */
interface Outcome {
  /** The columns of a row. */
  List<String> COLUMNS =
      List.of(
          "instance",
          "n",
          "pairs",
          "method",
          "seed",
          "seconds",
          "value",
          "hit_seconds",
          "bound",
          "gap",
          "proof");

  /** The best value, in the instance's own sense and units; empty if every rule was not kept. */
  OptionalDouble value();

  /** Whether there is a value, and it reaches the target if there was one. */
  boolean reached();

  /** The row under {@link #COLUMNS}. */
  List<String> cells();
}
