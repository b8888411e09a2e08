package dev.couplet.examples.rounds;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Draws the rounds of a plan as an SVG: villages where they lie, marked by their van, and the way
 * of each van from the library through its villages and back.
 */
final class RoundsMap {
  private static final Box FRAME = new Box(30, 92, 730, 652);
  private static final double LEGEND_LEFT = 762;
  private static final double LEGEND_STEP = 54;

  private final RoundsData data;
  private final List<Round> rounds;
  private final String subtitle;
  private final boolean ways;
  private final MapScale scale;
  private final StringBuilder svg = new StringBuilder();

  private RoundsMap(RoundsData data, List<Round> rounds, String subtitle, boolean ways) {
    this.data = data;
    this.rounds = rounds;
    this.subtitle = subtitle;
    this.ways = ways;
    List<Place> places = new ArrayList<>(data.villages());
    places.add(data.library());
    this.scale = MapScale.fitting(places, FRAME.grown(-56));
  }

  /** The drawing as text; the villages of each round are in the order of the visits. */
  static String svg(RoundsData data, List<Round> rounds, String subtitle) {
    return new RoundsMap(data, rounds, subtitle, true).write();
  }

  /** The drawing of rounds that are not in order. */
  static String withoutWays(RoundsData data, List<Round> rounds, String subtitle) {
    return new RoundsMap(data, rounds, subtitle, false).write();
  }

  private String write() {
    double height = Math.max(690, FRAME.top() + 40 + LEGEND_STEP * (rounds.size() + 2));
    add("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 1000 %.0f\" role=\"img\"", height);
    add(" font-family=\"Helvetica, Arial, sans-serif\" font-size=\"%.0f\">\n", MapLabels.FONT);
    add("<title>Rounds of a mobile library</title>\n");
    add("<desc>A map of villages, each marked by the van that serves it.</desc>\n");
    add("<rect width=\"100%%\" height=\"100%%\" fill=\"white\"/>\n");
    text(30, 44, " font-size=\"26\" font-weight=\"bold\"", "Rounds of a mobile library");
    text(30, 72, " font-size=\"15\" fill=\"#444444\"", subtitle);
    box(FRAME, "#FAFAF7", "#BBBBBB");
    if (ways) {
      lines();
    }
    marks();
    names();
    scaleBar();
    north();
    legend();
    String words =
        ways
            ? "Each line is the round of a van: from the library to its villages, one after the"
                + " other, and back."
            : "The villages of each van, not in order.";
    text(30, 676, " fill=\"#444444\"", words);
    add("</svg>\n");
    return svg.toString();
  }

  private void lines() {
    add("<g fill=\"none\" stroke-width=\"2.4\" stroke-linejoin=\"round\">\n");
    for (int k = 0; k < rounds.size(); k++) {
      List<Place> way = way(rounds.get(k));
      for (int stop = 0; stop < way.size(); stop++) {
        String before = stop == 0 ? "<path class=\"round\" d=\"M" : " L";
        add(before + " %.1f %.1f", x(way.get(stop)), y(way.get(stop)));
      }
      add(way.isEmpty() ? "" : "\" stroke=\"%s\"/>\n", mark(k).colour());
    }
    add("</g>\n");
  }

  /** Out and back; empty for a van that stays at home. */
  private List<Place> way(Round round) {
    List<Place> way = new ArrayList<>(round.villages());
    if (!way.isEmpty()) {
      way.add(0, data.library());
      way.add(data.library());
    }
    return way;
  }

  private void marks() {
    for (int k = 0; k < rounds.size(); k++) {
      for (Village village : rounds.get(k).villages()) {
        svg.append(mark(k).svg(x(village), y(village))).append('\n');
      }
    }
    house(x(data.library()), y(data.library()));
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

  private void house(double x, double y) {
    add("<path d=\"M %.1f %.1f m 0 -11 l 10 8 h -2.5 v 10 h -15 v -10 h -2.5 z\"", x, y);
    add(" fill=\"#333333\" stroke=\"white\" stroke-width=\"1.5\"/>\n");
  }

  private void names() {
    MapLabels labels = new MapLabels(FRAME.grown(-4));
    labels.addMark(FRAME.right() - 24, FRAME.top() + 20);
    data.villages().forEach(village -> labels.addMark(x(village), y(village)));
    labels.addMark(x(data.library()), y(data.library()));
    if (ways) {
      rounds.forEach(round -> addLines(way(round), labels));
    }
    add("<g text-anchor=\"middle\" stroke=\"#FAFAF7\" stroke-width=\"4\"");
    add(" stroke-linejoin=\"round\" paint-order=\"stroke\">\n");
    name(labels, data.library(), "library", "Library");
    for (Village village : data.villages()) {
      name(labels, village, "village", village.name() + " " + village.crates());
    }
    add("</g>\n");
  }

  private void name(MapLabels labels, Place place, String kind, String name) {
    Box box = labels.place(place, name, x(place), y(place));
    text(box.x(), box.bottom() - 4, " class=\"" + kind + "\"", name);
  }

  private void addLines(List<Place> way, MapLabels labels) {
    for (int k = 0; k + 1 < way.size(); k++) {
      Place from = way.get(k);
      Place to = way.get(k + 1);
      labels.addLine(x(from), y(from), x(to), y(to));
    }
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
    text(LEGEND_LEFT, y, " font-weight=\"bold\"", ways ? "Van, load, way" : "Van, load");
    for (int k = 0; k < rounds.size(); k++) {
      Round round = rounds.get(k);
      y += k == 0 ? 36 : LEGEND_STEP;
      svg.append(mark(k).svg(LEGEND_LEFT + 10, y)).append('\n');
      text(LEGEND_LEFT + 30, y, " font-weight=\"bold\"", round.van().toString());
      String load = round.crates() + " of " + round.van().capacity() + " crates";
      String way = ways ? ", " + round.way(data.library()) + " m" : "";
      text(LEGEND_LEFT + 30, y + 19, "", load + way);
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

  private double x(Place place) {
    return scale.x(place);
  }

  private double y(Place place) {
    return scale.y(place);
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
