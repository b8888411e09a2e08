package dev.couplet.bench.instances;

import dev.couplet.form.FormatException;
import dev.couplet.form.TokenReader;
import dev.couplet.model.Statement;
import java.io.BufferedReader;
import java.io.IOException;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.BiFunction;

/**
 * An opened text with what a reader of a format has to know besides.
 *
 * @param path where the text comes from, for error messages
 * @param name the name of the instance in it
 * @param reader at the start of the text
 * @param item which problem of several is wanted, counted from 1, if the caller said so
 */
record Source(String path, String name, BufferedReader reader, OptionalInt item) {
  TokenReader tokens() {
    return new TokenReader(path, reader);
  }

  /**
   * The problem to read of {@code problems}, counted from 1.
   *
   * @param text the text, just after the number of problems
   * @throws FormatException if there is no such problem, or several and none was picked
   */
  int pick(TokenReader text, int problems) {
    if (item.isEmpty() && problems > 1) {
      throw text.fault("the file holds " + problems + " problems; pick one with --item");
    }
    int picked = item.orElse(1);
    if (picked > problems) {
      throw text.fault(
          "item " + picked + " was asked for, the file holds " + problems + "; pick a lower one");
    }
    return picked;
  }

  /**
   * The problem that was picked of a text that begins with the number of problems.
   *
   * @param <P> what a problem is read as
   */
  <P> Instance oneOfSeveral(Reading<P> reading, BiFunction<String, P, Statement> stating)
      throws IOException {
    TokenReader text = tokens();
    text.seekToken("the number of problems");
    int problems = text.integer("the number of problems", 1, 1_000_000);
    int picked = pick(text, problems);
    Optional<P> found = Optional.empty();
    for (int p = 1; p <= problems; p++) {
      P read = reading.read(text);
      if (p == picked) {
        found = Optional.of(read);
      }
    }
    text.endOfLine();
    EntryList.endOfText(text);
    String named = nameOf(picked, problems);
    return new Instance.OfModel(named, stating.apply(named, found.orElseThrow()));
  }

  /** Reads one problem, from where the text stands. */
  @FunctionalInterface
  interface Reading<P> {
    P read(TokenReader text) throws IOException;
  }

  /** The name of one problem of several. */
  String nameOf(int picked, int problems) {
    return problems == 1 ? name : name + "#" + picked;
  }

  /**
   * For formats that hold one problem a file.
   *
   * @throws IllegalArgumentException if another than the first was picked
   */
  void requireSingle() {
    if (item.orElse(1) != 1) {
      throw new IllegalArgumentException(
          path + ": item " + item.getAsInt() + " was asked for, the file holds one problem");
    }
  }
}
