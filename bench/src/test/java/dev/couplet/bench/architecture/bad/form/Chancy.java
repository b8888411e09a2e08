package dev.couplet.bench.architecture.bad.form;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Random;
import java.util.concurrent.ThreadLocalRandom;

/** Random numbers from five places without a seed of the caller's. */
class Chancy {
  double draw() {
    Collections.shuffle(new ArrayList<>());
    return new Random().nextDouble()
        + ThreadLocalRandom.current().nextInt()
        + Math.random()
        + StrictMath.random();
  }
}
