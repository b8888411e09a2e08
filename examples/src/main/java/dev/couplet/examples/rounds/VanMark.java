package dev.couplet.examples.rounds;

import java.util.Locale;

/**
 * How a van's villages are marked on a map: by colour and by shape, so that nobody needs to tell
 * colours apart.
 *
 * <p>The colours are those that Okabe and Ito, "Color universal design" (2008), chose to be told
 * apart by people with any kind of colour vision; black and yellow are left out.
 */
record VanMark(String colour, Shape shape) {
  private static final String[] COLOURS = {
    "#0072B2", "#D55E00", "#009E73", "#CC79A7", "#E69F00", "#56B4E9"
  };

  /** Shapes of about the same area; they fit into a square of half side 10. */
  enum Shape {
    CIRCLE,
    SQUARE,
    TRIANGLE,
    DIAMOND,
    CROSS
  }

  /** The mark of a van by its place in the list; thirty differ. */
  static VanMark of(int van) {
    Shape[] shapes = Shape.values();
    return new VanMark(COLOURS[van % COLOURS.length], shapes[van % shapes.length]);
  }

  /** The mark as an SVG element. */
  String svg(double x, double y) {
    String style =
        " fill=\""
            + colour
            + "\" stroke=\"white\" stroke-width=\"1.5\" stroke-linejoin=\"round\"/>";
    return switch (shape) {
      case CIRCLE -> format("<circle cx=\"%.1f\" cy=\"%.1f\" r=\"8.5\"", x, y) + style;
      case SQUARE -> path(x, y, "m -7.5 -7.5 h 15 v 15 h -15 z") + style;
      case TRIANGLE -> path(x, y, "m 0 -10 l 9.5 17 h -19 z") + style;
      case DIAMOND -> path(x, y, "m 0 -10 l 10 10 l -10 10 l -10 -10 z") + style;
      case CROSS ->
          path(x, y, "m -3.5 -9.5 h 7 v 6 h 6 v 7 h -6 v 6 h -7 v -6 h -6 v -7 h 6 z") + style;
    };
  }

  private static String path(double x, double y, String steps) {
    return format("<path d=\"M %.1f %.1f ", x, y) + steps + "\"";
  }

  private static String format(String pattern, Object... values) {
    return String.format(Locale.ROOT, pattern, values);
  }
}
