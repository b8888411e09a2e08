package dev.couplet.bench.architecture.bad.sampling;

import dev.couplet.bench.architecture.bad.form.Backward;
import java.util.SplittableRandom;

/** Along the arrow; keeps every rule but that of cycles. */
public class Forward {
  Backward backward = new Backward();
  SplittableRandom random = new SplittableRandom(1);

  /** Serialisable as every enum. */
  enum Allowed {
    FIRST {
      @Override
      int number() {
        return 1;
      }
    };

    abstract int number();
  }
}
