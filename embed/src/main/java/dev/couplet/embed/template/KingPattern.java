package dev.couplet.embed.template;

import dev.couplet.host.King;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Paths that cross: w of them run side by side, one a row, and from column to column every other
 * pair of neighbours changes places along the two diagonals of a square (the rows as in sorting by
 * odd- even transposition). After w - 1 columns each has been beside every other. One set more is
 * the whole next column, beside the ends of all.
 *
 * @param king the lattice
 * @param count the number of sets
 * @param paths the number w of paths: {@code count}, or one less
 * @param turned whether the paths run from top to bottom, not from left to right
 */
record KingPattern(King king, int count, int paths, boolean turned) implements Pattern {
  static Optional<Pattern> of(int count, King king) {
    int fewer = count < 3 ? count : count - 1;
    for (int paths : new int[] {fewer, count}) {
      for (boolean turned : new boolean[] {false, true}) {
        KingPattern pattern = new KingPattern(king, count, paths, turned);
        if (pattern.spareRows() >= 0 && pattern.spareColumns() >= 0) {
          return Optional.of(pattern);
        }
      }
    }
    return Optional.empty();
  }

  private int steps() {
    return Math.max(1, paths - 1);
  }

  private int length() {
    return steps() + count - paths;
  }

  @Override
  public int spareRows() {
    return king.rows() - (turned ? length() : paths);
  }

  @Override
  public int spareColumns() {
    return king.columns() - (turned ? paths : length());
  }

  @Override
  public List<int[]> sets(int down, int right) {
    List<int[]> sets = new ArrayList<>(count);
    for (int path = 0; path < paths; path++) {
      sets.add(path(path, down, right));
    }
    if (count > paths) {
      int[] across = new int[paths];
      for (int place = 0; place < paths; place++) {
        across[place] = vertex(place, steps(), down, right);
      }
      sets.add(across);
    }
    return sets;
  }

  private int[] path(int number, int down, int right) {
    int[] path = new int[steps()];
    int place = number;
    for (int step = 0; step < path.length; step++) {
      path[step] = vertex(place, step, down, right);
      int partner = (place - step) % 2 == 0 ? place + 1 : place - 1;
      place = partner < 0 || partner >= paths ? place : partner;
    }
    return path;
  }

  private int vertex(int place, int step, int down, int right) {
    return turned
        ? king.vertex(down + step, right + place)
        : king.vertex(down + place, right + step);
  }
}
