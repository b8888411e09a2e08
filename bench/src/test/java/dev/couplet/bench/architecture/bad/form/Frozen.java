package dev.couplet.bench.architecture.bad.form;

import java.io.Serializable;

/** Serialisable, and neither an enum nor a throwable. */
class Frozen implements Serializable {
  /** Exempt. */
  static class Thrown extends RuntimeException {}
}
