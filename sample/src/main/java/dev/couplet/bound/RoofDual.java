package dev.couplet.bound;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;

/**
 * The roof dual of a form: the best bound of all linear ones, with the bits it fixes (Hammer,
 * Hansen and Simeone, Roof duality, complementation and persistency in quadratic 0-1 optimization,
 * 1984).
 *
 * <p>Found by one maximum flow on 2n + 2 nodes with whole-number capacities, so that the flow is
 * exact. Time O(n^2 m) at worst, near linear on sparse forms; memory some 100 bytes a pair. A run
 * that is cut short still gives a bound, but fixes nothing. The effort's draws and sweeps do not
 * matter. Immutable and thread-safe.
 */
public final class RoofDual implements Bound {
  private static final RoofDual STANDARD = new RoofDual();

  /** With more pairs than this the network is not built when nothing is left of the run. */
  private static final int SMALL = 1 << 16;

  private RoofDual() {}

  /** The roof dual. */
  public static RoofDual standard() {
    return STANDARD;
  }

  @Override
  public double below(Qubo form, Run run) {
    return roof(form, run).bound();
  }

  /** The bound with the bits that it fixes. */
  public Roof roof(Qubo form, Run run) {
    return roof(form, run.begin());
  }

  /** The bound with the bits that it fixes, as a stage of a run that has begun. */
  public Roof roof(Qubo form, Vigil vigil) {
    ScaledForm scaled = new ScaledForm(form);
    if (form.pairs() > SMALL && vigil.over()) {
      return Roof.unknown(form.size(), scaled.bound(scaled.lowest()));
    }
    Implications network = new Implications(scaled);
    boolean done = !vigil.over() && network.maximise(vigil);
    // Rounded up: twice a whole number is at least the odd number below it plus one.
    double bound = scaled.bound(-Math.floorDiv(-network.twiceBound(), 2));
    return done ? Roof.of(network, bound, scaled.slack()) : Roof.unknown(form.size(), bound);
  }
}
