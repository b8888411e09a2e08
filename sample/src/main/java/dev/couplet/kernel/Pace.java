package dev.couplet.kernel;

import dev.couplet.sampling.Vigil;
import java.util.function.BooleanSupplier;
import java.util.function.LongPredicate;

/**
 * How a kernel finds out whether to go on: it tells the steps it has done, and every 2^16 of them
 * the watch over the run is asked. Belongs to one thread and one draw.
 *
 * <p>An elementary step is one attempted flip, one update of a neighbour, or one coefficient passed
 * over. A kernel tells its steps in portions of at most 2^16, so that the watch is asked at most
 * 2^17 steps apart, an eighth of what is promised.
 */
public final class Pace {
  /** The largest portion of steps that may be told at once. */
  public static final int PORTION = 1 << 16;

  private static final int LOOK = 1 << 16;

  // Linked with the class, since a pace is also made when time is up.
  @SuppressWarnings("UnnecessaryLambda")
  private static final BooleanSupplier NEVER = () -> false;

  @SuppressWarnings("UnnecessaryLambda")
  private static final LongPredicate NEVER_BEFORE = bytes -> false;

  private final BooleanSupplier over;
  private final LongPredicate overBefore;
  private long left = Long.MAX_VALUE;
  private long since;
  private boolean ended;

  /** A pace that asks the given question. */
  public Pace(BooleanSupplier over) {
    this(over, bytes -> over.getAsBoolean());
  }

  private Pace(BooleanSupplier over, LongPredicate overBefore) {
    this.over = over;
    this.overBefore = overBefore;
  }

  /** A pace for work of a run that is no draw: setting up, for one. */
  public static Pace of(Vigil vigil) {
    return new Pace(vigil::over, vigil::overBefore);
  }

  /** A pace that never ends. */
  public static Pace free() {
    return new Pace(NEVER, NEVER_BEFORE);
  }

  /** A pace for what is still to be done when a draw was told to end: about 2^19 steps. */
  public static Pace closing() {
    Pace pace = free();
    pace.left = Vigil.STEPS / 2;
    return pace;
  }

  /** Tells of steps done; whether the draw has to end. */
  public boolean after(long steps) {
    since += steps;
    left -= steps;
    ended = ended || left <= 0;
    return since < LOOK ? ended : look();
  }

  /** Asks at once whether the draw has to end. */
  public boolean look() {
    since = 0;
    ended = ended || over.getAsBoolean();
    return ended;
  }

  /** Asks whether the run ends before an array of so many bytes could be had. */
  public boolean lookBefore(long bytes) {
    since = 0;
    ended = ended || overBefore.test(bytes);
    return ended;
  }

  /** Whether the draw was told to end. */
  public boolean ended() {
    return ended;
  }
}
