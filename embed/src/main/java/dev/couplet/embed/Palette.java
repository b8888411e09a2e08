package dev.couplet.embed;

import java.util.BitSet;

/**
 * Colours that people with any of the common kinds of colour blindness can tell apart, after Okabe
 * and Ito, "Color universal design" (2008), without its black; and which of them each branch set is
 * given.
 */
final class Palette {
  private static final String[] COLOURS = {
    "#e69f00", "#56b4e9", "#009e73", "#f0e442", "#0072b2", "#d55e00", "#cc79a7"
  };

  /** Which of the colours are dark enough to be written on in white. */
  private static final boolean[] DARK = {false, false, true, false, true, true, false};

  private final int[] chosen;

  /** Sets take turns; each takes the least used colour that no set beside it has taken. */
  Palette(Embedding embedding) {
    int n = embedding.sets().size();
    BitSet[] beside = beside(embedding);
    int[] used = new int[COLOURS.length];
    chosen = new int[n];
    for (int g = 0; g < n; g++) {
      int[] conflicts = new int[COLOURS.length];
      int now = g;
      beside[g].stream().filter(other -> other < now).forEach(other -> conflicts[chosen[other]]++);
      int best = 0;
      for (int c = 1; c < COLOURS.length; c++) {
        boolean fewer = conflicts[c] < conflicts[best];
        boolean rarer = conflicts[c] == conflicts[best] && used[c] < used[best];
        best = fewer || rarer ? c : best;
      }
      chosen[g] = best;
      used[best]++;
    }
  }

  /** For each set, those that a host edge leads to. */
  private static BitSet[] beside(Embedding embedding) {
    BitSet[] beside = new BitSet[embedding.sets().size()];
    for (int g = 0; g < beside.length; g++) {
      beside[g] = new BitSet();
    }
    embedding
        .host()
        .graph()
        .forEachEdge(
            (u, v) -> {
              int one = embedding.owner(u).orElse(-1);
              int other = embedding.owner(v).orElse(-1);
              if (one >= 0 && other >= 0 && one != other) {
                beside[one].set(other);
                beside[other].set(one);
              }
            });
    return beside;
  }

  String colour(int set) {
    return COLOURS[chosen[set]];
  }

  /** The colour of writing on a set's colour. */
  String ink(int set) {
    return DARK[chosen[set]] ? "#ffffff" : "#000000";
  }
}
