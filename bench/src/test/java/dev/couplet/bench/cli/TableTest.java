package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TableTest {
  @ParameterizedTest
  @CsvSource({
    "0, 0",
    "-0.0, 0",
    "-12, -12",
    "8706.1, 8706.1",
    "0.30000000000000004, 0.3",
    "4503599627370496, 4503599627370496",
    "0.000001, 0.000001",
    "1e300, 1E+300"
  })
  void valuesReadAsTheyWereWritten(double number, String text) {
    assertEquals(text, Table.value(number));
  }

  @Test
  void numbersAreWrittenTheSameEverywhere() {
    assertEquals("1234.500", Table.fixed(1234.5, 3));
    assertEquals("-", Table.fixed(OptionalDouble.empty(), 3));
    assertEquals("-", Table.value(OptionalDouble.empty()));
  }

  @Test
  void cellsAreSeparatedByTabsAndHoldNone() {
    StringWriter out = new StringWriter();
    Table table = new Table(new PrintWriter(out), List.of("first", "second"));
    table.row(List.of("a\tb", "c\nd"));
    assertEquals("first\tsecond\na b\tc d\n", out.toString());
    assertThrows(IllegalStateException.class, () -> table.row(List.of("alone")));
  }
}
