package dev.couplet.embed;

/** The signs of a picture: what stands for a vertex of each kind, a bond, an edge. */
final class PictureSigns {
  static final String UNUSED = "#dcdcdc";
  static final String CARRIER = "#5a5a5a";
  static final String CASING = "#1a1a1a";

  private static final String FREE = "#a6a6a6";
  private static final String MISSING = "#8c8c8c";

  private final Palette palette;

  PictureSigns(Palette palette) {
    this.palette = palette;
  }

  static void missing(Svg svg, double x, double y, double size) {
    double half = 0.35 * size;
    String data =
        String.join(
            " ",
            "M" + Svg.number(x - half) + " " + Svg.number(y - half),
            "L" + Svg.number(x + half) + " " + Svg.number(y + half),
            "M" + Svg.number(x - half) + " " + Svg.number(y + half),
            "L" + Svg.number(x + half) + " " + Svg.number(y - half));
    svg.element("path", "d", data, "stroke", MISSING, "stroke-width", 0.15 * size);
  }

  static void free(Svg svg, double x, double y, double radius) {
    svg.element("circle", "cx", x, "cy", y, "r", 0.6 * radius, "fill", "#ffffff", "stroke", FREE);
  }

  void taken(Svg svg, double x, double y, double radius, int set) {
    String number = Integer.toString(set);
    svg.element(
        "circle", "cx", x, "cy", y, "r", radius, "fill", palette.colour(set), "stroke", CASING);
    double size = radius * (number.length() < 3 ? 1.15 : 3.3 / number.length());
    svg.write(
        number,
        "text",
        "x",
        x,
        "y",
        y + 0.36 * size,
        "font-size",
        size,
        "text-anchor",
        "middle",
        "fill",
        palette.ink(set));
  }

  void bar(Svg to, double x, double y, double size) {
    double half = 0.9 * size;
    to.element("rect", "x", x - half, "y", y - 0.3 * size, "width", 2 * half, "height", 0.6 * size);
    to.element(
        "rect",
        "x",
        x - half,
        "y",
        y - 0.2 * size,
        "width",
        2 * half,
        "height",
        0.4 * size,
        "fill",
        palette.colour(0));
  }

  static void rule(Svg to, double x, double y, double size, String colour) {
    String data =
        "M" + Svg.number(x - 0.9 * size) + " " + Svg.number(y) + "h" + Svg.number(1.8 * size);
    to.element("path", "d", data, "stroke", colour, "stroke-width", 0.12 * size);
  }
}
