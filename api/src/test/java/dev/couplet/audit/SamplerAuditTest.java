package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Sampler;
import java.time.Duration;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class SamplerAuditTest {
  private static Arguments breaks(String check, String how, Sampler sampler) {
    return Arguments.of(check, how, sampler);
  }

  static Stream<Arguments> spoiledResults() {
    return Stream.of(
        breaks("energies", "energies of another form", Sabotaged.energiesOfAnotherForm()),
        breaks("states", "states of another size", Sabotaged.statesOfAnotherSize()),
        breaks("seed", "another seed", Sabotaged.anotherSeed()),
        breaks("counts", "loses a draw", Sabotaged.losesADraw()),
        breaks("counts", "adds a draw", Sabotaged.addsADraw()),
        breaks("bound", "claims a proof", Sabotaged.claimsAProof()),
        breaks("stop", "always says done", Sabotaged.alwaysSaysDone()),
        breaks("end", "never says done", Sabotaged.neverSaysDone()),
        breaks("returns", "null", Sabotaged.returnsNull()),
        breaks("repeat", "goes on from the last run", Sabotaged.goesOnFromTheLastRun()),
        breaks("threads", "one stream a thread", Sabotaged.oneStreamAThread()),
        breaks("apart", "one stream for all", Sabotaged.oneStreamForAllDraws()),
        breaks("shared instance", "seed in a field", Sabotaged.keepsTheSeedInAField()));
  }

  static Stream<Arguments> spoiledLimits() {
    return Stream.of(
        breaks("forms", "refuses silently", Sabotaged.refusesMoreThan(20, "no")),
        breaks("returns", "refuses early", Sabotaged.refusesMoreThan(8, "10 is too large")),
        breaks("returns", "no variables", Sabotaged.failsWithoutVariables()));
  }

  static Stream<Arguments> spoiledCourses() {
    return Stream.of(
        breaks("listener", "never reports", SabotagedCourse.neverReports()),
        breaks("listener", "backwards", SabotagedCourse.reportsBackwards()),
        breaks("listener", "more than all", SabotagedCourse.reportsMoreThanAll()),
        breaks("listener", "two threads", SabotagedCourse.callsListenersFromTwoThreads()),
        breaks("listener throws", "swallowed", SabotagedCourse.swallowsWhatListenersThrow()),
        breaks("listener throws", "wrapped", SabotagedCourse.wrapsWhatListenersThrow()),
        breaks("listener throws", "lost", SabotagedCourse.losesWhatListenersThrowOnItsThreads()),
        breaks("interrupt", "lost flag", SabotagedCourse.losesTheInterrupt()),
        breaks("interrupt", "throws", SabotagedCourse.throwsWhenInterrupted()),
        breaks("starts", "takes any", SabotagedCourse.takesAnyStart()),
        breaks("starts", "checks the first", SabotagedCourse.checksTheFirstStartOnly()),
        breaks("structure", "takes any", SabotagedCourse.takesAnyStructure()),
        breaks("starts", "ignored", SabotagedCourse.ignoresStarts()),
        breaks("target", "ignored", SabotagedCourse.ignoresTheTarget()),
        breaks("target", "goes on", SabotagedCourse.goesOnAfterTheTarget()),
        breaks("target", "drops draws before", SabotagedCourse.dropsDrawsBeforeTheTarget()),
        breaks("target", "makes up draws before", SabotagedCourse.makesUpDrawsBeforeTheTarget()),
        breaks("target", "ends at the round", SabotagedCourse.endsAtTheRoundOfTheTarget()));
  }

  private static void assertCaught(String check, SamplerAudit audit) {
    Findings findings = audit.run();
    assertTrue(findings.all().stream().anyMatch(f -> f.check().equals(check)), findings::toString);
    AssertionError error = assertThrows(AssertionError.class, findings::orThrow);
    assertTrue(error.getMessage().contains("\n  [" + check + "] "), error::getMessage);
  }

  @ParameterizedTest(name = "{0}: {1}")
  @MethodSource("spoiledLimits")
  void aBadLimitIsCaught(String check, String how, Sampler sampler) {
    assertCaught(check, SamplerAudit.contract(sampler));
  }

  /** Three of the audit's own forms are enough to catch these, in a fifth of the time. */
  @ParameterizedTest(name = "{0}: {1}")
  @MethodSource({"spoiledResults", "spoiledCourses"})
  void everySabotageIsCaughtByItsCheck(String check, String how, Sampler sampler) {
    List<String> names = List.of("all zero", "frustrated triangle", "dense integers");
    List<Qubo> few =
        Gallery.all().stream()
            .filter(specimen -> names.contains(specimen.name()))
            .map(Specimen::form)
            .toList();
    assertEquals(names.size(), few.size());
    assertCaught(check, SamplerAudit.contract(sampler).forms(few));
  }

  /** These work on to the end of what they were asked for, so they get one small form only. */
  static Stream<Arguments> runaways() {
    return Stream.of(
        breaks("stop", "ignores the signal", SabotagedCourse.ignoresTheStopSignal()),
        breaks("interrupt", "ignores interrupts", SabotagedCourse.ignoresInterrupts()),
        breaks("returns", "ignores the clock", SabotagedCourse.ignoresTheClock()),
        breaks("returns", "hangs", SabotagedCourse.hangs()));
  }

  @ParameterizedTest(name = "{0}: {1}")
  @MethodSource("runaways")
  void aRunawayIsCaught(String check, String how, Sampler sampler) {
    Qubo form = Qubo.builder(3).addPair(0, 1, -1).addPair(1, 2, 1).addLinear(1, -1).build();
    // Short where it has to run out; long where a slow machine must not run it out.
    Duration patience = Duration.ofSeconds(check.equals("returns") ? 2 : 60);
    assertCaught(check, SamplerAudit.contract(sampler).forms(List.of(form)).patience(patience));
  }

  static Stream<Arguments> honest() {
    return Stream.of(
        Arguments.of("descent", new HonestSampler()),
        Arguments.of("a limit, told", Sabotaged.refusesMoreThan(12, "16 or 70 is too large")),
        Arguments.of("exhaustive", new ProvingSampler()));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("honest")
  void anHonestSamplerPasses(String how, Sampler sampler) {
    Findings findings = SamplerAudit.contract(sampler).run();
    assertDoesNotThrow(findings::orThrow);
    assertTrue(findings.none());
    List<String> promised =
        List.of(
            "draws",
            "states",
            "energies",
            "merged",
            "order",
            "counts",
            "seed",
            "end",
            "returns",
            "repeat",
            "threads",
            "shared instance",
            "target",
            "starts",
            "structure",
            "stop",
            "interrupt",
            "deadline",
            "listener",
            "listener throws",
            "threads end",
            "forms");
    assertTrue(findings.checks().containsAll(promised), () -> findings.checks().toString());
  }

  @Test
  void checksThatDependOnTheMethodAreMadeWhereTheyApply() {
    Findings proving = SamplerAudit.contract(new ProvingSampler()).run();
    assertTrue(proving.checks().contains("bound"));
    Findings drawing = SamplerAudit.contract(Sabotaged.oneStreamForAllDraws()).run();
    assertTrue(drawing.checks().contains("apart"));
    assertFalse(drawing.checks().contains("bound"));
  }

  @Test
  void settingsAreChecked() {
    SamplerAudit audit = SamplerAudit.contract(new HonestSampler());
    assertAll(
        () -> assertThrows(IllegalArgumentException.class, () -> audit.forms(List.of())),
        () -> assertThrows(IllegalArgumentException.class, () -> audit.patience(Duration.ZERO)));
  }

  @Test
  void aSamplerThatTakesNothingIsSaidToTakeNothing() {
    Findings findings = SamplerAudit.contract(Sabotaged.refusesMoreThan(-1, "never")).run();
    Finding last = findings.all().get(findings.all().size() - 1);
    assertEquals(new Finding("forms", "the sampler takes none of the forms"), last);
  }

  @Test
  void theAuditCanBeInterrupted() {
    Thread.currentThread().interrupt();
    Findings findings = SamplerAudit.contract(new HonestSampler()).run();
    assertTrue(Thread.interrupted());
    assertEquals(
        "'no variables' (0 variables, 0 pairs): the audit was interrupted",
        findings.all().get(0).message());
  }
}
