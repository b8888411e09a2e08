package dev.couplet.bench.architecture.bad.form;

/** Prints in three ways. */
class Loud {
  void say() {
    System.out.println("out");
    System.err.println("err");
    new IllegalStateException("trace").printStackTrace();
  }
}
