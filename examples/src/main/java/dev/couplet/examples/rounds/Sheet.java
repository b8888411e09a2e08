package dev.couplet.examples.rounds;

/** A page of plain text being written, at most {@value #WIDTH} columns wide. */
final class Sheet {
  static final int WIDTH = 80;
  private static final String INDENT = "  ";

  private final StringBuilder text = new StringBuilder();

  /** A page that begins with a heading. */
  static Sheet headed(String heading) {
    return new Sheet().line(heading).line("-".repeat(heading.length()));
  }

  Sheet line(String line) {
    text.append(line).append('\n');
    return this;
  }

  Sheet blank() {
    return line("");
  }

  /** A paragraph, wrapped. */
  Sheet paragraph(String words) {
    Wrap.lines(words, WIDTH - INDENT.length()).forEach(piece -> line(INDENT + piece));
    return this;
  }

  Sheet table(Columns columns) {
    columns.lines(WIDTH - INDENT.length()).forEach(row -> line(INDENT + row));
    return this;
  }

  @Override
  public String toString() {
    return text.toString();
  }
}
