package dev.couplet.model;

import dev.couplet.form.FormatException;
import java.io.IOException;
import java.io.Reader;
import java.util.ArrayList;
import java.util.List;
import java.util.function.LongToDoubleFunction;

/** Reads one OPB text. */
final class PseudoBooleanReader {
  /** About what a bit takes with its name, in bytes: a slip of the pen must not fill the memory. */
  private static final int BYTES_A_BIT = 256;

  /** Products of negations multiply out to powers of two of terms: so many a text, no more. */
  private static final long MOST_EXTRA_TERMS = 1L << 24;

  private final PseudoBooleanScanner text;
  private final PseudoBooleanNotes notes;
  private final Model model;
  private final List<Bit> bits = new ArrayList<>();
  private long extraTerms;

  private static final int MOST_DIGITS_OF_A_NAME = 10;
  private static final int MOST_DIGITS = 17;

  /** A sum, and the magnitudes of its coefficients added up. */
  private static final class Sum {
    final List<Expr> parts = new ArrayList<>();
    long magnitude;
  }

  PseudoBooleanReader(String source, Reader reader) {
    this.model = Model.named(source);
    this.notes = new PseudoBooleanNotes();
    this.text = new PseudoBooleanScanner(source, reader, this::comment);
  }

  private void comment(String line) {
    notes.read(line, text);
  }

  Model read() throws IOException {
    boolean more = text.advance();
    if (more && text.is("min:")) {
      text.advance();
      readObjective();
      more = text.advance();
    } else {
      addObjective(new Sum());
    }
    int constraints = 0;
    while (more) {
      readConstraint("constraint " + ++constraints);
      more = text.advance();
    }
    requireAll(constraints);
    return model;
  }

  private void requireAll(int constraints) {
    if (notes.constraints().isPresent() && notes.constraints().getAsLong() != constraints) {
      throw text.fault(
          "the text ends after "
              + constraints
              + " constraints, its first line says "
              + notes.constraints().getAsLong()
              + "; mend the one or the other");
    }
    if (notes.variables().isPresent()) {
      int declared = (int) notes.variables().getAsLong();
      if (declared > 0) {
        grow(declared);
      }
    }
  }

  private void readObjective() throws IOException {
    int line = text.tokenLine();
    int start = text.tokenStart();
    Sum sum = text.is(";") ? new Sum() : readSum(notes::inOwnUnits);
    require(";", "a term or ';'");
    try {
      addObjective(sum);
    } catch (FormatException known) {
      throw known;
    } catch (IllegalArgumentException refused) {
      throw text.at(line, start, String.valueOf(refused.getMessage()));
    }
  }

  /** The objective in its own sense and units; a model without anything to say of it has none. */
  private void addObjective(Sum sum) {
    List<Expr> parts = new ArrayList<>(sum.parts);
    if (notes.constant() != 0) {
      parts.add(Expr.constant(notes.constant()));
    }
    if (notes.maximizes()) {
      model.maximize("objective", Expr.sum(parts));
    } else if (!parts.isEmpty()) {
      model.minimize("objective", Expr.sum(parts));
    }
    notes.close();
  }

  private void readConstraint(String name) throws IOException {
    int line = text.tokenLine();
    int start = text.tokenStart();
    if (text.is("min:")) {
      throw text.fault("the objective must stand once, before all constraints");
    }
    Sum sum = readSum(coefficient -> (double) coefficient);
    boolean equality = text.is("=");
    if (!equality) {
      require(">=", "a term, '>=' or '='");
    }
    text.advance();
    double limit = (double) number("the right-hand side");
    text.advance();
    require(";", "';'");
    Expr terms = Expr.sum(sum.parts);
    try {
      Rule unused = model.require(name, equality ? terms.exactly(limit) : terms.atLeast(limit));
    } catch (IllegalArgumentException refused) {
      throw text.at(line, start, String.valueOf(refused.getMessage()));
    }
  }

  private void require(String word, String expected) {
    if (!text.is(word)) {
      String mend = "";
      if (text.is("<=") || text.is("<") || text.is(">")) {
        mend = "; the format knows '>=' and '=' only: change the signs";
      } else if (text.isLiteral()) {
        mend = "; every product needs a coefficient before it";
      }
      throw text.fault("expected " + expected + ", found " + text.shown() + mend);
    }
  }

  private Sum readSum(LongToDoubleFunction units) throws IOException {
    Sum sum = new Sum();
    do {
      long coefficient = number("the coefficient");
      sum.magnitude += Math.abs(coefficient);
      if (sum.magnitude >= PseudoBooleanText.LIMIT) {
        throw text.fault("the coefficients add up to 2^51 or more, sums are exact below that");
      }
      text.advance();
      sum.parts.add(product(units.applyAsDouble(coefficient)));
    } while (startsNumber());
    return sum;
  }

  private boolean startsNumber() {
    String token = text.token();
    return !token.isEmpty() && "+-0123456789".indexOf(token.charAt(0)) >= 0;
  }

  private Expr product(double factor) throws IOException {
    if (!text.isLiteral()) {
      throw text.fault("expected a literal such as x1 or ~x1, found " + text.shown());
    }
    List<Literal> literals = new ArrayList<>();
    int negated = 0;
    for (; text.isLiteral(); text.advance()) {
      Literal literal = literal();
      negated += literal.negated() ? 1 : 0;
      if (negated > 1) {
        extraTerms += 1L << Math.min(negated, 40);
        if (extraTerms > MOST_EXTRA_TERMS) {
          throw text.fault(
              "products of negated literals multiply out to 2 terms for every literal, more than 2^24"
                  + " in all up to here; name the negations by variables of their own");
        }
      }
      literals.add(literal);
    }
    Expr product = literals.size() == 1 ? literals.get(0) : Expr.product(literals);
    return factor == 1 ? product : product.times(factor);
  }

  private Literal literal() {
    String token = text.token();
    boolean negated = token.startsWith("~");
    boolean named = token.startsWith("x", negated ? 1 : 0);
    long number = named ? digits(token, negated ? 2 : 1, MOST_DIGITS_OF_A_NAME) : -1;
    if (number < 1 || number > highest()) {
      throw text.fault(
          "expected a variable from x1 to x"
              + highest()
              + " or its negation ~x1, found "
              + text.shown());
    }
    Bit bit = bit((int) number);
    return negated ? bit.not() : bit;
  }

  /** The number written in digits from a position on; -1 if it is none, or has too many digits. */
  private static long digits(String token, int from, int most) {
    int start = from;
    while (start < token.length() - 1 && token.charAt(start) == '0') {
      start++;
    }
    long number = token.length() > start && token.length() - start <= most ? 0 : -1;
    for (int k = start; k < token.length() && number >= 0; k++) {
      char c = token.charAt(k);
      number = c >= '0' && c <= '9' ? 10 * number + (c - '0') : -1;
    }
    return number;
  }

  private long highest() {
    return notes.variables().orElse(Math.min(mostBits(), Integer.MAX_VALUE - 8));
  }

  static long mostBits() {
    return Runtime.getRuntime().maxMemory() / BYTES_A_BIT;
  }

  private Bit bit(int number) {
    grow(number);
    return bits.get(number - 1);
  }

  private void grow(int count) {
    while (bits.size() < count) {
      bits.add(model.bit("x" + (bits.size() + 1)));
    }
  }

  private long number(String what) {
    String token = text.token();
    boolean signed = token.startsWith("+") || token.startsWith("-");
    long number = digits(token, signed ? 1 : 0, MOST_DIGITS);
    if (number < 0 || number >= PseudoBooleanText.LIMIT) {
      throw text.fault(
          what
              + " is "
              + text.shown()
              + ", it must be a whole number, less than 2^51 in magnitude");
    }
    return token.startsWith("-") ? -number : number;
  }
}
