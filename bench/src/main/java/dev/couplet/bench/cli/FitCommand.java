package dev.couplet.bench.cli;

import dev.couplet.bench.instances.GraphReader;
import dev.couplet.embed.Embedder;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.io.IOException;
import java.io.PrintWriter;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.function.Function;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The verb {@code fit}: embeds one guest in one host. */
@Command(
    name = "fit",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Looks for an embedding of a guest graph in a host graph.",
      "",
      "Either can be a file: an edge list 'n m' / 'i j', vertices from 1. That of a guest can also"
          + " be an instance as solve reads it. The exit status is 1 if no embedding was found."
    },
    optionListHeading = "%nOptions:%n",
    footerHeading = "%nColumns:%n",
    footer = {
      "  guest, host   as asked for, the host with its faults",
      "  method, seed  as asked for",
      "  fits          yes, no (none was found) or impossible (proved: there is none)",
      "  vertices      host vertices in all branch sets together",
      "  longest       host vertices in the largest branch set",
      "  mean_length   vertices over the number of branch sets",
      "  seconds       how long the method ran",
      "A dash stands for what is not there."
    })
final class FitCommand implements Callable<Integer> {
  static final List<String> COLUMNS =
      List.of(
          "guest",
          "host",
          "method",
          "seed",
          "fits",
          "vertices",
          "longest",
          "mean_length",
          "seconds");
  private static final int NOT_REACHED = 1;

  @Spec private CommandSpec spec = CommandSpec.create();

  @Option(
      names = "--guest",
      paramLabel = "GUEST",
      required = true,
      description =
          "complete:N, bipartite:AxB, grid:RxC, regular:D:N (random, all of degree D), random:N:P"
              + " (each pair with probability P), cycle:N, or a file.")
  private String guestText = "";

  @Option(
      names = "--host",
      paramLabel = "HOST",
      required = true,
      description =
          "cells:K@RxC (R x C cells, each complete bipartite with K vertices a side), king:RxC,"
              + " square:RxC, cubic:XxYxZ, or a file.")
  private String hostText = "";

  @Option(
      names = "--faults",
      paramLabel = "SHARE",
      description =
          "The share of the host's vertices that are missing, chosen by the seed"
              + " (default: ${DEFAULT-VALUE}).")
  private double faults = 0;

  @Option(
      names = "--method",
      paramLabel = "NAME",
      completionCandidates = Embedders.Names.class,
      description = "One of ${COMPLETION-CANDIDATES} (default: ${DEFAULT-VALUE}).")
  private String method = Embedders.STANDARD;

  @Mixin private TimedOptions timed = new TimedOptions();

  @Override
  public Integer call() throws IOException {
    Embedder embedder = Embedders.named(method);
    Effort effort = timed.effort();
    Guest guest = GraphReader.guest(guestText, timed.seed());
    Host whole = GraphReader.host(hostText);
    Host host = whole.without(Faults.seeded(whole, faults, 0, timed.seed()));
    PrintWriter err = spec.commandLine().getErr();
    long began = System.nanoTime();
    Fit fit = fit(embedder, guest, host, effort, err);
    double taken = (System.nanoTime() - began) * 1e-9;
    new Table(spec.commandLine().getOut(), COLUMNS).row(cells(guest, host, fit, taken));
    explain(fit).ifPresent(err::println);
    return fit.fits() ? 0 : NOT_REACHED;
  }

  private static Fit fit(
      Embedder embedder, Guest guest, Host host, Effort effort, PrintWriter err) {
    try (ProgressLine line =
        new ProgressLine(err, ProgressLine.onTerminal(), "vertices", vertices -> vertices)) {
      Watch watch = Watch.stop(StopSignal.create()).progress(line);
      return embedder.embed(guest, host, effort, watch);
    }
  }

  private List<String> cells(Guest guest, Host host, Fit fit, double taken) {
    Optional<Embedding> found = fit.embedding();
    return List.of(
        guest.name(),
        faults == 0 ? host.name() : host.name() + " faults:" + Table.value(faults),
        method,
        Long.toString(timed.seed()),
        answer(fit),
        cell(found, embedding -> Integer.toString(embedding.total())),
        cell(found, embedding -> Integer.toString(embedding.longest())),
        cell(found, embedding -> Table.fixed(embedding.mean(), 3)),
        Table.fixed(taken, 3));
  }

  private static String answer(Fit fit) {
    if (fit.fits()) {
      return "yes";
    }
    return fit instanceof Fit.Impossible ? "impossible" : "no";
  }

  private static String cell(Optional<Embedding> found, Function<Embedding, String> text) {
    return found.map(text).orElse(Table.NOTHING);
  }

  /** What the columns cannot tell. */
  private static Optional<String> explain(Fit fit) {
    if (fit instanceof Fit.Impossible impossible) {
      return Optional.of("no embedding exists: " + impossible.because());
    }
    if (fit instanceof Fit.NotFound none && none.overlap().isPresent()) {
      return Optional.of(
          "the best attempt used host vertices " + none.overlap().getAsInt() + " times too often");
    }
    return Optional.empty();
  }
}
