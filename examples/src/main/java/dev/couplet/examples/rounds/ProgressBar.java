package dev.couplet.examples.rounds;

import dev.couplet.sampling.Watch.Progress;
import java.io.PrintStream;
import java.time.Duration;
import java.util.Locale;

/**
 * A line on a terminal that shows how far a run has come, drawn over at most ten times a second.
 *
 * <p>Listens to one run after the other; {@link #clear} after each leaves an empty line behind.
 */
final class ProgressBar {
  private static final int CELLS = 30;
  private static final Duration PAUSE = Duration.ofMillis(100);

  private final PrintStream terminal;
  private final String doing;
  private final Duration limit;
  private Duration drawn = PAUSE.negated();
  private int width;

  /**
   * A bar on a terminal.
   *
   * @param doing what the run does, in a word
   * @param limit the time that a run may take; shows how far it is where the run cannot tell
   */
  ProgressBar(PrintStream terminal, String doing, Duration limit) {
    this.terminal = terminal;
    this.doing = doing;
    this.limit = limit;
  }

  /** Draws the bar, unless it was drawn just now. */
  void show(Progress progress) {
    if (progress.elapsed().minus(drawn).compareTo(PAUSE) < 0) {
      return;
    }
    drawn = progress.elapsed();
    String line = line(progress);
    terminal.print("\r" + line + " ".repeat(Math.max(0, width - line.length())));
    terminal.flush();
    width = line.length();
  }

  private String line(Progress progress) {
    double passed = (double) progress.elapsed().toNanos() / limit.toNanos();
    double share = Math.max(0, Math.min(1, progress.share().orElse(passed)));
    int filled = (int) (share * CELLS);
    StringBuilder line = new StringBuilder(doing).append(" [");
    line.append("#".repeat(filled)).append(".".repeat(CELLS - filled)).append("] ");
    line.append(String.format(Locale.ROOT, "%3.0f %%", 100 * share));
    progress.best().ifPresent(best -> line.append("  best ").append(Numbers.metres(best)));
    progress.bound().ifPresent(bound -> line.append("  bound ").append(Numbers.metres(bound)));
    return line.toString();
  }

  /** Wipes the bar. */
  void clear() {
    if (width > 0) {
      terminal.print("\r" + " ".repeat(width) + "\r");
      terminal.flush();
    }
    width = 0;
    drawn = PAUSE.negated();
  }
}
