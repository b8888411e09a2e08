package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Bad input gives one clear line, status 2 and no report. */
class BadInputTest {
  @TempDir Path directory;
  private TestFolder folder;

  @BeforeEach
  void copyTheInventedData() {
    folder = TestFolder.invented(directory);
  }

  private static void refused(Outcome outcome, String line) {
    assertEquals("rounds: " + line + System.lineSeparator(), outcome.err());
    assertEquals("", outcome.out());
    assertEquals(2, outcome.status());
  }

  private void refused(String line) {
    refused(folder.run(), line);
  }

  private String path(String file) {
    return directory.resolve(file).toString();
  }

  @Test
  void missingFile() throws IOException {
    Files.delete(directory.resolve("wishes.csv"));
    refused(
        path("wishes.csv")
            + ": there is no such file; a folder of rounds holds villages.csv, vans.csv,"
            + " wishes.csv, together.csv, apart.csv");
  }

  @Test
  void emptyFile() {
    folder.write("vans.csv", "");
    refused(path("vans.csv") + ": the file is empty; it begins with a line van,crates");
  }

  @Test
  void noVillages() {
    folder.write("villages.csv", "village,crates,east,north\n");
    refused(path("villages.csv") + ": there is no village; list one or more, a line each");
  }

  @Test
  void missingColumn() {
    folder.write("villages.csv", "# none\nvillage,crates,east\nElm,2,1,1\n");
    refused(
        path("villages.csv")
            + ", line 2: column 'north' is missing; the line names village, crates, east");
  }

  @Test
  void columnTwice() {
    folder.write("vans.csv", "van,crates,crates\nsmall,2,3\n");
    refused(path("vans.csv") + ", line 1: column 'crates' stands twice");
  }

  @Test
  void tooFewFields() {
    folder.write("vans.csv", "van,crates\nsmall,2\nlarge\n");
    refused(path("vans.csv") + ", line 3: 1 field where 2 columns are named");
  }

  @Test
  void negativeCrates() {
    folder.replace("villages.csv", "Ash,2,", "Ash,-2,");
    refused(
        path("villages.csv") + ", line 6, column crates: -2 is too low; at least 0 is possible");
  }

  @Test
  void notANumber() {
    folder.replace("villages.csv", "Ash,2,5200", "Ash,2,5.2 km");
    refused(path("villages.csv") + ", line 6, column east: '5.2 km' is not a whole number");
  }

  @Test
  void tooHigh() {
    folder.replace("wishes.csv", "9000", "90000000000000000000000");
    refused(
        path("wishes.csv")
            + ", line 4, column metres: 90000000000000000000000 is too high; at most 1000000 is"
            + " possible");
  }

  @Test
  void duplicateVillage() {
    folder.replace("villages.csv", "Rowan,", "Elm,");
    refused(path("villages.csv") + ", line 15, column village: 'Elm' stands on line 8 already");
  }

  @Test
  void duplicateVan() {
    folder.replace("vans.csv", "large,", "small,");
    refused(path("vans.csv") + ", line 6, column van: 'small' stands on line 4 already");
  }

  @Test
  void noName() {
    folder.replace("vans.csv", "large,", " ,");
    refused(path("vans.csv") + ", line 6, column van: the field is empty; give a name");
  }

  @Test
  void longName() {
    folder.replace("vans.csv", "large,", "large and with a very long ladder,");
    refused(
        path("vans.csv")
            + ", line 6, column van: 'large and with a very long ladder' has more than 30 letters;"
            + " shorten it");
  }

  @Test
  void lineBreakInAName() {
    folder.replace("vans.csv", "large,", "\"lar\nge\",");
    refused(
        path("vans.csv")
            + ", line 7, column van: the name holds a line break or another control character");
  }

  @Test
  void unknownVanInAWish() {
    folder.replace("wishes.csv", "Oak,large", "Oak,huge");
    refused(path("wishes.csv") + ", line 5, column van: 'huge' does not stand in vans.csv");
  }

  @Test
  void sameWishTwice() {
    folder.append("wishes.csv", "Elm,small,4");
    refused(
        path("wishes.csv")
            + ", line 8, column van: the wish 'Elm by the small van' stands on line 4 already");
  }

  @Test
  void unknownVillageInAPair() {
    folder.append("apart.csv", "Elm,Ivy,");
    refused(path("apart.csv") + ", line 6, column other: 'Ivy' does not stand in villages.csv");
  }

  @Test
  void samePairTurnedRound() {
    folder.append("together.csv", "Hazel,Ash,");
    refused(
        path("together.csv")
            + ", line 6, column other: the pair Hazel and Ash stands on line 4 already");
  }

  @Test
  void pairedWithItself() {
    folder.append("apart.csv", "Elm,Elm,");
    refused(path("apart.csv") + ", line 6, column other: 'Elm' is paired with itself");
  }

  @Test
  void moreCratesThanRoom() {
    folder.replace("vans.csv", "large,11", "large,7");
    refused(
        "the villages of villages.csv get 22 crates in total, but the vans of vans.csv carry only"
            + " 21 in total");
  }

  @Test
  void mustAndMustNotShare() {
    folder.append("apart.csv", "Hazel,Ash,");
    refused(
        "Hazel and Ash must not share a van by apart.csv, but must by together.csv: Hazel with"
            + " Ash");
  }

  @Test
  void mustAndMustNotShareByWayOfOthers() {
    folder.write("together.csv", "village,other\nAsh,Birch\nMaple,Oak\nElm,Birch\nElm,Alder\n");
    folder.append("apart.csv", "Ash,Alder,");
    refused(
        "Alder and Elm must not share a van by apart.csv, but must by together.csv: Alder with"
            + " Elm");
    folder.write("apart.csv", "village,other\nLinden,Rowan\nAsh,Alder\n");
    refused(
        "Ash and Alder must not share a van by apart.csv, but must by together.csv: Ash with"
            + " Birch, Birch with Elm, Elm with Alder");
  }

  @Test
  void villageTooLargeForAnyVan() {
    folder.replace("vans.csv", "large,11", "large,8\nother,8");
    folder.replace("villages.csv", "Larch,3", "Larch,9");
    refused("Larch of villages.csv gets 9 crates, but no van of vans.csv carries more than 8");
  }

  @Test
  void groupTooLargeForAnyVan() {
    folder.write(
        "together.csv", "village,other\nLarch,Linden\nElm,Linden\nElm,Oak\nElm,Ash\nElm,Birch\n");
    refused(
        "Ash, Elm, Linden, Oak, Birch, Larch must share a van by together.csv and get 12 crates,"
            + " but no van of vans.csv carries more than 11");
  }

  @Test
  void apartWithOneVan() {
    folder.write("vans.csv", "van,crates\nonly,99\n").write("wishes.csv", "village,van,metres\n");
    refused("Alder and Elm must not share a van by apart.csv, but vans.csv lists only one");
  }

  @Test
  void notUtf8() throws IOException {
    Files.write(directory.resolve("vans.csv"), new byte[] {'v', (byte) 0xE9, '\n'});
    refused(path("vans.csv") + ": the file is not text in UTF-8; save it as UTF-8");
  }

  @Test
  void quoteThatDoesNotEnd() {
    folder.append("vans.csv", "\"huge,7");
    refused(path("vans.csv") + ", after line 6: a quoted field does not end as it should");
  }

  @Test
  void noLibraryOrTwo() {
    folder.write("library.csv", "east,north\n");
    refused(path("library.csv") + ": there is no library; list it, or leave out the file");
    folder.write("library.csv", "east,north\n1,2\n3,4\n");
    refused(path("library.csv") + ", line 3, column east: there is a second library; list one");
    folder.write("library.csv", "east,north\n1,x\n");
    refused(path("library.csv") + ", line 2, column north: 'x' is not a whole number");
  }

  @Test
  void badOptions() {
    refused(Outcome.of("--seconds", "0"), "--seconds 0.0: give a number above 0, at most 86400");
    refused(Outcome.of("--threads", "0"), "--threads 0: give a number from 1 to 1024");
    refused(Outcome.of("--seed", "x"), "Invalid value for option '--seed': 'x' is not a long");
    refused(Outcome.of("--fast"), "Unknown option: '--fast'");
    refused(
        Outcome.of("--svg", directory.toString()),
        "--svg " + directory + ": this is a folder; name a file");
    Path nowhere = directory.resolve("no").resolve("map.svg");
    refused(
        Outcome.of("--svg", nowhere.toString()),
        "--svg " + nowhere + ": there is no folder " + nowhere.getParent());
  }
}
