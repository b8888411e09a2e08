package dev.couplet.examples.rounds;

import java.util.ArrayList;
import java.util.List;

/** Breaks text into lines between words. */
final class Wrap {
  private Wrap() {}

  /** At least one line; a word longer than the width stands alone on a line of its own. */
  static List<String> lines(String text, int width) {
    List<String> lines = new ArrayList<>();
    int start = 0;
    while (text.length() - start > width) {
      int end = text.lastIndexOf(' ', start + width);
      if (end <= start) {
        end = text.indexOf(' ', start + 1);
      }
      if (end < 0) {
        break;
      }
      lines.add(text.substring(start, end));
      start = end + 1;
    }
    lines.add(text.substring(start));
    return lines;
  }
}
