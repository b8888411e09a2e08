package dev.couplet.bench.instances;

import dev.couplet.bench.models.NumberTable;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.Arrays;
import java.util.stream.Collectors;

/** The layouts of explicit distances in TSPLIB: row by row, lines broken anywhere. */
enum TspMatrix {
  FULL_MATRIX {
    @Override
    boolean holds(int i, int j) {
      return true;
    }
  },
  UPPER_ROW {
    @Override
    boolean holds(int i, int j) {
      return i < j;
    }
  },
  LOWER_ROW {
    @Override
    boolean holds(int i, int j) {
      return i > j;
    }
  },
  UPPER_DIAG_ROW {
    @Override
    boolean holds(int i, int j) {
      return i <= j;
    }
  },
  LOWER_DIAG_ROW {
    @Override
    boolean holds(int i, int j) {
      return i >= j;
    }
  };

  /** Whether a number for this row and column is written down. */
  abstract boolean holds(int i, int j);

  /** Reads the distances between so many cities; what is not written is mirrored, or 0. */
  static NumberTable read(TokenReader text, String format, int cities) throws IOException {
    for (TspMatrix layout : values()) {
      if (layout.name().equals(format)) {
        return layout.read(text, cities);
      }
    }
    String known = Arrays.stream(values()).map(Enum::name).collect(Collectors.joining(", "));
    throw text.fault("EDGE_WEIGHT_FORMAT is '" + format + "', read are " + known);
  }

  private NumberTable read(TokenReader text, int n) throws IOException {
    int count = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        count += holds(i, j) ? 1 : 0;
      }
    }
    double[] written = NumberList.read(text, count, "the distances");
    double[] full = new double[n * n];
    int next = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (holds(i, j)) {
          full[i * n + j] = written[next++];
          full[j * n + i] = holds(j, i) ? full[j * n + i] : full[i * n + j];
        }
      }
    }
    NumberTable table = NumberTable.of(n, n, full);
    if (!table.symmetric()) {
      throw text.fault("the distances are not symmetric, as those of a TYPE TSP must be");
    }
    return table;
  }
}
