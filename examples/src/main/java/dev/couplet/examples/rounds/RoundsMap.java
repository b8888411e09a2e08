package dev.couplet.examples.rounds;

import java.util.List;
import java.util.Locale;

/**
 * Draws the rounds of a plan as an SVG: villages where they lie, marked by their van, and the lines
 * whose lengths the plan adds up.
 */
final class RoundsMap {
  private static final Box FRAME = new Box(30, 92, 730, 652);
  private static final double LEGEND_LEFT = 762;
  private static final double LEGEND_STEP = 54;

  private final RoundsData data;
  private final List<Round> rounds;
  private final String subtitle;
  private final MapScale scale;
  private final StringBuilder svg = new StringBuilder();

  private RoundsMap(RoundsData data, List<Round> rounds, String subtitle) {
    this.data = data;
    this.rounds = rounds;
    this.subtitle = subtitle;
    this.scale = MapScale.fitting(data.villages(), FRAME.grown(-56));
  }

  /** The drawing as text. */
  static String svg(RoundsData data, List<Round> rounds, String subtitle) {
    RoundsMap map = new RoundsMap(data, rounds, subtitle);
    map.write();
    return map.svg.toString();
  }

  private void write() {
    double height = Math.max(690, FRAME.top() + 40 + LEGEND_STEP * (rounds.size() + 2));
    add("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 1000 %.0f\" role=\"img\"", height);
    add(" font-family=\"Helvetica, Arial, sans-serif\" font-size=\"%.0f\">\n", MapLabels.FONT);
    add("<title>Rounds of a mobile library</title>\n");
    add("<desc>A map of villages, each marked by the van that serves it.</desc>\n");
    add("<rect width=\"100%%\" height=\"100%%\" fill=\"white\"/>\n");
    text(30, 44, " font-size=\"26\" font-weight=\"bold\"", "Rounds of a mobile library");
    text(30, 72, " font-size=\"15\" fill=\"#444444\"", subtitle);
    box(FRAME, "#FAFAF7", "#BBBBBB");
    lines();
    marks();
    names();
    scaleBar();
    north();
    legend();
    text(
        30,
        676,
        " fill=\"#444444\"",
        "Lines join every two villages of a van; the plan adds up their lengths.");
    add("</svg>\n");
  }

  private void lines() {
    for (int k = 0; k < rounds.size(); k++) {
      add("<g stroke=\"%s\" stroke-width=\"1.6\" stroke-opacity=\"0.45\">\n", mark(k).colour());
      List<Village> served = rounds.get(k).villages();
      for (int a = 0; a < served.size(); a++) {
        for (int b = a + 1; b < served.size(); b++) {
          add("<line x1=\"%.1f\" y1=\"%.1f\"", x(served.get(a)), y(served.get(a)));
          add(" x2=\"%.1f\" y2=\"%.1f\"/>\n", x(served.get(b)), y(served.get(b)));
        }
      }
      add("</g>\n");
    }
  }

  private void marks() {
    for (int k = 0; k < rounds.size(); k++) {
      for (Village village : rounds.get(k).villages()) {
        svg.append(mark(k).svg(x(village), y(village))).append('\n');
      }
    }
    for (Village village : unserved()) {
      ring(x(village), y(village));
    }
  }

  /** The villages that the plan leaves open. */
  private List<Village> unserved() {
    return data.villages().stream()
        .filter(village -> rounds.stream().noneMatch(round -> round.villages().contains(village)))
        .toList();
  }

  private void ring(double x, double y) {
    add("<circle cx=\"%.1f\" cy=\"%.1f\" r=\"6\" fill=\"white\" stroke=\"#444444\"/>\n", x, y);
  }

  private void names() {
    MapLabels labels = new MapLabels(FRAME.grown(-4));
    labels.addMark(FRAME.right() - 24, FRAME.top() + 20);
    data.villages().forEach(village -> labels.addMark(x(village), y(village)));
    for (Round round : rounds) {
      for (Village village : round.villages()) {
        for (Village other : round.villages()) {
          labels.addLine(x(village), y(village), x(other), y(other));
        }
      }
    }
    add("<g text-anchor=\"middle\" stroke=\"#FAFAF7\" stroke-width=\"4\"");
    add(" stroke-linejoin=\"round\" paint-order=\"stroke\">\n");
    for (Village village : data.villages()) {
      String name = village.name() + " " + village.crates();
      Box box = labels.place(village, name, x(village), y(village));
      text(box.x(), box.bottom() - 4, " class=\"village\"", name);
    }
    add("</g>\n");
  }

  private void scaleBar() {
    int metres = scale.roundMetres(160);
    double left = FRAME.left() + 20;
    double y = FRAME.bottom() - 18;
    double right = left + scale.units(metres);
    add("<path d=\"M %.1f %.1f v 8 H %.1f v -8\"", left, y - 4, right);
    add(" fill=\"none\" stroke=\"#444444\" stroke-width=\"1.5\"/>\n");
    String words = metres % 1000 == 0 ? metres / 1000 + " km" : metres + " m";
    text(right + 8, y + 5, " fill=\"#444444\"", words);
  }

  private void north() {
    double x = FRAME.right() - 24;
    double y = FRAME.top() + 14;
    add("<path d=\"M %.1f %.1f l 6 14 l -6 -4 l -6 4 z\" fill=\"#444444\"/>\n", x, y);
    text(x, y + 30, " text-anchor=\"middle\" fill=\"#444444\"", "N");
  }

  private void legend() {
    double y = FRAME.top() + 14;
    text(LEGEND_LEFT, y, " font-weight=\"bold\"", "Van, load, distances");
    for (int k = 0; k < rounds.size(); k++) {
      Round round = rounds.get(k);
      y += k == 0 ? 36 : LEGEND_STEP;
      svg.append(mark(k).svg(LEGEND_LEFT + 10, y)).append('\n');
      text(LEGEND_LEFT + 30, y, " font-weight=\"bold\"", round.van().toString());
      String load = round.crates() + " of " + round.van().capacity() + " crates";
      text(LEGEND_LEFT + 30, y + 19, "", load + ", " + round.metres() + " m");
    }
    if (!unserved().isEmpty()) {
      y += LEGEND_STEP;
      ring(LEGEND_LEFT + 10, y);
      text(LEGEND_LEFT + 30, y + 5, "", "no van");
    }
    text(LEGEND_LEFT, y + LEGEND_STEP, " fill=\"#444444\"", "Numbers by names: crates");
  }

  private static VanMark mark(int van) {
    return VanMark.of(van);
  }

  private double x(Village village) {
    return scale.x(village);
  }

  private double y(Village village) {
    return scale.y(village);
  }

  private void box(Box box, String fill, String stroke) {
    add("<rect x=\"%.1f\" y=\"%.1f\"", box.left(), box.top());
    add(" width=\"%.1f\" height=\"%.1f\"", box.width(), box.height());
    add(" fill=\"%s\" stroke=\"%s\"/>\n", fill, stroke);
  }

  private void text(double x, double y, String style, String words) {
    add("<text x=\"%.1f\" y=\"%.1f\"", x, y);
    svg.append(style).append('>').append(escaped(words)).append("</text>\n");
  }

  private static String escaped(String words) {
    return words.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;");
  }

  private void add(String pattern, Object... values) {
    svg.append(String.format(Locale.ROOT, pattern, values));
  }
}
