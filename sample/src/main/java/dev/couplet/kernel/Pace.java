package dev.couplet.kernel;

import dev.couplet.sampling.Vigil;
import java.util.function.BooleanSupplier;

/**
 * How a kernel finds out whether to go on: it tells the steps it has done, and every 2^16 of them
 * the watch over the run is asked. Belongs to one thread and one draw.
 *
 * <p>An elementary step is one attempted flip or one update of a neighbour. A kernel tells its
 * steps in portions of at most 2^19, so that the watch is asked at most 2^20 steps apart.
 */
public final class Pace {
  /** The largest portion of steps that may be told at once. */
  public static final int PORTION = 1 << 19;

  private static final int LOOK = 1 << 16;

  private final BooleanSupplier over;
  private long since;
  private boolean ended;

  /** A pace that asks the given question. */
  public Pace(BooleanSupplier over) {
    this.over = over;
  }

  /** A pace that never ends. */
  public static Pace free() {
    return new Pace(() -> false);
  }

  /** A pace for what is still to be done when a draw was told to end: about 2^20 steps. */
  public static Pace closing() {
    int[] looks = {Vigil.STEPS / LOOK};
    return new Pace(() -> --looks[0] <= 0);
  }

  /** Tells of steps done; whether the draw has to end. */
  public boolean after(long steps) {
    since += steps;
    return since < LOOK ? ended : look();
  }

  /** Asks at once whether the draw has to end. */
  public boolean look() {
    since = 0;
    ended = ended || over.getAsBoolean();
    return ended;
  }

  /** Whether the draw was told to end. */
  public boolean ended() {
    return ended;
  }
}
