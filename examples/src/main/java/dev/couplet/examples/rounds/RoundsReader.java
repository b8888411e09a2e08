package dev.couplet.examples.rounds;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Reads the files of a folder; every fault names file, line and column. */
final class RoundsReader {
  static final String VILLAGES = "villages.csv";
  static final String VANS = "vans.csv";
  static final String WISHES = "wishes.csv";
  static final String TOGETHER = "together.csv";
  static final String APART = "apart.csv";
  static final String LIBRARY = "library.csv";

  /** Those that a folder must hold; the library's is not among them. */
  static final String FILES = String.join(", ", VILLAGES, VANS, WISHES, TOGETHER, APART);

  /** Keeps every sum of crates and every distance far inside exact whole numbers. */
  private static final int MOST = 1_000_000;

  private final Folder folder;
  private final Map<String, Village> villages = new LinkedHashMap<>();
  private final Map<String, Van> vans = new LinkedHashMap<>();

  private RoundsReader(Folder folder) {
    this.folder = folder;
  }

  /**
   * Reads a folder.
   *
   * @throws BadInput if a file is missing or faulty
   */
  static RoundsData read(Folder folder) {
    return new RoundsReader(folder).data();
  }

  private RoundsData data() {
    readVillages();
    readVans();
    List<Wish> wishes = wishes();
    List<Pair> together = pairs(TOGETHER);
    List<Pair> apart = pairs(APART);
    List<Village> all = List.copyOf(villages.values());
    return new RoundsData(all, List.copyOf(vans.values()), wishes, together, apart, library(all));
  }

  private void readVillages() {
    CsvFile file = CsvFile.read(folder, VILLAGES, "village", "crates", "east", "north");
    Unique<String> names = new Unique<>("village");
    for (Row row : file.rows()) {
      String name = row.name("village");
      names.claim(row, name, "'" + name + "'");
      int crates = row.whole("crates", 0, MOST);
      int east = row.whole("east", -MOST, MOST);
      int north = row.whole("north", -MOST, MOST);
      villages.put(name, new Village(name, crates, east, north));
    }
    requireRows(file, "village");
  }

  private void readVans() {
    CsvFile file = CsvFile.read(folder, VANS, "van", "crates");
    Unique<String> names = new Unique<>("van");
    for (Row row : file.rows()) {
      String name = row.name("van");
      names.claim(row, name, "'" + name + "'");
      vans.put(name, new Van(name, row.whole("crates", 0, MOST)));
    }
    requireRows(file, "van");
  }

  /** Where the library stands: as its file says, or without one amid the villages. */
  private Library library(List<Village> all) {
    if (!folder.holds(LIBRARY)) {
      return Library.amid(all);
    }
    CsvFile file = CsvFile.read(folder, LIBRARY, "east", "north");
    if (file.rows().isEmpty()) {
      throw new BadInput(file.name() + ": there is no library; list it, or leave out the file");
    }
    if (file.rows().size() > 1) {
      throw file.rows().get(1).fault("east", "there is a second library; list one");
    }
    Row row = file.rows().get(0);
    return new Library(row.whole("east", -MOST, MOST), row.whole("north", -MOST, MOST));
  }

  private static void requireRows(CsvFile file, String what) {
    if (file.rows().isEmpty()) {
      throw new BadInput(file.name() + ": there is no " + what + "; list one or more, a line each");
    }
  }

  private List<Wish> wishes() {
    List<Wish> wishes = new ArrayList<>();
    Unique<String> names = new Unique<>("van");
    for (Row row : CsvFile.read(folder, WISHES, "village", "van", "metres").rows()) {
      Village village = village(row, "village");
      Van van = known(row, "van", vans, VANS);
      Wish wish = new Wish(village, van, row.whole("metres", 0, MOST));
      names.claim(row, wish.toString(), "the wish '" + wish + "'");
      wishes.add(wish);
    }
    return wishes;
  }

  private List<Pair> pairs(String name) {
    List<Pair> pairs = new ArrayList<>();
    Unique<Pair> distinct = new Unique<>("other");
    for (Row row : CsvFile.read(folder, name, "village", "other").rows()) {
      Pair pair = new Pair(village(row, "village"), village(row, "other"));
      if (pair.one().equals(pair.other())) {
        throw row.fault("other", "'" + pair.other() + "' is paired with itself");
      }
      distinct.claim(row, sorted(pair), "the pair " + pair);
      pairs.add(pair);
    }
    return pairs;
  }

  private static Pair sorted(Pair pair) {
    return pair.one().name().compareTo(pair.other().name()) < 0 ? pair : pair.turned();
  }

  private Village village(Row row, String column) {
    return known(row, column, villages, VILLAGES);
  }

  private static <T> T known(Row row, String column, Map<String, T> known, String file) {
    String name = row.name(column);
    T found = known.get(name);
    if (found == null) {
      throw row.fault(column, "'" + name + "' does not stand in " + file);
    }
    return found;
  }

  /** What stands in a file already, and on which line. */
  private static final class Unique<K> {
    private final String column;
    private final Map<K, Long> lines = new LinkedHashMap<>();

    Unique(String column) {
      this.column = column;
    }

    void claim(Row row, K key, String words) {
      Long before = lines.putIfAbsent(key, row.line());
      if (before != null) {
        throw row.fault(column, words + " stands on line " + before + " already");
      }
    }
  }
}
