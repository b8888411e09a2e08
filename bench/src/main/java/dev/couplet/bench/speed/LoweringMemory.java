package dev.couplet.bench.speed;

import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Model;
import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.lang.management.MemoryType;
import java.util.Locale;
import java.util.function.Consumer;

/**
 * How much memory lowering takes: {@code java -XX:+UseSerialGC -Xmn8m -cp
 * bench/target/couplet-bench.jar dev.couplet.bench.speed.LoweringMemory sparse 6000000}, the
 * workload and its number of terms.
 *
 * <p>The form is counted as 12 bytes a pair and 12 a bit. The peak is the highest use of all pools
 * of the heap while lowering, what could have been collected included, less what was in use when
 * the model was built: an upper bound of what lowering needs. Kept is what is left of it after a
 * collection: with the ledger, and of the form alone. With a small young generation little of the
 * peak is garbage.
 */
public final class LoweringMemory {
  private LoweringMemory() {}

  /** Prints a header and a row. */
  public static void main(String[] arguments) {
    if (arguments.length != 2) {
      throw new IllegalArgumentException("say the workload, sparse or dense, and how many terms");
    }
    Workload workload = Workload.valueOf(arguments[0].toUpperCase(Locale.ROOT));
    System.out.println(
        "workload\tbits\tpairs\tform_mb\tpeak_over_form\tkept_over_form\tform_bytes_a_pair");
    System.out.println(row(workload, Integer.parseInt(arguments[1])));
  }

  /** The row of one workload. */
  static String row(Workload workload, int terms) {
    Model model = workload.model(terms, 1);
    long before = used();
    pools(MemoryPoolMXBean::resetPeakUsage);
    Lowered[] lowered = {Lowering.standard().lower(model)};
    long[] peak = {-before};
    pools(pool -> peak[0] += pool.getPeakUsage().getUsed());
    long kept = used() - before;
    Qubo form = lowered[0].qubo();
    lowered[0] = null;
    long alone = used() - before;
    double counted = 12.0 * form.pairs() + 12.0 * form.size();
    return String.format(
        Locale.ROOT,
        "%s\t%d\t%d\t%.1f\t%.2f\t%.2f\t%.2f",
        model.name().toLowerCase(Locale.ROOT),
        form.size(),
        form.pairs(),
        counted / 1e6,
        peak[0] / counted,
        kept / counted,
        (double) alone / form.pairs());
  }

  private static void pools(Consumer<MemoryPoolMXBean> action) {
    for (MemoryPoolMXBean pool : ManagementFactory.getMemoryPoolMXBeans()) {
      if (pool.getType() == MemoryType.HEAP) {
        action.accept(pool);
      }
    }
  }

  /** One collection in four of the serial collector leaves no dead objects as they lie. */
  private static long used() {
    for (int k = 0; k < 4; k++) {
      System.gc();
    }
    Runtime runtime = Runtime.getRuntime();
    return runtime.totalMemory() - runtime.freeMemory();
  }
}
