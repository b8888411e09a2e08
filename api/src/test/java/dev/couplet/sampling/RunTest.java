package dev.couplet.sampling;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class RunTest {
  private static final Effort EFFORT = Effort.draws(3);
  private static final Structure STRUCTURE = Structure.exactlyOne(List.of(List.of(0, 2)));

  @Test
  void aPlainRunHasNothingButAnEffort() {
    Run run = Run.of(EFFORT);
    assertSame(EFFORT, run.effort());
    assertSame(Watch.none(), run.watch());
    assertEquals(List.of(), run.starts());
    assertEquals(Structure.none(), run.structure());
  }

  @Test
  void copiesChangeOnePart() {
    Watch watch = Watch.stop(StopSignal.create());
    List<State> starts = List.of(State.zeros(3));
    Run full = new Run(EFFORT, watch, starts, STRUCTURE);
    assertEquals(full, Run.of(EFFORT).watch(watch).starts(starts).structure(STRUCTURE));
    assertEquals(full, full.effort(Effort.draws(4)).effort(EFFORT));
  }

  @Test
  void laterChangesOfTheListOfStartsDoNotMatter() {
    List<State> starts = new ArrayList<>(List.of(State.zeros(3)));
    Run run = Run.of(EFFORT).starts(starts);
    starts.clear();
    assertEquals(1, run.starts().size());
    assertThrows(UnsupportedOperationException.class, () -> run.starts().clear());
  }

  @Test
  void partsThatAreMissingAreRefused() {
    assertThrows(NullPointerException.class, () -> Run.of(null));
    assertThrows(NullPointerException.class, () -> Run.of(EFFORT).watch(null));
    assertThrows(NullPointerException.class, () -> Run.of(EFFORT).starts(null));
    assertThrows(NullPointerException.class, () -> Run.of(EFFORT).structure(null));
  }

  @Test
  void whatDoesNotFitTheFormIsRefused() {
    Run run = Run.of(EFFORT).starts(List.of(State.zeros(3), State.zeros(4)));
    String told =
        assertThrows(IllegalArgumentException.class, () -> run.requireFit(3)).getMessage();
    assertEquals(
        "start 1 has 4 variables, the form has 3; pass states of the form that is sampled", told);
    Run structured = Run.of(EFFORT).structure(STRUCTURE);
    structured.requireFit(3);
    told =
        assertThrows(IllegalArgumentException.class, () -> structured.requireFit(2)).getMessage();
    assertEquals(
        "an exactly-one set names bit 2, the form has 2 variables; pass the structure of the form"
            + " that is sampled",
        told);
  }

  @Test
  void aSamplerTakesAnEffortAlone() {
    Sampler sampler =
        (form, run) -> {
          assertEquals(Run.of(EFFORT), run);
          return Draws.of(form, List.of(State.zeros(1)), End.DONE, run.effort().seed());
        };
    assertEquals(1, sampler.sample(Qubo.builder(1).build(), EFFORT).total());
  }
}
