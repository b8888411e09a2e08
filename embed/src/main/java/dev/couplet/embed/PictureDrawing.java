package dev.couplet.embed;

import dev.couplet.host.Host;
import java.util.Locale;
import java.util.function.Predicate;

/**
 * Draws one picture, from the bottom up: edges not used, edges that carry a guest edge, bonds
 * inside the branch sets, vertices.
 */
final class PictureDrawing {
  private final Embedding embedding;
  private final Host host;
  private final String title;
  private final PictureScale scale;
  private final Palette palette;
  private final PictureSigns signs;
  private final PictureLegend legend;
  private final Svg svg = new Svg();
  private final double unit;
  private final double font;
  private final double left;
  private final double top;

  PictureDrawing(Embedding embedding, String title) {
    this.embedding = embedding;
    this.host = embedding.host();
    this.title = title;
    this.scale = new PictureScale(host);
    this.palette = new Palette(embedding);
    this.signs = new PictureSigns(palette);
    this.unit = scale.unit;
    this.font = Math.max(14, Math.min(36, scale.width / 50));
    this.left = Math.max(unit, font);
    this.top = 4 * font + unit;
    this.legend = legend();
  }

  String svg() {
    double inner = Math.max(Math.max(scale.width, legend.leastWidth()), headWidth());
    double below = top + scale.height + unit + font;
    double wide = inner + 2 * left;
    double high = below + legend.height(inner);
    svg.open(
        "svg",
        "xmlns",
        "http://www.w3.org/2000/svg",
        "role",
        "img",
        "font-family",
        "sans-serif",
        "width",
        wide,
        "height",
        high,
        "viewBox",
        "0 0 " + Svg.number(wide) + " " + Svg.number(high));
    svg.write(title, "title");
    svg.element("rect", "width", "100%", "height", "100%", "fill", "#ffffff");
    head();
    edges();
    vertices();
    legend.draw(svg, left, below, inner);
    svg.close("svg");
    return svg.toString();
  }

  private double headWidth() {
    return 0.56 * font * Math.max(1.35 * title.length(), figures().length());
  }

  private void head() {
    svg.write(
        title, "text", "x", left, "y", 1.8 * font, "font-size", 1.3 * font, "font-weight", "bold");
    svg.write(figures(), "text", "x", left, "y", 3.4 * font, "font-size", font, "fill", "#404040");
  }

  private String figures() {
    String there = "host: " + host.presentCount() + " vertices, " + host.edges() + " edges";
    if (embedding.sets().isEmpty()) {
      return there;
    }
    return String.format(
        Locale.ROOT,
        "%d branch sets, %d host vertices, longest %d, mean %.2f (%s)",
        embedding.sets().size(),
        embedding.total(),
        embedding.longest(),
        embedding.mean(),
        there);
  }

  private int owner(int vertex) {
    return embedding.owner(vertex).orElse(-1);
  }

  private void edges() {
    stroke(lines(e -> e[0] < 0 || e[1] < 0 || !carries(e)), PictureSigns.UNUSED, 0.06);
    stroke(lines(this::carries), PictureSigns.CARRIER, 0.06);
    for (BranchSet set : embedding.sets()) {
      String bonds = bonds(set);
      stroke(bonds, PictureSigns.CASING, 0.34);
      stroke(bonds, palette.colour(set.guest()), 0.22);
    }
  }

  private boolean carries(int[] owners) {
    return owners[0] >= 0
        && owners[1] >= 0
        && owners[0] != owners[1]
        && embedding.guest().graph().adjacent(owners[0], owners[1]);
  }

  /** The edges whose two owners satisfy a condition, as the data of one path. */
  private String lines(Predicate<int[]> owners) {
    StringBuilder data = new StringBuilder();
    host.graph()
        .forEachEdge(
            (u, v) -> {
              if (owners.test(new int[] {owner(u), owner(v)})) {
                line(u, v, data);
              }
            });
    return data.toString();
  }

  private String bonds(BranchSet set) {
    StringBuilder data = new StringBuilder();
    for (int u : set.toArray()) {
      for (int v : host.graph().neighbours(u)) {
        if (u < v && set.contains(v)) {
          line(u, v, data);
        }
      }
    }
    return data.toString();
  }

  private void line(int u, int v, StringBuilder data) {
    data.append('M').append(Svg.number(x(u))).append(' ').append(Svg.number(y(u)));
    data.append('L').append(Svg.number(x(v))).append(' ').append(Svg.number(y(v)));
  }

  private void stroke(String data, String colour, double units) {
    if (!data.isEmpty()) {
      double width = Math.max(0.5, units * unit);
      svg.element(
          "path", "d", data, "stroke", colour, "stroke-width", width, "stroke-linecap", "round");
    }
  }

  private double x(int vertex) {
    return left + scale.x(vertex);
  }

  private double y(int vertex) {
    return top + scale.y(vertex);
  }

  private void vertices() {
    double radius = 0.3 * unit;
    for (int v = 0; v < host.vertices(); v++) {
      int set = owner(v);
      svg.open("g");
      if (!host.present(v)) {
        svg.write("missing: " + host.describe(v), "title");
        PictureSigns.missing(svg, x(v), y(v), 2 * radius);
      } else if (set < 0) {
        svg.write("free: " + host.describe(v), "title");
        PictureSigns.free(svg, x(v), y(v), radius);
      } else {
        svg.write("guest vertex " + set + ": " + host.describe(v), "title");
        signs.taken(svg, x(v), y(v), radius, set);
      }
      svg.close("g");
    }
  }

  private PictureLegend legend() {
    PictureLegend rows = new PictureLegend(font);
    if (!embedding.sets().isEmpty()) {
      rows.add(
          "host vertex in a branch set, with the number of its guest vertex",
          (to, x, y, size) -> signs.taken(to, x, y, 0.6 * size, 0));
      rows.add("bond inside a branch set", (to, x, y, size) -> signs.bar(to, x, y, size));
      rows.add(
          "edge that carries a guest edge",
          (to, x, y, size) -> PictureSigns.rule(to, x, y, size, PictureSigns.CARRIER));
    }
    rows.add("free vertex", (to, x, y, size) -> PictureSigns.free(to, x, y, 0.6 * size));
    rows.add(
        "edge not used",
        (to, x, y, size) -> PictureSigns.rule(to, x, y, size, PictureSigns.UNUSED));
    if (host.presentCount() < host.vertices()) {
      rows.add("missing vertex", PictureSigns::missing);
    }
    return rows;
  }
}
