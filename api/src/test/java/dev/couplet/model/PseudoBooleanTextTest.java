package dev.couplet.model;

import static dev.couplet.model.Expr.constant;
import static dev.couplet.model.Expr.product;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.FormatException;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.io.StringReader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PseudoBooleanTextTest {
  /** In the style of the format's definition: an objective, relations and signs of each kind. */
  private static final String LINEAR =
      """
      * #variable= 5 #constraint= 4
      *
      * this is a dummy instance
      *
      min: 1 x2 -1 x3 ;
      1 x1 +4 x2 -2 x5 >= 2;
      -1 x1 +4 x2 -2 x5 >= +3 ;
      12345 x4 +4 x3 >= 10 ;
      * an equality
      2 x2 +3 x4 +2 x1 +3 x5 = 5 ;
      """;

  private static final String NONLINEAR =
      """
      * #variable= 5 #constraint= 3 #product= 5 sizeproduct= 13
      min: 1 x2 x3 +2 x4 ~x5 ;
      1 x1 +4 x1 ~x2 -2 x5 >= 1;
      -1 x1 +4 x2 -2 x5 x1 x2 >= -1;
      +2 ~x1 ~x2 +3 x3 x4 x5 = 3 ;
      """;

  @TempDir Path folder;

  private static Statement read(String text) throws IOException {
    return PseudoBooleanText.read("test", new StringReader(text)).snapshot();
  }

  private static String write(Model model) throws IOException {
    StringBuilder text = new StringBuilder();
    PseudoBooleanText.write(model.snapshot(), text);
    return text.toString();
  }

  private static FormatException fault(String text) {
    return assertThrows(FormatException.class, () -> read(text));
  }

  private static Rule.Part only(Statement statement, int rule) {
    assertEquals(1, statement.rules().get(rule).parts().size());
    return statement.rules().get(rule).parts().get(0);
  }

  @Test
  void aLinearTextIsRead() throws IOException {
    Statement statement = read(LINEAR);
    assertEquals(5, statement.literals());
    assertEquals(Sense.MINIMIZE, statement.sense());
    assertEquals(Polynomial.builder(5).add(1, 1).add(-1, 2).build(), statement.objective());
    assertEquals(4, statement.rules().size());
    assertEquals("constraint 1", statement.rules().get(0).name());
    Rule.Part first = only(statement, 0);
    assertEquals(Polynomial.builder(5).add(1, 0).add(4, 1).add(-2, 4).build(), first.terms());
    assertEquals(2, first.lowest());
    assertEquals(Double.POSITIVE_INFINITY, first.highest());
    Rule.Part last = only(statement, 3);
    assertEquals(5, last.lowest());
    assertEquals(5, last.highest());
    assertEquals("x5", statement.describe(4));
  }

  /** Multiplied out by hand. */
  @Test
  void negationsAndProductsAreMultipliedOut() throws IOException {
    Statement statement = read(NONLINEAR);
    assertEquals(
        Polynomial.builder(5).add(1, 1, 2).add(2, 3).add(-2, 3, 4).build(), statement.objective());
    assertEquals(
        Polynomial.builder(5).add(5, 0).add(-4, 0, 1).add(-2, 4).build(),
        only(statement, 0).terms());
    Rule.Part last = only(statement, 2);
    assertEquals(
        Polynomial.builder(5).add(-2, 0).add(-2, 1).add(2, 0, 1).add(3, 2, 3, 4).build(),
        last.terms());
    assertEquals(1, last.lowest());
    assertEquals(1, last.highest());
  }

  @Test
  void spacesAreNeededOnlyWhereTheFormatSaysSo() throws IOException {
    String tight = "min:-1 x1;+1 x1 +1 x2>=1;+1 x1\n~x2\n=0;";
    String wide = "min: -1 x1 ;\n +1 x1 +1 x2 >= 1 ;\n +1 x1 ~x2 = 0 ;\n";
    assertEquals(read(wide).objective(), read(tight).objective());
    for (int k = 0; k < 2; k++) {
      assertEquals(only(read(wide), k).terms(), only(read(tight), k).terms());
      assertEquals(only(read(wide), k).lowest(), only(read(tight), k).lowest());
      assertEquals(only(read(wide), k).highest(), only(read(tight), k).highest());
    }
  }

  @Test
  void variablesThatOccurNowhereAreBitsToo() throws IOException {
    assertEquals(7, read("* #variable= 7 #constraint= 1\n1 x2 >= 1 ;\n").literals());
    assertEquals(3, read("1 x3 >= 1 ;\n").literals());
    assertEquals(0, read("").literals());
    assertEquals(2, read("* #variable= 2 #constraint= 0\nmin: ;\n").literals());
  }

  @Test
  void aLiteralAndItsNegationMultiplyToNothing() throws IOException {
    assertEquals(0, read("min: 3 x1 ~x1 ;").objective().terms());
    assertEquals(Polynomial.builder(1).add(3, 0).build(), read("min: 3 x1 x1 ;").objective());
  }

  @Test
  void constantUnitAndSenseAreKept() throws IOException {
    Statement statement =
        read(
            "* #variable= 2 #constraint= 0\n*couplet constant 2.5\n*couplet decimals 1\n"
                + "*couplet maximize\nmin: -3 x1 +10 x2 ;\n");
    assertEquals(Sense.MAXIMIZE, statement.sense());
    assertEquals(
        Polynomial.builder(2).add(2.5).add(0.3, 0).add(-1, 1).build(), statement.objective());
  }

  @Test
  void aConstantAloneIsAnObjective() throws IOException {
    Statement statement = read("*couplet constant -1e-3\n1 x1 >= 0 ;");
    assertEquals(-0.001, statement.objective().constant());
    assertEquals(1, statement.objectives().size());
  }

  @Test
  void aModelIsWrittenAsItReads() throws IOException {
    Model model = Model.named("small");
    Bit a = model.bit("tea");
    Choice<String> c = model.choice("cake", List.of("plum", "apple"));
    model.require("not both", sum(a, c.is("plum")).atMost(1));
    model.require("some", sum(a.times(2), c.is("apple")).between(1, 2));
    model.maximize("joy", sum(a.times(1.5), a.times(c.is("apple")), constant(4)));
    assertEquals(
        """
        * #variable= 3 #constraint= 4 #product= 1 sizeproduct= 2
        * small
        * x1 is tea
        * x2 is cake = plum
        * x3 is cake = apple
        *couplet constant 4
        *couplet decimals 1
        *couplet maximize
        min: -15 x1 -10 x1 x3 ;
        * one option of 'cake'
        +1 x2 +1 x3 = 1 ;
        * not both
        -1 x1 -1 x2 >= -1 ;
        * some
        +2 x1 +1 x3 >= 1 ;
        * some
        -2 x1 -1 x3 >= -2 ;
        """,
        write(model));
  }

  /** The optimum and each plan's value stay, with the misses counted in variables of their own. */
  @Test
  void preferredRulesBecomeCosts() throws IOException {
    Model model = Model.named("soft");
    List<Bit> x = List.of(model.bit("a"), model.bit("b"), model.bit("c"), model.bit("d"));
    model.prefer("exactly one", sum(x).exactly(1), 2.5);
    model.prefer("no matter", sum(x).exactly(3), 0);
    model.maximize("sum", sum(x.get(0).times(3), x.get(1).times(2), x.get(2).times(2)));
    Statement written = read(write(model));
    Statement own = model.snapshot();
    assertEquals(4 + 2 + 1, written.literals());
    for (long pattern = 0; pattern < 16; pattern++) {
      double best = Double.NEGATIVE_INFINITY;
      for (long counts = 0; counts < 8; counts++) {
        Plan plan = written.plan(State.ofWords(7, counts << 4 | pattern));
        best = plan.feasible() ? Math.max(best, plan.value()) : best;
      }
      assertEquals(own.plan(State.ofWords(4, pattern)).value(), best);
    }
  }

  @Test
  void filesAreWrittenAndRead() throws IOException {
    Path file = folder.resolve("small.opb");
    PseudoBooleanText.write(read(NONLINEAR), file);
    Model again = PseudoBooleanText.read(file);
    assertEquals(file.toString(), again.name());
    assertEquals(read(NONLINEAR).objective(), again.snapshot().objective());
    Files.writeString(file, "1 x1 >= 1");
    FormatException fault = assertThrows(FormatException.class, () -> PseudoBooleanText.read(file));
    assertEquals(file.toString(), fault.source());
  }

  @Test
  void whatIsNotWholeIsRefusedBeforeAnythingIsWritten() throws IOException {
    Model third = Model.named("third");
    third.minimize("part", third.bit("a").times(1 / 3.0));
    Path file = folder.resolve("third.opb");
    IllegalArgumentException refusal =
        assertThrows(
            IllegalArgumentException.class, () -> PseudoBooleanText.write(third.snapshot(), file));
    assertTrue(refusal.getMessage().contains("16 decimals"), refusal.getMessage());
    assertFalse(Files.exists(file));
    Model large = Model.named("large");
    large.minimize("part", large.bit("a").times(0x1p51));
    assertThrows(IllegalArgumentException.class, () -> write(large));
    Model tiny = Model.named("tiny");
    tiny.minimize("part", tiny.bit("a").times(1e-301));
    assertThrows(IllegalArgumentException.class, () -> write(tiny));
    Model just = Model.named("just");
    just.minimize("part", just.bit("a").times(0x1p51 - 1));
    assertTrue(write(just).contains("+2251799813685247 x1 ;"));
  }

  /** A name with a line end would break out of its comment. */
  @Test
  void namesStayInTheirLine() throws IOException {
    Model model = Model.named("two\nlines");
    model.bit("a\r\n1 x1 >= 1 ;");
    model.minimize("count", product(model.bit("b"), model.bit("c")));
    assertEquals(3, read(write(model)).literals());
    assertEquals(0, read(write(model)).rules().size());
  }

  /** What is said, at which place. Two bars stand for a line end. */
  @ParameterizedTest
  @CsvSource(
      delimiter = '!',
      textBlock =
          """
          1 x1 > 1 ;                             ! 1:6  ! change the signs
          1 x1 <= 1 ;                            ! 1:6  ! change the signs
          x1 >= 1 ;                              ! 1:1  ! the coefficient is 'x1'
          1 >= 1 ;                               ! 1:3  ! expected a literal
          1 x1 >= 1                              ! 1:10 ! the end of the text
          1 x1 >= ;                              ! 1:9  ! the right-hand side
          1 x1 >= x2 ;                           ! 1:9  ! the right-hand side
          1 x1 2 >= 1 ;                          ! 1:8  ! expected a literal
          1.5 x1 >= 1 ;                          ! 1:1  ! whole number
          1 x0 >= 1 ;                            ! 1:3  ! expected a variable
          1 y1 >= 1 ;                            ! 1:3  ! expected a literal
          1 ~~x1 >= 1 ;                          ! 1:3  ! expected a variable
          1 x1x2 >= 1 ;                          ! 1:3  ! expected a variable
          1 x99999999999999999999 >= 1 ;         ! 1:3  ! expected a variable
          1 x2147483647 >= 1 ;                   ! 1:3  ! expected a variable
          1 x1 >= 1 ; min: 1 x1 ;                ! 1:13 ! before all constraints
          max: 1 x1 ;                            ! 1:1  ! the coefficient is 'max:'
          1 x1 >= 2 ;                            ! 1:1  ! can be kept by no plan
          1 x1 >= 0 ;||2 x1 +2 x2 = 3 ;          ! 2:1  ! can be kept by no plan
          2251799813685248 x1 >= 1 ;             ! 1:1  ! less than 2^51
          1 x1 >= -2251799813685248 ;            ! 1:9  ! less than 2^51
          1 x1 +2251799813685247 x2 >= 1 ;       ! 1:6  ! add up to 2^51
          99999999999999999999 x1 >= 1 ;         ! 1:1  ! less than 2^51
          * #variable= 1 #constraint= 1||1 x2 >= 1 ; ! 2:3 ! x1 to x1
          * #variable= 1 #constraint= 2||1 x1 >= 1 ; ! 2:12 ! its first line says 2
          * #variable= 999999999999 #constraint= 1 ! 1:14 ! the number is
          * #variable= -1 #constraint= 1           ! 1:14 ! the number is
          * #variable= 1 #constraint= many         ! 1:29 ! the number is
          *couplet constant||min: 1 x1 ;         ! 1:1  ! *couplet constant VALUE
          *couplet constant 0x1p3||min: 1 x1 ;   ! 1:1  ! *couplet constant VALUE
          *couplet constant 1e999||min: 1 x1 ;   ! 1:1  ! *couplet constant VALUE
          *couplet decimals 301||min: 1 x1 ;     ! 1:1  ! from 0 to 300
          *couplet maximize||*couplet maximize   ! 2:1  ! at most once
          *couplet colour blue||min: 1 x1 ;      ! 1:1  ! must be one of
          min: 1 x1 ;||*couplet constant 1       ! 2:1  ! before the objective
          min: 1 x1 >= 1 ;                       ! 1:11 ! expected a term or ';'
          """)
  void faultsArePointedAt(String text, String place, String words) {
    FormatException fault = fault(text.replace("||", "\n"));
    assertTrue(fault.getMessage().contains(words), fault.getMessage());
    assertEquals(place, fault.line() + ":" + fault.column(), fault.getMessage());
  }

  /** Eighteen negations are 2^18 terms; several such products are too many. */
  @Test
  void productsOfManyNegationsAreRefusedBeforeTheyAreMultipliedOut() {
    StringBuilder product = new StringBuilder("1");
    for (int k = 1; k <= 60; k++) {
      product.append(" ~x").append(k);
    }
    FormatException fault = fault(product + " >= 0 ;");
    assertTrue(fault.getMessage().contains("2^24"), fault.getMessage());
  }
}
