package dev.couplet.bench.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import dev.couplet.anneal.Annealing;
import dev.couplet.anneal.Tempering;
import dev.couplet.audit.SamplerAudit;
import dev.couplet.bond.HostedSampler;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Guests;
import dev.couplet.embed.path.PathEmbedder;
import dev.couplet.exact.BranchAndBound;
import dev.couplet.exact.Elimination;
import dev.couplet.exact.Enumeration;
import dev.couplet.form.Qubo;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Sampler;
import dev.couplet.search.GreedyDescent;
import dev.couplet.search.Relinking;
import dev.couplet.search.Tabu;
import dev.couplet.solve.Solver;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every sampler of the library, listed once, and the whole contract over each. */
class EverySamplerTest {
  private static final int HOSTED = 10;

  static Stream<Sampler> samplers() {
    return Stream.of(
        Annealing.standard(),
        Tempering.standard(),
        Tempering.standard().clusters(),
        Tabu.standard(),
        Relinking.standard(),
        GreedyDescent.standard(),
        Enumeration.standard(),
        Elimination.standard(),
        BranchAndBound.standard(),
        Solver.standard());
  }

  @ParameterizedTest
  @MethodSource("samplers")
  void keepsTheContract(Sampler sampler) {
    SamplerAudit.contract(sampler).orThrow();
  }

  /** A sampler on a host takes the forms of its guest. */
  @Test
  void keepsTheContractOnAHost() {
    Embedding embedding =
        PathEmbedder.standard()
            .embed(Guests.complete(HOSTED), Host.cells(4, 3, 3), Effort.draws(10))
            .orThrow();
    HostedSampler sampler = HostedSampler.on(embedding, Annealing.standard());
    List<Qubo> forms = List.of(Qubo.builder(HOSTED).build(), dense(1), dense(20));
    SamplerAudit.contract(sampler).forms(forms).orThrow();
  }

  private static Qubo dense(int range) {
    SplittableRandom random = new SplittableRandom(range);
    Qubo.Builder form = Qubo.builder(HOSTED);
    for (int i = 0; i < HOSTED; i++) {
      form.addLinear(i, random.nextInt(-range, range + 1));
      for (int j = i + 1; j < HOSTED; j++) {
        form.addPair(i, j, random.nextInt(-range, range + 1));
      }
    }
    return form.build();
  }

  @Test
  void noSamplerIsForgotten() {
    Set<String> found = new TreeSet<>();
    for (JavaClass type :
        new ClassFileImporter()
            .withImportOption(new ImportOption.DoNotIncludeTests())
            .importPackages("dev.couplet")) {
      if (type.isAssignableTo(Sampler.class)
          && type.getModifiers().contains(JavaModifier.PUBLIC)
          && !type.isInterface()) {
        found.add(type.getName());
      }
    }
    Set<String> listed = new TreeSet<>();
    samplers().forEach(sampler -> listed.add(sampler.getClass().getName()));
    listed.add(HostedSampler.class.getName());
    assertEquals(listed, found);
  }
}
