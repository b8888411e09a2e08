package dev.couplet.form;

import java.io.IOException;
import java.io.Reader;
import java.io.Writer;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * Reads and writes a {@link Qubo} as a symmetric matrix A in Matrix Market coordinate text: the
 * form is {@code constant + x'Ax}, to be minimised.
 *
 * <p>The text holds the lower triangle. An off-diagonal entry stands for two places of the matrix,
 * so it is half the coefficient of its pair; a diagonal entry is a linear coefficient. Entries for
 * the same place add up. The format has no place for a constant: it is written as the comment line
 * {@code %couplet constant VALUE}, which other readers skip.
 *
 * <p>Writing and reading again gives an equal form. Source of the format: Boisvert, Pozo and
 * Remington, "The Matrix Market exchange formats: initial design" (1996), from memory.
 */
public final class MatrixMarket {
  static final String HEADER = "%%MatrixMarket matrix coordinate real symmetric";
  static final String CONSTANT = "%couplet constant";

  private MatrixMarket() {}

  /**
   * Reads a form; linear in the length of the text.
   *
   * @param source the name of the text in error messages
   * @throws FormatException with line and column of the first fault
   * @throws IOException if the reader fails
   */
  @CheckReturnValue
  public static Qubo read(String source, Reader reader) throws IOException {
    return new MatrixReader(source, reader).read();
  }

  /**
   * Reads a form from a file in UTF-8; linear in its length.
   *
   * @throws FormatException with file, line and column of the first fault
   * @throws IOException if the file cannot be read
   */
  @CheckReturnValue
  public static Qubo read(Path file) throws IOException {
    try (Reader reader = Files.newBufferedReader(file)) {
      return read(file.toString(), reader);
    }
  }

  /**
   * Writes a form; linear in n + m. Nothing is written if the form is refused.
   *
   * @throws IllegalArgumentException if half a coefficient is not a double (a pair below 2^-1073)
   * @throws IOException if the output fails
   */
  public static void write(Qubo form, Appendable out) throws IOException {
    MatrixWriter.write(form, out);
  }

  /**
   * Writes a form to a file, new or overwritten; linear in n + m.
   *
   * @throws IllegalArgumentException if half a coefficient is not a double (a pair below 2^-1073)
   * @throws IOException if the file cannot be written
   */
  public static void write(Qubo form, Path file) throws IOException {
    MatrixWriter.requireHalves(form);
    try (Writer writer = Files.newBufferedWriter(file)) {
      write(form, writer);
    }
  }
}
