package dev.couplet.model;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayDeque;
import java.util.Collection;
import java.util.Deque;
import java.util.Iterator;
import java.util.List;

/** How this package writes numbers, lists and expressions; every text is of bounded length. */
final class Text {
  private static final int SHOWN_ITEMS = 8;
  private static final int SHOWN_PIECES = 24;
  private static final int SHOWN_CHARACTERS = 1000;

  private Text() {}

  /** The shortest decimal that stands for the number, the same on every JDK. */
  static String number(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 1e15) {
      return Long.toString((long) value);
    }
    return Double.isFinite(value) ? decimal(value).toString() : String.valueOf(value);
  }

  /** The decimal with the fewest digits that the double stands for. */
  static BigDecimal decimal(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 0x1p53) {
      return BigDecimal.valueOf((long) value);
    }
    BigDecimal exact = new BigDecimal(value);
    for (int digits = 1; digits < 17; digits++) {
      BigDecimal rounded = exact.round(new MathContext(digits));
      if (rounded.doubleValue() == value) {
        return rounded;
      }
    }
    return exact.round(new MathContext(17));
  }

  static String list(Collection<?> items) {
    StringBuilder text = new StringBuilder("[");
    Iterator<?> iterator = items.iterator();
    for (int i = 0; i < SHOWN_ITEMS && iterator.hasNext(); i++) {
      text.append(i == 0 ? "" : ", ").append(iterator.next());
    }
    if (iterator.hasNext()) {
      text.append(", ... ").append(items.size() - SHOWN_ITEMS).append(" more");
    }
    return text.append(']').toString();
  }

  static String between(String middle, double lowest, double highest) {
    if (lowest == highest) {
      return middle + " = " + number(lowest);
    }
    String text = middle;
    if (lowest != Double.NEGATIVE_INFINITY) {
      text = highest == Double.POSITIVE_INFINITY ? text + " >= " : number(lowest) + " <= " + text;
      text = highest == Double.POSITIVE_INFINITY ? text + number(lowest) : text;
    }
    return highest == Double.POSITIVE_INFINITY ? text : text + " <= " + number(highest);
  }

  /** An expression, cut short after some pieces; walks without recursion, however deep it is. */
  static String of(Expr expr) {
    StringBuilder text = new StringBuilder();
    Deque<Object> pending = new ArrayDeque<>(List.of(expr));
    for (int pieces = 0; !pending.isEmpty(); ) {
      Object next = pending.pop();
      if (text.length() > SHOWN_CHARACTERS) {
        return text.append("...").toString();
      }
      if (next instanceof String symbol) {
        text.append(symbol);
      } else if (next instanceof Node.Sum sum) {
        pushAll(pending, sum.parts, " + ");
      } else if (next instanceof Compound compound) {
        pending.push(")");
        pushAll(pending, compound.parts(), " " + compound.kind().word + " ");
        pending.push("(");
      } else if (next instanceof Node.Product product) {
        push(pending, "(", product.left, ")(", product.right, ")");
      } else if (next instanceof Node.Scaled scaled) {
        push(pending, number(scaled.factor) + " (", scaled.part, ")");
      } else if (pieces++ == SHOWN_PIECES) {
        return text.append("...").toString();
      } else {
        text.append(next);
      }
    }
    return text.toString();
  }

  private static void push(Deque<Object> pending, Object... items) {
    for (int i = items.length - 1; i >= 0; i--) {
      pending.push(items[i]);
    }
  }

  private static void pushAll(Deque<Object> pending, List<? extends Expr> parts, String between) {
    if (parts.isEmpty()) {
      pending.push("0");
    }
    for (int i = parts.size() - 1; i >= 0; i--) {
      pending.push(parts.get(i));
      if (i > 0) {
        pending.push(between);
      }
    }
  }
}
