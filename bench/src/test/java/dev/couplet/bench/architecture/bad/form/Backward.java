package dev.couplet.bench.architecture.bad.form;

import dev.couplet.bench.architecture.bad.sampling.Forward;

/** Against the arrow, and so part of a cycle. */
public class Backward {
  Forward forward = new Forward();
}
