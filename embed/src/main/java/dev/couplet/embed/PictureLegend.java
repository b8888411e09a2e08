package dev.couplet.embed;

import java.util.ArrayList;
import java.util.List;

/** The legend below a picture: signs with their meaning, in as many rows as the width takes. */
final class PictureLegend {
  /** The estimated width of a letter, in heights of the writing. */
  private static final double LETTER = 0.56;

  private final List<Entry> entries = new ArrayList<>();
  private final double font;

  PictureLegend(double font) {
    this.font = font;
  }

  void add(String meaning, Sign sign) {
    entries.add(new Entry(meaning, sign));
  }

  double leastWidth() {
    return entries.stream().mapToDouble(this::width).max().orElse(0);
  }

  private double width(Entry entry) {
    return 3.6 * font + LETTER * font * entry.meaning().length();
  }

  double height(double wide) {
    List<double[]> places = places(wide);
    return 2 * font * (1 + places.get(places.size() - 1)[1]);
  }

  /** Draws the entries below and to the right of a corner. */
  void draw(Svg svg, double left, double top, double wide) {
    List<double[]> places = places(wide);
    for (int k = 0; k < entries.size(); k++) {
      double x = left + places.get(k)[0];
      double y = top + 2 * font * places.get(k)[1];
      entries.get(k).sign().draw(svg, x + font, y, font);
      svg.write(
          entries.get(k).meaning(),
          "text",
          "x",
          x + 2.4 * font,
          "y",
          y + 0.36 * font,
          "font-size",
          font);
    }
  }

  /** The left edge and the row of every entry. */
  private List<double[]> places(double wide) {
    List<double[]> places = new ArrayList<>();
    double x = 0;
    int row = 0;
    for (Entry entry : entries) {
      if (x > 0 && x + width(entry) > wide) {
        x = 0;
        row++;
      }
      places.add(new double[] {x, row});
      x += width(entry);
    }
    return places;
  }

  /** A sign of the legend. */
  @FunctionalInterface
  interface Sign {
    /** Draws the sign around a point, about as large as {@code size} each way. */
    void draw(Svg svg, double x, double y, double size);
  }

  private record Entry(String meaning, Sign sign) {}
}
