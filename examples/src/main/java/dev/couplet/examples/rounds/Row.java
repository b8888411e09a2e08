package dev.couplet.examples.rounds;

import java.math.BigInteger;
import java.util.Map;

/**
 * One row of a CSV file, which knows where it stands.
 *
 * @param file the name of the file
 * @param line counted from 1
 * @param fields by column
 */
record Row(String file, long line, Map<String, String> fields) {
  private static final int LONGEST_NAME = 30;

  /** A name: not empty, on one line, short enough for a page. */
  String name(String column) {
    String name = fields.getOrDefault(column, "");
    if (name.isEmpty()) {
      throw fault(column, "the field is empty; give a name");
    }
    if (name.codePoints().anyMatch(Character::isISOControl)) {
      throw fault(column, "the name holds a line break or another control character");
    }
    if (name.codePointCount(0, name.length()) > LONGEST_NAME) {
      throw fault(column, "'" + name + "' has more than " + LONGEST_NAME + " letters; shorten it");
    }
    return name;
  }

  /** A whole number between two others, both included. */
  int whole(String column, int lowest, int highest) {
    String text = fields.getOrDefault(column, "");
    BigInteger number;
    try {
      number = new BigInteger(text);
    } catch (NumberFormatException e) {
      throw fault(column, "'" + text + "' is not a whole number");
    }
    if (number.compareTo(BigInteger.valueOf(lowest)) < 0) {
      throw fault(column, number + " is too low; at least " + lowest + " is possible");
    }
    if (number.compareTo(BigInteger.valueOf(highest)) > 0) {
      throw fault(column, number + " is too high; at most " + highest + " is possible");
    }
    return number.intValue();
  }

  BadInput fault(String column, String what) {
    return new BadInput(file + ", line " + line + ", column " + column + ": " + what);
  }
}
