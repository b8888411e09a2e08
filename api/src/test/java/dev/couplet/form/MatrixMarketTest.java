package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.StringReader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Texts written by hand from the definition of the format (Boisvert, Pozo and Remington 1996). */
class MatrixMarketTest {
  private static final String HEADER = "%%MatrixMarket matrix coordinate real symmetric\n";

  /** The matrix of Glover, Kochenberger and Du 2019, section 2; its least x'Qx is -11. */
  private static final String SECTION_2 =
      HEADER
          + "% section 2\n"
          + "4 4 8\n"
          + "1 1 -5\n2 2 -3\n3 3 -8\n4 4 -6\n"
          + "2 1 2\n3 1 4\n3 2 1\n4 3 5\n";

  private static Qubo read(String text) throws IOException {
    return MatrixMarket.read("given.mtx", new StringReader(text));
  }

  private static String written(Qubo form) throws IOException {
    StringBuilder text = new StringBuilder();
    MatrixMarket.write(form, text);
    return text.toString();
  }

  @Test
  void anOffDiagonalEntryStandsForTwoPlaces() throws IOException {
    Qubo form = read(SECTION_2);
    assertEquals(-5, form.linear(0));
    assertEquals(4, form.pair(0, 1));
    assertEquals(10, form.pair(2, 3));
    assertEquals(-11, form.value(State.parse("1001")));
    for (State state : Entries.states(4)) {
      assertTrue(form.value(state) > -11 || state.equals(State.parse("1001")));
    }
  }

  @Test
  void theConstantStandsInACommentThatOthersSkip() throws IOException {
    Qubo form = Qubo.builder(3).addConstant(-2.5).addLinear(2, 7).addPair(2, 0, -3).build();
    String text = HEADER + "%couplet constant -2.5\n3 3 2\n3 3 7\n3 1 -1.5\n";
    assertEquals(text, written(form));
    assertEquals(form, read(text));
  }

  @Test
  void numbersAreWrittenToTheLastBit() throws IOException {
    Qubo form =
        Qubo.builder(1).addConstant(0.1).addLinear(0, Double.MIN_VALUE).allowRounding().build();
    assertEquals(
        HEADER + "%couplet constant 0.10000000000000001\n1 1 1\n1 1 4.9406564584124654E-324\n",
        written(form));
    assertEquals(form, read(written(form)));
    Qubo large = Qubo.builder(1).allowRounding().addLinear(0, 0x1p60).build();
    assertEquals(HEADER + "1 1 1\n1 1 1.1529215046068470E+18\n", written(large));
    assertEquals(large, read(written(large)));
    Qubo largest = Qubo.builder(1).allowRounding().addLinear(0, Double.MAX_VALUE).build();
    assertEquals(largest, read(written(largest)));
  }

  @Test
  void theFormatsLibertiesAreTaken() throws IOException {
    Qubo expected = Qubo.builder(2).addLinear(0, 1).addPair(0, 1, -1).build();
    assertEquals(
        expected,
        read(
            "%%matrixmarket MATRIX Coordinate Real SYMMETRIC\r\n\r\n%\r\n2\t2 2\r\n1 1 1.0\r\n"
                + "2 1 -5E-1\r\n\r\n"));
    assertEquals(
        expected.times(2),
        read("%%MatrixMarket matrix coordinate integer symmetric\n%\n2 2 2\n1 1 2\n2 1 -1"));
    assertEquals(expected, read(HEADER + "  2   2 3  \n\n 1 1 0.5\n1 1 .5\n\n 2 1 -5e-1 \n  \n"));
    assertEquals(Qubo.builder(0).build(), read(HEADER + "0 0 0\n"));
    assertEquals(Qubo.builder(5).build(), read(HEADER + "%couplet is a library\n5 5 0"));
    assertEquals(
        Qubo.builder(1).addConstant(3).build(),
        read(HEADER + "%couplet constantly\n%couplet constant 3\n1 1 0"));
  }

  private static Arguments fault(int line, int column, String what, String text) {
    return Arguments.of(line, column, what, text);
  }

  static Stream<Arguments> faults() {
    String number = "it must be a finite number";
    return Stream.of(
        fault(1, 1, "the header '" + HEADER.strip() + "' is missing", ""),
        fault(1, 1, "the header says '2' where '%%matrixmarket' is needed", "2 2 1\n"),
        fault(
            1,
            23,
            "the header says 'array' where 'coordinate'",
            HEADER.replace("coordinate", "array")),
        fault(1, 34, "the header says 'pattern' where 'real'", HEADER.replace("real", "pattern")),
        fault(1, 39, "the header says 'general' where", HEADER.replace("symmetric", "general")),
        fault(1, 49, "nothing more was expected", HEADER.strip() + " twice\n"),
        fault(2, 1, "the text ends before the line of sizes", HEADER),
        fault(4, 1, "the text ends before the line of sizes", HEADER + "% a\n\n"),
        fault(2, 1, "the number of rows is 'x'", HEADER + "x 2 1\n"),
        fault(2, 1, "from 0 to 2147483639", HEADER + "-1 2 1\n"),
        fault(2, 3, "the matrix is 2 by 3, it must be square", HEADER + "2 3 1\n"),
        fault(
            2,
            5,
            "the number of entries is '4', it must be a whole number from 0 to 3",
            HEADER + "2 2 4\n"),
        fault(2, 4, "the number of entries is missing", HEADER + "2 2\n"),
        fault(2, 7, "nothing more was expected on this line, found '9'", HEADER + "2 2 1 9\n"),
        fault(2, 12, "takes more than the", HEADER + "2147483639 2147483639 1\n1 1 1\n"),
        fault(
            3,
            1,
            "the row is '0', it must be a whole number from 1 to 2",
            HEADER + "2 2 1\n0 1 5\n"),
        fault(3, 3, "the column is '3'", HEADER + "2 2 1\n2 3 5\n"),
        fault(3, 3, "entry (1, 2) lies above the diagonal", HEADER + "2 2 1\n1 2 5\n"),
        fault(3, 4, "the value is missing", HEADER + "2 2 1\n2 1\n"),
        fault(3, 5, "the value is '1,5', " + number, HEADER + "2 2 1\n2 1 1,5\n"),
        fault(3, 5, "the value is 'NaN', " + number, HEADER + "2 2 1\n2 1 NaN\n"),
        fault(3, 5, "the value is '1e999', " + number, HEADER + "2 2 1\n2 1 1e999\n"),
        fault(3, 5, "the value is '1d', " + number, HEADER + "2 2 1\n2 1 1d\n"),
        fault(3, 5, "the value is '0x1p3', " + number, HEADER + "2 2 1\n2 1 0x1p3\n"),
        fault(3, 5, "stands for two places and overflows", HEADER + "2 2 1\n2 1 1e308\n"),
        fault(4, 8, "found '8'", HEADER + "2 2 2\n1 1 1\n 2 1 3 8\n"),
        fault(4, 1, "the text ends where entry 2 of 2 should stand", HEADER + "2 2 2\n1 1 1\n"),
        fault(5, 2, "nothing more was expected", HEADER + "2 2 1\n1 1 1\n\n 2 2 1\n"),
        fault(
            5,
            1,
            "the linear coefficient of variable 0 is Infinity",
            HEADER + "2 2 2\n1 1 1e308\n1 1 1e308\n"),
        fault(2, 19, "the constant is 'three'", HEADER + "%couplet constant three\n1 1 0\n"),
        fault(2, 18, "the constant is missing", HEADER + "%couplet constant\n1 1 0\n"),
        fault(
            3,
            10,
            "the constant stands for the second time",
            HEADER + "%couplet constant 1\n%couplet constant 1\n1 1 0\n"));
  }

  @ParameterizedTest(name = "{0}:{1} {2}")
  @MethodSource("faults")
  void aFaultIsPointedAt(int line, int column, String what, String text) {
    FormatException fault = assertThrows(FormatException.class, () -> read(text));
    assertTrue(fault.getMessage().contains(what), fault::getMessage);
    assertEquals("given.mtx:" + line + ":" + column, place(fault), fault::getMessage);
    assertTrue(fault.getMessage().startsWith(place(fault) + ": "), fault::getMessage);
  }

  private static String place(FormatException fault) {
    return fault.source() + ":" + fault.line() + ":" + fault.column();
  }

  @Test
  void aFormThatCannotBeHalvedIsRefusedBeforeAnythingIsWritten(@TempDir Path folder)
      throws IOException {
    Qubo form = Qubo.builder(2).addPair(0, 1, 3 * Double.MIN_VALUE).build();
    StringBuilder text = new StringBuilder();
    String told =
        assertThrows(IllegalArgumentException.class, () -> MatrixMarket.write(form, text))
            .getMessage();
    assertTrue(told.endsWith("of pair (0, 1) is no double"), told);
    assertEquals("", text.toString());
    Path file = folder.resolve("form.mtx");
    assertThrows(IllegalArgumentException.class, () -> MatrixMarket.write(form, file));
    assertTrue(Files.notExists(file));
  }

  @Test
  void filesAreWrittenAndRead(@TempDir Path folder) throws IOException {
    Path file = folder.resolve("form.mtx");
    Qubo form = read(SECTION_2);
    MatrixMarket.write(form, file);
    assertEquals(form, MatrixMarket.read(file));
    Files.writeString(file, HEADER + "1 1 1\n1 2 3\n");
    FormatException fault = assertThrows(FormatException.class, () -> MatrixMarket.read(file));
    assertEquals(file.toString(), fault.source());
    assertEquals(3, fault.column());
  }

  @Test
  void whatTheOutputThrowsComesThrough() {
    Appendable full =
        new Appendable() {
          @Override
          public Appendable append(CharSequence text) throws IOException {
            throw new IOException("no space left");
          }

          @Override
          public Appendable append(CharSequence text, int start, int end) throws IOException {
            return append(text);
          }

          @Override
          public Appendable append(char c) throws IOException {
            return append("");
          }
        };
    Qubo form = Qubo.builder(1).build();
    IOException thrown = assertThrows(IOException.class, () -> MatrixMarket.write(form, full));
    assertEquals("no space left", thrown.getMessage());
  }
}
