package dev.couplet.consumer;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import java.io.File;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.lang.module.ModuleDescriptor;
import java.lang.module.ModuleFinder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.spi.ToolProvider;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A program that is a named module uses this one from the module path, with nothing else on it. */
class ModulePathTest {
  private static final String MODULE = "module tiny { requires dev.couplet.api; }\n";

  private static final String PROGRAM =
      """
      package tiny;

      import dev.couplet.audit.SamplerAudit;
      import dev.couplet.form.Qubo;
      import dev.couplet.form.State;
      import dev.couplet.sampling.Draws;
      import dev.couplet.sampling.Effort;
      import dev.couplet.sampling.End;
      import dev.couplet.sampling.Sampler;
      import java.util.List;

      public final class Main {
        public static void main(String[] args) {
          Qubo form = Qubo.builder(2).addLinear(0, -2).addPair(0, 1, 3).build();
          Sampler zeros =
              (f, run) ->
                  Draws.of(f, List.of(State.zeros(f.size())), End.DONE, run.effort().seed());
          System.out.println("best " + zeros.sample(form, Effort.draws(1)).best().energy());
          System.out.println("field " + form.toIsing().linear(0));
          System.out.println("sound " + SamplerAudit.contract(zeros).run().none());
          System.out.println("module " + Qubo.class.getModule().getName());
        }
      }
      """;

  /** What the compiler says; nothing if it is content. */
  private static String compile(Path folder, String program) throws Exception {
    Path module = Files.writeString(folder.resolve("module-info.java"), MODULE);
    Path main = Files.createDirectories(folder.resolve("tiny")).resolve("Main.java");
    Files.writeString(main, program);
    StringWriter told = new StringWriter();
    PrintWriter lines = new PrintWriter(told);
    int status =
        ToolProvider.findFirst("javac")
            .orElseThrow()
            .run(
                lines,
                lines,
                "-Xlint:all,-options",
                "--release",
                "17",
                "--module-path",
                ChildJvm.home(Qubo.class).toString(),
                "-d",
                folder.resolve("classes").toString(),
                module.toString(),
                main.toString());
    lines.flush();
    return status == 0 ? told.toString() : "failed: " + told;
  }

  @Test
  void aNamedModuleCompilesAndRuns(@TempDir Path folder) throws Exception {
    assertEquals("", compile(folder, PROGRAM));
    String path = folder.resolve("classes") + File.pathSeparator + ChildJvm.home(Qubo.class);
    ChildJvm.Outcome outcome =
        ChildJvm.run(folder, "--module-path", path, "--module", "tiny/tiny.Main");
    assertEquals(
        List.of("best 0.0", "field 0.25", "sound false", "module dev.couplet.api"),
        outcome.output().lines().toList());
    assertEquals(0, outcome.status());
  }

  @Test
  void everyPublicPackageIsExported() throws Exception {
    ModuleDescriptor described =
        ModuleFinder.of(ChildJvm.home(Qubo.class))
            .find("dev.couplet.api")
            .orElseThrow()
            .descriptor();
    assertAll(
        () ->
            assertEquals(
                described.packages().stream().sorted().toList(),
                described.exports().stream().map(e -> e.source()).sorted().toList()),
        () -> assertTrue(described.exports().stream().noneMatch(e -> e.isQualified())),
        () -> assertTrue(described.opens().isEmpty()));
  }
}
