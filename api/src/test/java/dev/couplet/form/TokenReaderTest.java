package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.StringReader;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class TokenReaderTest {
  private static TokenReader at(String text) throws IOException {
    TokenReader reader = new TokenReader("text", new StringReader(text));
    assertTrue(reader.nextLine());
    return reader;
  }

  @Test
  void tokensStandBetweenWhiteSpace() throws IOException {
    TokenReader text = at("  one\ttwo   three \r\n\n \n4");
    assertEquals("one", text.token("the first"));
    assertEquals("two", text.token("the second"));
    assertTrue(text.hasToken());
    assertEquals("three", text.token("the third"));
    assertFalse(text.hasToken());
    text.endOfLine();
    text.seekToken("the fourth");
    assertEquals(4, text.integer("the fourth", 4, 4));
    assertFalse(text.nextLine());
    assertFalse(text.hasToken());
    assertEquals("", text.line());
  }

  @Test
  void theLineStaysWholeWhileItsTokensAreTaken() throws IOException {
    TokenReader text = at(" a b\nc");
    assertEquals("a", text.token("a letter"));
    assertEquals(" a b", text.line());
    assertTrue(text.nextLine());
    assertEquals("c", text.line());
  }

  @Test
  void aFaultStandsAtTheTokenReadLast() throws IOException {
    TokenReader text = at("\nab  cd");
    text.seekToken("two words");
    assertEquals("ab", text.token("a word"));
    assertEquals("text:2:1: odd", text.fault("odd").getMessage());
    assertEquals("cd", text.token("a word"));
    assertEquals("text:2:5: odd", text.fault("odd").getMessage());
    FormatException missing = assertThrows(FormatException.class, () -> text.token("a word"));
    assertEquals("text:2:7: a word is missing", missing.getMessage());
    FormatException end = assertThrows(FormatException.class, () -> text.seekToken("a word"));
    assertEquals("text:3:1: the text ends where a word should stand", end.getMessage());
  }

  @Test
  void whatIsLeftOfALineIsPointedAt() throws IOException {
    TokenReader text = at("a  b c");
    assertEquals("a", text.token("a letter"));
    FormatException fault = assertThrows(FormatException.class, text::endOfLine);
    assertEquals("text:1:4: nothing more was expected on this line, found 'b'", fault.getMessage());
  }

  @Test
  void aFaultBeforeTheFirstLineStandsOnTheFirst() {
    TokenReader text = new TokenReader("text", new StringReader("a"));
    assertEquals("text:1:1: odd", text.fault("odd").getMessage());
  }

  @Test
  void aBufferedReaderIsReadNoFurtherThanTheLine() throws IOException {
    BufferedReader shared = new BufferedReader(new StringReader("a b\nrest\n"));
    assertTrue(new TokenReader("text", shared).nextLine());
    assertEquals("rest", shared.readLine());
  }

  @ParameterizedTest
  @CsvSource({
    "0,0",
    "-5,-5",
    "+5,5",
    "0010,10",
    "2147483647,2147483647",
    "-2147483648,-2147483648"
  })
  void wholeNumbersAreRead(String token, int value) throws IOException {
    int read = at(token).integer("the count", Integer.MIN_VALUE, Integer.MAX_VALUE);
    assertEquals(value, read);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"1.0", "1e3", "x", "2147483648", "99999999999999999999", "0x1", "1_0", "-"})
  void otherTokensAreNoWholeNumbers(String token) throws IOException {
    TokenReader text = at(token);
    FormatException fault =
        assertThrows(FormatException.class, () -> text.integer("the count", -1, Integer.MAX_VALUE));
    assertEquals(
        "text:1:1: the count is '" + token + "', it must be a whole number from -1 to 2147483647",
        fault.getMessage());
  }

  @ParameterizedTest
  @CsvSource({"0,0", "-1.5,-1.5", "+2e-3,0.002", ".5,0.5", "5.,5", "1E2,100", "4.9e-324,4.9e-324"})
  void decimalNumbersAreRead(String token, double value) throws IOException {
    assertEquals(value, at(token).number("the weight"));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "NaN",
        "Infinity",
        "-Infinity",
        "1e309",
        "1f",
        "1d",
        "0x1p1",
        "1,5",
        "e",
        ".",
        "--1"
      })
  void otherTokensAreNoNumbers(String token) throws IOException {
    TokenReader text = at(token);
    FormatException fault = assertThrows(FormatException.class, () -> text.number("the weight"));
    assertEquals(
        "text:1:1: the weight is '" + token + "', it must be a finite number", fault.getMessage());
  }
}
