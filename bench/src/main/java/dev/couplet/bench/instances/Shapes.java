package dev.couplet.bench.instances;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.regex.MatchResult;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** A small language of texts like {@code grid:RxC}, each a word, a colon and numbers. */
final class Shapes<T> {
  private static final String WHOLE = "(\\d{1,9})";
  private static final String DECIMAL = "(\\d*\\.?\\d+)";

  private record Shape<T>(String usage, Pattern pattern, Function<MatchResult, T> make) {
    String word() {
      return usage.substring(0, usage.indexOf(':') + 1);
    }
  }

  private final List<Shape<T>> shapes = new ArrayList<>();

  /**
   * Adds a shape.
   *
   * @param usage how it is written: capital letters stand for whole numbers, P for a decimal one
   * @param make makes the thing from the numbers, groups 1, 2, ...
   */
  Shapes<T> add(String usage, Function<MatchResult, T> make) {
    String regex =
        usage.replaceAll("[A-OQ-Z]", Matcher.quoteReplacement(WHOLE)).replace("P", DECIMAL);
    shapes.add(new Shape<>(usage, Pattern.compile(regex), make));
    return this;
  }

  /**
   * The thing that the text stands for; empty if it begins with none of the words.
   *
   * @throws IllegalArgumentException if it begins with one of them and goes on otherwise
   */
  Optional<T> parse(String text) {
    for (Shape<T> shape : shapes) {
      if (text.startsWith(shape.word())) {
        Matcher matcher = shape.pattern().matcher(text);
        if (!matcher.matches()) {
          throw new IllegalArgumentException("'" + text + "' is not written like " + shape.usage());
        }
        return Optional.of(shape.make().apply(matcher));
      }
    }
    return Optional.empty();
  }

  /** How all of them are written. */
  String usages() {
    return shapes.stream().map(Shape::usage).collect(Collectors.joining(", "));
  }

  /** The number of one capital letter of the usage. */
  static int whole(MatchResult numbers, int group) {
    return Integer.parseInt(numbers.group(group));
  }

  /** The number of a P of the usage. */
  static double decimal(MatchResult numbers, int group) {
    return Double.parseDouble(numbers.group(group));
  }
}
