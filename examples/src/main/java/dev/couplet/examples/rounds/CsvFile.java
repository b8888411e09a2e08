package dev.couplet.examples.rounds;

import java.io.IOException;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/**
 * A CSV file: a line that names the columns, then rows. Lines that begin with # and blank lines are
 * skipped, columns that nobody asks for are left alone.
 */
final class CsvFile {
  private static final CSVFormat FORMAT =
      CSVFormat.DEFAULT
          .builder()
          .setCommentMarker('#')
          .setIgnoreEmptyLines(true)
          .setIgnoreSurroundingSpaces(true)
          .setTrim(true)
          .get();

  private final String name;
  private final List<String> wanted;
  private final List<Row> rows = new ArrayList<>();

  private CsvFile(String name, List<String> wanted) {
    this.name = name;
    this.wanted = wanted;
  }

  /** Reads a file that must have the wanted columns, in any order. */
  static CsvFile read(Folder folder, String file, String... wanted) {
    CsvFile csv = new CsvFile(folder.nameOf(file), List.of(wanted));
    csv.parse(folder.text(file));
    return csv;
  }

  String name() {
    return name;
  }

  List<Row> rows() {
    return rows;
  }

  private void parse(String text) {
    long line = 0;
    try (CSVParser parser = FORMAT.parse(new StringReader(text))) {
      Iterator<CSVRecord> records = parser.iterator();
      if (!records.hasNext()) {
        throw new BadInput(
            name + ": the file is empty; it begins with a line " + String.join(",", wanted));
      }
      List<String> header = records.next().toList();
      line = parser.getCurrentLineNumber();
      requireColumns(header, line);
      while (records.hasNext()) {
        CSVRecord fields = records.next();
        line = parser.getCurrentLineNumber();
        rows.add(row(header, fields.toList(), line));
      }
    } catch (IOException | UncheckedIOException e) {
      throw new BadInput(
          name + ", after line " + line + ": a quoted field does not end as it should");
    }
  }

  private void requireColumns(List<String> header, long line) {
    for (String column : wanted) {
      if (!header.contains(column)) {
        throw new BadInput(
            name
                + ", line "
                + line
                + ": column '"
                + column
                + "' is missing; the line names "
                + String.join(", ", header));
      }
      if (header.indexOf(column) != header.lastIndexOf(column)) {
        throw new BadInput(name + ", line " + line + ": column '" + column + "' stands twice");
      }
    }
  }

  private Row row(List<String> header, List<String> fields, long line) {
    if (fields.size() != header.size()) {
      String found = fields.size() + (fields.size() == 1 ? " field" : " fields");
      throw new BadInput(
          name
              + ", line "
              + line
              + ": "
              + found
              + " where "
              + header.size()
              + " columns are named");
    }
    Map<String, String> byColumn = new LinkedHashMap<>();
    for (int k = 0; k < fields.size(); k++) {
      byColumn.put(header.get(k), fields.get(k));
    }
    return new Row(name, line, byColumn);
  }
}
