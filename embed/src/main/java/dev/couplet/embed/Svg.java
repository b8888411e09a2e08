package dev.couplet.embed;

/**
 * Collects the text of an SVG document. Numbers have one decimal at most, so that the text is short
 * and the same on every platform.
 */
final class Svg {
  private final StringBuilder text = new StringBuilder();

  /** Appends a start tag with attributes, names and values in turn. */
  void open(String tag, Object... attributes) {
    tag(tag, attributes);
    text.append(">\n");
  }

  void close(String tag) {
    text.append("</").append(tag).append(">\n");
  }

  /** Appends an element without content. */
  void element(String tag, Object... attributes) {
    tag(tag, attributes);
    text.append("/>\n");
  }

  /** Appends an element with a text in it. */
  void write(String content, String tag, Object... attributes) {
    tag(tag, attributes);
    text.append('>').append(escape(content)).append("</").append(tag).append(">\n");
  }

  private void tag(String tag, Object... attributes) {
    text.append('<').append(tag);
    for (int k = 0; k < attributes.length; k += 2) {
      String value =
          attributes[k + 1] instanceof Double number
              ? number(number)
              : attributes[k + 1].toString();
      text.append(' ').append(attributes[k]).append("=\"").append(escape(value)).append('"');
    }
  }

  static String number(double value) {
    long tenths = Math.round(10 * value);
    String sign = tenths < 0 ? "-" : "";
    long whole = Math.abs(tenths) / 10;
    long rest = Math.abs(tenths) % 10;
    return rest == 0 ? sign + whole : sign + whole + "." + rest;
  }

  private static String escape(String raw) {
    StringBuilder escaped = new StringBuilder(raw.length());
    for (int i = 0; i < raw.length(); i++) {
      char c = raw.charAt(i);
      switch (c) {
        case '&' -> escaped.append("&amp;");
        case '<' -> escaped.append("&lt;");
        case '>' -> escaped.append("&gt;");
        case '"' -> escaped.append("&quot;");
        default -> escaped.append(c < ' ' ? ' ' : c);
      }
    }
    return escaped.toString();
  }

  @Override
  public String toString() {
    return text.toString();
  }
}
