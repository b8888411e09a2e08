package dev.couplet.model;

import java.math.BigDecimal;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** What the comment lines of an OPB text say: its sizes, and what the format has no place for. */
final class PseudoBooleanNotes {
  private static final Pattern VARIABLES = Pattern.compile("#variable=\\s*(\\S+)");
  private static final Pattern CONSTRAINTS = Pattern.compile("#constraint=\\s*(\\S+)");
  private static final Pattern NOTE = Pattern.compile("\\s*\\*couplet\\s+(\\S+)\\s*(\\S*)\\s*");

  private OptionalLong variables = OptionalLong.empty();
  private OptionalLong constraints = OptionalLong.empty();
  private Optional<Double> constant = Optional.empty();
  private Optional<Integer> decimals = Optional.empty();
  private boolean maximizes;
  private boolean closed;

  void read(String line, PseudoBooleanScanner text) {
    if (text.tokenLine() == 1) {
      variables = size(line, VARIABLES, PseudoBooleanReader.mostBits(), text);
      constraints = size(line, CONSTRAINTS, Integer.MAX_VALUE, text);
    }
    if (line.stripLeading().startsWith("*couplet")) {
      note(line, text);
    }
  }

  private static OptionalLong size(
      String line, Pattern pattern, long most, PseudoBooleanScanner text) {
    Matcher matcher = pattern.matcher(line);
    if (!matcher.find()) {
      return OptionalLong.empty();
    }
    String number = matcher.group(1);
    if (!number.matches("[0-9]{1,18}") || Long.parseLong(number) > most) {
      throw text.at(
          text.tokenLine(),
          matcher.start(1),
          "the number is '" + shown(number) + "', it must be a whole number from 0 to " + most);
    }
    return OptionalLong.of(Long.parseLong(number));
  }

  private void note(String line, PseudoBooleanScanner text) {
    Matcher matcher = NOTE.matcher(line);
    if (closed || !matcher.matches() || !take(matcher.group(1), matcher.group(2))) {
      throw text.fault(
          closed
              ? "lines of this kind stand before the objective"
              : "the line must be one of '"
                  + PseudoBooleanText.CONSTANT
                  + " VALUE' with a finite number, '"
                  + PseudoBooleanText.DECIMALS
                  + " N' with N from 0 to "
                  + PseudoBooleanText.MOST_DECIMALS
                  + ", '"
                  + PseudoBooleanText.MAXIMIZE
                  + "', each at most once");
    }
  }

  private boolean take(String what, String value) {
    return switch (what) {
      case "constant" -> takeConstant(value);
      case "decimals" -> takeDecimals(value);
      case "maximize" -> takeSense(value);
      default -> false;
    };
  }

  private boolean takeConstant(String value) {
    boolean first = constant.isEmpty();
    constant = number(value);
    return first && constant.isPresent();
  }

  private boolean takeDecimals(String value) {
    boolean first = decimals.isEmpty();
    decimals = value.matches("[0-9]{1,3}") ? Optional.of(Integer.valueOf(value)) : Optional.empty();
    return first && decimals.filter(n -> n <= PseudoBooleanText.MOST_DECIMALS).isPresent();
  }

  private boolean takeSense(String value) {
    boolean first = !maximizes;
    maximizes = true;
    return first && value.isEmpty();
  }

  private static Optional<Double> number(String value) {
    if (!value.matches("[-+]?[0-9]+(\\.[0-9]+)?([eE][-+]?[0-9]+)?")) {
      return Optional.empty();
    }
    return Optional.of(Double.valueOf(value)).filter(Double::isFinite);
  }

  private static String shown(String number) {
    return number.length() > 40 ? number.substring(0, 40) + "..." : number;
  }

  /** From here on, nothing can be said of the objective any more. */
  void close() {
    closed = true;
  }

  OptionalLong variables() {
    return variables;
  }

  OptionalLong constraints() {
    return constraints;
  }

  double constant() {
    return constant.orElse(0.0);
  }

  boolean maximizes() {
    return maximizes;
  }

  /** A coefficient of the objective as it is written, in the model's own sense and units. */
  double inOwnUnits(long coefficient) {
    long signed = maximizes ? -coefficient : coefficient;
    return BigDecimal.valueOf(signed, decimals.orElse(0)).doubleValue();
  }
}
