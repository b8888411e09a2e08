package dev.couplet.bench.cli;

import dev.couplet.sampling.Watch.Progress;
import java.io.PrintWriter;
import java.util.Locale;
import java.util.function.Consumer;
import java.util.function.DoubleUnaryOperator;

/** One line on a terminal that is written over and over while a run goes on. */
final class ProgressLine implements Consumer<Progress>, AutoCloseable {
  private final PrintWriter err;
  private final boolean shown;
  private final String noun;
  private final DoubleUnaryOperator valueOf;

  /**
   * A line for somebody who looks on.
   *
   * @param err where it is written
   * @param shown whether somebody does; otherwise nothing is written
   * @param noun what the values are
   * @param valueOf turns energies into the values that are shown
   */
  ProgressLine(PrintWriter err, boolean shown, String noun, DoubleUnaryOperator valueOf) {
    this.err = err;
    this.shown = shown;
    this.noun = noun;
    this.valueOf = valueOf;
  }

  /** Whether this program runs on a terminal; some JDKs after 21 say so of any output. */
  @SuppressWarnings("SystemConsoleNull")
  static boolean onTerminal() {
    return System.console() != null;
  }

  @Override
  public void accept(Progress progress) {
    if (shown) {
      StringBuilder text = new StringBuilder("\r\033[K");
      text.append(String.format(Locale.ROOT, "%8.1f s", progress.elapsed().toMillis() / 1000.0));
      progress
          .share()
          .ifPresent(s -> text.append(String.format(Locale.ROOT, " %3.0f %%", 100 * s)));
      progress.best().ifPresent(e -> text.append("  " + noun + " ").append(shown(e)));
      progress.bound().ifPresent(e -> text.append("  bound ").append(shown(e)));
      err.print(text);
      err.flush();
    }
  }

  private String shown(double energy) {
    return Table.value(valueOf.applyAsDouble(energy));
  }

  /** Wipes the line. */
  @Override
  public void close() {
    if (shown) {
      err.print("\r\033[K");
      err.flush();
    }
  }
}
