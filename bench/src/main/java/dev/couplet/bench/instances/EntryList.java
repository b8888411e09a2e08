package dev.couplet.bench.instances;

import dev.couplet.form.Qubo;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.HashSet;
import java.util.Set;

/**
 * A line {@code n m} and m lines {@code i j value} below it, as several formats have it; no two
 * lines for the same two places.
 */
final class EntryList {
  private static final int LARGEST = 1 << 30;

  private final int size;
  private final int count;
  private final Places places;

  private EntryList(int size, int count, Places places) {
    this.size = size;
    this.count = count;
    this.places = places;
  }

  /** Which places an entry may have. */
  enum Places {
    /** On or above the diagonal. */
    UPPER_TRIANGLE("entry", "lies below the diagonal; write it once, with i <= j") {
      @Override
      boolean hold(int i, int j) {
        return i <= j;
      }
    },
    /** Two different vertices, in either order. */
    EDGES("edge", "is a loop, which no cut can cross; leave it out") {
      @Override
      boolean hold(int i, int j) {
        return i != j;
      }
    };

    private final String noun;
    private final String otherwise;

    Places(String noun, String otherwise) {
      this.noun = noun;
      this.otherwise = otherwise;
    }

    abstract boolean hold(int i, int j);
  }

  /** Reads the line of sizes. */
  static EntryList readSizes(TokenReader text, Places places) throws IOException {
    text.seekToken("the line of sizes");
    int size = text.integer("the number of variables", 0, LARGEST);
    int count = text.integer("the number of lines below", 0, LARGEST);
    text.endOfLine();
    return new EntryList(size, count, places);
  }

  int size() {
    return size;
  }

  /** Passes on every entry, places counted from 1 as in the text. */
  void forEach(TokenReader text, EntryVisitor visitor) throws IOException {
    Set<Long> seen = new HashSet<>();
    for (int e = 1; e <= count; e++) {
      text.seekToken(places.noun + " " + e + " of " + count);
      int i = text.integer("the first number", 1, size);
      int j = text.integer("the second number", 1, size);
      if (!places.hold(i, j)) {
        throw text.fault(places.noun + " " + i + " " + j + " " + places.otherwise);
      }
      if (!seen.add((long) Math.min(i, j) << 32 | Math.max(i, j))) {
        throw text.fault(
            places.noun + " " + i + " " + j + " stands here again; each is listed once");
      }
      double value = text.number("the value");
      text.endOfLine();
      visitor.visit(i, j, value);
    }
  }

  /** Insists that only blank lines are left. */
  static void endOfText(TokenReader text) throws IOException {
    while (text.nextLine()) {
      text.endOfLine();
    }
  }

  /** The form, or a fault of the text if its coefficients are too large to be exact. */
  static Qubo build(TokenReader text, Qubo.Builder form) {
    try {
      return form.build();
    } catch (IllegalArgumentException tooLarge) {
      throw text.fault(
          "the coefficients down to here are too large for exact energies, their magnitudes must add"
              + " up to less than 2^51; divide them by a common factor");
    }
  }

  /** Receives one entry. */
  @FunctionalInterface
  interface EntryVisitor {
    void visit(int i, int j, double value);
  }
}
