package dev.couplet.examples;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.io.StringWriter;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.tools.JavaCompiler;
import javax.tools.StandardJavaFileManager;
import javax.tools.ToolProvider;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The README's example compiles, runs, and prints what the README says. */
class ReadmeTest {
  private static final Path README = Path.of("..", "README.md");

  @TempDir Path folder;

  @Test
  void theExampleCompilesAndPrintsWhatIsWrittenBelowIt() throws Exception {
    Path source = folder.resolve("Books.java");
    Files.writeString(source, block("java"));
    compile(source);
    assertEquals(block("text"), run("Books"));
  }

  @Test
  void thereAreExactlyTwoCommandsAndFewerThan200Lines() throws IOException {
    List<String> commands = block("sh").lines().toList();
    assertEquals(2, commands.size());
    assertTrue(commands.stream().allMatch(line -> line.startsWith("mvn ")), commands.toString());
    assertTrue(Files.readAllLines(README).size() < 200);
  }

  private static String block(String language) throws IOException {
    String readme = Files.readString(README).replace("\r\n", "\n");
    Matcher matcher =
        Pattern.compile("```" + language + "\n(.*?)```", Pattern.DOTALL).matcher(readme);
    assertTrue(matcher.find(), "the README has a block of " + language);
    return matcher.group(1);
  }

  private void compile(Path source) throws IOException {
    JavaCompiler compiler = ToolProvider.getSystemJavaCompiler();
    assertNotNull(compiler, "tests run on a JDK");
    StringWriter messages = new StringWriter();
    try (StandardJavaFileManager files = compiler.getStandardFileManager(null, null, null)) {
      List<String> options =
          List.of("-d", folder.toString(), "-classpath", System.getProperty("java.class.path"));
      boolean compiled =
          compiler
              .getTask(messages, files, null, options, null, files.getJavaFileObjects(source))
              .call();
      assertTrue(compiled, messages.toString());
    }
  }

  private String run(String className) throws Exception {
    PrintStream before = System.out;
    ByteArrayOutputStream printed = new ByteArrayOutputStream();
    URL[] folders = {folder.toUri().toURL()};
    try (URLClassLoader loader = new URLClassLoader(folders);
        PrintStream captured = new PrintStream(printed, true, StandardCharsets.UTF_8)) {
      System.setOut(captured);
      loader
          .loadClass(className)
          .getMethod("main", String[].class)
          .invoke(null, (Object) new String[0]);
    } finally {
      System.setOut(before);
    }
    return printed.toString(StandardCharsets.UTF_8).replace("\r\n", "\n");
  }
}
