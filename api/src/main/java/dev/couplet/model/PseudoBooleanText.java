package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.FormatException;
import java.io.IOException;
import java.io.Reader;
import java.io.Writer;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * Reads and writes models in OPB, the text of the pseudo-Boolean competitions: an objective to be
 * minimised, and linear or nonlinear constraints with whole coefficients.
 *
 * <pre>{@code
 * * #variable= 3 #constraint= 2
 * min: +2 x1 -3 x2 x3 ;
 * +1 x1 +1 x2 >= 1 ;
 * +1 ~x1 x3 +4 x2 = 4 ;
 * }</pre>
 *
 * <p>Variables {@code x1, x2, ...} are bits of these names, constraints are required rules named
 * {@code constraint 1, ...}; {@code ~x} is a negation, literals side by side are a product, a line
 * that begins with {@code *} is a comment.
 *
 * <p>What the text has no place for stands in comment lines that other readers skip, before the
 * objective:
 *
 * <ul>
 *   <li>{@code *couplet constant VALUE}: the objective's constant, in the model's own units
 *   <li>{@code *couplet decimals N}: the objective is written 10^N times as large as it is
 *   <li>{@code *couplet maximize}: the model maximises; its objective is written with its sign
 *       changed
 * </ul>
 *
 * <p>Written are the literals of a statement in their order, what each stands for in comments. A
 * choice becomes an equality over its literals. A rule becomes one equality, or an inequality for
 * each of its limits; its coefficients are whole already, the unit they were scaled by is not kept,
 * and rules without a literal are left out. A preferred rule becomes a required one with variables
 * of its own that count by how much it is missed, each at its cost in the objective: the optimum is
 * the model's, at the price of about log2 of the largest miss in variables.
 *
 * <p>Reading what was written gives the same objective and the same limits on the same polynomials,
 * factors common to all numbers of a constraint apart. Everything is exact: numbers that add up to
 * 2^51 or more, where doubles and their sums begin to round, are refused in both directions. Time
 * and memory are linear in the length of the text and in the terms multiplied out.
 *
 * <p>Source of the format: Roussel and Manquinho, "Input/output format and solver requirements for
 * the competitions of pseudo-Boolean solvers" (2012), from memory.
 */
public final class PseudoBooleanText {
  static final String CONSTANT = "*couplet constant";
  static final String DECIMALS = "*couplet decimals";
  static final String MAXIMIZE = "*couplet maximize";
  static final int MOST_DECIMALS = 300;
  static final long LIMIT = 1L << 51;

  private PseudoBooleanText() {}

  /**
   * Reads a model; it is named like its source.
   *
   * @param source the name of the text in error messages
   * @throws FormatException with line and column of the first fault; also for a constraint that
   *     nothing can satisfy, and for more than 2^24 terms that products of negations multiply out
   *     to
   * @throws IOException if the reader fails
   */
  @CheckReturnValue
  public static Model read(String source, Reader reader) throws IOException {
    return new PseudoBooleanReader(source, reader).read();
  }

  /**
   * Reads a model from a file in UTF-8.
   *
   * @throws FormatException with file, line and column of the first fault, as for any text
   * @throws IOException if the file cannot be read
   */
  @CheckReturnValue
  public static Model read(Path file) throws IOException {
    try (Reader reader = Files.newBufferedReader(file)) {
      return read(file.toString(), reader);
    }
  }

  /**
   * Writes a statement. Nothing is written if it is refused.
   *
   * @throws IllegalArgumentException if the objective cannot be written in whole numbers that add
   *     up to less than 2^51, whatever power of ten they are multiplied by
   * @throws IOException if the output fails
   */
  public static void write(Statement statement, Appendable out) throws IOException {
    new PseudoBooleanWriter(statement).write(out);
  }

  /**
   * Writes a statement to a file, new or overwritten. Nothing is written if it is refused.
   *
   * @throws IllegalArgumentException as for any output
   * @throws IOException if the file cannot be written
   */
  public static void write(Statement statement, Path file) throws IOException {
    PseudoBooleanWriter ready = new PseudoBooleanWriter(statement);
    try (Writer writer = Files.newBufferedWriter(file)) {
      ready.write(writer);
    }
  }
}
