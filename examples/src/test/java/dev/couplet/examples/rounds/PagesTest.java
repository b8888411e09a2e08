package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Effort;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Solver;
import java.time.Duration;
import java.util.List;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

/** What single pages say, also in cases that the invented data does not lead to. */
class PagesTest {
  private static final RoundsData INVENTED = RoundsReader.read(Folder.invented());

  @Test
  void theSmallCopyHasEveryKindOfRuleAndLoadsThatBite() {
    RoundsData copy = SmallCopy.of(INVENTED);
    assertEquals(4, copy.villages().size());
    assertEquals(2, copy.vans().size());
    assertEquals(1, copy.together().size());
    assertEquals(1, copy.apart().size());
    assertFalse(copy.wishes().isEmpty());
    assertTrue(copy.vans().stream().allMatch(van -> van.capacity() < copy.crates()));
    assertTrue(copy.crates() <= copy.capacity());
  }

  @Test
  void theAuditPageSaysSoWhenWeightsAreTooSmall() {
    RoundsModel copy = RoundsModel.of(SmallCopy.of(INVENTED));
    Lowered light = Lowering.standard().with(Weights.fixed(1)).lower(copy.model());
    LoweringAudit.Report report = LoweringAudit.exhaustive(light);
    assertFalse(report.passed());
    String page = AuditPage.of(copy, light, report);
    assertFalse(page.contains("findings  0"), page);
    assertTrue(page.contains("margin    -"), page);
  }

  @Test
  void theLoweringPageCountsEveryRuleAndTakesOneCoefficientApart() {
    RoundsModel rounds = RoundsModel.of(INVENTED);
    Lowered lowered = Lowering.standard().lower(rounds.model());
    String page = LoweringPage.of(rounds, lowered);
    assertEquals(lowered.weights().size(), sum(page, "(?m)^  +(\\d+)  \\D.*  \\d+  [a-z]$"));
    for (String reason : lowered.weights().stream().map(Weight::reason).distinct().toList()) {
      assertTrue(unwrapped(page).contains(reason), reason);
    }
    long inAll = sum(page, "(?m)^ +(-?\\d+)  in all$");
    long parts = sum(page, "(?m)^ +(-?\\d+)  (?:distance|load of the small van|Ash with .*)$");
    assertTrue(inAll != 0, page);
    assertEquals(inAll, parts);
  }

  /** The text with its line breaks undone. */
  private static String unwrapped(String page) {
    return page.replaceAll("\\n +", " ");
  }

  private static long sum(String page, String pattern) {
    return Pattern.compile(pattern)
        .matcher(page)
        .results()
        .map((MatchResult result) -> Long.parseLong(result.group(1)))
        .mapToLong(Long::longValue)
        .sum();
  }

  @Test
  void thePlanPageNamesWhatIsNotKept() {
    RoundsModel rounds = RoundsModel.of(INVENTED);
    Plan.Draft draft = rounds.model().plan();
    Van small = INVENTED.vans().get(0);
    INVENTED.villages().forEach(village -> draft.set(rounds.vanOf(village), small));
    String page = unwrapped(PlanPage.of(rounds, draft.evaluate()));
    assertTrue(page.contains("22 of 6"), page);
    assertTrue(page.contains("load of the small van, missed by 16"), page);
    assertTrue(page.contains("Linden apart from Rowan, the small van, missed by 1"), page);
    assertTrue(page.contains("Oak by the large van, 8000 m"), page);
  }

  @Test
  void withoutProofTheAnswerPageTellsTheGap() {
    RoundsModel rounds = RoundsModel.of(INVENTED);
    Plan known = Solver.standard().solve(rounds.model(), Effort.draws(1)).plan();
    Effort none = Effort.within(Duration.ofNanos(1));
    Answer answer = Solver.standard().from(known).solve(rounds.model(), none);
    String page = AnswerPage.of(rounds, answer);
    assertTrue(page.contains("there may be a better plan"), page);
    assertTrue(page.contains("gap"), page);
    assertTrue(AnswerPage.summary(answer).contains("none is worth less than"), page);
  }

  @Test
  void tablesKeepTheirWidthAndLoseNoWord() {
    String words = "one two three four five six seven eight nine ten eleven twelve";
    Columns columns = new Columns("lrl").row("a", "1", words).row("bcd", "1234", "x");
    List<String> lines = columns.lines(30);
    assertTrue(lines.stream().allMatch(line -> line.length() <= 30));
    assertEquals("a       1  one two three four", lines.get(0));
    assertEquals("bcd  1234  x", lines.get(lines.size() - 1));
    assertEquals(
        "a1" + words.replace(" ", "") + "bcd1234x", String.join("", lines).replace(" ", ""));
    assertEquals(List.of("overlong", "word"), Wrap.lines("overlong word", 4));
  }
}
