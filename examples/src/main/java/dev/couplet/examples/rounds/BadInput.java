package dev.couplet.examples.rounds;

/** Input that cannot be used; the message is one line that names where the fault lies. */
final class BadInput extends RuntimeException {
  private static final long serialVersionUID = 1;

  BadInput(String message) {
    super(message);
  }
}
