package dev.couplet.bench.instances;

import dev.couplet.bench.models.NumberTable;
import dev.couplet.bench.models.Tour;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * TSPLIB, symmetric travelling salesman: lines {@code KEY : VALUE}, then sections of numbers. Read
 * are explicit matrices and the distances of {@link TspDistance}; the length is to be minimised.
 *
 * <p>Source: Reinelt, "TSPLIB - a traveling salesman problem library" (1991).
 */
final class TspText implements Format {
  private static final int LARGEST = 1 << 14;
  private static final Set<String> KEYS =
      Set.of(
          "NAME",
          "TYPE",
          "COMMENT",
          "DIMENSION",
          "EDGE_WEIGHT_TYPE",
          "EDGE_WEIGHT_FORMAT",
          "NODE_COORD_TYPE",
          "DISPLAY_DATA_TYPE");
  private static final String DISTANCES = "EDGE_WEIGHT_SECTION";
  private static final String COORDINATES = "NODE_COORD_SECTION";

  @Override
  public String kind() {
    return "tsp";
  }

  @Override
  public boolean recognises(List<String> head) {
    return !head.isEmpty()
        && head.get(0).matches("\\s*(" + String.join("|", KEYS) + ")\\s*:.*")
        && head.stream().anyMatch(line -> line.matches("\\s*(DIMENSION|EDGE_WEIGHT_TYPE)\\s*:.*"));
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    NumberTable distances = read(source.tokens());
    return new Instance.OfModel(source.name(), Tour.of(source.name(), distances).statement());
  }

  /** The distances between all cities. */
  static NumberTable read(TokenReader text) throws IOException {
    Map<String, String> header = new HashMap<>();
    String section = readHeader(text, header);
    String type = header.getOrDefault("TYPE", "");
    if (!type.equals("TSP")) {
      throw text.fault("TYPE is '" + type + "', symmetric problems of TYPE TSP are read");
    }
    int cities = dimension(text, header);
    String weights = header.getOrDefault("EDGE_WEIGHT_TYPE", "");
    boolean explicit = weights.equals("EXPLICIT");
    String needed = explicit ? DISTANCES : COORDINATES;
    if (!section.equals(needed)) {
      throw text.fault("the section is " + section + ", EDGE_WEIGHT_TYPE says " + needed);
    }
    text.endOfLine();
    NumberTable distances =
        explicit
            ? TspMatrix.read(text, header.getOrDefault("EDGE_WEIGHT_FORMAT", ""), cities)
            : coordinates(text, weights, cities);
    text.endOfLine();
    readRest(text, cities);
    return distances;
  }

  /** Reads the header lines into the map; the text then stands behind the section's name. */
  private static String readHeader(TokenReader text, Map<String, String> header)
      throws IOException {
    while (true) {
      if (!text.nextLine()) {
        throw text.fault("the text ends where a section of distances or coordinates should begin");
      }
      if (text.hasToken()) {
        String word = text.token("a key");
        if (word.endsWith("_SECTION")) {
          return word;
        }
        readKey(text, word, header);
      }
    }
  }

  private static void readKey(TokenReader text, String word, Map<String, String> header) {
    int colon = text.line().indexOf(':');
    String key = (colon < 0 ? word : text.line().substring(0, colon)).strip();
    if (colon < 0 || !KEYS.contains(key)) {
      throw text.fault("'" + key + "' is no key of a symmetric problem; a line is KEY : VALUE");
    }
    if (header.put(key, text.line().substring(colon + 1).strip()) != null
        && !key.equals("COMMENT")) {
      throw text.fault(key + " stands here again; say it once");
    }
  }

  private static int dimension(TokenReader text, Map<String, String> header) {
    String dimension = header.getOrDefault("DIMENSION", "");
    int cities = dimension.matches("\\d{1,9}") ? Integer.parseInt(dimension) : 0;
    if (cities < 3 || cities > LARGEST) {
      throw text.fault("DIMENSION is '" + dimension + "', it must be from 3 to " + LARGEST);
    }
    return cities;
  }

  private static NumberTable coordinates(TokenReader text, String weights, int cities)
      throws IOException {
    TspDistance distance =
        TspDistance.named(weights)
            .orElseThrow(
                () ->
                    text.fault(
                        "EDGE_WEIGHT_TYPE is '"
                            + weights
                            + "', read are EXPLICIT, "
                            + TspDistance.names()));
    double[] x = new double[cities];
    double[] y = new double[cities];
    boolean[] seen = new boolean[cities];
    for (int line = 1; line <= cities; line++) {
      text.seekToken("city " + line + " of " + cities);
      int city = text.integer("the city", 1, cities);
      if (seen[city - 1]) {
        throw text.fault("city " + city + " stands here again");
      }
      seen[city - 1] = true;
      x[city - 1] = text.number("the first coordinate");
      y[city - 1] = text.number("the second coordinate");
      text.endOfLine();
    }
    return distance.table(x, y);
  }

  /** Coordinates for drawing may follow, then the word EOF. */
  private static void readRest(TokenReader text, int cities) throws IOException {
    boolean ended = false;
    while (text.nextLine()) {
      if (text.hasToken()) {
        String word = text.token("the end");
        if (ended || !(word.equals("EOF") || word.equals("DISPLAY_DATA_SECTION"))) {
          throw text.fault("nothing more was expected, found '" + word + "'");
        }
        ended = word.equals("EOF");
        if (!ended) {
          NumberList.skip(text, 3 * cities, "the coordinates for drawing");
        }
        text.endOfLine();
      }
    }
  }
}
