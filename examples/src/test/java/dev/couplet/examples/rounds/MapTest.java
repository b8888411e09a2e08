package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

class MapTest {
  /** A letter of a sans serif face is at most this wide on average (common practice). */
  private static final double LETTER = 0.54 * MapLabels.FONT;

  private static final Pattern NAME =
      Pattern.compile("<text x=\"([\\d.]+)\" y=\"([\\d.]+)\" class=\"village\">([^<]*)<");

  @Test
  void namesCoverNeitherEachOtherNorMarks() {
    RoundsData data = RoundsReader.read(Folder.invented());
    assertLegible(data.villages(), RoundsMap.svg(data, rounds(data), "a test"));
    for (int seed = 0; seed < 20; seed++) {
      RoundsData random = random(seed, 20);
      assertLegible(random.villages(), RoundsMap.svg(random, rounds(random), "a test"));
    }
  }

  @Test
  void villagesAtOnePlaceAreDrawnToo() {
    List<Village> villages =
        List.of(new Village("A", 1, 5, 5), new Village("B", 1, 5, 5), new Village("C", 1, 5, 5));
    Van van = new Van("only", 9);
    RoundsData data = new RoundsData(villages, List.of(van), List.of(), List.of(), List.of());
    String svg = RoundsMap.svg(data, rounds(data), "a test");
    assertFalse(svg.contains("NaN") || svg.contains("Infinity"), svg);
    List<Box> names = names(svg);
    assertEquals(3, names.size());
    assertFalse(names.get(0).overlaps(names.get(1)));
  }

  @Test
  void everyRoundIsALineFromTheLibraryThroughItsVillagesAndBack() {
    RoundsData data = RoundsReader.read(Folder.invented());
    String svg = RoundsMap.svg(data, rounds(data), "a test");
    List<String> lines =
        Pattern.compile("<path class=\"round\" d=\"M ([^\"]*)\"")
            .matcher(svg)
            .results()
            .map(found -> found.group(1))
            .toList();
    assertEquals(3, lines.size());
    List<Box> names = names(svg);
    for (int k = 0; k < 3; k++) {
      String[] points = lines.get(k).split(" L ");
      assertEquals(6, points.length);
      assertEquals(points[0], points[5]);
      for (int stop = 1; stop <= 4; stop++) {
        Box name = names.get(data.villages().indexOf(rounds(data).get(k).villages().get(stop - 1)));
        String[] at = points[stop].split(" ");
        double x = Double.parseDouble(at[0]);
        double y = Double.parseDouble(at[1]);
        assertTrue(name.grown(35).overlaps(Box.around(x, y, 1, 1)), name + " is far from its mark");
      }
    }
    assertFalse(RoundsMap.withoutWays(data, rounds(data), "a test").contains("class=\"round\""));
  }

  @Test
  void northIsUpAndEastIsRight() {
    Village low = new Village("low", 1, 0, 0);
    Village high = new Village("high", 1, 10, 90);
    MapScale scale = MapScale.fitting(List.of(low, high), new Box(0, 0, 100, 100));
    assertTrue(scale.y(high) < scale.y(low));
    assertTrue(scale.x(high) > scale.x(low));
    assertEquals(scale.units(90), scale.y(low) - scale.y(high), 1e-9);
    assertEquals(20, scale.roundMetres(scale.units(49)));
  }

  @Test
  void thirtyVansHaveDifferentMarks() {
    Set<VanMark> marks = new HashSet<>();
    for (int van = 0; van < 30; van++) {
      marks.add(VanMark.of(van));
    }
    assertEquals(30, marks.size());
  }

  @Test
  void theLengthOfALineInABoxIsThatOfItsPartInside() {
    Box box = new Box(0, 0, 10, 10);
    assertEquals(10, box.lengthInside(-5, 3, 15, 3), 1e-12);
    assertEquals(5, box.lengthInside(7, 5, 7, 30), 1e-12);
    assertEquals(0, box.lengthInside(-5, 11, 15, 11), 0);
    assertEquals(0, box.lengthInside(20, 3, 30, 3), 0);
    assertEquals(Math.sqrt(200), box.lengthInside(-5, -5, 15, 15), 1e-12);
  }

  private static void assertLegible(List<Village> villages, String svg) {
    List<Box> names = names(svg);
    assertEquals(villages.size(), names.size());
    List<Box> marks = marks(svg);
    for (int a = 0; a < names.size(); a++) {
      for (Box mark : marks) {
        assertFalse(names.get(a).overlaps(mark), villages.get(a) + " covers a mark");
      }
      for (int b = 0; b < a; b++) {
        assertFalse(
            names.get(a).overlaps(names.get(b)), villages.get(a) + " covers " + villages.get(b));
      }
    }
  }

  private static List<Box> names(String svg) {
    List<Box> boxes = new ArrayList<>();
    for (MatchResult name : NAME.matcher(svg).results().toList()) {
      double half = name.group(3).length() * LETTER / 2;
      double middle = Double.parseDouble(name.group(2)) - 0.35 * MapLabels.FONT;
      boxes.add(Box.around(Double.parseDouble(name.group(1)), middle, half, 6));
    }
    return boxes;
  }

  /** Where circles stand and paths begin, as far as they are marks: fill and a white edge. */
  private static List<Box> marks(String svg) {
    List<Box> boxes = new ArrayList<>();
    Pattern mark =
        Pattern.compile("<(?:circle cx=\"|path d=\"M )([\\d.]+)(?:\" cy=\"| )([\\d.]+).*white");
    for (MatchResult at : mark.matcher(svg).results().toList()) {
      double x = Double.parseDouble(at.group(1));
      boxes.add(Box.around(x, Double.parseDouble(at.group(2)), 7, 7));
    }
    return boxes;
  }

  /** Every van takes the villages that come to it in turn. */
  private static List<Round> rounds(RoundsData data) {
    List<Round> rounds = new ArrayList<>();
    int vans = data.vans().size();
    for (int k = 0; k < vans; k++) {
      List<Village> served = new ArrayList<>();
      for (int v = k; v < data.villages().size(); v += vans) {
        served.add(data.villages().get(v));
      }
      rounds.add(new Round(data.vans().get(k), served));
    }
    return rounds;
  }

  private static RoundsData random(int seed, int count) {
    SplittableRandom random = new SplittableRandom(seed);
    List<Village> villages = new ArrayList<>();
    for (int v = 0; v < count; v++) {
      int east = random.nextInt(20_000);
      villages.add(new Village("Village " + v, 1 + v % 3, east, random.nextInt(15_000)));
    }
    List<Van> vans = List.of(new Van("a", 99), new Van("b", 99), new Van("c", 99));
    return new RoundsData(villages, vans, List.of(), List.of(), List.of());
  }
}
